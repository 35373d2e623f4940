/** A hot relic: it decouples relativistic at T_d with Y = Y_eq(T_d), which nothing but an entropy release changes. */
import { emptyExpansion } from '../../history/expansionPoint.ts'
import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { HotRelicInput } from '../../wire/candidate.ts'
import { InputError } from '../../wire/fault.ts'
import { logEquilibriumYield } from '../equilibrium.ts'
import { historyGuards } from '../guards/historyGuards.ts'
import { hotRelicGuards } from '../guards/hotRelicGuards.ts'
import { relicDensity } from '../relicDensity.ts'
import { emptySamples } from '../yieldSamples.ts'
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

/** Rounding, and the interpolation of n_eq. */
const CLOSED_FORM_ERROR = 1e-12

export const hotRelic: Mechanism<HotRelicInput> = {
  abundance(history, candidate) {
    const { lnYield, lnDilution } = atDecoupling(history, candidate)
    const yieldToday = Math.exp(lnYield - lnDilution)
    return {
      omegaH2: relicDensity(history, candidate.massGeV, yieldToday),
      yieldToday,
      numericalError: history.tableError + CLOSED_FORM_ERROR,
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
    return samples
  },

  scaleGeV: (_history, candidate) => candidate.massGeV,
  equilibrium: (candidate) => ({ of: 'candidate', species: [candidate] }),
  // No interaction is given, only where it ended: the rate is taken to fall as T⁵ against H as T², as for weak interactions.
  rateOverHubble: (_history, candidate) => (temperature) =>
    (temperature / candidate.decouplingTemperatureGeV) ** 3,
}
