import { gaussLegendre, integrateWith } from '../../numerics/quadrature/gaussLegendre.ts'

const RULE = gaussLegendre(20)

/** ∫ f between the first and last of the ascending edges, by 20 Gauss–Legendre points between neighbours. */
export function panelIntegral(f: (x: number) => number, edges: readonly number[]): number {
  let sum = 0
  for (let i = 0; i + 1 < edges.length; i++)
    if (edges[i + 1]! > edges[i]!) sum += integrateWith(RULE, f, edges[i]!, edges[i + 1]!)
  return sum
}

/** The ascending cuts inside (low, high), with both ends. */
export function edgesWithin(low: number, high: number, cuts: readonly number[]): number[] {
  return [low, ...cuts.filter((cut) => cut > low && cut < high).sort((a, b) => a - b), high]
}
