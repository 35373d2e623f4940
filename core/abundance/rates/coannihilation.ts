/**
 * Coannihilation: several species that turn into each other quickly annihilate as one,
 *
 *   σ_eff = Σ_ij σ_ij w_i w_j,   w_i = n_i,eq/Σ n_eq,
 *
 * with exact Maxwell–Boltzmann weights n_i ∝ g_i m_i² K₂(m_i/T) (Edsjö & Gondolo, Phys. Rev. D 56 (1997) 1879) or their
 * non-relativistic form g_i (1 + Δ_i)^{3/2} e^{−xΔ_i} (Griest & Seckel, Phys. Rev. D 43 (1991) 3191). ⟨σv⟩_ij = a_ij + 6b_ij/x.
 */
import { quickScaledBesselK } from '../../numerics/special/besselTable.ts'

export interface CoannihilatingSpecies {
  massGeV: number
  degreesOfFreedom: number
}

/** A pair and its partial waves, GeV⁻²; an off-diagonal pair is given once and counts twice. */
export interface AnnihilatingPair {
  first: number
  second: number
  sWave: number
  pWave: number
}

/** ⟨σ_eff v⟩ in GeV⁻² as a function of x = m₀/T; species 0 is the candidate. */
export function coannihilationRate(
  species: readonly CoannihilatingSpecies[],
  pairs: readonly AnnihilatingPair[],
  weights: 'exact' | 'nonrelativistic',
): (x: number) => number {
  const mass = species[0]!.massGeV
  const share = new Float64Array(species.length)
  const setShares = (x: number): void => {
    let sum = 0
    for (let i = 0; i < species.length; i++) {
      const { massGeV, degreesOfFreedom } = species[i]!
      const ratio = massGeV / mass
      const power = weights === 'exact' ? ratio ** 2 * quickScaledBesselK(2, x * ratio) : ratio ** 1.5
      share[i] = degreesOfFreedom * power * Math.exp(-x * (ratio - 1))
      sum += share[i]!
    }
    for (let i = 0; i < share.length; i++) share[i]! /= sum
  }
  return (x) => {
    setShares(x)
    let sum = 0
    for (const { first, second, sWave, pWave } of pairs) {
      const both = share[first]! * share[second]! * (first === second ? 1 : 2)
      sum += both * (sWave + (6 * pWave) / x)
    }
    return sum
  }
}
