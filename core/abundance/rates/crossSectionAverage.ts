/**
 * The exact thermal average of an annihilation cross-section σ(s) for Maxwell–Boltzmann particles of mass m:
 *
 *   ⟨σv⟩ = 1/(8m⁴T K₂²(m/T)) ∫_{4m²}^∞ σ(s) (s − 4m²) √s K₁(√s/T) ds.
 *
 * Source: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145, eq. 3.8.
 */
import { lazyPositive } from '../../numerics/interpolation/lazyPositive.ts'
import { quickScaledBesselK } from '../../numerics/special/besselTable.ts'
import { lowestEnergy, scaledCollisionIntegral } from './collisionIntegral.ts'
import type { PowerLawPieces } from './powerLawPieces.ts'

/** ⟨σv⟩, GeV⁻², as a function of x = m/T, for a cross-section in GeV⁻². */
export function crossSectionAverage(
  massGeV: number,
  sigma: PowerLawPieces,
  tolerance: number,
): (x: number) => number {
  const pair = { sum: 2 * massGeV, difference: 0, least: 2 * massGeV }
  // Where σ begins above the threshold, e^{−x·excess} of the pairs have the energy for it.
  const excess = lowestEnergy(sigma, pair) / massGeV - 2
  const scaled = lazyPositive(
    (x) => {
      const temperature = massGeV / x
      const bessel = quickScaledBesselK(2, x)
      return (
        scaledCollisionIntegral(temperature, sigma, pair) / (8 * massGeV ** 4 * temperature * bessel * bessel)
      )
    },
    { tolerance, coldPower: excess > 0 ? 0.5 : -0.5 },
  )
  return excess > 0 ? (x) => scaled(x) * Math.exp(-x * excess) : scaled
}
