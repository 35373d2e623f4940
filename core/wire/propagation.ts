import { z } from 'zod'
import { guard } from './compute.ts'
import { measuredDensity } from './measured.ts'
import { nonNegative, positive } from './numbers.ts'

/** Where the varied number or choice stands. */
const path = z
  .string()
  .max(200)
  .regex(
    /^(candidate|history)(\.\w+|\[\d+\])+$/,
    'allowed: a path into the history or the candidate, as candidate.massGeV',
  )
  .describe('Place in the history or the candidate, as candidate.parent.lifetimeS')

const ascending = { path: ['high'], message: 'allowed: above low' }

/** How likely each value at a place is; all places are independent. */
export const distributionInput = z
  .discriminatedUnion('kind', [
    z.strictObject({
      path,
      kind: z.literal('normal'),
      mean: z.number().describe('Mean'),
      standardDeviation: positive.describe('Standard deviation'),
    }),
    z
      .strictObject({
        path,
        kind: z.literal('two-piece-normal'),
        value: z.number().describe('Most likely value: the quoted one'),
        minus: nonNegative.describe('Width below it: the quoted error downwards'),
        plus: nonNegative.describe('Width above it: the quoted error upwards'),
      })
      .refine(({ minus, plus }) => minus + plus > 0, {
        path: ['plus'],
        message: 'allowed: above 0 when minus is 0; without errors nothing varies',
      }),
    z.strictObject({
      path,
      kind: z.literal('log-normal'),
      median: positive.describe('Median'),
      standardDeviationOfLn: positive.max(20).describe('Standard deviation of the natural logarithm'),
    }),
    z
      .strictObject({
        path,
        kind: z.literal('uniform'),
        low: z.number().describe('Lowest value'),
        high: z.number().describe('Highest value'),
      })
      .refine(({ low, high }) => high > low, ascending),
    z
      .strictObject({
        path,
        kind: z.literal('log-uniform'),
        low: positive.describe('Lowest value'),
        high: positive.describe('Highest value'),
      })
      .refine(({ low, high }) => high > low, ascending),
    z
      .strictObject({
        path,
        kind: z.literal('discrete'),
        values: z
          .array(z.json())
          .min(2)
          .max(100)
          .describe('The choices: any JSON values that may stand at the place, such as whole baths'),
        weights: z
          .array(positive.max(1e9))
          .optional()
          .describe('How likely each is, in proportion; all alike when left out'),
      })
      .refine(({ values, weights }) => weights === undefined || weights.length === values.length, {
        path: ['weights'],
        message: 'allowed: as many weights as values',
      }),
  ])
  .meta({ id: 'Distribution' })
export type DistributionInput = z.output<typeof distributionInput>

/** How many samples, and from which seed. */
export const sampling = {
  samples: z
    .number()
    .int()
    .min(10)
    .max(100_000)
    .default(1000)
    .describe('Number of samples of the Latin hypercube'),
  seed: z
    .number()
    .int()
    .min(0)
    .max(Number.MAX_SAFE_INTEGER)
    .default(1)
    .describe('Seed: the same seed gives the same samples everywhere'),
  largestFailedShare: z
    .number()
    .min(0)
    .max(1)
    .default(0.05)
    .describe('Share of samples that may be impossible or not converge before there is no result'),
  histogramBins: z
    .number()
    .int()
    .min(1)
    .max(1000)
    .default(40)
    .describe('Number of bins of the histogram, equally wide in ln Ωh²'),
  withSamples: z.boolean().default(false).describe('Whether the samples themselves are wanted'),
}

/** Input of `propagate`: what the uncertainty of some inputs makes of the abundance. */
export const propagateRequest = z
  .strictObject({
    history: z.looseObject({}).describe('A history; what varies may be left out of it'),
    candidate: z.looseObject({}).describe('A candidate; what varies may be left out of it'),
    distributions: z.array(distributionInput).min(1).max(50).describe('What varies; all independent'),
    target: measuredDensity
      .optional()
      .describe(
        'An abundance to compare with, such as the measured {value: 0.12, minus: 0.0012, plus: 0.0012}',
      ),
    ...sampling,
  })
  .meta({ id: 'PropagateRequest' })
export type PropagateRequest = z.output<typeof propagateRequest>

const quantileValue = z.object({
  probability: z.number().describe('Share of the samples below'),
  value: z.number().describe('The value they lie below'),
})

