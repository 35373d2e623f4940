/**
 * Sommerfeld factors of s-wave annihilation, v the relative velocity, and their Maxwell average, ⟨·⟩ ∝ ∫ v² e^{−xv²/4} dv.
 *
 * Coulomb: S = (2πα/v)/(1 − e^{−2πα/v}).
 * Hulthén potential for a mediator of mass m_φ: with ε_v = v/(2α) and ε = π²m_φ/(6αm),
 *   S = (π/ε_v) sinh(2πε_v/ε)/[cosh(2πε_v/ε) − cos(2π√(1/ε − ε_v²/ε²))], cos → cosh where the root is imaginary.
 * Sources: Cassel, J. Phys. G 37 (2010) 105009; Feng, Kaplinghat, Yu, Phys. Rev. D 82 (2010) 083525.
 * On a bound state at threshold the Hulthén factor grows as 1/v² without limit: a guard says when unitarity caps it.
 */
import { panelIntegral } from './panelIntegral.ts'

/** S of the Coulomb potential. */
export function coulombFactor(v: number, alpha: number): number {
  const z = (2 * Math.PI * alpha) / v
  return z / -Math.expm1(-z)
}

/** S of the Hulthén potential; exponentials are scaled out, and cosh a − cos r = 2(sinh²(a/2) + sin²(r/2)) keeps digits. */
export function hulthenFactor(v: number, alpha: number, epsilon: number): number {
  const speed = v / (2 * alpha)
  const a = (2 * Math.PI * speed) / epsilon
  const root = 1 / epsilon - (speed / epsilon) ** 2
  const r = 2 * Math.PI * Math.sqrt(Math.abs(root))
  const decay = Math.exp(-a)
  const denominator =
    root >= 0
      ? (1 - decay) ** 2 / 2 + 2 * decay * Math.sin(r / 2) ** 2
      : (1 + decay * decay) / 2 - (Math.exp(r - a) + Math.exp(-r - a)) / 2
  return ((Math.PI / speed) * (1 - decay * decay)) / 2 / denominator
}

/** ln w between panels of the average, v = 2w/√x; below e^−25 even S ∝ 1/v² adds nothing. */
const EDGES = [
  ...Array.from({ length: 24 }, (_, i) => -25 + i),
  ...Array.from({ length: 13 }, (_, i) => -1 + i * 0.25),
]

/** Maxwell average of S(v) at x = m/T. */
export function maxwellAverage(x: number, factor: (v: number) => number): number {
  const perLnW = (lnW: number): number => {
    const w = Math.exp(lnW)
    return w ** 3 * Math.exp(-w * w) * factor((2 * w) / Math.sqrt(x))
  }
  return (4 / Math.sqrt(Math.PI)) * panelIntegral(perLnW, EDGES)
}
