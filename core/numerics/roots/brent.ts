/**
 * Root of a continuous function that changes sign on [low, high], to the stated absolute tolerance in x.
 * Brent, Algorithms for Minimization without Derivatives (1973), chapter 4.
 * @throws RangeError when the ends have the same sign.
 */
export function brent(f: (x: number) => number, low: number, high: number, tolerance: number): number {
  const search = brentSearch({ at: low, value: f(low) }, { at: high, value: f(high) }, tolerance)
  let next = search.next()
  while (!next.done) next = search.next(f(next.value))
  return next.value
}

/** A point of a function. */
export interface Sample {
  at: number
  value: number
}

/** The same for a function that is evaluated elsewhere: yields each x it wants the value at, and is told it. */
export function* brentSearch(
  low: Sample,
  high: Sample,
  tolerance: number,
): Generator<number, number, number> {
  let [a, b] = [low.at, high.at]
  let [fa, fb] = [low.value, high.value]
  if (fa === 0) return a
  if (fb === 0) return b
  if (!(fa * fb < 0)) throw new RangeError(`no change of sign between ${a} and ${b}`)
  let [c, fc] = [a, fa]
  let step = b - a
  let before = step
  for (let i = 0; i < 200; i++) {
    if (fb * fc > 0) {
      ;[c, fc] = [a, fa]
      step = before = b - a
    }
    if (Math.abs(fc) < Math.abs(fb)) {
      ;[a, b, c] = [b, c, b]
      ;[fa, fb, fc] = [fb, fc, fb]
    }
    const limit = 2 * Number.EPSILON * Math.abs(b) + tolerance / 2
    const half = (c - b) / 2
    if (Math.abs(half) <= limit || fb === 0) return b
    const [p, q] = interpolationStep(a, b, c, fa, fb, fc)
    const usable =
      Math.abs(before) >= limit &&
      Math.abs(fa) > Math.abs(fb) &&
      2 * p < Math.min(3 * half * q - Math.abs(limit * q), Math.abs(before * q))
    before = usable ? step : half
    step = usable ? p / q : half
    ;[a, fa] = [b, fb]
    b += Math.abs(step) > limit ? step : Math.sign(half) * limit
    fb = yield b
  }
  return b
}

/** Numerator p ≥ 0 and denominator q of the secant or inverse quadratic step from b. */
function interpolationStep(
  a: number,
  b: number,
  c: number,
  fa: number,
  fb: number,
  fc: number,
): [number, number] {
  const half = (c - b) / 2
  const s = fb / fa
  let p = 2 * half * s
  let q = 1 - s
  if (a !== c) {
    const u = fa / fc
    const r = fb / fc
    p = s * (2 * half * u * (u - r) - (b - a) * (r - 1))
    q = (u - 1) * (r - 1) * (s - 1)
  }
  return p > 0 ? [p, -q] : [-p, q]
}
