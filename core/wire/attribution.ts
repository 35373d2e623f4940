import { z } from 'zod'
import { candidateInput } from './candidate.ts'
import { ASSUMPTION_GROUPS, historyInput } from './history.ts'

/** Input of `attribute`: what changed the abundance of a candidate between two histories. */
export const attributeRequest = z
  .strictObject({ baseline: historyInput, variant: historyInput, candidate: candidateInput })
  .meta({ id: 'AttributeRequest' })
export type AttributeRequest = z.output<typeof attributeRequest>

const part = z.object({
  group: z.enum(ASSUMPTION_GROUPS),
  lnFactor: z.number(),
  factor: z.number().describe('exp(lnFactor)'),
})

const elasticity = z.object({
  path: z.string(),
  value: z.number().nullable().describe('d ln Ωh²/d ln p; null where the input cannot be moved either way'),
  error: z.number().nullable().describe('Estimated absolute error of the value'),
})

export const attributeResult = z
  .object({
    baselineOmegaH2: z.number(),
    variantOmegaH2: z.number(),
    ratio: z.number().describe('Variant over baseline'),
    parts: z.array(part).describe('Exact Shapley parts of ln ratio: the factors’ product is the ratio'),
    elasticities: z.array(elasticity).describe('Of every continuous input of the variant and the candidate'),
    oneAtATime: z.array(part).describe('The baseline with one group alone taken from the variant'),
  })
  .meta({ id: 'AttributeResult' })
export type AttributeResult = z.output<typeof attributeResult>
