/**
 * The exact thermal average of an annihilation cross-section σ(s) for Maxwell–Boltzmann particles of mass m:
 *
 *   ⟨σv⟩ = 1/(8m⁴T K₂²(m/T)) ∫_{4m²}^∞ σ(s) (s − 4m²) √s K₁(√s/T) ds.
 *
 * Source: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145, eq. 3.8. Integrated over y = (√s − 2m)/T.
 */
import { quickScaledBesselK } from '../../numerics/special/besselTable.ts'
import { edgesWithin, panelIntegral } from './panelIntegral.ts'

/** y beyond which e^{−y} leaves nothing. */
const FARTHEST = 80

const CUTS = [0.03, 0.3, 1, 2.5, 5, 9, 14, 20, 28, 38, 50, 64]

/** The least and the largest √s, GeV, that count at x = m/T. */
export const crossSectionReach = (x: number, massGeV: number): [number, number] => [
  2 * massGeV,
  (2 + FARTHEST / x) * massGeV,
]

/**
 * ⟨σv⟩, GeV⁻², at x = m/T.
 * @param sigma cross-section, GeV⁻², as a function of √s, GeV
 * @param knots values of √s where a derivative of σ jumps, and the ends of its support
 */
export function crossSectionAverage(
  x: number,
  massGeV: number,
  sigma: (rootS: number) => number,
  knots: readonly number[],
): number {
  const temperature = massGeV / x
  const scaledKnots = knots.map((knot) => (knot - 2 * massGeV) / temperature)
  const low = Math.max(0, scaledKnots.length > 0 ? Math.min(...scaledKnots) : 0)
  const high = Math.min(FARTHEST, scaledKnots.length > 0 ? Math.max(...scaledKnots) : FARTHEST)
  if (high <= low) return 0
  // In units of the mass, so that no power overflows: r = √s/m.
  const integrand = (y: number): number => {
    const r = 2 + y / x
    return sigma(r * massGeV) * (y / x) * (r + 2) * r * r * quickScaledBesselK(1, r * x) * Math.exp(-y)
  }
  const integral = panelIntegral(integrand, edgesWithin(low, high, [...CUTS, ...scaledKnots]))
  return integral / (4 * quickScaledBesselK(2, x) ** 2)
}
