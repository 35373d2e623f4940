/** A cross-section made of powers of the energy: what a table joined by straight lines in the logarithms is, and a power law too. */
export interface PowerLawPieces {
  /** Ascending energies √s, GeV, between which it is a power; outside them it is zero. */
  readonly edges: Float64Array
  /** Between neighbouring edges σ = σ₀ (√s/E₀)^k: ln σ₀, ln E₀ and k. */
  readonly lnSigma: Float64Array
  readonly lnEnergy: Float64Array
  readonly exponent: Float64Array
}

/** Of points [√s in GeV, σ in GeV⁻²], ascending and positive. */
export function piecesOfTable(points: readonly (readonly [number, number])[]): PowerLawPieces {
  const edges = Float64Array.from(points, (point) => point[0])
  const below = points.slice(0, -1)
  const lnSigma = Float64Array.from(below, (point) => Math.log(point[1]))
  const lnEnergy = Float64Array.from(below, (point) => Math.log(point[0]))
  const exponent = Float64Array.from(below, ([energy, sigma], i) => {
    const [nextEnergy, nextSigma] = points[i + 1]!
    return Math.log(nextSigma / sigma) / Math.log(nextEnergy / energy)
  })
  return { edges, lnSigma, lnEnergy, exponent }
}

/** (E/E₀)^k at all energies. */
export const singlePower = (k: number, referenceGeV: number): PowerLawPieces => ({
  edges: Float64Array.of(0, Infinity),
  lnSigma: Float64Array.of(0),
  lnEnergy: Float64Array.of(Math.log(referenceGeV)),
  exponent: Float64Array.of(k),
})

/** The same with its end values held outside. */
export function heldAtEnds({ edges, lnSigma, lnEnergy, exponent }: PowerLawPieces): PowerLawPieces {
  const last = lnSigma.length - 1
  const lnLast = lnSigma[last]! + exponent[last]! * (Math.log(edges[last + 1]!) - lnEnergy[last]!)
  return {
    edges: between(0, edges, Infinity),
    lnSigma: between(lnSigma[0]!, lnSigma, lnLast),
    lnEnergy: between(0, lnEnergy, 0),
    exponent: between(0, exponent, 0),
  }
}

function between(first: number, inner: Float64Array, last: number): Float64Array {
  const all = new Float64Array(inner.length + 2)
  all[0] = first
  all.set(inner, 1)
  all[inner.length + 1] = last
  return all
}
