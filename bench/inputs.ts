/** Histories and candidates that the measurements share; each function makes a new input that nothing is cached for. */
import { candidateInput, historyInput } from '#core/wire/index'
import type { CandidateInput, HistoryInput } from '#core/wire/index'
import { slightly } from './unused.ts'

export const history = (input: object): HistoryInput => historyInput.parse(input)
export const candidate = (input: object): CandidateInput => candidateInput.parse(input)

export const FIT = history({ bath: { treatment: 'fit-2018' } })
export const STEPS = history({ bath: { treatment: 'thresholds' } })
export const KINATION = history({ expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 1.15 } })

const HEAVY_FERMION = { massGeV: 100, degreesOfFreedom: 2, statistics: 'fermion' }
const LIGHT_FERMION = { massGeV: 1e-5, degreesOfFreedom: 2, statistics: 'fermion' }
const BOSON_PARENT = { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-9 }

export const annihilating = (annihilation: object): CandidateInput =>
  candidate({ mechanism: 'freeze-out', ...HEAVY_FERMION, annihilation })

export const S_WAVE = annihilating({ kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 })
export const P_WAVE = annihilating({ kind: 'partial-waves', sWaveCm3PerS: 0, pWaveCm3PerS: 2.2e-25 })

export const coannihilating = (): CandidateInput =>
  annihilating({
    kind: 'coannihilation',
    others: [{ massGeV: slightly(110), degreesOfFreedom: 2, statistics: 'fermion' }],
    pairs: [
      { first: 0, second: 0, sWaveCm3PerS: 1e-26 },
      { first: 0, second: 1, sWaveCm3PerS: 1e-25 },
    ],
  })

export const resonant = (widthOverMass: number): CandidateInput => {
  const massGeV = slightly(210)
  const widthGeV = widthOverMass * massGeV
  return annihilating({ kind: 'resonance', massGeV, widthGeV, spin: 1, branchingProduct: 1e-3 })
}

export const enhanced = (mediator: object): CandidateInput =>
  annihilating({
    kind: 'sommerfeld',
    sWaveCm3PerS: 2.2e-26,
    couplingAlpha: slightly(0.03),
    ...mediator,
  })

export const withCrossSection = (): CandidateInput =>
  annihilating({
    kind: 'cross-section',
    points: [
      [slightly(200), 1e-9],
      [250, 3e-9],
      [400, 1e-9],
      [1000, 1e-10],
      [5000, 1e-12],
    ],
  })

export const asymmetric = (): CandidateInput =>
  candidate({
    mechanism: 'asymmetric',
    ...HEAVY_FERMION,
    degreesOfFreedom: 4,
    asymmetry: 4e-12,
    annihilation: { kind: 'partial-waves', sWaveCm3PerS: 5e-26 },
  })

export const fromDecay = (more: object = {}): CandidateInput =>
  candidate({ mechanism: 'freeze-in-decay', ...LIGHT_FERMION, parent: BOSON_PARENT, ...more })

export const fromAnnihilatingParent = (): CandidateInput =>
  fromDecay({
    parent: { ...BOSON_PARENT, annihilation: { kind: 'partial-waves', sWaveCm3PerS: 1e-26 } },
  })

const scattered = (scattering: object): CandidateInput =>
  candidate({ mechanism: 'freeze-in-scattering', ...HEAVY_FERMION, scattering })

const INCOMING = [
  { massGeV: 1, degreesOfFreedom: 2 },
  { massGeV: 2, degreesOfFreedom: 4 },
]

export const CONSTANT_MATRIX_ELEMENT = scattered({
  kind: 'constant-matrix-element',
  matrixElementSquared: 1e-20,
})

export const fromPowerLaw = (): CandidateInput =>
  scattered({
    kind: 'power-law',
    crossSectionGeVMinus2: 1e-25,
    referenceEnergyGeV: 100,
    exponent: slightly(-2),
    incoming: INCOMING,
  })

export const fromTable = (): CandidateInput =>
  scattered({
    kind: 'table',
    points: [
      [slightly(100), 1e-25],
      [200, 3e-25],
      [1000, 1e-26],
      [1e5, 1e-29],
    ],
    incoming: INCOMING,
  })

export const EARLY_MATTER = {
  kind: 'early-matter',
  reheatTemperatureGeV: 0.02,
  startTemperatureGeV: 50,
} as const

export const newEarlyMatter = () => ({ ...EARLY_MATTER, startTemperatureGeV: slightly(50) })
