/** Freeze-in by collisions 1 + 2 → X + 3. */
import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { FreezeInScatteringInput } from '../../wire/candidate.ts'
import { InputError } from '../../wire/fault.ts'
import { FREEZE_IN_RULES, solveFreezeIn } from '../freezeIn.ts'
import type { FreezeInSource } from '../freezeIn.ts'
import { scatteringSource } from '../freezeInSources.ts'
import { scatteringTableGuards } from '../guards/tableGuards.ts'
import { emptySamples } from '../yieldSamples.ts'
import { checkedFreezeIn, freezeInResult, productionOverHubble } from './freezeInResult.ts'
import type { Mechanism } from './mechanism.ts'

function sourceOf(history: ThermalHistory, candidate: FreezeInScatteringInput): FreezeInSource {
  const source = scatteringSource(history, candidate)
  if (source.hottestGeV > source.scaleGeV / 40 && source.coldestGeV > history.temperatureToday) return source
  const maximum = history.input.maximumTemperatureGeV
  const path = maximum === null ? 'candidate.massGeV' : 'history.maximumTemperatureGeV'
  const message = `allowed: a hottest temperature above a fortieth of the least collision energy, ${source.scaleGeV} GeV`
  throw new InputError([{ path, value: maximum ?? candidate.massGeV, message }])
}

export const freezeInScattering: Mechanism<FreezeInScatteringInput> = {
  abundance(history, candidate) {
    const source = sourceOf(history, candidate)
    const result = checkedFreezeIn(history, source)
    const common = freezeInResult(history, candidate, source, result)
    const guards = scatteringTableGuards(candidate, common.productionTemperatureGeV)
    return { ...common, yieldFreezeIn: result.value, guards: [...common.guards, ...guards] }
  },
  yields(history, candidate, lnX) {
    const samples = emptySamples(lnX)
    solveFreezeIn(history, sourceOf(history, candidate), FREEZE_IN_RULES[1]!, samples)
    return samples
  },
  scaleGeV: (history, candidate) => sourceOf(history, candidate).scaleGeV,
  equilibrium: (candidate) => ({ of: 'candidate', species: [candidate] }),
  rateOverHubble: (history, candidate) =>
    productionOverHubble(history, candidate, sourceOf(history, candidate)),
}
