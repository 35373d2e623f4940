/**
 * The integral over collision energies that thermal averages and reaction densities share, with Maxwell–Boltzmann initial states,
 *
 *   I(T) = ∫ ds σ(s) [s − (m₁+m₂)²][s − (m₁−m₂)²] K₁(√s/T)/√s.
 *
 * Source: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145. Between the knots of σ the integrand is analytic but at √s = 0; panels
 * are no wider than a fixed number of T, of powers of √s and of changes of σ, and take as many Gauss–Legendre points as their
 * width asks for. Relative error below 1e-11.
 */
import { quickScaledBesselK } from '../../numerics/special/besselTable.ts'
import { gaussLegendre } from '../../numerics/quadrature/gaussLegendre.ts'
import type { QuadratureRule } from '../../numerics/quadrature/gaussLegendre.ts'
import type { PowerLawPieces } from './powerLawPieces.ts'

/** Two particles that collide, and the least √s at which they make what is asked for; all GeV. */
export interface Collision {
  sum: number
  difference: number
  least: number
}

/** (√s − √s_min)/T beyond which e^{−y} leaves nothing. */
const FARTHEST = 70

/** Width in units of T of a panel that begins y above the threshold: wider where e^{−y} has left little to add up. */
const widthInT = (y: number): number => 6 + 0.5 * y

/** Largest ratio of the energies at the ends of a panel, and of the values of a power of them. */
const LN_WIDEST_RATIO = Math.log(3.5)
const LN_WIDEST_CHANGE = 10

/** Half the width of a panel, in units of the scales over which the integrand changes, up to which a rule is exact to 1e-13. */
const RULES: readonly (readonly [size: number, rule: QuadratureRule])[] = [
  [0.1, gaussLegendre(4)],
  [0.8, gaussLegendre(7)],
  [Infinity, gaussLegendre(14)],
]

const ruleFor = (size: number): QuadratureRule => RULES.find(([limit]) => size <= limit)![1]

/** √s, GeV, below which nothing collides: whatever is larger of the threshold and where σ begins. */
export const lowestEnergy = (sigma: PowerLawPieces, collision: Collision): number =>
  Math.max(collision.least, sigma.edges[0]!)

/** I(T) e^{√s_min/T}, GeV⁶ times the unit of σ. */
export function scaledCollisionIntegral(
  temperatureGeV: number,
  sigma: PowerLawPieces,
  collision: Collision,
): number {
  const low = lowestEnergy(sigma, collision)
  const { edges } = sigma
  let sum = 0
  for (let i = 0; i + 1 < edges.length; i++) {
    const from = Math.max(edges[i]! - low, 0)
    const to = Math.min(edges[i + 1]! - low, FARTHEST * temperatureGeV)
    if (to > from) sum += overPiece(temperatureGeV, sigma, i, collision, low, from, to)
  }
  return sum
}

/** The part of one piece of σ, from and to energies above the lowest. */
function overPiece(
  T: number,
  sigma: PowerLawPieces,
  piece: number,
  collision: Collision,
  low: number,
  from: number,
  to: number,
): number {
  const power = Math.abs(sigma.exponent[piece]!) + 4
  const widestRatio = Math.expm1(Math.min(LN_WIDEST_RATIO, LN_WIDEST_CHANGE / power))
  let sum = 0
  for (let start = from; start < to;) {
    const width = Math.min(T * widthInT(start / T), (low + start) * widestRatio)
    // A last sliver is taken along.
    const end = start + 1.1 * width < to ? start + width : to
    const half = (end - start) / 2
    const rule = ruleFor(half / T + (half * power) / (low + start))
    sum += overPanel(T, sigma, piece, collision, low, start, half, rule)
    start = end
  }
  return sum
}

function overPanel(
  T: number,
  sigma: PowerLawPieces,
  piece: number,
  { sum: m1PlusM2, difference }: Collision,
  low: number,
  start: number,
  half: number,
  { nodes, weights }: QuadratureRule,
): number {
  const lnT = Math.log(T)
  const lnSigma = sigma.lnSigma[piece]!
  const lnReference = sigma.lnEnergy[piece]!
  const exponent = sigma.exponent[piece]!
  // Counted from the threshold, so that nothing cancels in a cold bath.
  const aboveSum = low - m1PlusM2
  let total = 0
  for (let i = 0; i < nodes.length; i++) {
    const above = start + half * (1 + nodes[i]!)
    const energy = low + above
    const lnEnergy = Math.log(energy)
    const phaseSpace =
      (aboveSum + above) * (energy + m1PlusM2) * (energy - difference) * (energy + difference)
    const bessel = quickScaledBesselK(1, energy / T, lnEnergy - lnT)
    const scaled = Math.exp(lnSigma + exponent * (lnEnergy - lnReference) - above / T)
    total += weights[i]! * phaseSpace * bessel * scaled
  }
  return 2 * half * total
}
