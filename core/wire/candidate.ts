import { z } from 'zod'
import { annihilationInput, tablePoints } from './annihilation.ts'
import {
  degreesOfFreedom,
  massGeV,
  nonNegative,
  positive,
  quantumStatistics,
  temperatureGeV,
} from './numbers.ts'

const mass = massGeV.describe('Mass of the candidate, GeV')

const equilibriumStatistics = z
  .enum(['exact', 'maxwell-boltzmann'])
  .default('exact')
  .describe('Statistics of Y_eq: the exact quantum ones, or Maxwell–Boltzmann')

const startX = positive.min(1e-3).max(500).optional().describe('x = m/T at the start; 1 unless given')

const bothSigns = degreesOfFreedom.describe('Internal states, particle and antiparticle together')

/** Coannihilation may name only light companions as its candidate's partners; index 0 must be the lightest. */
const lightestFirst = (candidate: {
  massGeV: number
  annihilation: z.output<typeof annihilationInput>
}): boolean =>
  candidate.annihilation.kind !== 'coannihilation' ||
  candidate.annihilation.others.every((other) => other.massGeV >= candidate.massGeV)

const freezeOutFields = {
  massGeV: mass,
  degreesOfFreedom: bothSigns,
  statistics: quantumStatistics,
  selfConjugate: z.boolean().default(true).describe('Whether the particle is its own antiparticle'),
  annihilation: annihilationInput,
  equilibriumStatistics,
}

export const freezeOutInput = z
  .strictObject({
    mechanism: z.literal('freeze-out'),
    ...freezeOutFields,
    initialAbundance: z
      .enum(['equilibrium', 'zero'])
      .default('equilibrium')
      .describe('Abundance at the start: in equilibrium, or none'),
    startX,
  })
  .refine(lightestFirst, {
    path: ['annihilation', 'others'],
    message: 'allowed: masses not below the candidate’s, which must be the lightest',
  })
  .meta({ id: 'FreezeOut' })

const parentInput = z
  .strictObject({
    massGeV: massGeV.describe('Mass of the parent, GeV'),
    degreesOfFreedom,
    statistics: z.enum(['fermion', 'boson', 'maxwell-boltzmann']),
    lifetimeS: positive.max(1e25).optional().describe('Lifetime τ, s; give this or the width'),
    widthGeV: positive.optional().describe('Width Γ = ħ/τ, GeV; give this or the lifetime'),
    selfConjugate: z
      .boolean()
      .default(true)
      .describe('Whether the parent is its own antiparticle; matters when it annihilates'),
    annihilation: annihilationInput
      .optional()
      .describe('With it the parent has a freeze-out of its own; without, it stays in equilibrium'),
  })
  .refine((parent) => (parent.lifetimeS === undefined) !== (parent.widthGeV === undefined), {
    path: ['lifetimeS'],
    message: 'allowed: exactly one of lifetimeS and widthGeV',
  })
  .refine((parent) => parent.widthGeV === undefined || parent.widthGeV < parent.massGeV, {
    path: ['widthGeV'],
    message: 'allowed: below the mass of the parent, or it is no particle',
  })

export const freezeInDecayInput = z
  .strictObject({
    mechanism: z.literal('freeze-in-decay'),
    massGeV: mass,
    degreesOfFreedom,
    statistics: quantumStatistics,
    parent: parentInput,
    perDecay: positive.max(100).default(1).describe('Particles of the candidate per decay'),
    backReaction: z
      .boolean()
      .default(false)
      .describe('Whether inverse decays are kept: source times 1 − (Y/Y_eq)^perDecay'),
    lateDecay: z
      .boolean()
      .default(true)
      .describe('Whether an annihilating parent is followed through its freeze-out and decay'),
  })
  .refine((candidate) => candidate.perDecay * candidate.massGeV <= candidate.parent.massGeV, {
    path: ['massGeV'],
    message: 'allowed: at most the mass of the parent divided by perDecay',
  })
  .refine((candidate) => !(candidate.backReaction && candidate.parent.annihilation && candidate.lateDecay), {
    path: ['backReaction'],
    message:
      'allowed: false while an annihilating parent is followed; inverse decays are kept for a parent in equilibrium only',
  })
  .meta({ id: 'FreezeInDecay' })

