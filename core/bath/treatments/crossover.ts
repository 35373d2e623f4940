/**
 * Smooth crossover: the entropy of the strongly interacting part passes from hadrons to free quarks and gluons,
 *
 *   s = (1 − w) s_hadrons + w s_free,    w = ½[1 + tanh(ln(T/T_c)/δ)],    δ = ΔT/T_c,
 *   p = ∫₀ᵀ s dT′,    ρ = Ts − p.
 *
 * Entropy is blended, not pressure: blended pressures make c_s² > 1 for narrow widths and leave gluons today.
 * An interpolation of common practice, without a source.
 */
import { evaluate, integrate, tabulate } from '../../numerics/interpolation/chebyshev.ts'
import type { BathPart } from '../bath.ts'
import {
  addGas,
  contributionOf,
  entropyOf,
  entropySlopeOf,
  gasContributions,
  gasJet,
  pointOfJet,
} from '../gas.ts'
import type { PressureJet } from '../speciesTable.ts'
import { STRONG_PART, WITHOUT_COLOUR, WITH_COLOUR } from '../particles/standardModel.ts'
import type { Particle } from '../particles/species.ts'

/** ln(T/T_c)/δ beyond which the weight differs from 0 or 1 by less than e^−42. */
const REACH = 21

/** Where a table looks closely, in units of δ from ln T_c. */
const CLOSE = [-9, -5, -3, -1.8, -0.9, 0, 0.9, 1.8, 3, 5, 9]

/** w, its complement and dw/d ln T. */
function blend(lnRatio: number, delta: number): { weight: number; rest: number; slope: number } {
  const z = (2 * lnRatio) / delta
  const weight = 1 / (1 + Math.exp(-z))
  const rest = 1 / (1 + Math.exp(z))
  return { weight, rest, slope: (2 / delta) * weight * rest }
}

export function crossover(
  transitionTemperatureGeV: number,
  transitionWidthGeV: number,
  hadrons: readonly Particle[],
  others: readonly Particle[],
): BathPart {
  const delta = transitionWidthGeV / transitionTemperatureGeV
  const lnTc = Math.log(transitionTemperatureGeV)
  const low = lnTc - REACH * delta
  const high = lnTc + REACH * delta
  const always = [...WITHOUT_COLOUR, ...others]

  /** s/T³ of the strong part and its derivative ds/d ln T over T³. */
  const blendedEntropy = (lnT: number): { entropy: number; slope: number } => {
    const { weight, rest, slope } = blend(lnT - lnTc, delta)
    const temperature = Math.exp(lnT)
    const cold = gasJet(hadrons, temperature)
    const hot = gasJet(WITH_COLOUR, temperature)
    return {
      entropy: rest * entropyOf(cold) + weight * entropyOf(hot),
      slope:
        rest * entropySlopeOf(cold) +
        weight * entropySlopeOf(hot) +
        slope * (entropyOf(hot) - entropyOf(cold)),
    }
  }

  /** ∫ sT d ln T over the blend, with temperatures in units of its cold end so that the numbers stay moderate. */
  const integral = integrate(
    tabulate((lnT, out) => (out[0] = blendedEntropy(lnT).entropy * Math.exp(4 * (lnT - low))), 1, low, high, {
      tolerance: 1e-13,
      breaks: CLOSE.map((steps) => lnTc + steps * delta),
    }),
  )
  const scratch = new Float64Array(1)
  const pressureIntegral = (lnT: number): number => {
    evaluate(integral, lnT, scratch)
    return scratch[0]!
  }
  const atLow = gasJet(hadrons, Math.exp(low)).value
  /** p − p_free, constant above the blend: what is left of the latent heat, over T⁴ at the cold end. */
  const bag =
    atLow + pressureIntegral(high) - gasJet(WITH_COLOUR, Math.exp(high)).value * Math.exp(4 * (high - low))

  const strongJet = (lnT: number): PressureJet => {
    if (lnT <= low) return gasJet(hadrons, Math.exp(lnT))
    if (lnT >= high) {
      const jet = gasJet(WITH_COLOUR, Math.exp(lnT))
      const vacuum = bag * Math.exp(-4 * (lnT - low))
      return { value: jet.value + vacuum, first: jet.first - 4 * vacuum, second: jet.second + 16 * vacuum }
    }
    const { entropy, slope } = blendedEntropy(lnT)
    const value = (atLow + pressureIntegral(lnT)) * Math.exp(-4 * (lnT - low))
    const first = entropy - 4 * value
    return { value, first, second: slope - 12 * value - 7 * first }
  }

  return {
    breaks: [],
    sharp: CLOSE.map((steps) => Math.exp(lnTc + steps * delta)),
    evaluate(temperatureGeV, out) {
      const jet = strongJet(Math.log(temperatureGeV))
      addGas(jet, always, temperatureGeV)
      pointOfJet(jet, out)
    },
    // Entropies are blended by weights, pressure and energy are not: the energy between them belongs to neither, so the strong part
    // is one. Below the blend it is hadrons and nothing else.
    contributions(temperatureGeV) {
      const lnT = Math.log(temperatureGeV)
      const strong =
        lnT <= low
          ? gasContributions(hadrons, temperatureGeV)
          : [contributionOf(STRONG_PART, strongJet(lnT), temperatureGeV)]
      return [...gasContributions(always, temperatureGeV), ...strong]
    },
  }
}
