/**
 * Age of the universe: dt/dT = −(1 + δ_s)/(HT), from t = 2/((4 + n)H) at the start, n = 0 without a fluid (t = 1/(2H)).
 * Source: Kolb & Turner, The Early Universe (1990), §3.4 (t ≈ 2.42 g_*^{−1/2} (T/MeV)^{−2} s).
 */
import { HBAR_GEV_S } from '../constants/natural.ts'
import { gaussLegendre, integrateWith } from '../numerics/quadrature/gaussLegendre.ts'
import { complete, mapped } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { LATE_GEV, lateUniverse } from './lateUniverse.ts'
import { emptyExpansion, hubbleOf } from './expansionPoint.ts'
import type { ThermalHistory } from './thermalHistory.ts'

const rule = gaussLegendre(16)

/** Widest panel in ln T. */
export const LARGEST_PANEL = 0.3

/** What the age is an integral of. */
export interface AgeIntegrand {
  /** dt/d ln(1/T), 1/GeV, at ln(T/GeV). */
  perLnT(lnT: number): number
  /** Values of ln(T/GeV), descending, where it jumps. */
  readonly cuts: readonly number[]
}

export function ageIntegrand(history: ThermalHistory): AgeIntegrand {
  const late = lateUniverse(history)
  const point = emptyExpansion()
  return {
    perLnT(lnT) {
      history.at(lnT, point)
      return point.stretch / hubbleOf(point.energy + late.matter(point) + late.darkEnergy(point))
    },
    cuts: [...history.breaks, ...history.kinks, LATE_GEV].map(Math.log).sort((a, b) => b - a),
  }
}

/** The first cut below ln T; −∞ when there is none. */
export function nextCut({ cuts }: AgeIntegrand, lnT: number): number {
  let low = 0
  let high = cuts.length
  while (low < high) {
    const middle = (low + high) >> 1
    if (cuts[middle]! < lnT) high = middle
    else low = middle + 1
  }
  return cuts[low] ?? -Infinity
}

/** Time, 1/GeV, from ln T = `from` down to `to`. */
export function ageBetween(integrand: AgeIntegrand, from: number, to: number): number {
  let age = 0
  for (let high = from; high > to;) {
    const low = Math.max(to, nextCut(integrand, high))
    const panels = Math.max(1, Math.ceil((high - low) / LARGEST_PANEL))
    const width = (high - low) / panels
    for (let panel = 0; panel < panels; panel++)
      age += integrateWith(rule, integrand.perLnT, high - (panel + 1) * width, high - panel * width)
    high = low
  }
  return age
}

/** Age, 1/GeV, at ln T, when nothing but the expansion that dominates at the highest temperatures went before. */
export function earliestAge(history: ThermalHistory, lnT: number): number {
  const point = emptyExpansion()
  history.at(lnT, point)
  return 2 / ((4 + history.expansion.earlyIndex) * point.hubble)
}

/** Ages to a step: of the order of a millisecond. */
const AGES_TO_A_STEP = 200

/** Ages, s, at the given temperatures, GeV, in any order. */
export function* agesSteps(history: ThermalHistory, temperaturesGeV: readonly number[]): Steps<number[]> {
  const integrand = ageIntegrand(history)
  const order = temperaturesGeV.map((_, i) => i).sort((i, j) => temperaturesGeV[j]! - temperaturesGeV[i]!)
  let from = Math.log(Math.max(history.expansion.ageStartsAt, temperaturesGeV[order[0]!] ?? 0))
  let age = earliestAge(history, from)
  const result = new Array<number>(temperaturesGeV.length).fill(0)
  yield* mapped(order, AGES_TO_A_STEP, (i) => {
    const to = Math.log(temperaturesGeV[i]!)
    age += ageBetween(integrand, from, to)
    from = to
    result[i] = age * HBAR_GEV_S
  })
  return result
}

/** The same at once. */
export const ages = (history: ThermalHistory, temperaturesGeV: readonly number[]): number[] =>
  complete(agesSteps(history, temperaturesGeV))
