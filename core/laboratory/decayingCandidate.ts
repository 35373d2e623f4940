import type { FreezeInDecayInput } from '../wire/candidate.ts'
import type { LaboratoryRequest } from '../wire/laboratory.ts'

/** What a laboratory measures of a decay. */
export interface DecayNumbers {
  parentMassGeV: number
  lifetimeS: number
  /** Mass of the candidate, GeV. */
  massGeV: number
}

/** Where each of them stands in a candidate. */
export const PLACES: Record<keyof DecayNumbers, string> = {
  parentMassGeV: 'candidate.parent.massGeV',
  lifetimeS: 'candidate.parent.lifetimeS',
  massGeV: 'candidate.massGeV',
}

/** The candidate that is made by the decay. */
export function decayingCandidate(request: LaboratoryRequest, numbers: DecayNumbers): FreezeInDecayInput {
  return {
    mechanism: 'freeze-in-decay',
    ...request.candidate,
    massGeV: numbers.massGeV,
    perDecay: request.perDecay,
    parent: { ...request.parent, massGeV: numbers.parentMassGeV, lifetimeS: numbers.lifetimeS },
  }
}
