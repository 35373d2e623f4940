import { describe, expect, it } from 'vitest'
import { denseOde } from '#core/numerics/ode/dense'
import type { OdeProblem } from '#core/numerics/ode/problem'
import { solveOde } from '#core/numerics/ode/radau'
import { radauTableau } from '#core/numerics/ode/radauTableau'

const oscillator: OdeProblem = {
  dimension: 2,
  evaluate(_t, y, slope, jacobian) {
    slope[0] = y[1]!
    slope[1] = -y[0]!
    jacobian.set([0, 1, -1, 0])
  },
}

/** y′ = −λ(y − cos t) − sin t, whose solution from y(0) = 1 is cos t for any λ. */
const stiff = (lambda: number): OdeProblem => ({
  dimension: 1,
  evaluate(t, y, slope, jacobian) {
    slope[0] = -lambda * (y[0]! - Math.cos(t)) - Math.sin(t)
    jacobian[0] = -lambda
  },
})

/** Slope of the straight line of least squares. */
function slopeOf(points: readonly (readonly [number, number])[]): number {
  const mean = (i: 0 | 1): number => points.reduce((sum, point) => sum + point[i], 0) / points.length
  const [x, y] = [mean(0), mean(1)]
  const covariance = points.reduce((sum, point) => sum + (point[0] - x) * (point[1] - y), 0)
  return covariance / points.reduce((sum, point) => sum + (point[0] - x) ** 2, 0)
}

describe('the Radau IIA tableau', () => {
  it('has the published abscissae for three stages, (4 ∓ √6)/10 and 1 (Hairer & Wanner, table IV.5.6)', () => {
    const { c } = radauTableau(3)
    expect(c[0]).toBeCloseTo((4 - Math.sqrt(6)) / 10, 15)
    expect(c[1]).toBeCloseTo((4 + Math.sqrt(6)) / 10, 15)
    expect(c[2]).toBe(1)
  })

  it.each([2, 3, 5, 7])('with %i stages meets the stage conditions C(s): A⁻¹ c^k = k c^(k−1)', (s) => {
    const { c, inverse, atStart } = radauTableau(s)
    for (let k = 1; k <= s; k++) {
      for (let i = 0; i < s; i++) {
        let sum = 0
        for (let j = 0; j < s; j++) sum += inverse[i * s + j]! * c[j]! ** k
        // Entries of A⁻¹ reach 1e2 for seven stages; a few units in the last place of that.
        expect(Math.abs(sum - k * c[i]! ** (k - 1))).toBeLessThan(1e-11)
      }
    }
    const total = atStart.reduce((sum, weight) => sum + weight, 0)
    expect(total).toBeCloseTo(1, 13)
  })
})

