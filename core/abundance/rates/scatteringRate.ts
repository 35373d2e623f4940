/**
 * Reaction density of 1 + 2 → X + 3 with Maxwell–Boltzmann initial states:
 *
 *   γ = g₁g₂ T/(32π⁴) ∫ ds σ(s) [s − (m₁+m₂)²][s − (m₁−m₂)²] K₁(√s/T)/√s,   s ≥ max((m₁+m₂)², m_X²),
 *
 * and for a constant |M|², summed over all spins, with massless initial states and final masses (m, 0):
 *
 *   γ = |M|² m T³ K₁(m/T)/(128π⁵).
 *
 * Sources: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145; Edsjö & Gondolo, Phys. Rev. D 56 (1997) 1879.
 */
import { lazyPositive } from '../../numerics/interpolation/lazyPositive.ts'
import { quickScaledBesselK } from '../../numerics/special/besselTable.ts'
import { lowestEnergy, scaledCollisionIntegral } from './collisionIntegral.ts'
import type { Collision } from './collisionIntegral.ts'
import type { PowerLawPieces } from './powerLawPieces.ts'

export interface Incoming {
  massGeV: number
  degreesOfFreedom: number
}

/** The kinematics of 1 + 2 → X + 3, where 3 is light. */
export const collisionOf = ([one, two]: readonly [Incoming, Incoming], massGeV: number): Collision => ({
  sum: one.massGeV + two.massGeV,
  difference: Math.abs(one.massGeV - two.massGeV),
  least: Math.max(one.massGeV + two.massGeV, massGeV),
})

/** γ/(g₁g₂), GeV⁴, as a function of the temperature, GeV, for a cross-section in GeV⁻²; tabulated as it is asked for. */
export function scatteringRate(
  sigma: PowerLawPieces,
  collision: Collision,
  tolerance: number,
): (temperatureGeV: number) => number {
  const low = lowestEnergy(sigma, collision)
  const scaled = lazyPositive(
    (x) => ((low / x) * scaledCollisionIntegral(low / x, sigma, collision)) / (32 * Math.PI ** 4),
    { tolerance },
  )
  return (temperature) => scaled(low / temperature) * Math.exp(-low / temperature)
}

/** γ, GeV⁴, of a constant |M|². */
export function constantMatrixElementRate(
  temperatureGeV: number,
  massGeV: number,
  matrixElementSquared: number,
): number {
  const x = massGeV / temperatureGeV
  const bessel = quickScaledBesselK(1, x) * Math.exp(-x)
  return (matrixElementSquared * massGeV * temperatureGeV ** 3 * bessel) / (128 * Math.PI ** 5)
}
