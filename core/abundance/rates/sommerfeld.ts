/**
 * Sommerfeld factors of s-wave annihilation, v the relative velocity, and their Maxwell average, ⟨·⟩ ∝ ∫ v² e^{−xv²/4} dv.
 *
 * Coulomb: S = (2πα/v)/(1 − e^{−2πα/v}).
 * Hulthén potential for a mediator of mass m_φ: with ε_v = v/(2α) and ε = π²m_φ/(6αm),
 *   S = (π/ε_v) sinh(2πε_v/ε)/[cosh(2πε_v/ε) − cos(2π√(1/ε − ε_v²/ε²))], cos → cosh where the root is imaginary.
 * Sources: Cassel, J. Phys. G 37 (2010) 105009; Feng, Kaplinghat, Yu, Phys. Rev. D 82 (2010) 083525.
 * On a bound state at threshold the Hulthén factor grows as 1/v² without limit: a guard says when unitarity caps it.
 */
import { lazyPositive } from '../../numerics/interpolation/lazyPositive.ts'

/** S of the Coulomb potential. */
export function coulombFactor(v: number, alpha: number): number {
  const z = (2 * Math.PI * alpha) / v
  return z / -Math.expm1(-z)
}

/**
 * S of the Hulthén potential, with exponentials scaled out. With a = 2πε_v/ε and r = 2π√|1/ε − ε_v²/ε²| the denominator is
 * cosh a − cos r = 2(sinh²(a/2) + sin²(r/2)), or cosh a − cosh r = 2 sinh((a − r)/2) sinh((a + r)/2) with a − r = 4π²/(ε(a + r)), so
 * that no digit cancels.
 */
export function hulthenFactor(v: number, alpha: number, epsilon: number): number {
  const speed = v / (2 * alpha)
  const a = (2 * Math.PI * speed) / epsilon
  const root = 1 / epsilon - (speed / epsilon) ** 2
  const r = 2 * Math.PI * Math.sqrt(Math.abs(root))
  const sinh = -Math.expm1(-2 * a)
  if (root >= 0) {
    const decay = Math.exp(-a)
    const denominator = Math.expm1(-a) ** 2 + 4 * decay * Math.sin(r / 2) ** 2
    return ((Math.PI / speed) * sinh) / denominator
  }
  const gap = (4 * Math.PI ** 2) / (epsilon * (a + r))
  const denominator = Math.expm1(-gap) * Math.expm1(gap - 2 * a)
  return ((Math.PI / speed) * sinh) / denominator
}

/** Step in ln w of the trapezoidal rule: the Gaussian is bounded for |Im ln w| < π/4, so it leaves e^{−π²/(2h)} ≈ 1e-15. */
const STEP = 1 / 7
const STEP_DOWN = Math.exp(-STEP)

/** ln w above which e^{−w²} leaves nothing. */
const HIGHEST = 1.9

/** Share of the sum below which the rest is left out: terms fall as w at least, even where S ∝ 1/v². */
const NEGLIGIBLE = 1e-14

/** Steps in ln v to either side of v = 1 that are kept: to e^{±143}. */
const STEPS = 1000

/**
 * Maxwell average of S(v) as a function of x = m/T: over ln w, v = 2w/√x, by the trapezoidal rule, which converges exponentially for
 * an analytic integrand that vanishes at both ends wherever its nodes lie (Trefethen & Weideman, SIAM Review 56 (2014) 385). They lie
 * at the same v for every x, so S is computed once at each.
 */
export function maxwellAverage(factor: (v: number) => number): (x: number) => number {
  const known = new Float64Array(2 * STEPS + 1).fill(NaN)
  const factorAt = (k: number): number => {
    if (Number.isNaN(known[STEPS + k])) known[STEPS + k] = factor(Math.exp(k * STEP))
    return known[STEPS + k]!
  }
  return (x) => {
    const perV = Math.sqrt(x) / 2
    const first = Math.floor((HIGHEST - Math.log(perV)) / STEP)
    let w = perV * Math.exp(first * STEP)
    let sum = 0
    for (let k = first; k >= -STEPS; k--) {
      const term = w * w * w * Math.exp(-w * w) * factorAt(k)
      sum += term
      if (w < 1 && !(term > NEGLIGIBLE * sum)) break
      w *= STEP_DOWN
    }
    return (4 / Math.sqrt(Math.PI)) * STEP * sum
  }
}

/** Average of the Coulomb factor as a function of α²x, on which alone it depends; the same table for every candidate. */
const coulombOfSquare = lazyPositive(
  maxwellAverage((v) => coulombFactor(v, 1)),
  { tolerance: 1e-12, coldPower: 0.5 },
)

/** ⟨S⟩ of the Coulomb potential as a function of x. */
export const coulombAverage =
  (alpha: number): ((x: number) => number) =>
  (x) =>
    coulombOfSquare(alpha * alpha * x)

/** ⟨S⟩ of the Hulthén potential as a function of x; S is finite at rest. */
export const hulthenAverage = (alpha: number, epsilon: number, tolerance: number): ((x: number) => number) =>
  lazyPositive(
    maxwellAverage((v) => hulthenFactor(v, alpha, epsilon)),
    { tolerance, coldPower: 0 },
  )