const incoming = z
  .tuple([
    z.strictObject({ massGeV: nonNegative.max(1e19), degreesOfFreedom }),
    z.strictObject({ massGeV: nonNegative.max(1e19), degreesOfFreedom }),
  ])
  .describe('The two particles that collide')

const scatteringInput = z
  .discriminatedUnion('kind', [
    z.strictObject({
      kind: z.literal('constant-matrix-element'),
      matrixElementSquared: positive
        .max(1e3)
        .describe('|M|², summed over all spins; massless initial states, final masses (m, 0)'),
    }),
    z.strictObject({
      kind: z.literal('power-law'),
      crossSectionGeVMinus2: positive.max(1e10).describe('σ₀ in σ(s) = σ₀(√s/E₀)^k, GeV^-2'),
      referenceEnergyGeV: positive.max(1e19).describe('E₀, GeV'),
      exponent: z.number().min(-20).max(4).describe('k'),
      incoming,
    }),
    z.strictObject({
      kind: z.literal('table'),
      points: tablePoints('[√s in GeV, σ in GeV^-2], log–log between the rows, zero outside'),
      incoming,
    }),
  ])
  .meta({ id: 'Scattering' })

export const freezeInScatteringInput = z
  .strictObject({
    mechanism: z.literal('freeze-in-scattering'),
    massGeV: mass,
    degreesOfFreedom,
    statistics: quantumStatistics,
    scattering: scatteringInput,
  })
  .meta({ id: 'FreezeInScattering' })

export const freezeInUltravioletInput = z
  .strictObject({
    mechanism: z.literal('freeze-in-ultraviolet'),
    massGeV: mass,
    degreesOfFreedom,
    statistics: quantumStatistics,
    ultraviolet: z.strictObject({
      coefficient: positive.max(1e12).describe('C in γ = C T^(2q+4)/Λ^(2q)'),
      scaleGeV: positive.max(1e30).describe('Λ, GeV'),
      index: z.number().min(1).max(10).describe('q'),
    }),
  })
  .meta({ id: 'FreezeInUltraviolet' })

export const asymmetricInput = z
  .strictObject({
    mechanism: z.literal('asymmetric'),
    ...freezeOutFields,
    selfConjugate: z
      .literal(false)
      .default(false)
      .describe('An asymmetric particle is never its own antiparticle'),
    asymmetry: positive.max(1).describe('η_X = Y₊ − Y₋, today'),
    startX,
  })
  .refine((candidate) => candidate.annihilation.kind !== 'coannihilation', {
    path: ['annihilation', 'kind'],
    message: 'allowed: any but coannihilation, whose species have no common asymmetry here',
  })
  .meta({ id: 'Asymmetric' })

export const hotRelicInput = z
  .strictObject({
    mechanism: z.literal('hot-relic'),
    massGeV: mass,
    degreesOfFreedom: bothSigns,
    statistics: quantumStatistics,
    decouplingTemperatureGeV: temperatureGeV.describe('Temperature T_d at which it decouples, GeV'),
  })
  .meta({ id: 'HotRelic' })

/** One dark-matter candidate: how it is made, and its particle numbers. */
export const candidateInput = z
  .discriminatedUnion('mechanism', [
    freezeOutInput,
    freezeInDecayInput,
    freezeInScatteringInput,
    freezeInUltravioletInput,
    asymmetricInput,
    hotRelicInput,
  ])
  .meta({ id: 'Candidate' })

export type CandidateInput = z.output<typeof candidateInput>
export type FreezeOutInput = z.output<typeof freezeOutInput>
export type FreezeInDecayInput = z.output<typeof freezeInDecayInput>
export type FreezeInScatteringInput = z.output<typeof freezeInScatteringInput>
export type FreezeInUltravioletInput = z.output<typeof freezeInUltravioletInput>
export type AsymmetricInput = z.output<typeof asymmetricInput>
export type HotRelicInput = z.output<typeof hotRelicInput>
export type Mechanism = CandidateInput['mechanism']
