/**
 * The thermal average of an s-channel Breit–Wigner resonance of mass M, width Γ and spin J,
 *
 *   σ(s) = (1 + δ)(4πω/k²) M²Γ²B/((s − M²)² + M²Γ²),   ω = (2J + 1)/(2S + 1)²,   k² = s/4 − m²,
 *
 * with B the constant product of branchings on the peak and δ = 1 for a self-conjugate candidate. That B is constant makes
 * σv grow as 1/v towards the threshold: a stated limit of the form.
 * Average: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145, eq. 3.8; resonances: Griest & Seckel, Phys. Rev. D 43 (1991) 3191.
 *
 * σ(s)(s − 4m²) is a Lorentzian in s. With s = M² + MΓ sinh u it becomes 1/cosh u, smooth on a scale of one in u however narrow the
 * peak and however far from it, so panels of even width in u meet everything. Nodes and Lorentzian do not depend on x: they are laid
 * out for a range of x at a time. Relative error below 1e-10.
 */
import { LeastRecentlyUsed } from '../../numerics/leastRecentlyUsed.ts'
import { quickScaledBesselK } from '../../numerics/special/besselTable.ts'
import { gaussLegendre } from '../../numerics/quadrature/gaussLegendre.ts'

const RULE = gaussLegendre(16)

/**
 * Edges of panels in u. 1/cosh u is analytic to |Im u| < π/2, so about the peak sixteen points on a width of three leave 1e-12 of
 * it; farther away it is an exponential, and they do for more.
 */
const HALF_OF_EDGES = [3, 7.5, 12, 16.5, 21, 25.5, 30, 34.5, 39, 43.5, 48]
const EDGES_IN_U = [...HALF_OF_EDGES.map((u) => -u).reverse(), 0, ...HALF_OF_EDGES]

/** (√s − 2m)/T beyond which e^{−y} leaves nothing, and edges of panels that resolve it. */
const FARTHEST = 60
const CUTS = [2.5, 7, 14, 26, FARTHEST]

/** Largest ratio of √s at the ends of a panel: K₁ has a pole at zero. */
const WIDEST_RATIO = 2

/** Width in ln x of the range that nodes are laid out for. */
const RANGE = 2

export interface Resonance {
  /** Mass of the candidate, GeV. */
  candidateGeV: number
  massGeV: number
  widthGeV: number
}

/** Nodes of an integral over r = √s/m. */
interface Nodes {
  /** r, ln r and r − 2, exact near the threshold too. */
  readonly r: Float64Array
  readonly lnR: Float64Array
  readonly excess: Float64Array
  /** Weight times r times the Lorentzian, in s over m². */
  readonly weight: Float64Array
}

/** r − 2 where panels begin and end for x within a factor e^RANGE from `least` up. */
function edgesInExcess(least: number): number[] {
  const most = FARTHEST / least
  const edges = [0]
  for (const y of CUTS) edges.push(y / (least * Math.exp(RANGE)))
  while (edges.at(-1)! < most) edges.push(2 * edges.at(-1)!)
  for (let r = 2 * WIDEST_RATIO; r - 2 < most; r *= WIDEST_RATIO) edges.push(r - 2)
  return edges.sort((a, b) => a - b)
}

/**
 * The nodes for x from `least` on. Everything is in units of the candidate's mass and counted from the threshold, d = s − 4, so that
 * nothing cancels when the bath is so cold that only the threshold matters.
 */
function layOut(least: number, { candidateGeV, massGeV, widthGeV }: Resonance): Nodes {
  const ratio = massGeV / candidateGeV
  const pole = (ratio - 2) * (ratio + 2)
  const width = ratio * (widthGeV / candidateGeV)
  const edges = edgesInExcess(least).map((excess) => excess * (4 + excess))
  const high = edges.at(-1)!
  const d: number[] = []
  const weight: number[] = []
  const add = (
    low: number,
    high: number,
    dAt: (t: number) => number,
    weightAt: (t: number) => number,
  ): void => {
    const half = (high - low) / 2
    RULE.nodes.forEach((node, i) => {
      const t = low + half * (1 + node)
      d.push(Math.max(0, dAt(t)))
      weight.push(half * RULE.weights[i]! * weightAt(t))
    })
  }
  const uOf = (at: number): number => Math.asinh((at - pole) / width)
  // When the pole is far from everything the bath reaches, d would be a small difference in u.
  const far = pole > 3 * high || pole < -2 * high
  for (let i = 0; i + 1 < edges.length; i++) {
    const [from, to] = [edges[i]!, edges[i + 1]!]
    if (far) {
      add(
        from,
        to,
        (at) => at,
        (at) => 1 / (1 + ((at - pole) / width) ** 2),
      )
      continue
    }
    const [low, high] = [uOf(from), uOf(to)]
    const cuts = [low, ...EDGES_IN_U.filter((u) => u > low && u < high), high]
    for (let k = 0; k + 1 < cuts.length; k++)
      add(
        cuts[k]!,
        cuts[k + 1]!,
        (u) => pole + width * Math.sinh(u),
        (u) => width / Math.cosh(u),
      )
  }
  const r = Float64Array.from(d, (each) => Math.sqrt(4 + each))
  return {
    r,
    lnR: r.map(Math.log),
    excess: r.map((each, i) => d[i]! / (each + 2)),
    weight: r.map((each, i) => each * weight[i]!),
  }
}

/** Ranges whose nodes are kept: those of the widest stretch of x that is tabulated at a time. */
const RANGES_KEPT = 6

/** ⟨σv⟩/((1 + δ)ωB), GeV⁻², as a function of x = m/T. */
export function resonanceAverage(resonance: Resonance): (x: number) => number {
  const laidOut = new LeastRecentlyUsed<Nodes>(RANGES_KEPT)
  return (x) => {
    const lnX = Math.log(x)
    const range = Math.floor(lnX / RANGE)
    const { r, lnR, excess, weight } = laidOut.get(String(range), () =>
      layOut(Math.exp(range * RANGE), resonance),
    )
    let integral = 0
    for (let i = 0; i < r.length && excess[i]! * x < FARTHEST; i++)
      integral += weight[i]! * quickScaledBesselK(1, r[i]! * x, lnR[i]! + lnX) * Math.exp(-excess[i]! * x)
    const bessel = quickScaledBesselK(2, x, lnX)
    return ((2 * Math.PI) / resonance.candidateGeV ** 2) * (x / (bessel * bessel)) * integral
  }
}
