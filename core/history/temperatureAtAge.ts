/** The bath's temperature at given ages: the inverse of `ages`, by Newton's iteration on the same integral. */
import { brent } from '../numerics/roots/brent.ts'
import { InputError } from '../wire/fault.ts'
import { HBAR_GEV_S } from '../constants/natural.ts'
import { mapped } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { COLDEST_GEV, HOTTEST_GEV } from './radiation.ts'
import type { ThermalHistory } from './thermalHistory.ts'
import { LARGEST_PANEL, ageBetween, ageIntegrand, earliestAge, nextCut } from './time.ts'
import type { AgeIntegrand } from './time.ts'

const LN_COLDEST = Math.log(COLDEST_GEV)
const LN_HOTTEST = Math.log(HOTTEST_GEV)

/** Relative error of an age at which the iteration ends; two more digits than an age has. */
const CLOSE_ENOUGH = 1e-13

const refuse = (index: number, timeS: number, bound: string): never => {
  throw new InputError([{ path: `timesS[${index}]`, value: timeS, message: `allowed: ${bound}` }])
}

/** A stretch of the history without breaks, with the ages at its ends, 1/GeV. */
interface Panel {
  high: number
  low: number
  ageAtHigh: number
  ageAtLow: number
}

/** The panel below ln T = `high`. */
function panelBelow(integrand: AgeIntegrand, high: number, ageAtHigh: number): Panel {
  const low = Math.max(nextCut(integrand, high), high - LARGEST_PANEL, LN_COLDEST)
  return { high, low, ageAtHigh, ageAtLow: ageAtHigh + ageBetween(integrand, high, low) }
}

/** ln T inside the panel at that age: Newton's iteration, kept inside. */
function within(integrand: AgeIntegrand, { high, low, ageAtHigh, ageAtLow }: Panel, age: number): number {
  // ln t is all but straight in ln T.
  const share = ageAtHigh > 0 ? Math.log(age / ageAtHigh) / Math.log(ageAtLow / ageAtHigh) : 0.5
  let lnT = high + (low - high) * share
  for (let i = 0; i < 30; i++) {
    const excess = ageAtHigh + ageBetween(integrand, high, lnT) - age
    if (Math.abs(excess) <= CLOSE_ENOUGH * age) break
    lnT = Math.min(high, Math.max(low, lnT + excess / integrand.perLnT(lnT)))
  }
  return lnT
}

/** ln T from which the age is integrated, so that the earliest of the ages comes after it. */
function startFor(history: ThermalHistory, earliest: number, index: number): number {
  const usual = Math.log(history.expansion.ageStartsAt)
  if (earliest >= earliestAge(history, usual)) return usual
  if (earliest < earliestAge(history, LN_HOTTEST))
    refuse(
      index,
      earliest * HBAR_GEV_S,
      `at least ${earliestAge(history, LN_HOTTEST) * HBAR_GEV_S} s, the age at ${HOTTEST_GEV} GeV`,
    )
  return brent((lnT) => Math.log(earliestAge(history, lnT) / earliest), usual, LN_HOTTEST, 1e-14)
}

/** Temperatures to a step: of the order of a millisecond. */
const TEMPERATURES_TO_A_STEP = 50

/**
 * Temperatures, GeV, at the given ages, s, in any order.
 * @throws InputError for an age before the hottest or after the coldest temperature of the tables
 */
export function* temperatureSteps(history: ThermalHistory, timesS: readonly number[]): Steps<number[]> {
  const ages = timesS.map((time) => time / HBAR_GEV_S)
  const order = ages.map((_, i) => i).sort((i, j) => ages[i]! - ages[j]!)
  const integrand = ageIntegrand(history)
  const start = startFor(history, ages[order[0]!]!, order[0]!)
  let panel = panelBelow(integrand, start, earliestAge(history, start))
  const temperatures = new Array<number>(timesS.length).fill(0)
  yield* mapped(order, TEMPERATURES_TO_A_STEP, (i) => {
    while (panel.ageAtLow < ages[i]!) {
      if (panel.low <= LN_COLDEST)
        refuse(i, timesS[i]!, `at most ${panel.ageAtLow * HBAR_GEV_S} s, the age at ${COLDEST_GEV} GeV`)
      panel = panelBelow(integrand, panel.low, panel.ageAtLow)
    }
    temperatures[i] = Math.exp(within(integrand, panel, ages[i]!))
  })
  return temperatures
}
