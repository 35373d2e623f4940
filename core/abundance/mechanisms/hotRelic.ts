/** A hot relic: it decouples relativistic at T_d with Y = Y_eq(T_d); entropy dilutes it, and a decaying field may add to it. */
import { emptyExpansion } from '../../history/expansionPoint.ts'
import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { HotRelicInput } from '../../wire/candidate.ts'
import { InputError } from '../../wire/fault.ts'
import type { Checked } from '../checked.ts'
import { addField, fieldSource } from '../freezeIn.ts'
import type { FreezeInSource } from '../freezeIn.ts'
import { logEquilibriumYield } from '../equilibrium.ts'
import { historyGuards } from '../guards/historyGuards.ts'
import { hotRelicGuards } from '../guards/hotRelicGuards.ts'
import { relicDensity } from '../relicDensity.ts'
import { emptySamples } from '../yieldSamples.ts'
import { checkedFreezeIn } from './freezeInResult.ts'
import type { Mechanism } from './mechanism.ts'

/** ln Y at decoupling, and ln of what entropy dilutes it by afterwards. */
function atDecoupling(
  history: ThermalHistory,
  candidate: HotRelicInput,
): { lnYield: number; lnDilution: number } {
  const { decouplingTemperatureGeV: decoupling } = candidate
  const maximum = history.input.maximumTemperatureGeV
  if (maximum !== null && decoupling > maximum)
    throw new InputError([
      {
        path: 'candidate.decouplingTemperatureGeV',
        value: decoupling,
        message: `allowed: at most the maximum temperature, ${maximum} GeV`,
      },
    ])
  const point = emptyExpansion()
  history.at(Math.log(decoupling), point)
  return {
    lnYield: logEquilibriumYield([candidate], candidate.massGeV, candidate.massGeV / decoupling, point.gS),
    lnDilution: point.lnDilution,
  }
}

/** The field that decays once the relic has let go; before, what it makes shares the fate of the rest. Null when none does. */
function fieldAfter(
  history: ThermalHistory,
  { massGeV, decouplingTemperatureGeV }: HotRelicInput,
): FreezeInSource | null {
  const until = history.expansion.producesUntil
  return until === null || until >= decouplingTemperatureGeV
    ? null
    : fieldSource(massGeV, decouplingTemperatureGeV)
}

/** What that field makes. */
function madeByField(history: ThermalHistory, candidate: HotRelicInput): Checked<number> {
  const field = fieldAfter(history, candidate)
  return field === null ? { value: 0, error: 0 } : checkedFreezeIn(history, field)
}

/** Rounding, and the interpolation of n_eq. */
const CLOSED_FORM_ERROR = 1e-12

export const hotRelic: Mechanism<HotRelicInput> = {
  abundance(history, candidate) {
    const { lnYield, lnDilution } = atDecoupling(history, candidate)
    const fromField = madeByField(history, candidate)
    const yieldToday = Math.exp(lnYield - lnDilution) + fromField.value
    return {
      omegaH2: relicDensity(history, candidate.massGeV, yieldToday),
      yieldToday,
      numericalError: Math.max(history.tableError + CLOSED_FORM_ERROR, fromField.error),
      guards: [...hotRelicGuards(candidate), ...historyGuards(history)],
    }
  },

  yields(history, candidate, lnX) {
    const samples = emptySamples(lnX)
    const point = emptyExpansion()
    const decoupled = atDecoupling(history, candidate)
    lnX.forEach((at, i) => {
      const temperature = candidate.massGeV / Math.exp(at)
      history.at(Math.log(temperature), point)
      samples.lnYield[i] =
        temperature >= candidate.decouplingTemperatureGeV
          ? logEquilibriumYield([candidate], candidate.massGeV, Math.exp(at), point.gS)
          : decoupled.lnYield - decoupled.lnDilution + point.lnDilution
    })
    const field = fieldAfter(history, candidate)
    if (field !== null) addField(history, field, samples)
    return samples
  },

  scaleGeV: (_history, candidate) => candidate.massGeV,
  equilibrium: (candidate) => ({ of: 'candidate', species: [candidate] }),
  // No interaction is given, only where it ended: the rate is taken to fall as T⁵ against H as T², as for weak interactions.
  rateOverHubble: (_history, candidate) => (temperature) =>
    (temperature / candidate.decouplingTemperatureGeV) ** 3,
}
