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
import { quickScaledBesselK } from '../../numerics/special/besselTable.ts'
import { edgesWithin, panelIntegral } from './panelIntegral.ts'

export interface Incoming {
  massGeV: number
  degreesOfFreedom: number
}

/** (√s − √s_min)/T beyond which e^{−y} leaves nothing. */
const FARTHEST = 90
const CUTS = [0.3, 1, 2.5, 5, 9, 14, 20, 28, 38, 50, 68]

/** The least and the largest √s, GeV, that count at temperature T, GeV. */
export const scatteringReach = (temperatureGeV: number, leastRootS: number): [number, number] => [
  leastRootS,
  leastRootS + FARTHEST * temperatureGeV,
]

/** Fourfold steps of √s above its least value, in y, up to where the thermal scale takes over. */
function fourfolds(leastOverT: number): number[] {
  const cuts: number[] = []
  for (let ratio = 2; leastOverT * (ratio - 1) < 1; ratio *= 4) cuts.push(leastOverT * (ratio - 1))
  return cuts
}

/** γ, GeV⁴, times e^{√s_min/T}, for σ(√s) in GeV⁻². */
export function scaledScatteringRate(
  temperatureGeV: number,
  sigma: (rootS: number) => number,
  [one, two]: readonly [Incoming, Incoming],
  leastRootS: number,
  knots: readonly number[],
): number {
  const T = temperatureGeV
  const sum2 = (one.massGeV + two.massGeV) ** 2
  const difference2 = (one.massGeV - two.massGeV) ** 2
  const scaledKnots = knots.map((knot) => (knot - leastRootS) / T)
  const low = Math.max(0, scaledKnots.length > 0 ? Math.min(...scaledKnots) : 0)
  const high = Math.min(FARTHEST, scaledKnots.length > 0 ? Math.max(...scaledKnots) : FARTHEST)
  if (high <= low) return 0
  const integrand = (y: number): number => {
    const rootS = leastRootS + y * T
    const s = rootS * rootS
    return (
      sigma(rootS) * (s - sum2) * (s - difference2) * quickScaledBesselK(1, rootS / T) * Math.exp(-y) * 2 * T
    )
  }
  const edges = edgesWithin(low, high, [...CUTS, ...fourfolds(leastRootS / T), ...scaledKnots])
  return (
    ((one.degreesOfFreedom * two.degreesOfFreedom * T) / (32 * Math.PI ** 4)) *
    panelIntegral(integrand, edges)
  )
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
