/**
 * Extra species apart from the bath in entropy: `ratio` (T_X = ξT at all times) and `decoupled` at T_d, whose own entropy
 * g_s,X a³T_X³ and the bath's g_s a³T³ are conserved separately below T_d. They add to ρ and p, not to the bath's s.
 * That T_X = ξT goes on through entropy transfers, and that entropy released later heats the bath alone, are stated
 * simplifications.
 */
import type { ExtraSpeciesInput } from '../wire/history.ts'
import { emptyPoint } from './bath.ts'
import type { BathPart, Contribution } from './bath.ts'
import { pointOfJet, zeroJet } from './gas.ts'
import { addSpeciesAt } from './speciesTable.ts'
import type { PressureJet } from './speciesTable.ts'

/** ρ and p of all species apart, in effective numbers of the bath's temperature. */
export interface ApartPoint {
  gRho: number
  gP: number
}

export interface SpeciesApart {
  /** Temperatures of decoupling, GeV. */
  readonly breaks: readonly number[]
  /** Adds up all species apart, given the bath's g_s at that temperature. */
  evaluate(temperatureGeV: number, bathGS: number, out: ApartPoint): void
  /** What each gives to ρ and p, in the order of the input; their entropy is their own, so g_s is zero. */
  contributions(temperatureGeV: number, bathGS: number): Contribution[]
  /** Temperature of each species apart, GeV, in the order of the input. */
  temperatures(temperatureGeV: number, bathGS: number): number[]
}

type TemperatureLaw = (temperatureGeV: number, bathGS: number) => number

function jetOf(species: ExtraSpeciesInput, temperatureGeV: number): PressureJet {
  const jet = zeroJet()
  addSpeciesAt(jet, species.massGeV / temperatureGeV, species.degreesOfFreedom, species.statistics)
  return jet
}

/** T_X of a species that let go at T_d: Newton's iteration on ln(s_X a³), which is monotone in ln T_X. */
function decoupledTemperature(
  species: ExtraSpeciesInput,
  decouplingGeV: number,
  gBathThere: number,
): TemperatureLaw {
  const there = jetOf(species, decouplingGeV)
  const entropyThere = Math.log(4 * there.value + there.first) + 3 * Math.log(decouplingGeV)
  return (temperatureGeV, bathGS) => {
    if (temperatureGeV >= decouplingGeV) return temperatureGeV
    const massless = temperatureGeV * Math.cbrt(bathGS / gBathThere)
    if (species.massGeV === 0) return massless
    const wanted = entropyThere + Math.log(bathGS / gBathThere) + 3 * Math.log(temperatureGeV / decouplingGeV)
    // Below T_d the entropy it had keeps a massive species warmer than a massless one; start on the hot side, where the
    // logarithm of the entropy is concave and Newton's iteration cannot overshoot.
    let lnT = Math.log(Math.max(massless, species.massGeV / 650))
    for (let i = 0; i < 60; i++) {
      const jet = jetOf(species, Math.exp(lnT))
      const entropy = 4 * jet.value + jet.first
      const slope = (12 * jet.value + 7 * jet.first + jet.second) / entropy
      const step = (wanted - Math.log(entropy) - 3 * lnT) / slope
      lnT += Math.max(-0.5, Math.min(0.5, step))
      if (Math.abs(step) < 1e-14 * Math.max(1, Math.abs(lnT))) break
    }
    return Math.exp(lnT)
  }
}

export function speciesApart(extraSpecies: readonly ExtraSpeciesInput[], bath: BathPart): SpeciesApart {
  const breaks: number[] = []
  const laws: { species: ExtraSpeciesInput; temperatureAt: TemperatureLaw }[] = []
  for (const species of extraSpecies) {
    const { coupling } = species
    if (coupling.kind === 'ratio')
      laws.push({ species, temperatureAt: (temperatureGeV) => coupling.ratio * temperatureGeV })
    if (coupling.kind === 'decoupled') {
      const point = emptyPoint()
      bath.evaluate(coupling.temperatureGeV, point)
      breaks.push(coupling.temperatureGeV)
      laws.push({ species, temperatureAt: decoupledTemperature(species, coupling.temperatureGeV, point.gS) })
    }
  }
  const point = emptyPoint()
  return {
    breaks,
    evaluate(temperatureGeV, bathGS, out) {
      out.gRho = out.gP = 0
      for (const { species, temperatureAt } of laws) {
        const own = temperatureAt(temperatureGeV, bathGS)
        pointOfJet(jetOf(species, own), point)
        out.gRho += point.gRho * (own / temperatureGeV) ** 4
        out.gP += point.gP * (own / temperatureGeV) ** 4
      }
    },
    contributions: (temperatureGeV, bathGS) =>
      laws.map(({ species, temperatureAt }) => {
        const own = temperatureAt(temperatureGeV, bathGS)
        pointOfJet(jetOf(species, own), point)
        const hotter = (own / temperatureGeV) ** 4
        return {
          name: species.name,
          temperatureGeV: own,
          gRho: point.gRho * hotter,
          gS: 0,
          gP: point.gP * hotter,
        }
      }),
    temperatures: (temperatureGeV, bathGS) =>
      laws.map(({ temperatureAt }) => temperatureAt(temperatureGeV, bathGS)),
  }
}
