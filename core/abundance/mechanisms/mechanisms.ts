import type { CandidateInput, Mechanism as MechanismName } from '../../wire/candidate.ts'
import { asymmetric } from './asymmetric.ts'
import { freezeInDecay } from './freezeInDecay.ts'
import { freezeInScattering } from './freezeInScattering.ts'
import { freezeInUltraviolet } from './freezeInUltraviolet.ts'
import { freezeOut } from './freezeOut.ts'
import { hotRelic } from './hotRelic.ts'
import type { Mechanism } from './mechanism.ts'

type Mechanisms = { [K in MechanismName]: Mechanism<Extract<CandidateInput, { mechanism: K }>> }

const MECHANISMS: Mechanisms = {
  'freeze-out': freezeOut,
  'freeze-in-decay': freezeInDecay,
  'freeze-in-scattering': freezeInScattering,
  'freeze-in-ultraviolet': freezeInUltraviolet,
  asymmetric,
  'hot-relic': hotRelic,
}

/** The mechanism of a candidate. */
export function mechanismOf<C extends CandidateInput>(candidate: C): Mechanism<C> {
  // The table holds, under each name, the mechanism for just the candidates of that name.
  return MECHANISMS[candidate.mechanism] as unknown as Mechanism<C>
}
