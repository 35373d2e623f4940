import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  emptyCubic,
  evaluatePiece,
  monotoneSpline,
  pieceOf,
} from '#core/numerics/interpolation/monotoneSpline'
import type { MonotoneSpline } from '#core/numerics/interpolation/monotoneSpline'

const jet = emptyCubic()
function at(spline: MonotoneSpline, x: number): number {
  evaluatePiece(spline, pieceOf(spline, x), x, jet)
  return jet.value
}

const through = (f: (x: number) => number, low: number, high: number, rows: number): MonotoneSpline => {
  const x = Float64Array.from({ length: rows }, (_, i) => low + ((high - low) * i) / (rows - 1))
  return monotoneSpline(x, x.map(f))
}

function worst(f: (x: number) => number, low: number, high: number, rows: number): number {
  const spline = through(f, low, high, rows)
  let most = 0
  for (let i = 0; i < 4001; i++) {
    const x = low + ((high - low) * i) / 4000
    most = Math.max(most, Math.abs(at(spline, x) - f(x)))
  }
  return most
}

/** Steps up, of any size and at any distance. */
const rising = fc
  .array(
    fc.record({
      width: fc.double({ min: 0.01, max: 2, noNaN: true }),
      rise: fc.double({ min: 0, max: 5, noNaN: true }),
    }),
    {
      minLength: 4,
      maxLength: 30,
    },
  )
  .map((steps) => {
    let [x, y] = [0, 0]
    const rows = steps.map(({ width, rise }) => [(x += width), (y += rise)] as const)
    return monotoneSpline(
      Float64Array.from(rows, ([place]) => place),
      Float64Array.from(rows, ([, height]) => height),
    )
  })

describe('a monotone spline', () => {
  it('gives a cubic back exactly where it is monotone', () => {
    const cubic = (x: number): number => 1 + 2 * x + 0.3 * x * x + 0.2 * x ** 3
    expect(worst(cubic, 0, 3, 7)).toBeLessThan(1e-13)
  })

  it.each([
    ['a rise', (x: number) => Math.tanh(x), -3, 3],
    ['a bump, whose extreme lies between rows', (x: number) => Math.exp(-x * x), -2, 2.3],
  ] as const)('meets %s with an error of fourth order in the distance of the rows', (_name, f, low, high) => {
    const errors = [41, 81, 161, 321].map((rows) => worst(f, low, high, rows))
    // Halved distances: 16 in the limit; 12 leaves room for the order to be reached from below.
    for (let i = 1; i < errors.length; i++) expect(errors[i - 1]! / errors[i]!).toBeGreaterThan(12)
  })

  it('rises wherever its rows do not fall', () => {
    fc.assert(
      fc.property(rising, (spline) => {
        const { x, y } = spline
        for (let i = 0; i + 1 < x.length; i++) {
          const width = x[i + 1]! - x[i]!
          let before = y[i]!
          for (let k = 1; k <= 20; k++) {
            evaluatePiece(spline, i, x[i]! + (width * k) / 20, jet)
            expect(jet.value).toBeGreaterThan(before - 1e-13 * Math.max(1, y.at(-1)!))
            before = jet.value
          }
        }
      }),
    )
  })

  it('does not ring beside a step', () => {
    const step = through((x) => (x < 0 ? 0 : 1), -5.5, 5.5, 12)
    for (let x = -5.5; x <= 5.5; x += 0.01) {
      expect(at(step, x)).toBeGreaterThanOrEqual(0)
      expect(at(step, x)).toBeLessThanOrEqual(1)
    }
  })

  it('has the derivatives it says it has', () => {
    const spline = through(Math.sin, 0, 3, 20)
    const i = pieceOf(spline, 1.234)
    const value = (x: number): number => {
      evaluatePiece(spline, i, x, jet)
      return jet.value
    }
    const h = 1e-2
    const [a, b, c, d] = [-3, -1, 1, 3].map((k) => value(1.234 + (k * h) / 2))
    evaluatePiece(spline, i, 1.234, jet)
    // A cubic: differences of third order are exact, those of first order off by h²/24 of it.
    expect((d! - 3 * c! + 3 * b! - a!) / h ** 3).toBeCloseTo(jet.third, 6)
    expect((d! - c! - b! + a!) / (2 * h * h)).toBeCloseTo(jet.second, 9)
    expect((c! - b!) / h - (jet.third * h * h) / 24).toBeCloseTo(jet.first, 11)
  })
})
