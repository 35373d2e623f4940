/** Freeze-out on the wire: annihilation out of equilibrium, or from nothing. */
import { GEV_MINUS2_PER_CM3_S } from '../../constants/natural.ts'
import { HOTTEST_GEV } from '../../history/radiation.ts'
import type { ThermalHistory } from '../../history/thermalHistory.ts'
import { brent } from '../../numerics/roots/brent.ts'
import type { FreezeOutInput } from '../../wire/candidate.ts'
import type { AbundanceResult } from '../../wire/compute.ts'
import { InputError } from '../../wire/fault.ts'
import { AnnihilatingState } from '../annihilatingState.ts'
import { checked } from '../checked.ts'
import type { EquilibriumSpecies } from '../equilibrium.ts'
import { solveFreezeOut } from '../freezeOut.ts'
import type { FreezeOut, FreezeOutStart } from '../freezeOut.ts'
import { EFFORTS, LEFT_OF_TOLERANCE } from '../freezeOutEffort.ts'
import { freezeOutGuards } from '../guards/freezeOutGuards.ts'
import { historyGuards } from '../guards/historyGuards.ts'
import { annihilationRate } from '../rates/annihilationRate.ts'
import { relicDensity } from '../relicDensity.ts'
import { emptySamples } from '../yieldSamples.ts'
import type { Mechanism } from './mechanism.ts'

/** The species that share the annihilation: the candidate, and those it coannihilates with. */
export function annihilatingSpecies(
  candidate: Pick<
    FreezeOutInput,
    'massGeV' | 'degreesOfFreedom' | 'statistics' | 'annihilation' | 'equilibriumStatistics'
  >,
): EquilibriumSpecies[] {
  const others = candidate.annihilation.kind === 'coannihilation' ? candidate.annihilation.others : []
  const boltzmann = candidate.equilibriumStatistics === 'maxwell-boltzmann'
  return [candidate, ...others].map(({ massGeV, degreesOfFreedom, statistics }) => ({
    massGeV,
    degreesOfFreedom,
    statistics: boltzmann ? 'maxwell-boltzmann' : statistics,
  }))
}

/** The candidate as the equations see it. The pairs of coannihilation are averaged over particle and antiparticle already. */
export function annihilatingState(history: ThermalHistory, candidate: FreezeOutInput): AnnihilatingState {
  return new AnnihilatingState(history, {
    massGeV: candidate.massGeV,
    species: annihilatingSpecies(candidate),
    rate: annihilationRate(candidate),
    selfConjugate: candidate.selfConjugate || candidate.annihilation.kind === 'coannihilation',
  })
}

/** x beyond which a problem has no beginning: e^{−x} is nothing. */
const LATEST_START = 500

/** Where the integration may begin: x = 1 or `startX`, or the maximum temperature when that is colder. */
export function startX(
  history: ThermalHistory,
  candidate: { massGeV: number; startX?: number | undefined },
): number {
  const maximum = history.input.maximumTemperatureGeV
  const x = Math.max(candidate.startX ?? 1, maximum === null ? 0 : candidate.massGeV / maximum)
  const refuse = (message: string): never => {
    throw new InputError([{ path: 'candidate.massGeV', value: candidate.massGeV, message }])
  }
  if (x > LATEST_START && maximum !== null && x === candidate.massGeV / maximum)
    throw new InputError([
      {
        path: 'history.maximumTemperatureGeV',
        value: maximum,
        message: `allowed: above a ${LATEST_START}th of the mass; colder, nothing of the candidate is left to decide`,
      },
    ])
  if (candidate.massGeV / x > HOTTEST_GEV)
    refuse(`allowed: at most ${HOTTEST_GEV * x} GeV, where the bath's tables end`)
  if (candidate.massGeV / x <= history.temperatureToday * 1.01)
    refuse('allowed: a mass that starts the calculation above today’s temperature')
  return x
}

const startOf = (history: ThermalHistory, candidate: FreezeOutInput): FreezeOutStart => ({
  x: startX(history, candidate),
  initialAbundance: candidate.initialAbundance,
})

/** Temperature, GeV, of the first moment from x on when n_eq⟨σv⟩ falls below H; undefined when it does not within a factor 4. */
function rateEqualsHubble(state: AnnihilatingState, fromX: number): number | undefined {
  const excess = (lnX: number): number => Math.log(state.rateOverHubble(lnX))
  const early = Math.log(fromX)
  for (let lnX = early; lnX < early + 1.4; lnX += 0.05) {
    if (excess(lnX) > 0 && excess(lnX + 0.05) <= 0)
      return Math.exp(state.lnMass - brent(excess, lnX, lnX + 0.05, 1e-12))
  }
  return undefined
}

/** The facts of freeze-out at x_f. */
export function factsAtFreezeOut(state: AnnihilatingState, x: number): Partial<AbundanceResult> {
  state.readAll()
  const rate = state.rateOverHubble(Math.log(x))
  const equal = rateEqualsHubble(state, x)
  return {
    freezeOutX: x,
    freezeOutTemperatureGeV: state.particle.massGeV / x,
    sigmaVAtFreezeOutCm3PerS: state.particle.rate.at(x) / GEV_MINUS2_PER_CM3_S,
    rateOverHubbleAtFreezeOut: rate,
    ...(equal === undefined ? {} : { rateEqualsHubbleTemperatureGeV: equal }),
  }
}

/** Solves with rising effort until two agree on the number that counts. */
export function checkedFreezeOut(
  history: ThermalHistory,
  state: AnnihilatingState,
  start: FreezeOutStart,
  numberOf: (solution: FreezeOut) => number = (solution) => solution.yieldToday,
): { value: FreezeOut; error: number } {
  return checked(
    EFFORTS.length,
    (i) => solveFreezeOut(state, start, EFFORTS[i]!),
    numberOf,
    (i) => history.tableError + LEFT_OF_TOLERANCE * EFFORTS[i]!.tolerance,
  )
}

export const freezeOut: Mechanism<FreezeOutInput> = {
  abundance(history, candidate) {
    const state = annihilatingState(history, candidate)
    const start = startOf(history, candidate)
    const { value, error } = checkedFreezeOut(history, state, start)
    return {
      omegaH2: relicDensity(history, candidate.massGeV, value.yieldToday),
      yieldToday: value.yieldToday,
      numericalError: error,
      ...(value.freezeOutX === null ? {} : factsAtFreezeOut(state, value.freezeOutX)),
      guards: [...freezeOutGuards(history, candidate, state, start, value), ...historyGuards(history)],
    }
  },

  /** Y_eq before the start, unless the bath never was that hot or Y starts from nothing. */
  yields(history, candidate, lnX) {
    const samples = emptySamples(lnX)
    const state = annihilatingState(history, candidate)
    solveFreezeOut(state, startOf(history, candidate), EFFORTS[1]!, samples)
    if (candidate.initialAbundance === 'equilibrium' && history.input.maximumTemperatureGeV === null) {
      state.readAll()
      for (let i = 0; i < lnX.length && Number.isNaN(samples.lnYield[i]); i++) {
        state.moveTo(lnX[i]!)
        samples.lnYield[i] = state.lnEquilibrium + state.lnDilution
      }
    }
    return samples
  },

  scaleGeV: (_history, candidate) => candidate.massGeV,
  equilibrium: (candidate) => ({ of: 'candidate', species: annihilatingSpecies(candidate) }),
  rateOverHubble(history, candidate) {
    const state = annihilatingState(history, candidate)
    return (temperature) => state.rateOverHubble(Math.log(candidate.massGeV / temperature))
  },
}
