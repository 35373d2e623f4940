/** e^z K₁(z) and e^z K₂(z) from tables, for integrands that need them thousands of times. Relative error 1e-13. */
import { evaluateColumn, tabulate } from '../interpolation/chebyshev.ts'
import type { ChebyshevTable } from '../interpolation/chebyshev.ts'
import { scaledBesselK } from './besselK.ts'

const LEAST = 1e-4
const LARGEST = 1e5

let table: ChebyshevTable | null = null

function columns(): ChebyshevTable {
  table ??= tabulate(
    (lnZ, out) => {
      const z = Math.exp(lnZ)
      out[0] = scaledBesselK(1, z)
      out[1] = scaledBesselK(2, z)
    },
    2,
    Math.log(LEAST),
    Math.log(LARGEST),
    { tolerance: 1e-14, floor: 0 },
  )
  return table
}

/** e^z K_n(z) for n = 1 or 2 and z > 0. */
export function quickScaledBesselK(n: 1 | 2, z: number): number {
  if (z < LEAST || z > LARGEST) return scaledBesselK(n, z)
  return evaluateColumn(columns(), n - 1, Math.log(z))
}
