/** From a freeze-in-by-decay candidate on the wire to its result. */
import { HBAR_GEV_S } from '../constants/natural.ts'
import { emptyExpansion } from '../history/thermalHistory.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import type { FreezeInDecayInput } from '../wire/candidate.ts'
import type { AbundanceResult } from '../wire/compute.ts'
import { InputError } from '../wire/fault.ts'
import { checked } from './checked.ts'
import { logEquilibriumYield } from './equilibrium.ts'
import { DECAY_RULES, hottestProduction, productionPeak, solveFreezeInDecay } from './freezeInDecay.ts'
import type { DecaySource } from './freezeInDecay.ts'
import type { YieldSamples } from './freezeOut.ts'
import { decayGuards, historyGuards } from './guards.ts'
import { relicDensity } from './relicDensity.ts'

/** Width of the parent, GeV: as given, or ħ/τ. */
export function widthOf(candidate: FreezeInDecayInput): number {
  const { widthGeV, lifetimeS } = candidate.parent
  return widthGeV ?? HBAR_GEV_S / lifetimeS!
}

export function decaySource(candidate: FreezeInDecayInput): DecaySource {
  const { massGeV, degreesOfFreedom, statistics } = candidate.parent
  return {
    parent: { massGeV, degreesOfFreedom, statistics },
    widthGeV: widthOf(candidate),
    perDecay: candidate.perDecay,
  }
}

/** Nothing is produced when even the hottest bath holds no parents. */
function refuseUnreachable(history: ThermalHistory, source: DecaySource): void {
  const hottest = hottestProduction(history, source.parent)
  const path =
    history.input.maximumTemperatureGeV === null
      ? 'candidate.parent.massGeV'
      : 'history.maximumTemperatureGeV'
  if (hottest > source.parent.massGeV / 50 && hottest > 2 * history.temperatureToday) return
  const value = history.input.maximumTemperatureGeV ?? source.parent.massGeV
  throw new InputError([
    {
      path,
      value,
      message:
        'allowed: a hottest temperature above a fiftieth of the parent’s mass; below it no parents are left to decay',
    },
  ])
}

/** @throws ConvergenceError, InputError */
export function freezeInDecayAbundance(
  history: ThermalHistory,
  candidate: FreezeInDecayInput,
): AbundanceResult {
  const source = decaySource(candidate)
  refuseUnreachable(history, source)
  const { value: yieldToday, error } = checked(
    DECAY_RULES.length,
    (i) => solveFreezeInDecay(history, source, DECAY_RULES[i]!),
    (found) => found,
    () => history.tableError,
  )
  const peak = productionPeak(history, source)
  const point = emptyExpansion()
  history.at(Math.log(peak), point)
  const lifetimeS = HBAR_GEV_S / source.widthGeV
  return {
    omegaH2: relicDensity(history, candidate.massGeV, yieldToday),
    yieldToday,
    yieldFreezeIn: yieldToday,
    numericalError: error,
    lifetimeS,
    widthGeV: source.widthGeV,
    productionTemperatureGeV: peak,
    guards: [
      ...decayGuards({
        massGeV: candidate.massGeV,
        parentMassGeV: candidate.parent.massGeV,
        lifetimeS,
        yieldToday,
        equilibriumYield: Math.exp(logEquilibriumYield(candidate, candidate.massGeV / peak, point.gS)),
        maximumTemperatureGeV: history.input.maximumTemperatureGeV,
      }),
      ...historyGuards(history.input),
    ],
  }
}

/** ln Y at the wanted ln x = ln(m_B/T) (ascending). */
export function freezeInDecayYields(
  history: ThermalHistory,
  candidate: FreezeInDecayInput,
  lnX: Float64Array,
): YieldSamples {
  const samples = { lnX, lnYield: new Float64Array(lnX.length).fill(NaN) }
  solveFreezeInDecay(history, decaySource(candidate), DECAY_RULES[1]!, samples)
  return samples
}
