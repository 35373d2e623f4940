/** e^z K₁(z) and e^z K₂(z) from tables, for integrands that need them thousands of times. Relative error 1e-13. */
import { evaluateColumn, tabulate } from '../interpolation/chebyshev.ts'
import type { ChebyshevTable } from '../interpolation/chebyshev.ts'
import { scaledBesselK } from './besselK.ts'

const LEAST = 1e-4
const LARGEST = 1e4

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

/** Euler's constant γ (DLMF 5.2.3). */
const EULER_GAMMA = 0.5772156649015329

/** The first terms for small z, DLMF 10.31.1; what is left out is of order z⁴ ln z. */
function small(n: 1 | 2, z: number): number {
  const half = z / 2
  const bessel = n === 1 ? 1 / z + half * (Math.log(half) + EULER_GAMMA - 0.5) : 2 / (z * z) - 0.5
  return bessel * Math.exp(z)
}

/** The first terms for large z, DLMF 10.40.2; what is left out is of order z⁻⁴. */
function large(n: 1 | 2, z: number): number {
  const four = 4 * n * n
  const inverse = 1 / (8 * z)
  const series =
    1 + (four - 1) * inverse * (1 + ((four - 9) / 2) * inverse * (1 + ((four - 25) / 3) * inverse))
  return Math.sqrt(Math.PI / (2 * z)) * series
}

/** e^z K_n(z) for n = 1 or 2 and z > 0; ln z may be given where it is known. */
export function quickScaledBesselK(n: 1 | 2, z: number, lnZ = Math.log(z)): number {
  if (z < LEAST) return small(n, z)
  if (z > LARGEST) return large(n, z)
  return evaluateColumn(columns(), n - 1, lnZ)
}
