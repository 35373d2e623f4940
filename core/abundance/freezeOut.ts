/**
 * Freeze-out: ln Z against ln x by the stiff integrator while production matters, then by quadrature,
 * 1/Z(x₂) = 1/Z(x₁) + ∫ k d ln x, once Z_eq has fallen a millionfold below Z for good.
 * Restarted wherever the bath steps; Z = n a³/(s a³)_today and T are continuous there.
 * Source: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145.
 */
import { solveOde } from '../numerics/ode/radau.ts'
import type { OdeOptions, OdeProblem, OdeStep } from '../numerics/ode/problem.ts'
import { integrateWith } from '../numerics/quadrature/gaussLegendre.ts'
import { brent } from '../numerics/roots/brent.ts'
import type { AnnihilatingState } from './annihilatingState.ts'
import { integrationFailure } from '../numerics/convergence.ts'
import { panelRule } from './freezeOutEffort.ts'
import {
  annihilated,
  drawnYield,
  followingYield,
  linearProblem,
  logarithmicProblem,
  steadyYield,
} from './freezeOutEquations.ts'
import type { Effort } from './freezeOutEffort.ts'
import { Sampler } from './yieldSamples.ts'
import type { YieldSamples } from './yieldSamples.ts'

/** How the problem begins. */
export interface FreezeOutStart {
  /** x = m/T where it begins. */
  x: number
  initialAbundance: 'equilibrium' | 'zero'
}

export interface FreezeOut {
  yieldToday: number
  /** Where Y = 2.5 Y_eq for the first time; null when Y never was in equilibrium. */
  freezeOutX: number | null
  /** k Z_eq, about Γ/H, at the start of the problem. */
  rateAtStart: number
}

/** Y = (1 + δ) Y_eq with δ = 1.5 (Gondolo & Gelmini 1991, from memory). */
const LN_DEPARTURE = Math.log(2.5)

/**
 * k Z_eq/x from which on equilibrium is certain: the yield then lags by 1/(2·12), known to second order, and the rest of a
 * wrong start is forgotten as exp(−2∫ k Z_eq d ln x) ≈ e^{−24} before freeze-out.
 */
const LN_CERTAIN = Math.log(12)

/** ln of how many times more than certain a start from nothing is to come to equilibrium at once, within 1e-4 of an e-fold. */
const LN_AT_ONCE = Math.log(1e4)

/** Gain over loss at which production is dropped: the relative error made. */
const LN_NEGLIGIBLE = Math.log(1e-12)

/** Z − Z_eq relative to Z_eq below which a yield that grew from nothing has arrived. */
const ARRIVED = 1e-3

/** Share of 1/Z per e-fold below which the rest of the way would not be seen were it a thousand times as much. */
const NOTHING_MORE = 1e-15

const LATEST_X = 1000
const WIDEST_PANEL = 2.5

/** What an accepted step means for the way on. */
type Outcome = 'go on' | 'in equilibrium' | 'production over'

/** Whatever a solve carries along. */
interface Run {
  readonly state: AnnihilatingState
  readonly effort: Effort
  readonly sampler: Sampler
  readonly watchesFreezeOut: boolean
  readonly lnXToday: number
  lnX: number
  lnZ: number
  freezeOutX: number | null
}

/** ln Y from ln Z. */
function lnYield(state: AnnihilatingState, lnX: number, lnZ: number): number {
  state.moveTo(lnX)
  return lnZ + state.lnDilution
}

/** ln of k times the number of partners, over x and over 12: positive where equilibrium is certain. */
function certainty(state: AnnihilatingState, lnX: number): number {
  state.moveTo(lnX)
  const lnPartners =
    state.asymmetry === 0 ? state.lnEquilibrium : Math.log(Math.exp(steadyYield(state)) + state.asymmetry)
  return Math.log(state.strength) + lnPartners - Math.max(lnX, 0) - LN_CERTAIN
}

/** The ln x after which equilibrium is not certain any more, looked for from the cold side so that it is the last one. */
function lastCertainty(state: AnnihilatingState, from: number): number {
  let late = Math.log(LATEST_X)
  let lateExcess = certainty(state, late)
  while (late > from) {
    const early = Math.max(from, late - 0.25)
    const earlyExcess = certainty(state, early)
    if (earlyExcess > 0)
      return lateExcess > 0 ? late : early + ((late - early) * earlyExcess) / (earlyExcess - lateExcess)
    late = early
    lateExcess = earlyExcess
  }
  return from
}

function solveStretch(run: Run, problem: OdeProblem, y: number, to: number, options: OdeOptions): number {
  const solution = solveOde(problem, run.lnX, [y], to, options)
  if (solution.status === 'failed') throw integrationFailure(solution.reason, Math.exp(solution.t))
  run.lnX = solution.t
  return solution.y[0]!
}

/** The first stretch from nothing, in Z itself; short, and shorter than the way to the next break. */
function leaveZero(run: Run): void {
  const { state } = run
  const next = state.breaksBetween(run.lnX, run.lnX + 0.1)[0] ?? run.lnX + 0.1
  const length = (next - run.lnX) / 2
  state.stayWithin(run.lnX, next)
  state.moveTo(run.lnX)
  const equilibrium = Math.exp(steadyYield(state))
  const unit = Math.min(1, length * state.strength * equilibrium) * equilibrium
  const z = solveStretch(run, linearProblem(state, unit), 0, run.lnX + length, {
    absoluteTolerance: run.effort.tolerance,
    firstStep: 1e-4 * length,
    onStep: (step) =>
      run.sampler.upTo(step.to, (lnX) => lnYield(state, lnX, Math.log(unit * step.at(lnX, 0)))),
  })
  run.lnZ = Math.log(unit * z)
}

