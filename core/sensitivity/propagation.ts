/**
 * What the uncertainty of inputs makes of the abundance: Latin hypercube samples of independent distributions. The samples of each
 * place come from a stream of its own, named by its path, so that they depend neither on the order of the distributions nor on
 * which others there are.
 * Source: McKay, Beckman, Conover, Technometrics 21 (1979) 239.
 */
import { abundance } from '../abundance/abundance.ts'
import { ConvergenceError } from '../numerics/convergence.ts'
import { latinHypercubeColumn } from '../numerics/sampling/latinHypercube.ts'
import { quantile } from '../numerics/statistics/quantile.ts'
import { rankCorrelation } from '../numerics/statistics/rankCorrelation.ts'
import { complete } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { VariedInput } from '../variation/variedInput.ts'
import { InputError, parseInput } from '../wire/fault.ts'
import { propagateRequest } from '../wire/propagation.ts'
import type { DistributionInput, PropagateRequest, PropagateResult } from '../wire/propagation.ts'
import { quantileOf } from './distributions.ts'
import type { DiscreteInput } from './distributions.ts'
import { comparedWith, logHistogram, sampledNumber } from './sampleStatistics.ts'
import { SampleTally } from './sampleTally.ts'
import { centralValues, checkPlaces, placedValue, refuseOverlaps, writtenPath } from './variedPlaces.ts'

/** The sampled numbers, or indices of choices, of one place. */
const drawnColumn = (distribution: DistributionInput, { samples, seed }: PropagateRequest): Float64Array =>
  latinHypercubeColumn(writtenPath(distribution.path), samples, seed).map((probability) =>
    quantileOf(distribution, probability),
  )

/** The error of too many failures, or null while there are few enough. */
function tooManyFailed(tally: SampleTally, { samples, largestFailedShare }: PropagateRequest): Error | null {
  if (tally.failed <= largestFailedShare * samples && tally.failed < samples) return null
  const { error, path, message } = tally.failuresByFrequency()[0]!
  const words =
    `${tally.failed} samples have no abundance; allowed: at most a share ${largestFailedShare} of ${samples} ` +
    `(largestFailedShare). Most often: ${path === undefined ? '' : `${path}: `}${message}`
  return error === 'InputError'
    ? new InputError([{ path: 'distributions', message: words }])
    : new ConvergenceError(words)
}

/** The abundance of every sample. */
function* sampled(
  request: PropagateRequest,
  varied: VariedInput,
  columns: readonly Float64Array[],
): Steps<SampleTally> {
  const { distributions, samples } = request
  const tally = new SampleTally(samples)
  for (let i = 0; i < samples; i++) {
    try {
      const { history, candidate } = varied.at(
        columns.map((column, j) => placedValue(distributions[j]!, column[i]!)),
      )
      tally.add(i, abundance(history, candidate))
    } catch (error) {
      tally.addFailure(i, error)
      const enough = tooManyFailed(tally, request)
      if (enough) throw enough
    }
    yield { done: i + 1, of: samples }
  }
  return tally
}

/** Whether ranks mean anything. */
const isNumeric = (distribution: DistributionInput): boolean =>
  distribution.kind !== 'discrete' || distribution.values.every((value) => typeof value === 'number')

/** Rank correlation of one place with the abundances, over the samples that have one. */
function correlationWith(
  distribution: DistributionInput,
  column: Float64Array,
  { omegaH2 }: SampleTally,
): number | null {
  if (!isNumeric(distribution)) return null
  const computed = (_value: number, i: number): boolean => !Number.isNaN(omegaH2[i])
  const drawn = column.filter(computed).map((value) => placedValue(distribution, value) as number)
  return rankCorrelation(drawn, omegaH2.filter(computed))
}

function choicesOf(
  { path, values }: DiscreteInput,
  column: Float64Array,
  { omegaH2 }: SampleTally,
): PropagateResult['choices'][number] {
  return {
    path,
    values: values.map((_value, choice) => {
      const own = omegaH2.filter((value, i) => column[i] === choice && !Number.isNaN(value)).sort()
      return { samples: own.length, medianOmegaH2: own.length > 0 ? quantile(own, 0.5) : null }
    }),
  }
}

function samplesOf(
  { distributions }: PropagateRequest,
  columns: readonly Float64Array[],
  { omegaH2 }: SampleTally,
): PropagateResult['samples'] {
  return {
    omegaH2: Array.from(omegaH2, (value) => (Number.isNaN(value) ? null : value)),
    inputs: distributions.map(({ path }, i) => ({ path, values: Array.from(columns[i]!) })),
  }
}

/**
 * Propagates a parsed request.
 * @throws InputError when a distribution does not fit its place, or too many samples are impossible
 * @throws ConvergenceError when the central abundance or too many samples do not converge
 */
export function* propagationSteps(request: PropagateRequest): Steps<PropagateResult> {
  const { distributions, target } = request
  refuseOverlaps(distributions)
  const varied = new VariedInput(
    { history: request.history, candidate: request.candidate },
    distributions.map(({ path }) => path),
  )
  checkPlaces(varied, distributions)
  const middle = varied.at(centralValues(distributions))
  const { omegaH2, numericalError } = abundance(middle.history, middle.candidate)
  const columns = distributions.map((distribution) => drawnColumn(distribution, request))
  const tally = yield* sampled(request, varied, columns)
  const ascending = tally.ascending()
  return {
    central: { omegaH2, numericalError },
    omegaH2: sampledNumber(ascending),
    histogram: logHistogram(ascending, request.histogramBins),
    samplesComputed: ascending.length,
    samplesFailed: tally.failed,
    failures: tally.failuresByFrequency(),
    guards: tally.guardsByFrequency(),
    numericalError: tally.numericalError,
    rankCorrelations: distributions.map((distribution, i) => ({
      path: distribution.path,
      value: correlationWith(distribution, columns[i]!, tally),
    })),
    choices: distributions.flatMap((distribution, i) =>
      distribution.kind === 'discrete' ? [choicesOf(distribution, columns[i]!, tally)] : [],
    ),
    ...(target ? { target: comparedWith(target, ascending) } : {}),
    ...(request.withSamples ? { samples: samplesOf(request, columns, tally) } : {}),
  }
}

/** The same from the wire: parses, fills defaults in. */
export function* propagateSteps(input: unknown): Steps<PropagateResult> {
  return yield* propagationSteps(parseInput(propagateRequest, input))
}

export const computePropagation = (input: unknown): PropagateResult => complete(propagateSteps(input))
