/**
 * Radiation beside the photons after e± annihilation, as effective numbers of neutrinos:
 *
 *   N_eff = ρ_ν/[(7/8)(4/11)^{4/3} ρ_γ],   ΔN_eff of an extra species the same with its own ρ,
 *
 * taken at 1 keV, where m_e/T = 511 and nucleosynthesis is over. Source: Kolb & Turner, The Early Universe (1990), §3.5; PDG,
 * Big-bang cosmology.
 */
import { emptyPoint } from '../bath/bath.ts'
import { addGas, pointOfJet, zeroJet } from '../bath/gas.ts'
import type { EffectiveNeutrinos } from '../wire/compute.ts'
import type { ThermalHistory } from './thermalHistory.ts'

/** Where it is taken, GeV. */
export const AFTER_ANNIHILATION_GEV = 1e-6

/** g_ρ of photons. */
const PHOTONS = 2

const numberOf = (gRho: number): number => gRho / (PHOTONS * (7 / 8) * (4 / 11) ** (4 / 3))

type SpeciesThere = EffectiveNeutrinos['extraSpecies'][number]

/** ΔN_eff of a species with that g_ρ and temperature, or why it has none: it counts while its mass is at most its temperature. */
function deltaOf(name: string, massGeV: number, gRho: number, temperatureGeV: number): SpeciesThere {
  if (massGeV <= temperatureGeV) return { name, deltaNEff: numberOf(gRho) }
  const ratio = (massGeV / temperatureGeV).toPrecision(3)
  return {
    name,
    deltaNEff: null,
    because: `not relativistic then: its mass is ${ratio} times its temperature`,
  }
}

/** N_eff of the neutrinos and ΔN_eff of every extra species at 1 keV. */
export function effectiveNeutrinos({ input, radiation }: ThermalHistory): EffectiveNeutrinos {
  const temperature = AFTER_ANNIHILATION_GEV
  const point = emptyPoint()
  radiation.bath.evaluate(temperature, point)
  const { gRho: bathGRho, gS: bathGS } = point
  const apart = radiation.apart.contributions(temperature, bathGS)
  let inBath = 0
  let nextApart = 0
  const extraSpecies = input.extraSpecies.map((species): SpeciesThere => {
    if (species.coupling.kind !== 'bath') {
      const { gRho, temperatureGeV } = apart[nextApart++]!
      return deltaOf(species.name, species.massGeV, gRho, temperatureGeV)
    }
    const jet = zeroJet()
    addGas(jet, [species], temperature)
    pointOfJet(jet, point)
    inBath += point.gRho
    return deltaOf(species.name, species.massGeV, point.gRho, temperature)
  })
  return {
    temperatureGeV: temperature,
    neutrinos: numberOf(bathGRho - PHOTONS - inBath),
    extraSpecies,
    deltaNEff: extraSpecies.reduce((sum, { deltaNEff }) => sum + (deltaNEff ?? 0), 0),
  }
}
