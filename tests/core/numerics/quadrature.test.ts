import { describe, expect, it } from 'vitest'
import { gaussLegendre, integrateWith } from '#core/numerics/quadrature/gaussLegendre'

describe('Gauss–Legendre rules', () => {
  it.each([2, 3, 6, 12, 24])(
    'with %i points are exact for polynomials of degree 2n − 1 and for no higher one',
    (n) => {
      const rule = gaussLegendre(n)
      const monomial = (power: number): number => integrateWith(rule, (x) => x ** power, -1, 1)
      for (let power = 0; power < 2 * n; power++) {
        const exact = power % 2 === 0 ? 2 / (power + 1) : 0
        // A few units in the last place of a sum of at most 24 terms of order one.
        expect(Math.abs(monomial(power) - exact)).toBeLessThan(5e-15)
      }
      if (n < 12) expect(Math.abs(monomial(2 * n) - 2 / (2 * n + 1))).toBeGreaterThan(1e-8)
    },
  )

  it('integrate over any interval', () => {
    expect(integrateWith(gaussLegendre(16), Math.exp, 1, 3)).toBeCloseTo(Math.exp(3) - Math.exp(1), 12)
  })
})