/** Follows one accepted step: samples, the moment of freeze-out, and what it means for the way on. */
function followStep(run: Run, step: OdeStep): Outcome {
  const { state } = run
  const lead = (lnX: number): number => {
    state.moveTo(lnX)
    return step.at(lnX, 0) - state.lnEquilibrium
  }
  run.sampler.upTo(step.to, (lnX) => lnYield(state, lnX, step.at(lnX, 0)))
  const leadAtEnd = lead(step.to)
  if (run.watchesFreezeOut && run.freezeOutX === null && leadAtEnd > LN_DEPARTURE) {
    const early = lead(step.from) - LN_DEPARTURE
    run.freezeOutX = Math.exp(
      early >= 0 ? step.from : brent((lnX) => lead(lnX) - LN_DEPARTURE, step.from, step.to, 1e-13),
    )
    state.moveTo(step.to)
  }
  // Z_eq may still rise by what is left of the dilution, and no more.
  const lnZ = step.end[0]!
  const lnGainOverLoss =
    2 * (state.lnEquilibrium + state.lnDilution) - lnZ - Math.log(Math.exp(lnZ) + state.asymmetry)
  if (state.productionOver && lnGainOverLoss < LN_NEGLIGIBLE) return 'production over'
  return !run.watchesFreezeOut && Math.abs(leadAtEnd) < ARRIVED && certainty(state, step.to) > 0
    ? 'in equilibrium'
    : 'go on'
}

/** The integration while production matters; ends at today, where production is over, or where Z has come to equilibrium. */
function whileProduced(run: Run): Outcome {
  const { state } = run
  const problem = logarithmicProblem(state)
  for (const end of [...state.breaksBetween(run.lnX, run.lnXToday), run.lnXToday]) {
    state.stayWithin(run.lnX, end)
    let outcome: Outcome = 'go on'
    run.lnZ = solveStretch(run, problem, run.lnZ, end, {
      absoluteTolerance: run.effort.tolerance,
      firstStep: Math.min(0.02, end - run.lnX),
      onStep: (accepted) => (outcome = followStep(run, accepted)) !== 'go on',
    })
    if (outcome !== 'go on') return outcome
  }
  return 'go on'
}

/** What annihilation still does without production. */
function afterProduction(run: Run): void {
  const { state, effort } = run
  const strengthAt = (lnX: number): number => {
    state.moveTo(lnX)
    return state.strength
  }
  const start = Math.exp(run.lnZ)
  const lnZAfter = (integral: number): number => Math.log(annihilated(start, state.asymmetry, integral))
  let integral = 0
  const edges = state.panelEdges(run.lnX, run.lnXToday, WIDEST_PANEL)
  for (let i = 0; i + 1 < edges.length; i++) {
    const [from, to] = [edges[i]!, edges[i + 1]!]
    state.stayWithin(from, to)
    const before = integral
    const share = strengthAt(from) * (Math.exp(lnZAfter(before)) + state.asymmetry)
    const rule = panelRule(effort, share)
    run.sampler.upTo(to, (lnX) =>
      lnYield(state, lnX, lnZAfter(before + integrateWith(rule, strengthAt, from, lnX))),
    )
    integral += share < NOTHING_MORE ? 0 : integrateWith(rule, strengthAt, from, to)
  }
  run.lnX = run.lnXToday
  run.lnZ = lnZAfter(integral)
}

/** Puts the run where equilibrium is last certain, with the yield that follows it. */
function followEquilibrium(run: Run, from: number): void {
  const { state } = run
  state.readAll()
  const last = lastCertainty(state, from)
  run.sampler.upTo(last, (lnX) => {
    const lnZ = drawnYield(state, lnX)
    return lnZ + state.lnDilution
  })
  run.lnX = last
  state.moveTo(last)
  // The small lag left by first order makes the integrator begin with short steps, which serve it well: begun exactly, the same
  // tolerance leaves ten times the error. A curve must not show the lag.
  const following = run.sampler.wanted ? drawnYield : followingYield
  run.lnZ = last > from ? following(state, last) : steadyYield(state)
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
  const lnStart = Math.log(start.x)
  const run: Run = {
    state,
    effort,
    sampler: new Sampler(samples),
    watchesFreezeOut: fromEquilibrium,
    lnXToday: state.lnMass - Math.log(state.history.temperatureToday),
    lnX: lnStart,
    lnZ: 0,
    freezeOutX: null,
  }
  run.sampler.upTo(lnStart - 1e-12, () => NaN)
  state.readAll()
  state.moveTo(lnStart)
  const rateAtStart = state.strength * Math.exp(state.lnEquilibrium)
  if (fromEquilibrium) followEquilibrium(run, lnStart)
  else if (certainty(state, lnStart) > LN_AT_ONCE) followEquilibrium(run, lnStart)
  else leaveZero(run)
  let outcome = whileProduced(run)
  if (outcome === 'in equilibrium') {
    followEquilibrium(run, run.lnX)
    outcome = whileProduced(run)
  }
  if (outcome === 'production over') afterProduction(run)
  return { yieldToday: Math.exp(run.lnZ), freezeOutX: run.freezeOutX, rateAtStart }
}
