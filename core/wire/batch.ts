import { z } from 'zod'
import { problem } from './problem.ts'

/** What can be asked in a batch, by the names of the command. */
export const QUESTION_NAMES = [
  'history',
  'abundance',
  'solve',
  'attribute',
  'propagate',
  'convert',
  'laboratory',
  'evidence',
] as const

export const MOST_BATCH_ITEMS = 500

export const batchRequest = z
  .strictObject({
    items: z
      .array(
        z.strictObject({
          what: z.enum(QUESTION_NAMES).describe('Which question, as in the address of each alone'),
          input: z.unknown().describe('Its input, as the question alone takes it'),
        }),
      )
      .min(1)
      .max(MOST_BATCH_ITEMS),
  })
  .meta({ id: 'BatchRequest' })

/** An answer for each item, in their order: its result, or what was wrong with it alone. */
export const batchResult = z
  .object({
    items: z.array(
      z.discriminatedUnion('status', [
        z.object({ status: z.literal('done'), result: z.unknown() }),
        z.object({ status: z.literal('failed'), problem }),
      ]),
    ),
  })
  .meta({ id: 'BatchResult' })
export type BatchResult = z.output<typeof batchResult>
