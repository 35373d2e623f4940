/**
 * Freeze-out: ln Y against ln x by the stiff integrator while production matters, then by quadrature,
 * 1/Y(x₂) = 1/Y(x₁) + ∫ k d ln x, once Y_eq has fallen a millionfold below Y.
 * Restarted wherever the bath steps; Y and T are continuous there, and Y falls by D at a sudden entropy release.
 * Source: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145.
 */
import { solveOde } from '../numerics/ode/radau.ts'
import type { OdeOptions, OdeProblem, OdeStep } from '../numerics/ode/problem.ts'
import { gaussLegendre, integrateWith } from '../numerics/quadrature/gaussLegendre.ts'
import type { QuadratureRule } from '../numerics/quadrature/gaussLegendre.ts'
import { brent } from '../numerics/roots/brent.ts'
import type { AnnihilatingState } from './annihilatingState.ts'
import { integrationFailure } from './convergence.ts'
import { breaksBetween, panelEdges } from './panels.ts'

/** How the problem begins. */
export interface FreezeOutStart {
  /** x = m/T where it begins, or where equilibrium is known to hold. */
  x: number
  initialAbundance: 'equilibrium' | 'zero'
}

/** Numerical effort: the tolerance of a step in ln Y and the quadrature afterwards. */
export interface Effort {
  tolerance: number
  /** The rule while annihilation still matters. */
  rule: QuadratureRule
}

/** Rules for panels that add less than 1e-3, and less than 1e-7, to 1/Y. */
const MINOR_RULE = gaussLegendre(6)
const SLIGHT_RULE = gaussLegendre(3)

function panelRule(effort: Effort, share: number): QuadratureRule {
  if (share > 1e-3) return effort.rule
  return share > 1e-7 ? MINOR_RULE : SLIGHT_RULE
}

/** Share of 1/Y per e-fold below which the rest of the way, were it a thousand times as much, would not be seen. */
const NOTHING_MORE = 1e-15

/** Efforts of rising care. Two neighbours that agree vouch for each other; see `checked.ts`. */
export const EFFORTS: readonly Effort[] = [
  { tolerance: 1e-4, rule: gaussLegendre(6) },
  { tolerance: 1e-5, rule: gaussLegendre(8) },
  { tolerance: 1e-7, rule: gaussLegendre(12) },
  { tolerance: 1e-9, rule: gaussLegendre(16) },
]

/** Wanted values of ln x, ascending, and the ln Y found there. */
export interface YieldSamples {
  readonly lnX: Float64Array
  readonly lnYield: Float64Array
}

export interface FreezeOut {
  yieldToday: number
  /** Where Y = 2.5 Y_eq for the first time; null when Y never was in equilibrium. */
  freezeOutX: number | null
  /** k Y_eq, about Γ/H, at the start of the integration. */
  rateAtStart: number
}

/** Y = (1 + δ) Y_eq with δ = 1.5 (Gondolo & Gelmini 1991, from memory). */
const LN_DEPARTURE = Math.log(2.5)

/**
 * k Y_eq/x from which on equilibrium is certain: the yield then lags by 1/(2·12), known to second order, and the rest of a
 * wrong start is forgotten as exp(−2∫ k Y_eq d ln x) ≈ e^{−24} before freeze-out.
 */
const LN_CERTAIN = Math.log(12)

/** Y_eq/Y at which production is dropped: its square, 1e-12, is the relative error made. */
const LN_NEGLIGIBLE = Math.log(1e-6)

const LATEST_X = 1000

/** What an accepted step means for the way on. */
type Outcome = 'go on' | 'in equilibrium' | 'production over'

/** Whatever a solve carries along. */
class FreezeOutRun {
  readonly state: AnnihilatingState
  readonly effort: Effort
  readonly samples: YieldSamples | null
  private nextSample = 0
  lnX = 0
  lnYield = 0
  freezeOutX: number | null = null
  readonly watchesFreezeOut: boolean

  constructor(
    state: AnnihilatingState,
    effort: Effort,
    samples: YieldSamples | null,
    watchesFreezeOut: boolean,
  ) {
    this.state = state
    this.effort = effort
    this.samples = samples
    this.watchesFreezeOut = watchesFreezeOut
  }

  /** Fills samples up to `to`, where ln Y is known as a function. */
  sample(to: number, lnYieldAt: (lnX: number) => number): void {
    const { samples } = this
    if (!samples) return
    while (this.nextSample < samples.lnX.length && samples.lnX[this.nextSample]! <= to) {
      samples.lnYield[this.nextSample] = lnYieldAt(samples.lnX[this.nextSample]!)
      this.nextSample++
    }
  }
}

