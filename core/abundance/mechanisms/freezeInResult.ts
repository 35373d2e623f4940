/** What the kinds of freeze-in have in common: a source, a quadrature, and how close they come to equilibrium. */
import { emptyExpansion } from '../../history/expansionPoint.ts'
import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { AbundanceResult } from '../../wire/compute.ts'
import { checked } from '../checked.ts'
import type { Checked } from '../checked.ts'
import { logEquilibriumYield } from '../equilibrium.ts'
import type { EquilibriumSpecies } from '../equilibrium.ts'
import { FREEZE_IN_RULES, productionPeak, solveFreezeIn } from '../freezeIn.ts'
import type { FreezeInSource } from '../freezeIn.ts'
import { freezeInGuards } from '../guards/freezeInGuards.ts'
import { historyGuards } from '../guards/historyGuards.ts'
import { relicDensity } from '../relicDensity.ts'

/** The quadrature with rising rules until two agree. */
export function checkedFreezeIn(history: ThermalHistory, source: FreezeInSource): Checked<number> {
  return checked(
    FREEZE_IN_RULES.length,
    (i) => solveFreezeIn(history, source, FREEZE_IN_RULES[i]!),
    (found) => found,
    () => history.tableError,
  )
}

/** Y_eq of a candidate at temperature T, GeV. */
export function equilibriumYield(
  history: ThermalHistory,
  candidate: EquilibriumSpecies,
  temperatureGeV: number,
): number {
  const point = emptyExpansion()
  history.at(Math.log(temperatureGeV), point)
  return Math.exp(
    logEquilibriumYield([candidate], candidate.massGeV, candidate.massGeV / temperatureGeV, point.gS),
  )
}

/** The fields common to every freeze-in result. */
export function freezeInResult(
  history: ThermalHistory,
  candidate: EquilibriumSpecies,
  source: FreezeInSource,
  { value, error }: Checked<number>,
): AbundanceResult & { productionTemperatureGeV: number } {
  const peak = productionPeak(history, source)
  return {
    omegaH2: relicDensity(history, candidate.massGeV, value),
    yieldToday: value,
    numericalError: error,
    productionTemperatureGeV: peak,
    guards: [
      ...freezeInGuards({
        massGeV: candidate.massGeV,
        yieldToday: value,
        equilibriumYield: equilibriumYield(history, candidate, peak),
        rateOverHubble: productionOverHubble(history, candidate, source)(peak),
        maximumTemperatureGeV: history.input.maximumTemperatureGeV,
        unboundedPeakGeV: source.scaleGeV / 3,
      }),
      ...historyGuards(history),
    ],
  }
}

/** γ/(n_eq H): production per candidate in equilibrium, against the expansion. */
export function productionOverHubble(
  history: ThermalHistory,
  candidate: EquilibriumSpecies,
  source: FreezeInSource,
): (temperatureGeV: number) => number {
  const point = emptyExpansion()
  return (temperature) => {
    history.at(Math.log(temperature), point)
    const yieldThere = Math.exp(
      logEquilibriumYield([candidate], candidate.massGeV, candidate.massGeV / temperature, point.gS),
    )
    return source.reactionDensity(temperature) / (yieldThere * point.entropy * point.hubble)
  }
}
