import { z } from 'zod'
import { positive } from './numbers.ts'

/** Input of `solve`: which number is the unknown, and what abundance it has to give. */
export const solveRequest = z
  .strictObject({
    history: z.looseObject({}).describe('A history; the unknown may be left out of it'),
    candidate: z.looseObject({}).describe('A candidate; the unknown may be left out of it'),
    solveFor: z
      .string()
      .regex(
        /^(candidate|history)(\.\w+|\[\d+\])+$/,
        'allowed: a path to a number, as candidate.annihilation.sWaveCm3PerS',
      )
      .describe('Path of the unknown'),
    targetOmegaH2: positive.default(0.12).describe('Abundance to reach'),
    between: z
      .tuple([z.number(), z.number()])
      .refine(([low, high]) => low < high, { message: 'allowed: [low, high] with low below high' })
      .optional()
      .describe(
        'Where to look; by default far on both sides of what is usual for that number. Scanned evenly in the logarithm, or in the number itself when it begins at zero or below',
      ),
  })
  .meta({ id: 'SolveRequest' })
export type SolveRequest = z.output<typeof solveRequest>

const reached = z.object({
  value: z.number().describe('Value of the unknown'),
  omegaH2: z.number().describe('The abundance it gives'),
})

export const solveResult = z
  .object({
    solutions: z.array(z.number()).describe('All values found in the bracket, ascending'),
    searched: z.tuple([z.number(), z.number()]).describe('The bracket'),
    targetOmegaH2: z.number().describe('The abundance asked for'),
    closest: reached
      .nullable()
      .describe('Where the abundance came nearest to the target; null when a solution was found'),
    lowest: reached.describe('The smallest abundance seen in the bracket'),
    highest: reached.describe('The largest abundance seen in the bracket'),
    leaps: z
      .array(z.number())
      .describe('Where the abundance leaps over the target without reaching it, as at a step of the bath'),
    gaps: z
      .array(
        z.object({
          from: z.number(),
          to: z.number(),
          message: z.string().describe('Why, by the first value in it'),
        }),
      )
      .describe('Stretches of the bracket whose values give no abundance'),
    explanation: z.string().nullable().describe('Why there is no solution, in words; null when there is one'),
    notComputable: z
      .number()
      .int()
      .describe('Values tried that history or candidate do not allow, or that did not converge'),
  })
  .meta({ id: 'SolveResult' })
export type SolveResult = z.output<typeof solveResult>