describe('the stiff integrator', () => {
  it.each([
    [2, 3],
    [3, 5],
    [5, 9],
  ])(
    'with %i stages is of order %i: the error falls as that power of the number of steps',
    (stages, order) => {
      const tableau = radauTableau(stages)
      const points: [lnSteps: number, lnError: number][] = []
      for (let exponent = 2; exponent <= 9; exponent++) {
        const options = { absoluteTolerance: 10 ** -exponent, maximumSteps: 50_000 }
        const { y, counters } = solveOde(oscillator, 0, [1, 0], 40, options, tableau)
        const error = Math.hypot(y[0]! - Math.cos(40), y[1]! + Math.sin(40))
        // Above, the asymptotic regime is not reached; below, rounding takes over.
        if (error < 0.05 && error > 1e-11) points.push([Math.log(counters.steps), Math.log(error)])
      }
      expect(points.length).toBeGreaterThanOrEqual(5)
      // The step control keeps the steps of a circle alike, so the slope is that of fixed steps; few steps make it ragged.
      expect(Math.abs(-slopeOf(points) - order)).toBeLessThan(0.03 * order)
    },
  )

  it.each([1, 1e3, 1e7])('is better than its tolerance at stiffness %f', (lambda) => {
    const solution = solveOde(stiff(lambda), 0, [1], 3, { absoluteTolerance: 1e-8 })
    expect(solution.status).toBe('finished')
    expect(Math.abs(solution.y[0]! - Math.cos(3))).toBeLessThan(1e-8)
    expect(solution.counters.steps).toBeLessThan(40)
  })

  it('runs backwards as well', () => {
    const solution = solveOde(oscillator, 3, [Math.cos(3), -Math.sin(3)], 0, { absoluteTolerance: 1e-10 })
    expect(solution.y[0]).toBeCloseTo(1, 9)
  })

  it('answers with a reason, not an exception, when its steps are used up', () => {
    const solution = solveOde(oscillator, 0, [1, 0], 1e4, { absoluteTolerance: 1e-10, maximumSteps: 20 })
    expect(solution).toMatchObject({ status: 'failed', reason: 'too-many-steps' })
  })

  it('answers with a reason when the equations give no number', () => {
    const broken: OdeProblem = {
      dimension: 1,
      evaluate(t, _y, slope, jacobian) {
        slope[0] = t > 0.5 ? NaN : 1
        jacobian[0] = 0
      },
    }
    expect(solveOde(broken, 0, [0], 1, { absoluteTolerance: 1e-8 })).toMatchObject({
      status: 'failed',
      reason: 'step-too-small',
    })
  })

  it('gives up on a blow-up in finite time with a reason, where it stood, and no number that is not finite', () => {
    const explosion: OdeProblem = {
      dimension: 1,
      evaluate(_t, y, slope, jacobian) {
        slope[0] = y[0]! ** 2
        jacobian[0] = 2 * y[0]!
      },
    }
    const solution = solveOde(explosion, 0, [1], 2, { absoluteTolerance: 1e-8, maximumSteps: 500 })
    expect(solution.status).toBe('failed')
    // y = 1/(1 − t) leaves every bound at t = 1.
    expect(solution.t).toBeLessThan(1.001)
    expect(Number.isFinite(solution.y[0])).toBe(true)
  })

  it('stops where the caller says', () => {
    const solution = solveOde(oscillator, 0, [1, 0], 40, {
      absoluteTolerance: 1e-8,
      onStep: (step) => step.to > 10,
    })
    expect(solution.status).toBe('stopped')
    expect(solution.t).toBeLessThan(15)
  })

  it.each([1, -0.5])('restarts a dense solution at a break, at %f, which saves the search for it', (kink) => {
    let asked = 0
    const kinked: OdeProblem = {
      dimension: 1,
      evaluate(t, y, slope, jacobian) {
        asked++
        slope[0] = t < kink ? y[0]! : -y[0]!
        jacobian[0] = t < kink ? 1 : -1
      },
    }
    const range = { low: -1, high: 2 }
    const solution = denseOde(kinked, 0, [1], range, [kink], 1e-9)
    const withBreak = asked
    // e^{±t} about 0, mirrored at the kink.
    const side = kink > 0 ? 1 : -1
    const exact = (t: number): number => Math.exp(side * (side * t < side * kink ? t : 2 * kink - t))
    for (let t = -1; t <= 2; t += 0.013)
      // Twenty times the tolerance of a step, for the polynomial between its ends.
      expect(Math.abs(solution.at(t, 0) - exact(t)), `t = ${t}`).toBeLessThan(2e-8)
    denseOde(kinked, 0, [1], range, [], 1e-9)
    expect(asked - withBreak).toBeGreaterThan(2 * withBreak)
  })

  it('keeps a dense solution as good as its tolerance between the steps', () => {
    const solution = denseOde(oscillator, 0, [1, 0], { low: -5, high: 5 }, [1.234], 1e-9)
    for (let t = -5; t <= 5; t += 0.0371) expect(Math.abs(solution.at(t, 0) - Math.cos(t))).toBeLessThan(2e-8)
  })
})
