/** Everything the Bench shows, in one answer. */
import { abundance } from '../abundance/abundance.ts'
import { guardsLookedAt } from '../abundance/guards/guard.ts'
import { mechanismOf } from '../abundance/mechanisms/mechanisms.ts'
import { ConvergenceError } from '../numerics/convergence.ts'
import { ages } from '../history/time.ts'
import { buildHistory } from '../history/thermalHistory.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { attribute, differingGroups, withGroups } from '../sensitivity/attribution.ts'
import { z } from 'zod'
import { temperatureGeV } from '../wire/numbers.ts'
import { candidateInput } from '../wire/candidate.ts'
import type { CandidateInput } from '../wire/candidate.ts'
import type { AbundanceResult } from '../wire/compute.ts'
import { InputError, faultsOf } from '../wire/fault.ts'
import { ASSUMPTION_GROUPS, historyInput } from '../wire/history.ts'
import type { HistoryInput } from '../wire/history.ts'
import {
  effectiveNumberCurves,
  equilibriumCurve,
  rateOverHubbleCurve,
  temperatureGrid,
  yieldCurve,
} from './curves.ts'
import { epochsOf } from './epochs.ts'
import type { AssumptionFactor, BenchAnswer, BenchReport, BenchRequest } from './types.ts'
import { workingsOf } from './workings.ts'

const omegaH2Of = (history: HistoryInput, candidate: CandidateInput): number =>
  abundance(buildHistory(history), candidate).omegaH2

/** The factor of every group. A mixed history that cannot be computed leaves the attribution open, not the answer. */
function factorsOf(
  baseline: HistoryInput,
  history: HistoryInput,
  candidate: CandidateInput,
): AssumptionFactor[] {
  const differing = new Set(differingGroups(baseline, history))
  const reference = omegaH2Of(baseline, candidate)
  try {
    const { lnFactors, oneAtATime } = attribute(baseline, history, (mixed) => omegaH2Of(mixed, candidate))
    return ASSUMPTION_GROUPS.map((group) => ({
      group,
      differs: differing.has(group),
      oneAtATime: Math.exp(oneAtATime[group]),
      attributed: Math.exp(lnFactors[group]),
    }))
  } catch (error) {
    if (!isRefusal(error)) throw error
    return ASSUMPTION_GROUPS.map((group) => ({
      group,
      differs: differing.has(group),
      oneAtATime: differing.has(group) ? singleFactor(baseline, history, candidate, group, reference) : 1,
      attributed: differing.has(group) ? null : 1,
    }))
  }
}

function singleFactor(
  baseline: HistoryInput,
  history: HistoryInput,
  candidate: CandidateInput,
  group: AssumptionFactor['group'],
  reference: number,
): number | null {
  try {
    return omegaH2Of(withGroups(baseline, history, [group]), candidate) / reference
  } catch (error) {
    if (isRefusal(error)) return null
    throw error
  }
}

const isRefusal = (error: unknown): boolean =>
  error instanceof InputError || error instanceof ConvergenceError

/** Ω_χh² at both ends of the bath's own band. */
function bandOf(history: HistoryInput, candidate: CandidateInput): BenchReport['band'] {
  if (history.bath.treatment !== 'fit-2018') return null
  const ends = [-1, 1].map((band) =>
    omegaH2Of({ ...history, bath: { treatment: 'fit-2018', band } }, candidate),
  )
  return {
    low: Math.min(...ends),
    high: Math.max(...ends),
    because:
      'the bath moved between its two published whole determinations, the 2018 fit and the 2016 lattice table, and as far to the other side',
  }
}

function markOf(result: AbundanceResult): BenchReport['mark'] {
  if (result.freezeOutTemperatureGeV !== undefined)
    return { kind: 'freeze-out', temperatureGeV: result.freezeOutTemperatureGeV }
  if (result.productionTemperatureGeV !== undefined)
    return { kind: 'production', temperatureGeV: result.productionTemperatureGeV }
  return null
}

/** Ages at the powers of ten inside the window. */
function timesOf(history: ThermalHistory, { hotGeV, coldGeV }: BenchRequest['window']): BenchReport['times'] {
  const temperatures: number[] = []
  for (let decade = Math.floor(Math.log10(hotGeV)); decade >= Math.ceil(Math.log10(coldGeV)); decade--)
    temperatures.push(Number(`1e${decade}`))
  return ages(history, temperatures).map((timeS, i) => ({ temperatureGeV: temperatures[i]!, timeS }))
}

