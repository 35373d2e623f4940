/**
 * Radau IIA collocation with s stages: order 2s − 1, stiffly accurate, L-stable.
 * The abscissae are the zeros of P_s(2c − 1) − P_{s−1}(2c − 1), the last of which is 1.
 * Source: Hairer & Wanner, Solving Ordinary Differential Equations II (1996), section IV.5.
 */
export interface RadauTableau {
  readonly stages: number
  /** Abscissae c_1 … c_s = 1. */
  readonly c: Float64Array
  /** A⁻¹, row by row: maps the stage increments z to h u′ at the stages. */
  readonly inverse: Float64Array
  /** Weights ℓ_j(0) that carry u′ from the stages back to the start of the step. */
  readonly atStart: Float64Array
  /** Barycentric weights of the nodes 0, c_1, …, c_s. */
  readonly barycentric: Float64Array
}

/** P_s(x) − P_{s−1}(x), whose zeros on (−1, 1] are the right Radau points. */
function radauPolynomial(s: number, x: number): number {
  let previous = 1
  let value = x
  for (let k = 2; k <= s; k++) [previous, value] = [value, ((2 * k - 1) * x * value - (k - 1) * previous) / k]
  return value - previous
}

function abscissae(s: number): Float64Array {
  const c: number[] = []
  const cells = 400
  for (let i = 0; i < cells && c.length < s - 1; i++) {
    let [low, high] = [-1 + (2 * i) / cells, -1 + (2 * (i + 1)) / cells]
    const sign = Math.sign(radauPolynomial(s, low))
    if (sign * radauPolynomial(s, high) >= 0) continue
    for (let k = 0; k < 60; k++) {
      const middle = (low + high) / 2
      if (sign * radauPolynomial(s, middle) > 0) low = middle
      else high = middle
    }
    c.push((1 + (low + high) / 2) / 2)
  }
  return Float64Array.from([...c, 1])
}

function barycentricWeights(nodes: ArrayLike<number>): Float64Array {
  return Float64Array.from(nodes, (x, i) => {
    let product = 1
    for (let j = 0; j < nodes.length; j++) if (j !== i) product *= x - nodes[j]!
    return 1 / product
  })
}

/** The tableau with s stages, 2 ≤ s ≤ 9. */
export function radauTableau(s: number): RadauTableau {
  const c = abscissae(s)
  const nodes = Float64Array.from([0, ...c])
  const barycentric = barycentricWeights(nodes)
  const inverse = new Float64Array(s * s)
  for (let i = 1; i <= s; i++) {
    let diagonal = 0
    for (let j = 0; j <= s; j++) {
      if (j === i) continue
      const entry = barycentric[j]! / barycentric[i]! / (nodes[i]! - nodes[j]!)
      diagonal -= entry
      if (j > 0) inverse[(i - 1) * s + j - 1] = entry
    }
    inverse[(i - 1) * s + i - 1] = diagonal
  }
  const stageWeights = barycentricWeights(c)
  const terms = Float64Array.from(c, (x, j) => stageWeights[j]! / (0 - x))
  const total = terms.reduce((sum, term) => sum + term, 0)
  return { stages: s, c, inverse, atStart: terms.map((term) => term / total), barycentric }
}
