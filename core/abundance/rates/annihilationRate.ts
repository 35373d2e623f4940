/** From the wire's words to ⟨σv⟩. */
import { GEV_MINUS2_PER_CM3_S } from '../../constants/natural.ts'
import { lazyPositive } from '../../numerics/interpolation/lazyPositive.ts'
import { LeastRecentlyUsed } from '../../numerics/leastRecentlyUsed.ts'
import type { AnnihilationInput } from '../../wire/annihilation.ts'
import { coannihilationRate } from './coannihilation.ts'
import { crossSectionAverage } from './crossSectionAverage.ts'
import { heldOutside, logLogTable, zeroOutside } from './logLogTable.ts'
import { resonanceAverage } from './resonanceAverage.ts'
import { coulombFactor, hulthenFactor, maxwellAverage } from './sommerfeld.ts'

/** A thermally averaged annihilation cross-section. */
export interface AnnihilationRate {
  /** ⟨σv⟩ in GeV⁻² at x = m/T. */
  at(x: number): number
  /** Values of x where a derivative jumps. */
  readonly breaks: readonly number[]
}

/** What a rate needs to know of the particle that annihilates. */
export interface AnnihilatingCandidate {
  massGeV: number
  /** Particle and antiparticle together. */
  degreesOfFreedom: number
  selfConjugate: boolean
  annihilation: AnnihilationInput
}

/** Error of ln⟨σv⟩ where an average is tabulated. */
const AVERAGE_TOLERANCE = 1e-9

type Of<K extends AnnihilationInput['kind']> = Extract<AnnihilationInput, { kind: K }>

function resonant(candidate: AnnihilatingCandidate, resonance: Of<'resonance'>): (x: number) => number {
  const spinStates = candidate.degreesOfFreedom / (candidate.selfConjugate ? 1 : 2)
  const statisticalFactor = (2 * resonance.spin + 1) / spinStates ** 2
  const pole = {
    candidateGeV: candidate.massGeV,
    massGeV: resonance.massGeV,
    widthGeV: resonance.widthGeV,
    strength: (candidate.selfConjugate ? 2 : 1) * statisticalFactor * resonance.branchingProduct,
  }
  return (x) => resonanceAverage(x, pole)
}

function enhanced(
  massGeV: number,
  { sWaveCm3PerS, couplingAlpha: alpha, mediatorMassGeV }: Of<'sommerfeld'>,
): (x: number) => number {
  const bare = sWaveCm3PerS * GEV_MINUS2_PER_CM3_S
  if (mediatorMassGeV === undefined) return (x) => bare * maxwellAverage(x, (v) => coulombFactor(v, alpha))
  const epsilon = (Math.PI ** 2 * mediatorMassGeV) / (6 * alpha * massGeV)
  return (x) => bare * maxwellAverage(x, (v) => hulthenFactor(v, alpha, epsilon))
}

function tabulated(massGeV: number, { against, points }: Of<'table'>): AnnihilationRate {
  const table = logLogTable(points)
  const inX = against === 'x'
  return {
    at: (x) => GEV_MINUS2_PER_CM3_S * heldOutside(table, inX ? x : massGeV / x),
    breaks: points.map((point) => (inX ? point[0] : massGeV / point[0])),
  }
}

function coannihilating(candidate: AnnihilatingCandidate, input: Of<'coannihilation'>): AnnihilationRate {
  const pairs = input.pairs.map((pair) => ({
    ...pair,
    sWave: pair.sWaveCm3PerS * GEV_MINUS2_PER_CM3_S,
    pWave: pair.pWaveCm3PerS * GEV_MINUS2_PER_CM3_S,
  }))
  return { at: coannihilationRate([candidate, ...input.others], pairs, input.weights), breaks: [] }
}

function buildRate(candidate: AnnihilatingCandidate): AnnihilationRate {
  const { annihilation, massGeV } = candidate
  const averaged = (f: (x: number) => number): AnnihilationRate => ({
    at: lazyPositive(f, AVERAGE_TOLERANCE),
    breaks: [],
  })
  switch (annihilation.kind) {
    case 'partial-waves': {
      // ⟨σv⟩ = a + 6b/x to leading order: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145.
      const a = annihilation.sWaveCm3PerS * GEV_MINUS2_PER_CM3_S
      const b = 6 * annihilation.pWaveCm3PerS * GEV_MINUS2_PER_CM3_S
      return { at: (x) => a + b / x, breaks: [] }
    }
    case 'power-law': {
      const coefficient = annihilation.coefficientCm3PerS * GEV_MINUS2_PER_CM3_S
      return { at: (x) => coefficient * x ** -annihilation.exponent, breaks: [] }
    }
    case 'cross-section': {
      const table = logLogTable(annihilation.points)
      const knots = annihilation.points.map((point) => point[0])
      return averaged((x) => crossSectionAverage(x, massGeV, (rootS) => zeroOutside(table, rootS), knots))
    }
    case 'resonance':
      return averaged(resonant(candidate, annihilation))
    case 'sommerfeld':
      return averaged(enhanced(massGeV, annihilation))
    case 'coannihilation':
      return coannihilating(candidate, annihilation)
    case 'table':
      return tabulated(massGeV, annihilation)
  }
}

const memo = new LeastRecentlyUsed<AnnihilationRate>(32)

/** The rate of a candidate; averages are tabulated once for each distinct input among the last few dozen. */
export function annihilationRate(candidate: AnnihilatingCandidate): AnnihilationRate {
  const { massGeV, degreesOfFreedom, selfConjugate, annihilation } = candidate
  if (annihilation.kind === 'partial-waves' || annihilation.kind === 'power-law') return buildRate(candidate)
  return memo.get(JSON.stringify([massGeV, degreesOfFreedom, selfConjugate, annihilation]), () =>
    buildRate(candidate),
  )
}