/** Temperatures a chart can be drawn between, GeV. */
const benchWindow = z
  .object({ hotGeV: temperatureGeV, coldGeV: temperatureGeV })
  .refine(({ hotGeV, coldGeV }) => hotGeV > coldGeV, { path: ['coldGeV'], message: 'allowed: below hotGeV' })

/** What is wrong with the baseline is said of the baseline. */
function asBaseline<T>(compute: () => T): T {
  try {
    return compute()
  } catch (error) {
    if (!(error instanceof InputError)) throw error
    throw new InputError(
      error.faults.map((fault) => ({ ...fault, path: fault.path.replace(/^history/, 'baseline') })),
    )
  }
}

/** The report for parsed inputs. @throws InputError, ConvergenceError */
export function benchReport({
  history: input,
  baseline: baselineInput,
  candidate,
  window,
}: BenchRequest): BenchReport {
  const history = buildHistory(input)
  const baseline = buildHistory(baselineInput)
  const result = abundance(history, candidate)
  const baselineOmegaH2 = asBaseline(() => abundance(baseline, candidate).omegaH2)
  const grid = temperatureGrid(window.hotGeV, window.coldGeV, [history, baseline])
  const numbers = effectiveNumberCurves(history, grid)
  const baselineNumbers = effectiveNumberCurves(baseline, grid)
  return {
    result,
    baselineOmegaH2,
    band: bandOf(input, candidate),
    factors: factorsOf(baselineInput, input, candidate),
    guardsLookedAt: guardsLookedAt(candidate.mechanism),
    yieldCurve: yieldCurve(history, candidate, grid),
    equilibriumCurve: equilibriumCurve(history, candidate, grid),
    equilibriumOf: mechanismOf(candidate).equilibrium(candidate).of,
    baselineYieldCurve: yieldCurve(baseline, candidate, grid),
    rateOverHubbleCurve: rateOverHubbleCurve(history, candidate, grid),
    gRhoCurve: numbers.gRho,
    gSCurve: numbers.gS,
    baselineGRhoCurve: baselineNumbers.gRho,
    gRhoRatioCurve: {
      temperatureGeV: grid,
      value: numbers.gRho.value.map((g, i) => g / baselineNumbers.gRho.value[i]!),
    },
    mark: markOf(result),
    epochs: epochsOf(input),
    times: timesOf(history, window),
    workings: workingsOf(history, candidate, result),
  }
}

/** Answers a request as it comes from a form: bad input comes back as faults with paths, never as an exception. */
export function benchAnswer(request: BenchRequest): BenchAnswer {
  if (typeof request !== 'object' || request === null)
    return {
      status: 'refused',
      faults: [{ path: '', message: 'allowed: an object with history, baseline, candidate and window' }],
    }
  const history = historyInput.safeParse(request.history)
  const candidate = candidateInput.safeParse(request.candidate)
  const baseline = historyInput.safeParse(request.baseline)
  const window = benchWindow.safeParse(request.window)
  const faults = [
    ...(history.success
      ? []
      : faultsOf(history.error, request.history).map((fault) => under('history', fault))),
    ...(candidate.success
      ? []
      : faultsOf(candidate.error, request.candidate).map((fault) => under('candidate', fault))),
    ...(baseline.success
      ? []
      : faultsOf(baseline.error, request.baseline).map((fault) => under('baseline', fault))),
    ...(window.success ? [] : faultsOf(window.error, request.window).map((fault) => under('window', fault))),
  ]
  if (!history.success || !candidate.success || !baseline.success || !window.success)
    return { status: 'refused', faults }
  try {
    const report = benchReport({
      history: history.data,
      baseline: baseline.data,
      candidate: candidate.data,
      window: window.data,
    })
    return { status: 'done', report }
  } catch (error) {
    if (error instanceof InputError) return { status: 'refused', faults: error.faults }
    if (error instanceof ConvergenceError) return { status: 'failed', reason: error.reason }
    throw error
  }
}

const under = <F extends { path: string }>(root: string, fault: F): F => ({
  ...fault,
  path: fault.path === '' ? root : `${root}.${fault.path}`,
})
