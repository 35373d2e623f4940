import { GEV_MINUS2_PER_CM3_S } from '../../constants/natural.ts'
import type { AnnihilationInput } from '../../wire/candidate.ts'

/** A thermally averaged annihilation cross-section. */
export interface AnnihilationRate {
  /** ⟨σv⟩ in GeV⁻² at x = m/T. */
  at(x: number): number
  /** Values of x where a derivative jumps. */
  readonly breaks: readonly number[]
}

/**
 * The thermally averaged annihilation cross-section of an input.
 * partial waves: σv = a + b v² gives ⟨σv⟩ = a + 6b/x to leading order (Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145).
 * power law: ⟨σv⟩ = σ₀ x^{−n} (Kolb & Turner, The Early Universe (1990), §5.2).
 */
export function annihilationRate(annihilation: AnnihilationInput): AnnihilationRate {
  switch (annihilation.kind) {
    case 'partial-waves': {
      const a = annihilation.sWaveCm3PerS * GEV_MINUS2_PER_CM3_S
      const b = 6 * annihilation.pWaveCm3PerS * GEV_MINUS2_PER_CM3_S
      return { at: (x) => a + b / x, breaks: [] }
    }
    case 'power-law': {
      const coefficient = annihilation.coefficientCm3PerS * GEV_MINUS2_PER_CM3_S
      return { at: (x) => coefficient * x ** -annihilation.exponent, breaks: [] }
    }
  }
}
