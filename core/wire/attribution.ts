import { z } from 'zod'
import { candidateInput } from './candidate.ts'
import { historyInput } from './history.ts'

/** Input of `attribute`: what changed the abundance between two histories, or two candidates in them. */
export const attributeRequest = z
  .strictObject({
    baseline: historyInput,
    variant: historyInput,
    candidate: candidateInput,
    variantCandidate: candidateInput
      .optional()
      .describe(
        'The candidate in the variant, when it differs too: each field that differs is then a group of its own',
      ),
  })
  .meta({ id: 'AttributeRequest' })
export type AttributeRequest = z.output<typeof attributeRequest>

const part = z.object({
  group: z
    .string()
    .describe(
      'bath, neutrinos, extraSpecies, expansion, maximumTemperatureGeV or today; or a field of the candidate, as candidate.massGeV',
    ),
  lnFactor: z.number().describe('Its part of ln ratio; 0 for a group that does not differ'),
  factor: z.number().describe('exp(lnFactor)'),
})

const elasticity = z.object({
  path: z.string().describe('Place of the input'),
  value: z.number().nullable().describe('d ln Ωh²/d ln p; null where the input cannot be moved either way'),
  error: z.number().nullable().describe('Estimated absolute error of the value'),
})

export const attributeResult = z
  .object({
    baselineOmegaH2: z.number().describe('Ω_χ h² of the baseline'),
    variantOmegaH2: z.number().describe('Ω_χ h² of the variant'),
    ratio: z.number().describe('Variant over baseline'),
    parts: z.array(part).describe('Exact Shapley parts of ln ratio: the factors’ product is the ratio'),
    elasticities: z.array(elasticity).describe('Of every continuous input of the variant and its candidate'),
    oneAtATime: z.array(part).describe('The baseline with one group alone taken from the variant'),
  })
  .meta({ id: 'AttributeResult' })
export type AttributeResult = z.output<typeof attributeResult>
