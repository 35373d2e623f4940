/**
 * Neutrinos that let go at a temperature T_dec and from then on keep their entropy to themselves.
 *
 * `instantaneous`: T_ν/T = (g_plasma(T)/g_plasma(T_dec))^{1/3}, by separate entropy conservation.
 * `specified`: the same T_ν, with ρ_ν and s_ν multiplied by 1 + (K_ρ − 1)h and 1 + (K_s − 1)h, where h grows from 0 at T_dec
 * to 1 late, so that the late values are exactly those of N_eff: with r the late T_ν/T,
 *   K_ρ = (N_eff/3)[(4/11)^{1/3}/r]⁴,   K_s = (N_eff/3)^{3/4}[(4/11)^{1/3}/r]³  (heated: ρ ∝ T_ν⁴, s ∝ T_ν³).
 * Sources: Kolb & Turner (1990), §3.5; N_eff = 3.044: Bennett et al., JCAP 04 (2021) 073. The growth h is this project's own.
 */
import type { NeutrinosInput } from '../wire/history.ts'
import { emptyPoint } from './bath.ts'
import type { BathPart, BathPoint } from './bath.ts'
import { NEUTRINO_G } from './particles/standardModel.ts'

/** T_ν/T after e± annihilation if neutrinos let go when electrons were still fully relativistic. */
const TEXTBOOK_RATIO = Math.cbrt(4 / 11)

/** Instantaneous decoupling means three neutrinos. */
export const effectiveNeutrinos = (neutrinos: NeutrinosInput): number =>
  neutrinos.treatment === 'specified' ? neutrinos.nEff : 3

/** Today's g_s: 2 + (21/11)(N_eff/3)^{3/4}, or the cruder 2 + (7/11)N_eff. */
export function entropyNumberToday(neutrinos: NeutrinosInput): number {
  const nEff = effectiveNeutrinos(neutrinos)
  const linear = neutrinos.treatment === 'specified' && neutrinos.entropyScaling === 'linear'
  return linear ? 2 + (7 / 11) * nEff : 2 + (21 / 11) * (nEff / 3) ** 0.75
}

/** T/T_ν − 1 late, below which decoupling came after everything that could heat the photons. */
const NOTHING_TO_HEAT = 1e-9

/** Adds neutrinos to a plasma that shares the photons' temperature. */
export function withNeutrinos(plasma: BathPart, neutrinos: NeutrinosInput): BathPart {
  const decoupling = neutrinos.decouplingTemperatureGeV
  const point = emptyPoint()
  plasma.evaluate(decoupling, point)
  const gAtDecoupling = point.gS
  const lateRatio = Math.cbrt(2 / gAtDecoupling)
  const nEff = effectiveNeutrinos(neutrinos)
  const specified = neutrinos.treatment === 'specified'
  const entropyPower = specified && neutrinos.entropyScaling === 'linear' ? 1 : 0.75
  const lateEnergy = specified ? (nEff / 3) * (TEXTBOOK_RATIO / lateRatio) ** 4 : 1
  const lateEntropy = specified ? (nEff / 3) ** entropyPower * (TEXTBOOK_RATIO / lateRatio) ** 3 : 1

  /** Adds the neutrinos to the numbers of the plasma; returns T_ν/T. */
  const addTo = (out: BathPoint, temperatureGeV: number): number => {
    if (temperatureGeV >= decoupling) {
      out.gRho += NEUTRINO_G
      out.gS += NEUTRINO_G
      out.gP += NEUTRINO_G
      return 1
    }
    const logSlope = out.gSSlope / out.gS
    const ratio = Math.cbrt(out.gS / gAtDecoupling)
    // With nothing left to heat the photons, T_ν stays at T and the late values hold at once.
    const heated = 1 / lateRatio - 1
    const growth = heated < NOTHING_TO_HEAT ? 1 : (1 / ratio - 1) / heated
    const growthSlope = heated < NOTHING_TO_HEAT ? 0 : -logSlope / 3 / ratio / heated
    const energy = NEUTRINO_G * (1 + (lateEnergy - 1) * growth) * ratio ** 4
    const inEntropy = 1 + (lateEntropy - 1) * growth
    out.gRho += energy
    out.gP += energy
    out.gS += NEUTRINO_G * inEntropy * ratio ** 3
    out.gSSlope += NEUTRINO_G * ratio ** 3 * ((lateEntropy - 1) * growthSlope + inEntropy * logSlope)
    return ratio
  }

  return {
    breaks: [...plasma.breaks, decoupling],
    sharp: plasma.sharp ?? [],
    evaluate(temperatureGeV, out) {
      plasma.evaluate(temperatureGeV, out)
      addTo(out, temperatureGeV)
    },
    contributions(temperatureGeV) {
      plasma.evaluate(temperatureGeV, point)
      const { gRho, gS, gP } = point
      const ratio = addTo(point, temperatureGeV)
      const own = { gRho: point.gRho - gRho, gS: point.gS - gS, gP: point.gP - gP }
      return [
        ...plasma.contributions(temperatureGeV),
        { name: 'ν', temperatureGeV: ratio * temperatureGeV, ...own },
      ]
    },
  }
}
