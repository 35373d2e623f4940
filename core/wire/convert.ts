import { z } from 'zod'
import { historyInput } from './history.ts'

/** Numbers that tell a moment of a history. */
export const EPOCH_QUANTITIES = [
  'temperatureGeV',
  'temperatureK',
  'timeS',
  'timeYears',
  'redshift',
  'scaleFactor',
  'hubbleGeV',
  'hubblePerS',
  'hubbleKmPerSPerMpc',
  'energyDensityGeV4',
  'entropyDensityGeV3',
  'entropyDensityPerCm3',
  'photonDensityPerCm3',
  'waveFrequencyHz',
  'horizonMassSolar',
  'gRho',
  'gS',
] as const
export type EpochQuantity = (typeof EPOCH_QUANTITIES)[number]

/** Those of them that do not tell it by themselves: they stand still, or rise and fall. */
export const NOT_INVERTIBLE: readonly EpochQuantity[] = ['gRho', 'gS']

/** Numbers of a particle that are the same in other units; they know no history. */
export const PARTICLE_QUANTITIES = [
  'lifetimeS',
  'widthGeV',
  'decayLengthM',
  'sigmaVCm3PerS',
  'sigmaVGeVMinus2',
  'sigmaVPicobarnC',
] as const
export type ParticleQuantity = (typeof PARTICLE_QUANTITIES)[number]

const quantity = z.enum([...EPOCH_QUANTITIES, ...PARTICLE_QUANTITIES]).meta({ id: 'Quantity' })
export type Quantity = z.output<typeof quantity>

export const isEpochQuantity = (name: Quantity): name is EpochQuantity =>
  (EPOCH_QUANTITIES as readonly string[]).includes(name)

const invertible = quantity.refine((name) => !(NOT_INVERTIBLE as readonly string[]).includes(name), {
  message:
    'allowed: a quantity that rises or falls throughout; this one has the same value at many temperatures',
})

/** Input of `convert`: what else is true of the moments, or of the particle, at which one quantity has these values. */
export const convertRequest = z
  .strictObject({
    history: historyInput
      .prefault({})
      .describe('The history; without meaning for conversions of lifetimes and cross-sections'),
    from: z
      .strictObject({
        quantity: invertible.describe('What is given, its unit in its name; a/a₀ for scaleFactor'),
        values: z.array(z.number()).min(1).max(20_000).describe('Its values'),
      })
      .describe('What is given'),
    to: z.array(quantity).min(1).max(30).describe('What is wanted'),
  })
  .meta({ id: 'ConvertRequest' })
export type ConvertRequest = z.output<typeof convertRequest>

export const convertResult = z
  .object({
    rows: z
      .array(z.partialRecord(quantity, z.number()))
      .describe('One for each value, in their order: the given quantity and the wanted ones, by name'),
  })
  .meta({ id: 'ConvertResult' })
export type ConvertResult = z.output<typeof convertResult>
