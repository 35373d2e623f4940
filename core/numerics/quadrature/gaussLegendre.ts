export interface QuadratureRule {
  /** Abscissae on [−1, 1]. */
  readonly nodes: Float64Array
  readonly weights: Float64Array
}

/** P_n(z) and its derivative by the three-term recurrence. */
function legendre(n: number, z: number): { value: number; slope: number } {
  let previous = 1
  let value = z
  for (let k = 2; k <= n; k++) [previous, value] = [value, ((2 * k - 1) * z * value - (k - 1) * previous) / k]
  return { value, slope: (n * (z * value - previous)) / (z * z - 1) }
}

/**
 * Gauss–Legendre rule with n ≥ 2 points, exact for polynomials of degree 2n − 1: Newton's iteration on P_n from
 * Tricomi's estimate of its zeros (DLMF 18.16.14, 3.5.15–3.5.20).
 */
export function gaussLegendre(n: number): QuadratureRule {
  const nodes = new Float64Array(n)
  const weights = new Float64Array(n)
  for (let i = 0; i < n; i++) {
    let z = -Math.cos((Math.PI * (i + 0.75)) / (n + 0.5))
    for (let k = 0; k < 6; k++) {
      const { value, slope } = legendre(n, z)
      z -= value / slope
    }
    const { slope } = legendre(n, z)
    nodes[i] = z
    weights[i] = 2 / ((1 - z * z) * slope * slope)
  }
  return { nodes, weights }
}

/** ∫ f over [low, high] by the rule. */
export function integrateWith(
  rule: QuadratureRule,
  f: (x: number) => number,
  low: number,
  high: number,
): number {
  const middle = (low + high) / 2
  const half = (high - low) / 2
  let sum = 0
  for (let i = 0; i < rule.nodes.length; i++) sum += rule.weights[i]! * f(middle + half * rule.nodes[i]!)
  return half * sum
}
