import { gaussLegendre } from '../numerics/quadrature/gaussLegendre.ts'
import type { QuadratureRule } from '../numerics/quadrature/gaussLegendre.ts'

/** Numerical effort: the tolerance of a step in ln Z and the quadrature while annihilation still matters. */
export interface Effort {
  tolerance: number
  rule: QuadratureRule
}

/** Efforts of rising care. Two neighbours that agree vouch for each other; see `checked.ts`. */
export const EFFORTS: readonly Effort[] = [
  { tolerance: 1e-4, rule: gaussLegendre(6) },
  { tolerance: 1e-5, rule: gaussLegendre(8) },
  { tolerance: 1e-7, rule: gaussLegendre(12) },
  { tolerance: 1e-9, rule: gaussLegendre(16) },
]

/** The same for a decaying parent: errors of ln Z_B grow with the e-folds of its decay, so the tolerances are finer. */
export const DECAY_EFFORTS: readonly Effort[] = [
  { tolerance: 1e-6, rule: gaussLegendre(8) },
  { tolerance: 1e-8, rule: gaussLegendre(12) },
  { tolerance: 1e-9, rule: gaussLegendre(16) },
  { tolerance: 1e-10, rule: gaussLegendre(20) },
]

/** Global error of the order-9 solution over the tolerance of its order-5 estimate; at most this in all reference cases. */
export const LEFT_OF_TOLERANCE = 5e-4

/** The same for a decaying parent. */
export const LEFT_OF_DECAY_TOLERANCE = 1

const MINOR_RULE = gaussLegendre(6)
const SLIGHT_RULE = gaussLegendre(3)

/** The rule for a panel by the share it adds to 1/Z per e-fold: below 1e-3, and below 1e-7, a coarser one does. */
export function panelRule(effort: Effort, share: number): QuadratureRule {
  if (share > 1e-3) return effort.rule
  return share > 1e-7 ? MINOR_RULE : SLIGHT_RULE
}
