import { z } from 'zod'

/** A published value beside what this core gives for it. */
export const publishedValue = z
  .object({
    id: z.string().describe('Unchanging name, such as entropy-density-today'),
    name: z.string(),
    quantity: z.string().describe('What is compared, in symbols or few words'),
    unit: z.string().describe('Empty for a pure number'),
    formula: z.string().describe('How ours is computed'),
    published: z.number().nullable().describe('Null where the source prints no number for this point'),
    publishedError: z.number().optional().describe('Standard error of the published value, same unit'),
    ours: z.number().describe('Computed by this core when asked, never stored'),
    relativeDifference: z.number().nullable().describe('ours/published − 1'),
    within: z.number().describe('Relative difference that counts as agreement'),
    withinBecause: z.string().describe('Why no less and no more than that'),
    agrees: z.boolean().nullable().describe('Null where nothing published stands there'),
    deviation: z.string().describe('Why ours differs, one sentence'),
    source: z.string().describe('Authors, journal or book, place'),
    tag: z.enum(['published', 'from memory', 'common practice']),
  })
  .meta({ id: 'PublishedValue' })
export type PublishedValue = z.output<typeof publishedValue>

export const publishedResult = z
  .object({ coreVersion: z.string(), values: z.array(publishedValue) })
  .meta({ id: 'PublishedResult' })
export type PublishedResult = z.output<typeof publishedResult>
