/** Ultraviolet freeze-in: made at the highest temperature there was. */
import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { FreezeInUltravioletInput } from '../../wire/candidate.ts'
import { InputError } from '../../wire/fault.ts'
import { FREEZE_IN_RULES, solveFreezeIn } from '../freezeIn.ts'
import type { FreezeInSource } from '../freezeIn.ts'
import { ultravioletSource } from '../freezeInSources.ts'
import { emptySamples } from '../yieldSamples.ts'
import { checkedFreezeIn, freezeInResult, productionOverHubble } from './freezeInResult.ts'
import type { Mechanism } from './mechanism.ts'

function sourceOf(history: ThermalHistory, candidate: FreezeInUltravioletInput): FreezeInSource {
  const maximum = history.input.maximumTemperatureGeV
  if (maximum === null)
    throw new InputError([
      {
        path: 'history.maximumTemperatureGeV',
        value: null,
        message: 'needed: ultraviolet freeze-in grows with the highest temperature without end',
      },
    ])
  if (maximum < 100 * history.temperatureToday)
    throw new InputError([
      {
        path: 'history.maximumTemperatureGeV',
        value: maximum,
        message: 'allowed: well above today’s temperature',
      },
    ])
  return ultravioletSource(history, candidate)
}

export const freezeInUltraviolet: Mechanism<FreezeInUltravioletInput> = {
  abundance(history, candidate) {
    const source = sourceOf(history, candidate)
    const result = checkedFreezeIn(history, source)
    return { ...freezeInResult(history, candidate, source, result), yieldFreezeIn: result.value }
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
