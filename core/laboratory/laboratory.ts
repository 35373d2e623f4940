/**
 * The laboratory check: a parent's mass and lifetime and the candidate's mass, measured with errors, predict an abundance by decays
 * with its distribution, which is held against the measured density.
 */
import { buildHistory } from '../history/thermalHistory.ts'
import { propagationSteps } from '../sensitivity/propagation.ts'
import { complete, part } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { InputError, parseInput } from '../wire/fault.ts'
import { laboratoryRequest } from '../wire/laboratory.ts'
import type { LaboratoryRequest, LaboratoryResult } from '../wire/laboratory.ts'
import type { DistributionInput, PropagateResult } from '../wire/propagation.ts'
import { PLACES, decayingCandidate } from './decayingCandidate.ts'
import type { DecayNumbers } from './decayingCandidate.ts'
import { flightOf } from './flight.ts'
import { Abundances, lifetimeForDensitySteps, lifetimeMassLineSteps } from './lifetimeMassLine.ts'

const MEASURED_NAMES = Object.keys(PLACES) as (keyof DecayNumbers)[]

function distributionsOf({ measured }: LaboratoryRequest): DistributionInput[] {
  return MEASURED_NAMES.map((name) => ({ path: PLACES[name], kind: 'two-piece-normal', ...measured[name] }))
}

/** Paths of the candidate made here, as the one who asked wrote them. */
const AS_ASKED: readonly (readonly [made: RegExp, asked: string])[] = [
  [/distributions\[(\d)\](?:\.path)?/g, 'measured.$1'],
  ...MEASURED_NAMES.map((name, i) => [new RegExp(`measured\\.${i}`, 'g'), `measured.${name}`] as const),
  [/\bdistributions\b/g, 'measured'],
  ...MEASURED_NAMES.map((name) => [new RegExp(`${PLACES[name]}\\b`, 'g'), `measured.${name}`] as const),
  [/\bcandidate\.parent\b/g, 'parent'],
  [/\bcandidate\.perDecay\b/g, 'perDecay'],
]

const asAsked = (text: string): string =>
  AS_ASKED.reduce((changed, [made, asked]) => changed.replace(made, asked), text)

/** The steps, with faults told of what was asked. */
function* toldAsAsked<T>(steps: Steps<T>): Steps<T> {
  try {
    return yield* steps
  } catch (error) {
    if (!(error instanceof InputError)) throw error
    throw new InputError(
      error.faults.map((fault) => ({ ...fault, path: asAsked(fault.path), message: asAsked(fault.message) })),
    )
  }
}

function predictionSteps(request: LaboratoryRequest): Steps<PropagateResult> {
  const best = {
    parentMassGeV: request.measured.parentMassGeV.value,
    lifetimeS: request.measured.lifetimeS.value,
    massGeV: request.measured.massGeV.value,
  }
  return propagationSteps({
    ...request,
    candidate: { ...decayingCandidate(request, best) },
    distributions: distributionsOf(request),
    target: request.measuredDensity,
  })
}

const renamed = <T extends { path: string }>(each: T): T => ({ ...each, path: asAsked(each.path) })

/** Shares of prediction, needed lifetime and line in the progress told. */
const SHARES = { prediction: 80, needed: 2, line: 18 } as const
const WHOLE = SHARES.prediction + SHARES.needed + SHARES.line

/** The check of a parsed request. */
function* laboratoryCheckSteps(request: LaboratoryRequest): Steps<LaboratoryResult> {
  const prediction = yield* part(predictionSteps(request), 0, SHARES.prediction, WHOLE)
  const abundances = new Abundances(buildHistory(request.history), request)
  const needed = yield* part(
    lifetimeForDensitySteps(abundances, request.measured.massGeV.value),
    SHARES.prediction,
    SHARES.needed,
    WHOLE,
  )
  const line =
    request.line &&
    (yield* part(
      lifetimeMassLineSteps(abundances, request.line),
      SHARES.prediction + SHARES.needed,
      SHARES.line,
      WHOLE,
    ))
  const { samples, rankCorrelations, failures } = prediction
  return {
    central: prediction.central,
    omegaH2: prediction.omegaH2,
    histogram: prediction.histogram,
    samplesComputed: prediction.samplesComputed,
    samplesFailed: prediction.samplesFailed,
    guards: prediction.guards,
    numericalError: prediction.numericalError,
    flight: flightOf(request),
    failures: failures.map((failure) =>
      failure.path === undefined ? failure : { ...failure, path: asAsked(failure.path) },
    ),
    rankCorrelations: rankCorrelations.map(renamed),
    comparison: prediction.target!,
    needed,
    ...(line ? { line } : {}),
    ...(samples ? { samples: { ...samples, inputs: samples.inputs.map(renamed) } } : {}),
  }
}

/** The same from the wire: parses, fills defaults in. */
export function* laboratorySteps(input: unknown): Steps<LaboratoryResult> {
  return yield* toldAsAsked(laboratoryCheckSteps(parseInput(laboratoryRequest, input)))
}

export const computeLaboratory = (input: unknown): LaboratoryResult => complete(laboratorySteps(input))
