import { describe, expect, it } from 'vitest'
import { evaluate, evaluateColumn, integrate, tabulate } from '#core/numerics/interpolation/chebyshev'
import { evaluateSpline, naturalCubicSpline } from '#core/numerics/interpolation/naturalCubicSpline'
import { lazyPositive } from '#core/numerics/interpolation/lazyPositive'

const out = new Float64Array(2)
const twoFunctions = (x: number, values: Float64Array): void => {
  values[0] = Math.exp(-x * x)
  values[1] = Math.sin(5 * x)
}

describe('a Chebyshev table', () => {
  it('reproduces analytic functions to its tolerance', () => {
    const table = tabulate(twoFunctions, 2, -4, 4, { tolerance: 1e-13 })
    expect(table.error).toBeLessThan(1e-13)
    for (let x = -4; x <= 4; x += 0.0137) {
      evaluate(table, x, out)
      expect(out[0]).toBeCloseTo(Math.exp(-x * x), 12)
      expect(out[1]).toBeCloseTo(Math.sin(5 * x), 12)
      expect(evaluateColumn(table, 1, x)).toBe(out[1])
    }
  })

  it('keeps a jump at a break sharp, reading the right side at the break itself', () => {
    const table = tabulate((x, values) => (values[0] = x < 1 ? 2 : 5), 1, 0, 3, { breaks: [1] })
    expect(evaluateColumn(table, 0, 1 - 1e-12)).toBeCloseTo(2, 13)
    expect(evaluateColumn(table, 0, 1)).toBeCloseTo(5, 13)
  })

  it('says how far it is off when it may not divide further', () => {
    const table = tabulate((x, values) => (values[0] = Math.abs(x - 0.3)), 1, 0, 1, { maximumDepth: 2 })
    expect(table.error).toBeGreaterThan(1e-4)
  })

  it('has an exact integral', () => {
    const integral = integrate(
      tabulate((x, values) => (values[0] = Math.cos(x)), 1, 0, 6, { tolerance: 1e-14 }),
    )
    for (const x of [0.01, 1, 3.3, 6]) expect(evaluateColumn(integral, 0, x)).toBeCloseTo(Math.sin(x), 13)
  })
})

describe('a natural cubic spline', () => {
  const x = [0, 1, 2.5, 3, 5]
  const y = [1, -1, 0.5, 2, 2.5]
  const spline = naturalCubicSpline(x, y)

  it('passes through its knots with no curvature at its ends', () => {
    x.forEach((knot, i) => expect(evaluateSpline(spline, knot).value).toBeCloseTo(y[i]!, 13))
    expect(spline.curvature[0]).toBe(0)
    expect(spline.curvature.at(-1)).toBe(0)
  })

  it('is smooth across its knots, and its slope is its derivative', () => {
    for (const knot of x.slice(1, -1)) {
      const [left, right] = [evaluateSpline(spline, knot - 1e-9), evaluateSpline(spline, knot + 1e-9)]
      // Slopes differ by curvature times 2e-9.
      expect(Math.abs(left.slope - right.slope)).toBeLessThan(1e-7)
    }
    const h = 1e-5
    const difference =
      (evaluateSpline(spline, 1.7 + h).value - evaluateSpline(spline, 1.7 - h).value) / (2 * h)
    expect(Math.abs(evaluateSpline(spline, 1.7).slope - difference)).toBeLessThan(1e-8)
  })
})

describe('a lazily tabulated function', () => {
  it('is asked for only where it is needed, and gives its values over many decades', () => {
    let asked = 0
    const quick = lazyPositive((x) => {
      asked++
      return x ** 2 * Math.exp(-x)
    }, 1e-12)
    expect(Math.abs(quick(30) / (900 * Math.exp(-30)) - 1)).toBeLessThan(1e-11)
    const first = asked
    expect(Math.abs(quick(31) / (961 * Math.exp(-31)) - 1)).toBeLessThan(1e-11)
    expect(asked).toBe(first)
    expect(quick(1e-3)).toBeGreaterThan(0)
    expect(asked).toBeGreaterThan(first)
  })
})
