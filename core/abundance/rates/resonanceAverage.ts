/**
 * The thermal average of an s-channel Breit–Wigner resonance of mass M, width Γ and spin J,
 *
 *   σ(s) = (1 + δ)(4πω/k²) M²Γ²B/((s − M²)² + M²Γ²),   ω = (2J + 1)/(2S + 1)²,   k² = s/4 − m²,
 *
 * with B the constant product of branchings on the peak and δ = 1 for a self-conjugate candidate. That B is constant makes
 * σv grow as 1/v towards the threshold: a stated limit of the form.
 * Average: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145, eq. 3.8; resonances: Griest & Seckel, Phys. Rev. D 43 (1991) 3191.
 *
 * σ(s)(s − 4m²) is a Lorentzian in s; near the pole the integral runs over the angle θ, s = M² + MΓ tan θ, beside it over
 * ln|s − M²|, so a peak of any width is met.
 */
import { quickScaledBesselK } from '../../numerics/special/besselTable.ts'
import { gaussLegendre, integrateWith } from '../../numerics/quadrature/gaussLegendre.ts'

const RULE = gaussLegendre(12)

/** |s − M²| in units of MΓ up to which the angle is the variable. */
const NEAR = 3

/** (√s − 2m)/T beyond which e^{−y} leaves nothing. */
const FARTHEST = 60
const CUTS = [0.05, 0.3, 1, 2, 3.5, 5, 7, 9, 12, 15, 18, 22, 26, 30, 35, 40, 45, 50, 55]

export interface Resonance {
  /** Mass of the candidate, GeV. */
  candidateGeV: number
  massGeV: number
  widthGeV: number
  /** (1 + δ) ω B. */
  strength: number
}

/**
 * ⟨σv⟩, GeV⁻², at x = m/T.
 * Everything is in units of the candidate's mass and counted from the threshold, d = s − 4, so that nothing cancels when the
 * bath is so cold that only the threshold matters.
 */
export function resonanceAverage(
  x: number,
  { candidateGeV: m, massGeV, widthGeV, strength }: Resonance,
): number {
  const ratio = massGeV / m
  const pole = (ratio - 2) * (ratio + 2)
  const width = ratio * (widthGeV / m)
  const above = (y: number): number => (y / x) * (4 + y / x)
  const high = above(FARTHEST)
  const cuts = CUTS.map(above)
  const body = (d: number): number => {
    const r = Math.sqrt(4 + d)
    return r * quickScaledBesselK(1, r * x) * Math.exp((-d / (r + 2)) * x)
  }
  const near = (from: number, to: number): number => {
    const angle = (d: number): number => Math.atan2(d - pole, width)
    return integrateWith(
      RULE,
      (theta) => width * body(pole + width * Math.tan(theta)),
      angle(from),
      angle(to),
    )
  }
  /** ∫ over the distance from the pole, in its logarithm; the Lorentzian is a function of the distance alone. */
  const side = (sign: 1 | -1, from: number, to: number): number =>
    integrateWith(
      RULE,
      (u) => {
        const distance = Math.exp(u)
        const lorentzian = 1 / (1 + (distance / width) ** 2)
        return body(pole + sign * distance) * lorentzian * distance
      },
      Math.log(from),
      Math.log(to),
    )
  /** ∫ over y: what is left when the pole is far from everything the bath reaches. */
  const far = (from: number, to: number): number =>
    integrateWith(
      RULE,
      (y) => {
        const d = above(y)
        return ((body(d) / (1 + ((d - pole) / width) ** 2)) * (4 + (2 * y) / x)) / x
      },
      from,
      to,
    )

  let sum = 0
  if (pole > 3 * high || pole < -2 * high) {
    const edges = [0, ...CUTS, FARTHEST]
    for (let i = 0; i + 1 < edges.length; i++) sum += far(edges[i]!, edges[i + 1]!)
  } else {
    const nearEdges = cutUp(Math.max(0, pole - NEAR * width), Math.min(high, pole + NEAR * width), [
      ...cuts,
      pole - width,
      pole,
      pole + width,
    ])
    for (let i = 0; i + 1 < nearEdges.length; i++) sum += near(nearEdges[i]!, nearEdges[i + 1]!)
    for (const sign of [1, -1] as const) {
      const first = Math.max(NEAR * width, sign === 1 ? -pole : pole - high)
      const last = sign === 1 ? high - pole : pole
      const edges = cutUp(first, last, [...doublings(first, last), ...cuts.map((d) => sign * (d - pole))])
      for (let i = 0; i + 1 < edges.length; i++) sum += side(sign, edges[i]!, edges[i + 1]!)
    }
  }
  return ((16 * Math.PI * strength) / (8 * m ** 2)) * (x / quickScaledBesselK(2, x) ** 2) * sum
}

/** Ascending cuts inside (low, high) with both ends; empty when there is nothing between them. */
function cutUp(low: number, high: number, cuts: readonly number[]): number[] {
  if (!(high > low)) return []
  return [
    low,
    ...cuts.filter((cut) => cut > low * (1 + 1e-12) && cut < high * (1 - 1e-12)).sort((a, b) => a - b),
    high,
  ]
}

function doublings(first: number, last: number): number[] {
  const cuts: number[] = []
  for (let at = first * 2; at < last; at *= 2) cuts.push(at)
  return cuts
}
