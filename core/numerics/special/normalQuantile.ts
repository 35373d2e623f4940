/* eslint-disable no-loss-of-precision -- the coefficients stand as published */
/**
 * The quantile of the standard normal distribution, Φ⁻¹(p), to about 1e-16 relative: rational functions on three ranges.
 * Source: Wichura, Algorithm AS 241, Applied Statistics 37 (1988) 477 (PPND16).
 */

/** In powers of (0.425² − (p − ½)²), for |p − ½| ≤ 0.425. */
const CENTRE_ABOVE = [
  3.387132872796366608, 1.3314166789178437745e2, 1.9715909503065514427e3, 1.3731693765509461125e4,
  4.5921953931549871457e4, 6.7265770927008700853e4, 3.3430575583588128105e4, 2.5090809287301226727e3,
] as const
const CENTRE_BELOW = [
  1, 4.2313330701600911252e1, 6.871870074920579083e2, 5.3941960214247511077e3, 2.1213794301586595867e4,
  3.930789580009271061e4, 2.8729085735721942674e4, 5.226495278852854561e3,
] as const

/** In powers of r − 1.6, r = √(−ln min(p, 1 − p)) ≤ 5. */
const TAIL_ABOVE = [
  1.42343711074968357734, 4.6303378461565452959, 5.7694972214606914055, 3.64784832476320460504,
  1.27045825245236838258, 2.4178072517745061177e-1, 2.27238449892691845833e-2, 7.7454501427834140764e-4,
] as const
const TAIL_BELOW = [
  1, 2.05319162663775882187, 1.6763848301838038494, 6.8976733498510000455e-1, 1.4810397642748007459e-1,
  1.51986665636164571966e-2, 5.475938084995344946e-4, 1.05075007164441684324e-9,
] as const

/** In powers of r − 5, r > 5. */
const FAR_ABOVE = [
  6.6579046435011037772, 5.4637849111641143699, 1.7848265399172913358, 2.9656057182850489123e-1,
  2.6532189526576123093e-2, 1.2426609473880784386e-3, 2.71155556874348757815e-5, 2.01033439929228813265e-7,
] as const
const FAR_BELOW = [
  1, 5.9983220655588793769e-1, 1.3692988092273580531e-1, 1.48753612908506148525e-2, 7.868691311456132591e-4,
  1.8463183175100546818e-5, 1.4215117583164458887e-7, 2.04426310338993978564e-15,
] as const

const CENTRE = 0.425
const FAR = 5

function ratio(above: readonly number[], below: readonly number[], r: number): number {
  let [p, q] = [0, 0]
  for (let i = above.length - 1; i >= 0; i--) {
    p = p * r + above[i]!
    q = q * r + below[i]!
  }
  return p / q
}

/** Φ⁻¹(p) for 0 < p < 1; −∞ at 0, ∞ at 1, NaN outside. */
export function normalQuantile(p: number): number {
  const q = p - 0.5
  if (Math.abs(q) <= CENTRE) return q * ratio(CENTRE_ABOVE, CENTRE_BELOW, CENTRE * CENTRE - q * q)
  const tail = q < 0 ? p : 1 - p
  if (!(tail > 0)) return tail === 0 ? Math.sign(q) * Infinity : NaN
  const r = Math.sqrt(-Math.log(tail))
  const size = r <= FAR ? ratio(TAIL_ABOVE, TAIL_BELOW, r - 1.6) : ratio(FAR_ABOVE, FAR_BELOW, r - FAR)
  return Math.sign(q) * size
}
