import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import { denseOde } from '#core/numerics/ode/dense'
import type { OdeProblem } from '#core/numerics/ode/problem'
import { solveOde } from '#core/numerics/ode/radau'
import { radauTableau } from '#core/numerics/ode/radauTableau'
import { solveInPlace } from '#core/numerics/linear/solve'
import { brent } from '#core/numerics/roots/brent'

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
  it('gains digits as order nine does: the error falls with the number of steps to the power −9', () => {
    const errorAndSteps = [1e-4, 1e-7].map((absoluteTolerance) => {
      const solution = solveOde(oscillator, 0, [1, 0], 40, { absoluteTolerance })
      return [Math.abs(solution.y[0]! - Math.cos(40)), solution.counters.steps] as const
    })
    const [[coarse, few], [fine, many]] = errorAndSteps as [
      readonly [number, number],
      readonly [number, number],
    ]
    const order = Math.log(coarse / fine) / Math.log(many / few)
    // Measured 8.5 to 9.5: the first and last steps are chosen, not free.
    expect(order).toBeGreaterThan(8)
    expect(order).toBeLessThan(10.5)
  })

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

  it('stops where the caller says', () => {
    const solution = solveOde(oscillator, 0, [1, 0], 40, {
      absoluteTolerance: 1e-8,
      onStep: (step) => step.to > 10,
    })
    expect(solution.status).toBe('stopped')
    expect(solution.t).toBeLessThan(15)
  })

  it('keeps a dense solution as good as its tolerance between the steps', () => {
    const solution = denseOde(oscillator, 0, [1, 0], { low: -5, high: 5 }, [1.234], 1e-9)
    for (let t = -5; t <= 5; t += 0.0371) expect(Math.abs(solution.at(t, 0) - Math.cos(t))).toBeLessThan(2e-8)
  })
})

describe('linear systems', () => {
  it('are solved to rounding for well-conditioned matrices', () => {
    const entry = fc.double({ min: -1, max: 1, noNaN: true })
    fc.assert(
      fc.property(fc.array(entry, { minLength: 30, maxLength: 30 }), (numbers) => {
        const n = 5
        const matrix = Float64Array.from(
          { length: n * n },
          (_, k) => numbers[k]! + (k % (n + 1) === 0 ? 6 : 0),
        )
        const right = Float64Array.from(numbers.slice(25))
        const x = right.slice()
        expect(solveInPlace(matrix.slice(), x, n)).toBe(true)
        for (let i = 0; i < n; i++) {
          let sum = 0
          for (let j = 0; j < n; j++) sum += matrix[i * n + j]! * x[j]!
          // Diagonally dominant: the condition number is of order one.
          expect(Math.abs(sum - right[i]!)).toBeLessThan(1e-14)
        }
      }),
    )
  })

  it('are refused when singular', () => {
    expect(solveInPlace(Float64Array.from([1, 2, 2, 4]), Float64Array.from([1, 1]), 2)).toBe(false)
  })
})

describe('roots', () => {
  it('are found to the tolerance asked for', () => {
    expect(brent((x) => Math.cos(x) - x, 0, 1, 1e-14)).toBeCloseTo(0.7390851332151607, 14)
    expect(brent((x) => (x - 2) ** 3, 0, 5, 1e-12)).toBeCloseTo(2, 4)
  })

  it('are refused without a change of sign', () => {
    expect(() => brent((x) => x * x + 1, -1, 1, 1e-9)).toThrow(RangeError)
  })
})
