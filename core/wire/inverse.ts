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
      .tuple([positive, positive])
      .refine(([low, high]) => low < high, { message: 'allowed: [low, high] with low below high' })
      .optional()
      .describe('Where to look; by default far on both sides of what is usual for that number'),
  })
  .meta({ id: 'SolveRequest' })
export type SolveRequest = z.output<typeof solveRequest>

export const solveResult = z
  .object({
    solutions: z.array(z.number()).describe('All values found in the bracket, ascending'),
    searched: z.tuple([z.number(), z.number()]),
    targetOmegaH2: z.number(),
    closest: z
      .object({ value: z.number(), omegaH2: z.number() })
      .nullable()
      .describe('Where the abundance came nearest to the target; null when a solution was found'),
    notComputable: z
      .number()
      .int()
      .describe('Values tried that history or candidate do not allow, or that did not converge'),
  })
  .meta({ id: 'SolveResult' })
export type SolveResult = z.output<typeof solveResult>
