/**
 * Freeze-in without back-reaction: dn_X/dt + 3Hn_X = γ(T), so that with Z = n a³/(s a³)_today
 *
 *   Z = ∫ γ/(sH) (−d ln a/d ln T) e^{−lnDilution} d ln(1/T),
 *
 * a quadrature between the breaks of the history, from nothing at the hottest temperature.
 * Source: Hall, Jedamzik, March-Russell, West, JHEP 03 (2010) 080.
 */
import { emptyExpansion } from '../history/expansionPoint.ts'
import type { ExpansionPoint } from '../history/expansionPoint.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { gaussLegendre, integrateWith } from '../numerics/quadrature/gaussLegendre.ts'
import type { QuadratureRule } from '../numerics/quadrature/gaussLegendre.ts'
import { panelEdges } from './panels.ts'
import { Sampler, emptySamples } from './yieldSamples.ts'
import type { YieldSamples } from './yieldSamples.ts'

/** What produces the candidate. */
export interface FreezeInSource {
  /** The mass in x = m/T, GeV. */
  scaleGeV: number
  /** Candidates produced per volume and time, GeV⁴, at temperature T, GeV. */
  reactionDensity(temperatureGeV: number): number
  /** Where production begins and where it is over, GeV. */
  hottestGeV: number
  coldestGeV: number
  /** Temperatures, GeV, where a derivative of the reaction density jumps. */
  breaks: readonly number[]
}

/** Rules of rising care for `checked`. */
export const FREEZE_IN_RULES: readonly QuadratureRule[] = [
  gaussLegendre(6),
  gaussLegendre(10),
  gaussLegendre(16),
  gaussLegendre(24),
]

const WIDEST_PANEL = 1

/** dZ/d ln(1/T) at ln T for a rate per volume and time, GeV⁴. */
function perLnT(history: ThermalHistory, rateAt: (point: ExpansionPoint) => number): (lnT: number) => number {
  const point = emptyExpansion()
  return (lnT) => {
    history.at(lnT, point)
    return (rateAt(point) * point.stretch * Math.exp(-point.lnDilution)) / (point.entropy * point.hubble)
  }
}

/** dZ/d ln(1/T) at ln T from the bath alone. */
export const thermalPerLnT = (history: ThermalHistory, source: FreezeInSource) =>
  perLnT(history, (point) => source.reactionDensity(point.temperature))

/** dZ/d ln(1/T) at ln T from a decaying field alone. */
export const fieldPerLnT = (history: ThermalHistory) => perLnT(history, (point) => point.candidatesPerTime)

/** dZ/d ln(1/T) at ln T. */
export const productionPerLnT = (history: ThermalHistory, source: FreezeInSource) =>
  perLnT(history, (point) => source.reactionDensity(point.temperature) + point.candidatesPerTime)

/** Temperature, GeV, below which nothing is made, neither by the bath nor by a decaying field. */
export const productionEnds = (history: ThermalHistory, source: FreezeInSource): number =>
  Math.max(history.temperatureToday, Math.min(source.coldestGeV, history.expansion.producesUntil ?? Infinity))

/** What a decaying field makes from a temperature, GeV, downwards; the bath makes nothing. */
export const fieldSource = (scaleGeV: number, hottestGeV: number): FreezeInSource => ({
  scaleGeV,
  hottestGeV,
  coldestGeV: hottestGeV,
  reactionDensity: () => 0,
  breaks: [],
})

/**
 * The yield today.
 * @param samples wanted ln x, ascending; ln Y is written there, NaN before the start
 */
export function solveFreezeIn(
  history: ThermalHistory,
  source: FreezeInSource,
  rule: QuadratureRule,
  samples: YieldSamples | null = null,
): number {
  const lnScale = Math.log(source.scaleGeV)
  const production = productionPerLnT(history, source)
  const sampler = new Sampler(samples)
  const point = emptyExpansion()
  const lnYield = (lnX: number, z: number): number => {
    history.at(lnScale - lnX, point)
    return Math.log(z) + point.lnDilution
  }
  const hot = Math.log(source.hottestGeV)
  const today = Math.log(history.temperatureToday)
  const cold = Math.log(productionEnds(history, source))
  const edges = panelEdges(history, hot, cold, WIDEST_PANEL, source.breaks.map(Math.log))
  let z = 0
  sampler.upTo(lnScale - hot - 1e-12, () => NaN)
  for (let i = 0; i + 1 < edges.length; i++) {
    const [from, to] = [edges[i]!, edges[i + 1]!]
    const before = z
    sampler.upTo(lnScale - to, (lnX) =>
      lnYield(lnX, before + integrateWith(rule, production, lnScale - lnX, from)),
    )
    z += integrateWith(rule, production, to, from)
  }
  sampler.upTo(lnScale - today, (lnX) => lnYield(lnX, z))
  return z
}

/** Adds what a decaying field makes, as a source, to samples of a yield from elsewhere. */
export function addField(history: ThermalHistory, field: FreezeInSource, samples: YieldSamples): void {
  const more = emptySamples(samples.lnX)
  solveFreezeIn(history, field, FREEZE_IN_RULES[1]!, more)
  more.lnYield.forEach((lnMore, i) => {
    if (!Number.isFinite(lnMore)) return
    const lnElsewhere = samples.lnYield[i]!
    samples.lnYield[i] = Number.isNaN(lnElsewhere)
      ? lnMore
      : lnMore + Math.log1p(Math.exp(lnElsewhere - lnMore))
  })
}

/** Temperature, GeV, where dZ/d ln T is largest, by a scan in steps of 2 %. */
export function productionPeak(history: ThermalHistory, source: FreezeInSource): number {
  const production = productionPerLnT(history, source)
  const cold = Math.log(source.coldestGeV)
  let best = Math.log(source.hottestGeV)
  let most = 0
  const from = Math.min(best, Math.log(source.scaleGeV) + 5)
  for (let lnT = from; lnT > cold; lnT -= 0.02) {
    const here = production(lnT)
    if (here > most) [most, best] = [here, lnT]
  }
  return Math.exp(best)
}
