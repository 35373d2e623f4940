import { describe, expect, it } from 'vitest'
import { besselK, scaledBesselK } from '#core/numerics/special/besselK'
import { quickScaledBesselK } from '#core/numerics/special/besselTable'
import { relative, speciesFixture } from '../fixtures.ts'

describe('modified Bessel functions of the second kind', () => {
  it('agree with 30-digit quadrature to 1e-13 from z = 1e-6 to 700, scaled and not', () => {
    for (const row of speciesFixture.bessel) {
      for (const n of [0, 1, 2]) {
        expect(relative(scaledBesselK(n, row.z), row[`scaledK${n}`]!), `scaled K${n}(${row.z})`).toBeLessThan(
          1e-13,
        )
        // Below 1e-300 a double has lost digits already.
        if (row[`k${n}`]! > 1e-300)
          expect(relative(besselK(n, row.z), row[`k${n}`]!), `K${n}(${row.z})`).toBeLessThan(1e-13)
      }
    }
  })

  it('obey K₂(z) = K₀(z) + 2K₁(z)/z (DLMF 10.29.1)', () => {
    for (const z of [1e-8, 1e-3, 0.7, 3, 50, 1e5]) {
      const sum = scaledBesselK(0, z) + (2 / z) * scaledBesselK(1, z)
      expect(relative(scaledBesselK(2, z), sum)).toBeLessThan(1e-13)
    }
  })

  it('come from their tables, and beyond them from their series, with the same digits', () => {
    for (let z = 1e-9; z < 9e8; z *= 1.37) {
      expect(relative(quickScaledBesselK(1, z), scaledBesselK(1, z))).toBeLessThan(2e-13)
      expect(relative(quickScaledBesselK(2, z), scaledBesselK(2, z))).toBeLessThan(2e-13)
    }
  })

  it('are infinite at zero and not a number below', () => {
    expect(scaledBesselK(1, 0)).toBe(Infinity)
    expect(scaledBesselK(1, -1)).toBeNaN()
  })
})
