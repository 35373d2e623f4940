import type { Guard } from '../../wire/compute.ts'
import { COMMON_PRACTICE, raise } from './guard.ts'

/** Numbers that the guards of freeze-in rest on. */
export interface FreezeInFacts {
  massGeV: number
  yieldToday: number
  /** Y_eq of the candidate at the production peak. */
  equilibriumYield: number
  /** Production per candidate in equilibrium over H at the production peak. */
  rateOverHubble: number
  maximumTemperatureGeV: number | null
  /** Where production would peak were the temperature not bounded, GeV. */
  unboundedPeakGeV: number
}

const KEV = 1e-6

/** Y/Y_eq where Y_eq is too small for a double. */
const LARGEST_FRACTION = 1e300

/** Guards that say the inverse process counts. */
export const OF_THE_INVERSE: readonly string[] = ['not-freeze-in', 'production-above-expansion']

/** Guards common to every freeze-in. */
export function freezeInGuards(facts: FreezeInFacts): Guard[] {
  const guards: Guard[] = []
  const fraction = Math.min(facts.yieldToday / facts.equilibriumYield, LARGEST_FRACTION)
  if (fraction > 0.1) {
    const message = 'The yield comes near that of equilibrium: the inverse process would lower it.'
    guards.push(
      raise('not-freeze-in', message, fraction, 0.1, 'Y/Y_eq', 'Hall et al., JHEP 03 (2010) 080, §2'),
    )
  }
  const rate = Math.min(facts.rateOverHubble, LARGEST_FRACTION)
  if (rate > 1) {
    const message = 'Production is faster than the expansion: it brings the candidate into equilibrium.'
    guards.push(
      raise('production-above-expansion', message, rate, 1, 'Γ/H', 'Hall et al., JHEP 03 (2010) 080, §2'),
    )
  }
  const { maximumTemperatureGeV, unboundedPeakGeV } = facts
  if (maximumTemperatureGeV !== null && maximumTemperatureGeV < unboundedPeakGeV) {
    const message = 'The maximum temperature lies below the production peak: only the tail is made.'
    guards.push(
      raise('production-cut-off', message, maximumTemperatureGeV, unboundedPeakGeV, 'GeV', COMMON_PRACTICE),
    )
  }
  if (facts.massGeV < 10 * KEV) {
    const message = 'A freeze-in candidate this light moves fast enough to smooth structure on small scales.'
    const source = "D'Eramo & Lenoci, JCAP 10 (2021) 045, from memory"
    guards.push(raise('structure-formation', message, facts.massGeV / KEV, 10, 'keV', source))
  }
  return guards
}

/** Numbers that the guards of a decaying parent rest on. */
export interface DecayFacts {
  lifetimeS: number
  /** Γ/H at the parent's freeze-out; undefined for a parent kept in equilibrium. */
  widthOverHubble: number | undefined
}

/** Guards of a decaying parent. */
export function decayGuards({ lifetimeS, widthOverHubble }: DecayFacts): Guard[] {
  const guards: Guard[] = []
  if (lifetimeS > 0.1) {
    const message = 'Parents decay after 0.1 s: their late decays can change the light elements.'
    guards.push(raise('late-decay', message, lifetimeS, 0.1, 's', COMMON_PRACTICE))
  }
  if (widthOverHubble !== undefined && widthOverHubble > 0.1) {
    const message =
      'The parent decays near its own freeze-out: freeze-in and late decay are no separate parts of the answer.'
    guards.push(raise('decay-near-freeze-out', message, widthOverHubble, 0.1, 'Γ/H', COMMON_PRACTICE))
  }
  return guards
}
