import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { brent } from '#core/numerics/roots/brent'
import { between } from '../arbitraries.ts'

describe('roots', () => {
  it('are found to the tolerance asked for', () => {
    // cos x = x: OEIS A003957.
    expect(Math.abs(brent((x) => Math.cos(x) - x, 0, 1, 1e-14) - 0.7390851332151607)).toBeLessThan(1e-14)
  })

  it('are found to the tolerance asked for wherever they lie and however steep the function is', () => {
    fc.assert(
      fc.property(
        between(0.01, 0.99),
        between(1e-6, 1e6),
        between(1e-13, 1e-3),
        (root, steepness, tolerance) => {
          const found = brent((x) => Math.expm1(steepness * (x - root)), 0, 1, tolerance)
          expect(Math.abs(found - root)).toBeLessThanOrEqual(tolerance + 1e-15)
        },
      ),
    )
  })

  it('are found at an end of the bracket, and across a jump', () => {
    expect(brent((x) => x, 0, 1, 1e-12)).toBe(0)
    expect(brent((x) => x - 1, 0, 1, 1e-12)).toBe(1)
    expect(Math.abs(brent((x) => (x < 0.3 ? -1 : 1), 0, 1, 1e-12) - 0.3)).toBeLessThan(1e-11)
  })

  it('are refused without a change of sign', () => {
    expect(() => brent((x) => x * x + 1, -1, 1, 1e-9)).toThrow(RangeError)
  })
})
