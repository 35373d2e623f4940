import { z } from 'zod'

/** An error as an RFC 9457 problem document; `faults` when the input was at fault. */
export const problem = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.number().int(),
    detail: z.string().optional(),
    instance: z.string().optional().describe('The id of the request, to quote when asking for help'),
    faults: z
      .array(z.object({ path: z.string(), value: z.unknown().optional(), message: z.string() }))
      .optional(),
  })
  .meta({ id: 'Problem' })
export type Problem = z.output<typeof problem>
