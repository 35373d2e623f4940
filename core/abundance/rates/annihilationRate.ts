/** From the wire's words to ⟨σv⟩. */
import { GEV_MINUS2_PER_CM3_S } from '../../constants/natural.ts'
import { lazyPositive } from '../../numerics/interpolation/lazyPositive.ts'
import { LeastRecentlyUsed } from '../../numerics/leastRecentlyUsed.ts'
import type { AnnihilationInput } from '../../wire/annihilation.ts'
import { coannihilationRate } from './coannihilation.ts'
import { crossSectionAverage } from './crossSectionAverage.ts'
import { heldOutside, logLogTable } from './logLogTable.ts'
import { piecesOfTable } from './powerLawPieces.ts'
import { resonanceAverage } from './resonanceAverage.ts'
import { coulombAverage, hulthenAverage } from './sommerfeld.ts'

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
const AVERAGE_TOLERANCE = 2e-10

type Of<K extends AnnihilationInput['kind']> = Extract<AnnihilationInput, { kind: K }>

/** Averages as functions of x, by what they depend on but their strength. */
const averages = new LeastRecentlyUsed<(x: number) => number>(32)

function resonant(candidate: AnnihilatingCandidate, resonance: Of<'resonance'>): (x: number) => number {
  const spinStates = candidate.degreesOfFreedom / (candidate.selfConjugate ? 1 : 2)
  const statisticalFactor = (2 * resonance.spin + 1) / spinStates ** 2
  const strength = (candidate.selfConjugate ? 2 : 1) * statisticalFactor * resonance.branchingProduct
  const { massGeV, widthGeV } = resonance
  const pole = { candidateGeV: candidate.massGeV, massGeV, widthGeV }
  const average = averages.get(`resonance ${pole.candidateGeV} ${massGeV} ${widthGeV}`, () =>
    // Off the pole σv ∝ 1/v.
    lazyPositive(resonanceAverage(pole), { tolerance: AVERAGE_TOLERANCE, coldPower: 0.5 }),
  )
  return (x) => strength * average(x)
}

function enhanced(
  massGeV: number,
  { sWaveCm3PerS, couplingAlpha: alpha, mediatorMassGeV }: Of<'sommerfeld'>,
): (x: number) => number {
  const bare = sWaveCm3PerS * GEV_MINUS2_PER_CM3_S
  const average =
    mediatorMassGeV === undefined ? coulombAverage(alpha) : screened(massGeV, alpha, mediatorMassGeV)
  return (x) => bare * average(x)
}

function screened(massGeV: number, alpha: number, mediatorGeV: number): (x: number) => number {
  const epsilon = (Math.PI ** 2 * mediatorGeV) / (6 * alpha * massGeV)
  return averages.get(`Hulthén ${alpha} ${epsilon}`, () => hulthenAverage(alpha, epsilon, AVERAGE_TOLERANCE))
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
    case 'cross-section':
      return {
        at: crossSectionAverage(massGeV, piecesOfTable(annihilation.points), AVERAGE_TOLERANCE),
        breaks: [],
      }
    case 'resonance':
      return { at: resonant(candidate, annihilation), breaks: [] }
    case 'sommerfeld':
      return { at: enhanced(massGeV, annihilation), breaks: [] }
    case 'coannihilation':
      return coannihilating(candidate, annihilation)
    case 'table':
      return tabulated(massGeV, annihilation)
  }
}

const rates = new LeastRecentlyUsed<AnnihilationRate>(32)

/** The rate of a candidate; what is made of a table is made once for each distinct one among the last few dozen. */
export function annihilationRate(candidate: AnnihilatingCandidate): AnnihilationRate {
  const { massGeV, annihilation } = candidate
  if (annihilation.kind !== 'cross-section' && annihilation.kind !== 'table') return buildRate(candidate)
  return rates.get(JSON.stringify([massGeV, annihilation]), () => buildRate(candidate))
}
