import type { HotRelicInput } from '../../wire/candidate.ts'
import type { Guard } from '../../wire/compute.ts'
import { raise } from './guard.ts'

/** Guards of hot relics. */
export function hotRelicGuards({ massGeV, decouplingTemperatureGeV }: HotRelicInput): Guard[] {
  const x = massGeV / decouplingTemperatureGeV
  if (x < 1) return []
  const message =
    'It decouples when no longer relativistic: it would have gone on annihilating, and the abundance is too high.'
  return [raise('not-hot', message, x, 1, 'm/T_d', 'Kolb & Turner, The Early Universe (1990), §5.2')]
}
