import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { NODES, evaluate, evaluateColumn, integrate, tabulate } from '#core/numerics/interpolation/chebyshev'
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

  it('reproduces every polynomial of a degree below its number of nodes in one piece', () => {
    const coefficient = fc.integer({ min: -1000, max: 1000 }).map((i) => i / 1000)
    fc.assert(
      fc.property(fc.array(coefficient, { minLength: 1, maxLength: NODES - 3 }), (coefficients) => {
        const polynomial = (x: number): number => coefficients.reduceRight((sum, c) => sum * x + c, 0)
        const table = tabulate((x, values) => (values[0] = polynomial(x)), 1, -1, 1)
        expect(table.edges.length).toBe(2)
        // A sum of at most thirteen terms of at most one each.
        for (const x of [-1, -0.77, 0, 0.123, 1])
          expect(Math.abs(evaluateColumn(table, 0, x) - polynomial(x))).toBeLessThan(2e-14)
      }),
    )
  })

  it('makes every break inside its range an edge, and none outside', () => {
    const table = tabulate((x, values) => (values[0] = x), 1, 0, 3, { breaks: [2, 1, 1, -4, 9] })
    expect([...table.edges]).toEqual([0, 1, 2, 3])
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

  it('has an integral that goes on through a jump without a jump', () => {
    const step = tabulate((x, values) => (values[0] = x < 1 ? 2 : 5), 1, 0, 3, { breaks: [1] })
    const integral = integrate(step)
    expect(evaluateColumn(integral, 0, 1)).toBeCloseTo(2, 13)
    expect(evaluateColumn(integral, 0, 3)).toBeCloseTo(12, 13)
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

describe('a natural cubic spline through any data', () => {
  const knots = fc
    .array(fc.tuple(fc.integer({ min: 1, max: 30 }), fc.integer({ min: -50, max: 50 })), {
      minLength: 2,
      maxLength: 12,
    })
    .map((rows) => {
      let x = 0
      return rows.map(([gap, y]) => [(x += gap / 10), y / 10] as const)
    })

  it('passes through all of it, and is the straight line when the data lie on one', () => {
    fc.assert(
      fc.property(knots, (rows) => {
        const x = rows.map((row) => row[0])
        const through = naturalCubicSpline(
          x,
          rows.map((row) => row[1]),
        )
        // Curvatures reach 6·10/0.1²; a few units in the last place of their share in y.
        for (const [at, y] of rows)
          expect(Math.abs(evaluateSpline(through, at).value - y)).toBeLessThan(1e-12)
        const line = naturalCubicSpline(
          x,
          x.map((at) => 3 - 2 * at),
        )
        const middle = (x[0]! + x.at(-1)!) / 2
        expect(Math.abs(evaluateSpline(line, middle).value - (3 - 2 * middle))).toBeLessThan(1e-12)
        expect(Math.abs(evaluateSpline(line, middle).slope + 2)).toBeLessThan(1e-12)
      }),
    )
  })
})

describe('a lazily tabulated function', () => {
  it('is asked for only where it is needed, and gives its values over many decades', () => {
    let asked = 0
    const quick = lazyPositive(
      (x) => {
        asked++
        return x ** 2 * Math.exp(-x)
      },
      { tolerance: 1e-12 },
    )
    expect(Math.abs(quick(30) / (900 * Math.exp(-30)) - 1)).toBeLessThan(1e-11)
    const first = asked
    expect(Math.abs(quick(31) / (961 * Math.exp(-31)) - 1)).toBeLessThan(1e-11)
    expect(asked).toBe(first)
    expect(quick(1e-3)).toBeGreaterThan(0)
    expect(asked).toBeGreaterThan(first)
  })
})
