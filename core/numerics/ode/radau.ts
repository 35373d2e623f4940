/**
 * Stiff integrator: Radau IIA collocation with variable steps.
 * Each step solves the collocation equations by Newton's iteration with the Jacobian taken at every stage, starting from the
 * polynomial of the step before. The step is controlled by the defect f(t₀, y₀) − u′(t₀) of the collocation polynomial,
 * filtered by (1/γ − hJ)⁻¹: an estimate of order s for a result of order 2s − 1, so the result is better than the tolerance.
 * Source: Hairer & Wanner, Solving Ordinary Differential Equations II (1996), sections IV.5 and IV.8.
 */
import { solveInPlace } from '../linear/solve.ts'
import type { OdeCounters, OdeOptions, OdeProblem, OdeSolution, OdeStep } from './problem.ts'
import { radauTableau } from './radauTableau.ts'
import type { RadauTableau } from './radauTableau.ts'

/** Five stages, order 9: at 1e-8 it takes a fifth of the steps of three stages. */
export const RADAU_5_STAGES = radauTableau(5)

/** Real eigenvalue of A⁻¹ for five stages. Any positive number would do; this one makes the filter as stiff as the method. */
const FILTER = 6.286704751729277

const NEWTON_LIMIT = 12
const SAFETY = 0.9

/** Scratch space and state of one integration. */
class Integration implements OdeStep {
  readonly tableau: RadauTableau
  readonly problem: OdeProblem
  readonly options: OdeOptions
  readonly counters: OdeCounters = { steps: 0, rejected: 0, evaluations: 0 }
  from: number
  to: number
  /** Value at the start of the step under way. */
  start: Float64Array
  end: Float64Array
  /** Stage increments z_j = u(t₀ + c_j h) − y₀, stage by stage. */
  increments: Float64Array
  private readonly slopes: Float64Array
  private readonly jacobians: Float64Array
  private readonly matrix: Float64Array
  private readonly rightSide: Float64Array
  private readonly point: Float64Array
  private readonly startSlope: Float64Array
  private readonly startJacobian: Float64Array
  private readonly guessed: Float64Array
  private readonly filter: Float64Array
  private readonly error: Float64Array

  constructor(
    problem: OdeProblem,
    t: number,
    y: ArrayLike<number>,
    options: OdeOptions,
    tableau: RadauTableau,
  ) {
    const n = problem.dimension
    const s = tableau.stages
    this.problem = problem
    this.options = options
    this.tableau = tableau
    this.from = this.to = t
    this.start = Float64Array.from(y)
    this.end = Float64Array.from(y)
    this.increments = new Float64Array(s * n)
    this.slopes = new Float64Array(s * n)
    this.jacobians = new Float64Array(s * n * n)
    this.matrix = new Float64Array(s * n * s * n)
    this.rightSide = new Float64Array(s * n)
    this.point = new Float64Array(n)
    this.startSlope = new Float64Array(n)
    this.startJacobian = new Float64Array(n * n)
    this.guessed = new Float64Array(s * n)
    this.filter = new Float64Array(n * n)
    this.error = new Float64Array(n)
  }

  at(t: number, component: number): number {
    return valueAt(this.tableau, this, t, component, this.problem.dimension)
  }

  polynomial(): (t: number, component: number) => number {
    const { tableau } = this
    const n = this.problem.dimension
    const kept = {
      from: this.from,
      to: this.to,
      start: this.start.slice(),
      increments: this.increments.slice(),
    }
    return (t, component) => valueAt(tableau, kept, t, component, n)
  }

  /** Guesses the increments of a step of length h by going on along the last polynomial. */
  guess(h: number): void {
    const n = this.problem.dimension
    const { c, stages } = this.tableau
    if (this.to === this.from) {
      this.increments.fill(0)
      return
    }
    for (let j = 0; j < stages; j++)
      for (let i = 0; i < n; i++) this.guessed[j * n + i] = this.at(this.to + c[j]! * h, i) - this.end[i]!
    this.increments.set(this.guessed)
  }

  tolerance(i: number): number {
    const { absoluteTolerance, relativeTolerance = 0 } = this.options
    return absoluteTolerance + relativeTolerance * Math.abs(this.start[i]!)
  }

  /** Newton's iteration for the increments of the step from `t` of length h. */
  collocate(t: number, h: number): boolean {
    const size = this.tableau.stages * this.problem.dimension
    let last = Infinity
    for (let iteration = 0; iteration < NEWTON_LIMIT; iteration++) {
      if (!this.assemble(t, h) || !solveInPlace(this.matrix, this.rightSide, size)) return false
      let change = 0
      for (let k = 0; k < size; k++) {
        this.increments[k]! += this.rightSide[k]!
        change = Math.max(change, Math.abs(this.rightSide[k]!) / this.tolerance(k % this.problem.dimension))
      }
      if (!Number.isFinite(change)) return false
      // Convergence is quadratic: the next change would be change · (change/last)².
      if (change < 1e-2 || (iteration > 0 && change < last && change * (change / last) ** 2 < 1e-3))
        return true
      if (iteration > 3 && change > last) return false
      last = change
    }
    return false
  }

