/** From a freeze-out candidate on the wire to its result. */
import { GEV_MINUS2_PER_CM3_S } from '../constants/natural.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { brent } from '../numerics/roots/brent.ts'
import type { FreezeOutInput } from '../wire/candidate.ts'
import type { AbundanceResult } from '../wire/compute.ts'
import { InputError } from '../wire/fault.ts'
import { AnnihilatingState } from './annihilatingState.ts'
import { checked } from './checked.ts'
import { solveFreezeOut } from './freezeOut.ts'
import type { FreezeOut, FreezeOutStart } from './freezeOut.ts'
import { EFFORTS, LEFT_OF_TOLERANCE } from './freezeOutEffort.ts'
import { freezeOutGuards, historyGuards } from './guards.ts'
import { annihilationRate } from './rates/annihilationRate.ts'
import { relicDensity } from './relicDensity.ts'
import { emptySamples } from './yieldSamples.ts'
import type { YieldSamples } from './yieldSamples.ts'

/** The candidate as the equations see it. Coannihilating species share one equilibrium, and their pairs count both signs. */
export function annihilatingState(history: ThermalHistory, candidate: FreezeOutInput): AnnihilatingState {
  const { annihilation, massGeV } = candidate
  const others = annihilation.kind === 'coannihilation' ? annihilation.others : []
  const boltzmann = candidate.equilibriumStatistics === 'maxwell-boltzmann'
  return new AnnihilatingState(history, {
    massGeV,
    species: [candidate, ...others].map((species) => ({
      massGeV: species.massGeV,
      degreesOfFreedom: species.degreesOfFreedom,
      statistics: boltzmann ? 'maxwell-boltzmann' : species.statistics,
    })),
    rate: annihilationRate(candidate),
    selfConjugate: candidate.selfConjugate || annihilation.kind === 'coannihilation',
  })
}

/** Where the integration may begin: x = 1 or `startX`, or the maximum temperature when that is colder. */
export function startOf(history: ThermalHistory, candidate: FreezeOutInput): FreezeOutStart {
  const maximum = history.input.maximumTemperatureGeV
  const x = Math.max(candidate.startX ?? 1, maximum === null ? 0 : candidate.massGeV / maximum)
  const hottest = 1e16
  if (candidate.massGeV / x > hottest)
    throw new InputError([
      {
        path: 'candidate.massGeV',
        value: candidate.massGeV,
        message: `allowed: at most ${hottest * x} GeV, where the bath's tables end`,
      },
    ])
  if (candidate.massGeV / x <= history.temperatureToday)
    throw new InputError([
      {
        path: 'candidate.massGeV',
        value: candidate.massGeV,
        message: 'allowed: a mass that starts the calculation above today’s temperature',
      },
    ])
  return { x, initialAbundance: candidate.initialAbundance }
}

/** Temperature, GeV, of the last moment when n_eq⟨σv⟩ = H. */
function rateEqualsHubble(state: AnnihilatingState, fromX: number): number | undefined {
  state.readAll()
  const excess = (lnX: number): number => Math.log(state.rateOverHubble(lnX))
  const early = Math.log(fromX)
  for (let lnX = early; lnX < early + 1.5; lnX += 0.05) {
    if (excess(lnX) > 0 && excess(lnX + 0.05) <= 0)
      return Math.exp(state.lnMass - brent(excess, lnX, lnX + 0.05, 1e-12))
  }
  return undefined
}

/** The facts of freeze-out at x_f. */
function atFreezeOut(state: AnnihilatingState, x: number): Partial<AbundanceResult> {
  state.readAll()
  const rate = state.rateOverHubble(Math.log(x))
  const equal = rateEqualsHubble(state, x)
  return {
    freezeOutX: x,
    freezeOutTemperatureGeV: Math.exp(state.lnMass) / x,
    sigmaVAtFreezeOutCm3PerS: state.particle.rate.at(x) / GEV_MINUS2_PER_CM3_S,
    rateOverHubbleAtFreezeOut: rate,
    ...(equal === undefined ? {} : { rateEqualsHubbleTemperatureGeV: equal }),
  }
}

function guardsOf(
  history: ThermalHistory,
  candidate: FreezeOutInput,
  state: AnnihilatingState,
  start: FreezeOutStart,
  solution: FreezeOut,
) {
  const x = solution.freezeOutX
  const { annihilation } = candidate
  const pWave =
    annihilation.kind === 'partial-waves' &&
    x !== null &&
    (6 * annihilation.pWaveCm3PerS) / x > annihilation.sWaveCm3PerS
  return [
    ...freezeOutGuards({
      massGeV: candidate.massGeV,
      freezeOut: x === null ? null : { x, crossSectionGeVMinus2: state.particle.rate.at(x) },
      highestWave: pWave ? 1 : 0,
      startsFromEquilibrium: candidate.initialAbundance === 'equilibrium',
      rateAtStart: solution.rateAtStart,
      startX: start.x,
      boundedByMaximumTemperature: history.input.maximumTemperatureGeV !== null,
    }),
    ...historyGuards(history.input),
  ]
}

/** @throws ConvergenceError, InputError */
export function freezeOutAbundance(history: ThermalHistory, candidate: FreezeOutInput): AbundanceResult {
  const state = annihilatingState(history, candidate)
  const start = startOf(history, candidate)
  const { value, error } = checked(
    EFFORTS.length,
    (i) => solveFreezeOut(state, start, EFFORTS[i]!),
    (solution) => solution.yieldToday,
    (i) => history.tableError + LEFT_OF_TOLERANCE * EFFORTS[i]!.tolerance,
  )
  return {
    omegaH2: relicDensity(history, candidate.massGeV, value.yieldToday),
    yieldToday: value.yieldToday,
    numericalError: error,
    ...(value.freezeOutX === null ? {} : atFreezeOut(state, value.freezeOutX)),
    guards: guardsOf(history, candidate, state, start, value),
  }
}

/** ln Y at the wanted ln x (ascending). */
export function freezeOutYields(
  history: ThermalHistory,
  candidate: FreezeOutInput,
  lnX: Float64Array,
): YieldSamples {
  const samples = emptySamples(lnX)
  solveFreezeOut(annihilatingState(history, candidate), startOf(history, candidate), EFFORTS[1]!, samples)
  return samples
}
