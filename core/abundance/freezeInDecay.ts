/**
 * Freeze-in by decay of a parent B in equilibrium, B → n_X X + …, width Γ:
 *
 *   dn_X/dt + 3Hn_X = n_X g_B m_B² T Γ/(2π²) · Σ_k (−η)^{k+1} K₁(k m_B/T)/k,
 *
 * the first term alone for Maxwell–Boltzmann; so dY/d ln T = −γ(1 + δ_s)/(sH), a quadrature. It starts at infinite
 * temperature (numerically x = 1e-5, where what is missing is below 1e-14) or at the maximum temperature, from nothing.
 * Source: Hall, Jedamzik, March-Russell, West, JHEP 03 (2010) 080, eq. 4.5; the sum: exact statistics of the parent.
 */
import { decaySum } from '../bath/speciesTable.ts'
import { emptyExpansion } from '../history/thermalHistory.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { gaussLegendre, integrateWith } from '../numerics/quadrature/gaussLegendre.ts'
import type { QuadratureRule } from '../numerics/quadrature/gaussLegendre.ts'
import type { EquilibriumSpecies } from './equilibrium.ts'
import type { YieldSamples } from './freezeOut.ts'
import { panelEdges } from './panels.ts'

/** The decaying parent. */
export interface DecaySource {
  parent: EquilibriumSpecies
  widthGeV: number
  /** Particles of the candidate per decay. */
  perDecay: number
}

const EARLIEST_X = 1e-5
/** e^{−x} is then below 1e-19. */
const LATEST_X = 60

/** Rules of rising care for `checked`. */
export const DECAY_RULES: readonly QuadratureRule[] = [
  gaussLegendre(6),
  gaussLegendre(10),
  gaussLegendre(16),
  gaussLegendre(24),
]

const WIDEST_PANEL = 1

/** dY/d ln x of the candidate at ln T, where x = m_B/T. */
export function decayProduction(
  history: ThermalHistory,
  { parent, widthGeV, perDecay }: DecaySource,
): (lnT: number) => number {
  const point = emptyExpansion()
  const factor = (perDecay * parent.degreesOfFreedom * parent.massGeV ** 2 * widthGeV) / (2 * Math.PI ** 2)
  return (lnT) => {
    history.at(lnT, point)
    const source =
      factor * point.temperature * decaySum(parent.massGeV / point.temperature, parent.statistics)
    return (source * (1 + point.delta)) / (point.entropy * point.hubble)
  }
}

/** Hottest temperature at which anything is produced, GeV. */
export function hottestProduction(history: ThermalHistory, parent: EquilibriumSpecies): number {
  return Math.min(history.input.maximumTemperatureGeV ?? Infinity, parent.massGeV / EARLIEST_X, 1e16)
}

/**
 * The yield today.
 * @param samples wanted ln x = ln(m_B/T), ascending; ln Y is written there, NaN before the start
 */
export function solveFreezeInDecay(
  history: ThermalHistory,
  source: DecaySource,
  rule: QuadratureRule,
  samples: YieldSamples | null = null,
): number {
  const lnMass = Math.log(source.parent.massGeV)
  const production = decayProduction(history, source)
  const hot = Math.log(hottestProduction(history, source.parent))
  const today = Math.log(history.temperatureToday)
  const cold = Math.max(lnMass - Math.log(LATEST_X), today)
  const step = history.entropyStep
  const edges = panelEdges(history, hot, cold, WIDEST_PANEL)
  let next = 0
  let yieldSoFar = 0
  const sampleTo = (lnX: number, lnYieldAt: (lnX: number) => number): void => {
    if (!samples) return
    while (next < samples.lnX.length && samples.lnX[next]! <= lnX)
      samples.lnYield[next] = lnYieldAt(samples.lnX[next++]!)
  }
  sampleTo(lnMass - hot - 1e-12, () => NaN)
  for (let i = 0; i + 1 < edges.length; i++) {
    const [from, to] = [edges[i]!, edges[i + 1]!]
    const before = yieldSoFar
    sampleTo(lnMass - to, (lnX) => Math.log(before + integrateWith(rule, production, lnMass - lnX, from)))
    yieldSoFar += integrateWith(rule, production, to, from)
    if (step && Math.abs(to - Math.log(step.temperature)) < 1e-12) yieldSoFar /= step.factor
  }
  const released = step && Math.log(step.temperature) < cold - 1e-12 ? step.factor : 1
  const stepX = step ? lnMass - Math.log(step.temperature) : Infinity
  sampleTo(lnMass - today, (lnX) => Math.log(yieldSoFar / (lnX > stepX ? released : 1)))
  return yieldSoFar / released
}

/** Temperature, GeV, where dY/d ln T is largest. */
export function productionPeak(history: ThermalHistory, source: DecaySource): number {
  const production = decayProduction(history, source)
  const lnMass = Math.log(source.parent.massGeV)
  const hot = Math.log(hottestProduction(history, source.parent))
  let best = hot
  let most = 0
  for (let lnX = Math.max(lnMass - hot, Math.log(1e-2)); lnX < Math.log(30); lnX += 0.02) {
    const here = production(lnMass - lnX)
    if (here > most) {
      most = here
      best = lnMass - lnX
    }
  }
  return Math.exp(best)
}