  /** Writes (A⁻¹/h − J) and f − A⁻¹z/h at the present increments. */
  private assemble(t: number, h: number): boolean {
    const { inverse, c, stages } = this.tableau
    const n = this.problem.dimension
    const size = stages * n
    this.matrix.fill(0)
    for (let j = 0; j < stages; j++) {
      for (let i = 0; i < n; i++) this.point[i] = this.start[i]! + this.increments[j * n + i]!
      const slope = this.slopes.subarray(j * n, (j + 1) * n)
      const jacobian = this.jacobians.subarray(j * n * n, (j + 1) * n * n)
      this.problem.evaluate(t + c[j]! * h, this.point, slope, jacobian)
      this.counters.evaluations++
      for (let i = 0; i < n; i++) {
        const row = j * n + i
        let sum = slope[i]!
        for (let k = 0; k < stages; k++) {
          const weight = inverse[j * stages + k]! / h
          sum -= weight * this.increments[k * n + i]!
          this.matrix[row * size + k * n + i] = weight
        }
        for (let k = 0; k < n; k++) this.matrix[row * size + j * n + k]! -= jacobian[i * n + k]!
        this.rightSide[row] = sum
        if (!Number.isFinite(sum)) return false
      }
    }
    return true
  }

  /** Estimated error of the step over its tolerance. */
  defect(t: number, h: number): number {
    const { inverse, atStart, stages } = this.tableau
    const n = this.problem.dimension
    this.problem.evaluate(t, this.start, this.startSlope, this.startJacobian)
    this.counters.evaluations++
    for (let i = 0; i < n; i++) {
      let defect = this.startSlope[i]!
      for (let j = 0; j < stages; j++)
        for (let k = 0; k < stages; k++)
          defect -= (atStart[j]! * inverse[j * stages + k]! * this.increments[k * n + i]!) / h
      this.error[i] = defect
      for (let k = 0; k < n; k++)
        this.filter[i * n + k] = (i === k ? FILTER / h : 0) - this.startJacobian[i * n + k]!
    }
    if (!solveInPlace(this.filter, this.error, n)) return Infinity
    let worst = 0
    for (let i = 0; i < n; i++) worst = Math.max(worst, Math.abs(this.error[i]!) / this.tolerance(i))
    return Number.isFinite(worst) ? worst : Infinity
  }

  /** Takes the collocated step as the new state. */
  accept(t: number, h: number): void {
    const n = this.problem.dimension
    const lastStage = (this.tableau.stages - 1) * n
    this.from = t
    this.to = t + h
    for (let i = 0; i < n; i++) this.end[i] = this.start[i]! + this.increments[lastStage + i]!
    this.counters.steps++
  }
}

/** The collocation polynomial of a step, by the barycentric formula. */
function valueAt(
  { barycentric, c, stages }: RadauTableau,
  step: { from: number; to: number; start: Float64Array; increments: Float64Array },
  t: number,
  component: number,
  n: number,
): number {
  const z = (t - step.from) / (step.to - step.from)
  const start = step.start[component]!
  if (z === 0) return start
  let top = 0
  let bottom = barycentric[0]! / z
  for (let j = 0; j < stages; j++) {
    const distance = z - c[j]!
    if (distance === 0) return start + step.increments[j * n + component]!
    const weight = barycentric[j + 1]! / distance
    top += weight * step.increments[j * n + component]!
    bottom += weight
  }
  return start + top / bottom
}

/** Solves the problem from t₀ to t₁ (either direction). */
export function solveOde(
  problem: OdeProblem,
  t0: number,
  y0: ArrayLike<number>,
  t1: number,
  options: OdeOptions,
  tableau: RadauTableau = RADAU_5_STAGES,
): OdeSolution {
  const run = new Integration(problem, t0, y0, options, tableau)
  const direction = Math.sign(t1 - t0)
  const maximumSteps = options.maximumSteps ?? 2000
  const smallest = 1e-14 * Math.max(1, Math.abs(t0), Math.abs(t1))
  let t = t0
  let h = direction * Math.min(options.firstStep ?? Math.abs(t1 - t0) / 20, Math.abs(t1 - t0))
  const end = (status: 'finished' | 'stopped'): OdeSolution => ({
    status,
    t,
    y: run.end.slice(),
    counters: run.counters,
  })
  const fail = (reason: 'step-too-small' | 'too-many-steps'): OdeSolution => ({
    status: 'failed',
    reason,
    t,
    y: run.end.slice(),
    counters: run.counters,
  })
  while (direction * (t1 - t) > 0) {
    if (run.counters.steps + run.counters.rejected >= maximumSteps) return fail('too-many-steps')
    if (direction * (t + h * 1.0000001 - t1) > 0) h = t1 - t
    run.guess(h)
    run.start.set(run.end)
    const solved = run.collocate(t, h)
    const error = solved ? run.defect(t, h) : Infinity
    if (!(error <= 1)) {
      run.counters.rejected++
      restart(run, t)
      h *= Number.isFinite(error) ? Math.max(0.1, SAFETY * error ** (-1 / (tableau.stages + 1))) : 0.25
      if (Math.abs(h) < smallest) return fail('step-too-small')
      continue
    }
    run.accept(t, h)
    t = run.to
    if (direction * (t1 - t) <= smallest / 10) t = t1
    if (options.onStep?.(run) === true) return end('stopped')
    h *= Math.min(6, Math.max(0.2, SAFETY * Math.max(error, 1e-12) ** (-1 / (tableau.stages + 1))))
  }
  return end('finished')
}

/** Forgets the polynomial of the last step: the increments of a refused one would spoil the next guess. */
function restart(run: Integration, t: number): void {
  run.from = run.to = t
}
