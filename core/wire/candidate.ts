import { z } from 'zod'
import { annihilationInput } from './annihilation.ts'
import { degreesOfFreedom, massGeV, positive, quantumStatistics } from './numbers.ts'

const mass = massGeV.describe('Mass of the candidate, GeV')
const equilibriumStatistics = z
  .enum(['exact', 'maxwell-boltzmann'])
  .default('exact')
  .describe('Statistics of Y_eq: the exact quantum ones, or Maxwell–Boltzmann')

export const freezeOutInput = z
  .strictObject({
    mechanism: z.literal('freeze-out'),
    massGeV: mass,
    degreesOfFreedom: degreesOfFreedom.describe('Internal states, particle and antiparticle together'),
    statistics: quantumStatistics,
    selfConjugate: z.boolean().default(true).describe('Whether the particle is its own antiparticle'),
    annihilation: annihilationInput,
    equilibriumStatistics,
    initialAbundance: z
      .enum(['equilibrium', 'zero'])
      .default('equilibrium')
      .describe('Abundance at the start: in equilibrium, or none'),
    startX: positive.min(1e-3).max(500).optional().describe('x = m/T at the start; 1 unless given'),
  })
  .meta({ id: 'FreezeOut' })

const parentFields = {
  massGeV: massGeV.describe('Mass of the parent, GeV'),
  degreesOfFreedom,
  statistics: z.enum(['fermion', 'boson', 'maxwell-boltzmann']),
  lifetimeS: positive.max(1e25).optional().describe('Lifetime τ, s; give this or the width'),
  widthGeV: positive.optional().describe('Width Γ = ħ/τ, GeV; give this or the lifetime'),
}

export const freezeInDecayInput = z
  .strictObject({
    mechanism: z.literal('freeze-in-decay'),
    massGeV: mass,
    degreesOfFreedom,
    statistics: quantumStatistics,
    parent: z
      .strictObject(parentFields)
      .refine((parent) => (parent.lifetimeS === undefined) !== (parent.widthGeV === undefined), {
        path: ['lifetimeS'],
        message: 'allowed: exactly one of lifetimeS and widthGeV',
      })
      .refine((parent) => parent.widthGeV === undefined || parent.widthGeV < parent.massGeV, {
        path: ['widthGeV'],
        message: 'allowed: below the mass of the parent, or it is no particle',
      }),
    perDecay: positive.max(100).default(1).describe('Particles of the candidate per decay'),
  })
  .refine((candidate) => candidate.perDecay * candidate.massGeV <= candidate.parent.massGeV, {
    path: ['massGeV'],
    message: 'allowed: at most the mass of the parent divided by perDecay',
  })
  .meta({ id: 'FreezeInDecay' })

/** One dark-matter candidate: how it is made, and its particle numbers. */
export const candidateInput = z
  .discriminatedUnion('mechanism', [freezeOutInput, freezeInDecayInput])
  .meta({ id: 'Candidate' })

export type CandidateInput = z.output<typeof candidateInput>
export type FreezeOutInput = z.output<typeof freezeOutInput>
export type FreezeInDecayInput = z.output<typeof freezeInDecayInput>
export type Mechanism = CandidateInput['mechanism']
