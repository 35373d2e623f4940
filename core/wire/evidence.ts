import { z } from 'zod'
import { candidateInput } from './candidate.ts'
import { abundanceResult } from './compute.ts'
import { historyInput } from './history.ts'

const digest = z
  .string()
  .regex(/^[0-9a-f]{64}$/)
  .describe('SHA-256 of the RFC 8785 form, hexadecimal')

const named = z.object({ name: z.string(), revision: z.number().int() })

/** One evaluation with everything that is needed to repeat it: what went in, what came out, and how to do it again. */
export const evidenceBundle = z
  .object({
    format: z.literal('emberline evidence'),
    formatVersion: z.literal(1),
    evaluationId: z.uuid(),
    group: z.string(),
    author: z.string(),
    evaluatedAt: z.iso.datetime(),
    coreVersion: z.string(),
    history: named,
    candidate: named,
    input: z.object({ history: historyInput, candidate: candidateInput }).describe('With defaults filled in'),
    result: abundanceResult,
    digests: z.object({ input: digest, history: digest, candidate: digest, result: digest }),
    datasets: z.array(z.object({ name: z.string(), digest })).describe('Uploaded tables the input names'),
    repeat: z.string().describe('The command that repeats it from this file'),
  })
  .meta({ id: 'EvidenceBundle' })
export type EvidenceBundle = z.output<typeof evidenceBundle>

/** What repeating a bundle found. */
export const evidenceCheck = z
  .object({
    digestsMatch: z.boolean().describe('Whether input and result are those the digests were taken of'),
    omegaH2: z.number(),
    storedOmegaH2: z.number(),
    relativeDifference: z.number(),
    allowed: z.number().describe('max(1e-9, stated numerical error)'),
    agrees: z.boolean(),
    coreVersion: z.string().describe('The core that repeated it'),
    storedCoreVersion: z.string(),
  })
  .meta({ id: 'EvidenceCheck' })
export type EvidenceCheck = z.output<typeof evidenceCheck>