/** Y′ in ln Y: y′ = −k (Y − Y_eq²/Y), Y = e^y. */
function logarithmicProblem(state: AnnihilatingState): OdeProblem {
  return {
    dimension: 1,
    evaluate(lnX, y, slope, jacobian) {
      state.moveTo(lnX)
      const loss = state.strength * Math.exp(y[0]!)
      const gain = state.strength * Math.exp(2 * state.lnEquilibrium - y[0]!)
      slope[0] = gain - loss
      jacobian[0] = -gain - loss
    },
  }
}

/** The same in Y/unit, for a start from nothing, where ln Y does not exist. */
function linearProblem(state: AnnihilatingState, unit: number): OdeProblem {
  return {
    dimension: 1,
    evaluate(lnX, y, slope, jacobian) {
      state.moveTo(lnX)
      slope[0] = state.strength * (Math.exp(2 * state.lnEquilibrium) / unit - unit * y[0]! * y[0]!)
      jacobian[0] = -2 * state.strength * unit * y[0]!
    },
  }
}

/** The ln x after which equilibrium is not certain any more, looked for from the cold side so that it is the last one. */
function lastCertainty(state: AnnihilatingState, from: number): number {
  const excess = (lnX: number): number => {
    state.moveTo(lnX)
    return Math.log(state.strength) + state.lnEquilibrium - Math.max(lnX, 0) - LN_CERTAIN
  }
  let late = Math.log(LATEST_X)
  let lateExcess = excess(late)
  while (late > from) {
    const early = Math.max(from, late - 0.25)
    const earlyExcess = excess(early)
    if (earlyExcess > 0)
      return lateExcess > 0 ? late : early + ((late - early) * earlyExcess) / (earlyExcess - lateExcess)
    late = early
    lateExcess = earlyExcess
  }
  return from
}

/** ln of the yield that follows equilibrium to first order in H/Γ. */
function followingYield(state: AnnihilatingState, lnX: number): number {
  const h = 1e-3
  state.moveTo(lnX + h)
  const after = state.lnEquilibrium
  state.moveTo(lnX)
  const lag = -(after - state.lnEquilibrium) / h / (2 * state.strength * Math.exp(state.lnEquilibrium))
  return state.lnEquilibrium + Math.log1p(Math.max(0, Math.min(lag, 1)))
}

function solveStretch(
  run: FreezeOutRun,
  problem: OdeProblem,
  y: number,
  to: number,
  options: OdeOptions,
): number {
  const solution = solveOde(problem, run.lnX, [y], to, options)
  if (solution.status === 'failed') throw integrationFailure(solution.reason, Math.exp(solution.t))
  run.lnX = solution.t
  return solution.y[0]!
}

/** The first stretch from nothing, in Y itself; short, and shorter than the way to the next break. */
function leaveZero(run: FreezeOutRun): void {
  const { state } = run
  const hot = state.lnMass - run.lnX
  const next = breaksBetween(state.history, hot, hot - 0.1)[0] ?? hot - 0.1
  const length = (hot - next) / 2
  state.moveTo(run.lnX)
  const equilibrium = Math.exp(state.lnEquilibrium)
  const unit = Math.min(1, length * state.strength * equilibrium) * equilibrium
  const y = solveStretch(run, linearProblem(state, unit), 0, run.lnX + length, {
    absoluteTolerance: run.effort.tolerance,
    firstStep: 1e-4 * length,
    onStep: (step) => run.sample(step.to, (lnX) => Math.log(unit * step.at(lnX, 0))),
  })
  run.lnYield = Math.log(unit * y)
}

/** Y − Y_eq relative to Y_eq below which a yield that grew from nothing has arrived. */
const ARRIVED = 1e-3

/** Follows one accepted step: samples, the moment of freeze-out, and what it means for the way on. */
function followStep(run: FreezeOutRun, step: OdeStep, lnStillToDilute: number): Outcome {
  const { state } = run
  const lead = (lnX: number): number => {
    state.moveTo(lnX)
    return step.at(lnX, 0) - state.lnEquilibrium
  }
  run.sample(step.to, (lnX) => step.at(lnX, 0))
  const leadAtEnd = lead(step.to)
  if (run.watchesFreezeOut && run.freezeOutX === null && leadAtEnd > LN_DEPARTURE) {
    const early = lead(step.from) - LN_DEPARTURE
    run.freezeOutX = Math.exp(
      early >= 0 ? step.from : brent((lnX) => lead(lnX) - LN_DEPARTURE, step.from, step.to, 1e-13),
    )
  }
  if (-leadAtEnd < LN_NEGLIGIBLE - lnStillToDilute) return 'production over'
  const certain = Math.log(state.strength) + state.lnEquilibrium > Math.max(step.to, 0) + LN_CERTAIN
  return !run.watchesFreezeOut && certain && Math.abs(leadAtEnd) < ARRIVED ? 'in equilibrium' : 'go on'
}

