/** From a freeze-in-by-decay candidate on the wire to its result. */
import { HBAR_GEV_S } from '../constants/natural.ts'
import { emptyExpansion } from '../history/expansionPoint.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import type { FreezeInDecayInput } from '../wire/candidate.ts'
import type { AbundanceResult } from '../wire/compute.ts'
import { InputError } from '../wire/fault.ts'
import { checked } from './checked.ts'
import { logEquilibriumYield } from './equilibrium.ts'
import { FREEZE_IN_RULES, productionPeak, solveFreezeIn } from './freezeIn.ts'
import type { FreezeInSource } from './freezeIn.ts'
import { decaySource } from './freezeInDecay.ts'
import { decayGuards, historyGuards } from './guards.ts'
import { relicDensity } from './relicDensity.ts'
import { emptySamples } from './yieldSamples.ts'
import type { YieldSamples } from './yieldSamples.ts'

/** Width of the parent, GeV: as given, or ħ/τ. */
export function widthOf(candidate: FreezeInDecayInput): number {
  const { widthGeV, lifetimeS } = candidate.parent
  return widthGeV ?? HBAR_GEV_S / lifetimeS!
}

function sourceOf(history: ThermalHistory, candidate: FreezeInDecayInput): FreezeInSource {
  const source = decaySource(history, candidate.parent, widthOf(candidate), candidate.perDecay)
  refuseUnreachable(history, source)
  return source
}

/** Nothing is produced when even the hottest bath holds no parents. */
function refuseUnreachable(history: ThermalHistory, source: FreezeInSource): void {
  if (source.hottestGeV > source.scaleGeV / 40 && source.coldestGeV > history.temperatureToday) return
  const maximum = history.input.maximumTemperatureGeV
  const path = maximum === null ? 'candidate.parent.massGeV' : 'history.maximumTemperatureGeV'
  const message = 'allowed: a hottest temperature above a fortieth of the parent’s mass; below it no parents are left to decay'
  throw new InputError([{ path, value: maximum ?? source.scaleGeV, message }])
}

/** @throws ConvergenceError, InputError */
export function freezeInDecayAbundance(
  history: ThermalHistory,
  candidate: FreezeInDecayInput,
): AbundanceResult {
  const source = sourceOf(history, candidate)
  const widthGeV = widthOf(candidate)
  const { value: yieldToday, error } = checked(
    FREEZE_IN_RULES.length,
    (i) => solveFreezeIn(history, source, FREEZE_IN_RULES[i]!),
    (found) => found,
    () => history.tableError,
  )
  const peak = productionPeak(history, source)
  const point = emptyExpansion()
  history.at(Math.log(peak), point)
  const lifetimeS = HBAR_GEV_S / widthGeV
  return {
    omegaH2: relicDensity(history, candidate.massGeV, yieldToday),
    yieldToday,
    yieldFreezeIn: yieldToday,
    numericalError: error,
    lifetimeS,
    widthGeV,
    productionTemperatureGeV: peak,
    guards: [
      ...decayGuards({
        massGeV: candidate.massGeV,
        parentMassGeV: candidate.parent.massGeV,
        lifetimeS,
        yieldToday,
        equilibriumYield: Math.exp(logEquilibriumYield([candidate], candidate.massGeV, candidate.massGeV / peak, point.gS)),
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
  const samples = emptySamples(lnX)
  solveFreezeIn(history, sourceOf(history, candidate), FREEZE_IN_RULES[1]!, samples)
  return samples
}
