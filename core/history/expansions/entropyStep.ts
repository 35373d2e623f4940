/** A sudden release of entropy by a factor D at T_D: n a³ and T go on, s a³ grows by D, so Y = n/s falls by D. */
import type { ExpansionInput } from '../../wire/history.ts'
import { RADIATION } from './expansion.ts'
import type { Expansion } from './expansion.ts'

export function entropyStep({
  temperatureGeV,
  factor,
}: Extract<ExpansionInput, { kind: 'entropy-step' }>): Expansion {
  const lnReleased = Math.log(factor)
  const lnStep = Math.log(temperatureGeV)
  return {
    ...RADIATION,
    breaks: [temperatureGeV],
    complete(lnT, out) {
      if (lnT > lnStep) out.lnDilution = lnReleased
    },
  }
}