/** ln D of a sudden entropy release at that break, else 0. */
function dilutionAt(run: FreezeOutRun, lnT: number): number {
  const step = run.state.history.entropyStep
  return step && Math.abs(lnT - Math.log(step.temperature)) < 1e-12 ? Math.log(step.factor) : 0
}

/** The integration while production matters; ends at today, where production is over, or where Y has come to equilibrium. */
function whileProduced(run: FreezeOutRun, lnXToday: number): Outcome {
  const { state } = run
  const problem = logarithmicProblem(state)
  const step = state.history.entropyStep
  const ends = [
    ...breaksBetween(state.history, state.lnMass - run.lnX, state.lnMass - lnXToday).map(
      (lnT) => state.lnMass - lnT,
    ),
    lnXToday,
  ]
  for (const end of ends) {
    state.stayBelow(state.lnMass - run.lnX)
    const ahead =
      step && step.temperature < Math.exp(state.lnMass - run.lnX) * (1 - 1e-12) ? Math.log(step.factor) : 0
    let outcome: Outcome = 'go on'
    run.lnYield = solveStretch(run, problem, run.lnYield, end, {
      absoluteTolerance: run.effort.tolerance,
      firstStep: Math.min(0.02, end - run.lnX),
      onStep: (accepted) => (outcome = followStep(run, accepted, ahead)) !== 'go on',
    })
    if (run.lnX === end) run.lnYield -= dilutionAt(run, state.lnMass - end)
    if (outcome !== 'go on') return outcome
  }
  return 'go on'
}

/** What annihilation still does without production: 1/Y grows by ∫ k d ln x. */
function afterProduction(run: FreezeOutRun, lnXToday: number): void {
  const { state, effort } = run
  const strengthAt = (lnX: number): number => {
    state.moveTo(lnX)
    return state.strength
  }
  let inverse = Math.exp(-run.lnYield)
  const edges = panelEdges(state.history, state.lnMass - run.lnX, state.lnMass - lnXToday, 2.5).map(
    (lnT) => state.lnMass - lnT,
  )
  for (let i = 0; i + 1 < edges.length; i++) {
    const [from, to] = [edges[i]!, edges[i + 1]!]
    state.stayBelow(state.lnMass - from)
    const start = inverse
    const share = strengthAt(from) / inverse
    const rule = panelRule(effort, share)
    run.sample(to, (lnX) => -Math.log(start + integrateWith(rule, strengthAt, from, lnX)))
    inverse += share < NOTHING_MORE ? 0 : integrateWith(rule, strengthAt, from, to)
    inverse *= Math.exp(dilutionAt(run, state.lnMass - to))
  }
  run.lnX = lnXToday
  run.lnYield = -Math.log(inverse)
}

/** Puts the run where equilibrium is last certain, with the yield that follows it. */
function followEquilibrium(run: FreezeOutRun, from: number): void {
  const { state } = run
  state.stayAnywhere()
  const last = lastCertainty(state, from)
  run.sample(last, (lnX) => {
    state.moveTo(lnX)
    return state.lnEquilibrium
  })
  run.lnX = last
  state.stayBelow(state.lnMass - last)
  state.moveTo(last)
  run.lnYield = last > from ? followingYield(state, last) : state.lnEquilibrium
}

/**
 * Solves for the yield today.
 * @param samples wanted values of ln x; ln Y is written there, NaN before the start
 * @throws ConvergenceError when the integrator does not arrive
 */
export function solveFreezeOut(
  state: AnnihilatingState,
  start: FreezeOutStart,
  effort: Effort,
  samples: YieldSamples | null = null,
): FreezeOut {
  const fromEquilibrium = start.initialAbundance === 'equilibrium'
  const run = new FreezeOutRun(state, effort, samples, fromEquilibrium)
  const lnXToday = state.lnMass - Math.log(state.history.temperatureToday)
  run.lnX = Math.log(start.x)
  run.sample(run.lnX - 1e-12, () => NaN)
  state.stayBelow(state.lnMass - run.lnX)
  state.moveTo(run.lnX)
  const rateAtStart = state.strength * Math.exp(state.lnEquilibrium)
  if (fromEquilibrium) followEquilibrium(run, run.lnX)
  else leaveZero(run)
  let outcome = whileProduced(run, lnXToday)
  if (outcome === 'in equilibrium') {
    followEquilibrium(run, run.lnX)
    outcome = whileProduced(run, lnXToday)
  }
  if (outcome === 'production over') afterProduction(run, lnXToday)
  return { yieldToday: Math.exp(run.lnYield), freezeOutX: run.freezeOutX, rateAtStart }
}