/** What the samples of a positive number are like. */
export const sampledNumber = z
  .object({
    quantiles: z
      .array(quantileValue)
      .describe('Linear between neighbouring samples: 2.5, 16, 50, 84 and 97.5 %'),
    mean: z.number().describe('Mean'),
    standardDeviation: z.number().describe('Standard deviation'),
    meanOfLn: z.number().describe('Mean of the natural logarithm'),
    standardDeviationOfLn: z.number().describe('Standard deviation of the natural logarithm'),
    smallest: z.number().describe('Smallest sample'),
    largest: z.number().describe('Largest sample'),
  })
  .meta({ id: 'SampledNumber' })
export type SampledNumber = z.output<typeof sampledNumber>

/** A distribution of abundances beside a measured one. */
export const comparison = z
  .object({
    measured: measuredDensity.describe('What it is compared with'),
    pull: z
      .number()
      .nullable()
      .describe(
        'ln(median/measured) over the standard deviation: the 16 or 84 % quantile’s distance from the median and the measurement’s error, both on the facing side and in ln, added in quadrature; null when both are zero',
      ),
    probabilityBelow: z.number().describe('Share of the samples below the measured value'),
    share: sampledNumber.describe(
      'Sampled abundance over the measured value: the share of the dark matter explained; the error of the measurement is in the pull alone',
    ),
  })
  .meta({ id: 'Comparison' })
export type Comparison = z.output<typeof comparison>

export const histogram = z
  .object({
    edges: z.array(z.number()).describe('Edges of the bins in Ωh², ascending, one more than bins'),
    counts: z
      .array(z.number().int())
      .describe('Samples in each bin; the upper edge of the last belongs to it'),
  })
  .meta({ id: 'Histogram' })
export type Histogram = z.output<typeof histogram>

const failure = z.object({
  error: z
    .enum(['InputError', 'ConvergenceError'])
    .describe('Whether the input was impossible or the numerics failed'),
  path: z.string().optional().describe('Where in the input'),
  message: z.string().describe('What was wrong with the first of them'),
  count: z.number().int().describe('Samples that failed so'),
  firstSample: z.number().int().describe('Index of the first of them'),
})
export type Failure = z.output<typeof failure>

/** What is reported of any set of sampled abundances. */
export const sampledAbundance = {
  omegaH2: sampledNumber.describe('Ω_χ h² of the samples that were computed'),
  histogram,
  samplesComputed: z.number().int().describe('Samples with a result'),
  samplesFailed: z.number().int().describe('Samples without, which no statistic includes'),
  failures: z.array(failure).describe('Why samples failed, the most frequent first'),
  guards: z
    .array(guard.extend({ samples: z.number().int().describe('In how many samples it spoke') }))
    .describe('Warnings by their code, the most frequent first, each with the numbers of its first sample'),
  numericalError: z
    .number()
    .describe('Largest estimated relative error of a sample from the numerical method alone'),
}

export const propagateResult = z
  .object({
    central: z
      .object({ omegaH2: z.number(), numericalError: z.number() })
      .describe(
        'With every number at its median (a two-piece normal one at its quoted value), every choice at its first value',
      ),
    ...sampledAbundance,
    rankCorrelations: z
      .array(
        z.object({
          path: z.string(),
          value: z
            .number()
            .nullable()
            .describe('Null for choices that are not numbers, or when nothing changed'),
        }),
      )
      .describe('Spearman’s rank correlation of each varied number with the abundance'),
    choices: z
      .array(
        z.object({
          path: z.string(),
          values: z.array(
            z.object({
              samples: z.number().int().describe('Samples of this choice that were computed'),
              medianOmegaH2: z
                .number()
                .nullable()
                .describe('Their median abundance; null when there is none'),
            }),
          ),
        }),
      )
      .describe('For each discrete distribution, what each choice gave'),
    target: comparison.optional(),
    samples: z
      .object({
        omegaH2: z.array(z.number().nullable()).describe('Null where a sample failed'),
        inputs: z.array(
          z.object({
            path: z.string(),
            values: z.array(z.number()).describe('The number, or the index of the choice'),
          }),
        ),
      })
      .optional()
      .describe('The samples, when asked for'),
  })
  .meta({ id: 'PropagateResult' })
export type PropagateResult = z.output<typeof propagateResult>
