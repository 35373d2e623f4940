/** What can be asked of the core, by its name on the wire: from an input as it came to the steps that answer it. */
import { computeAbundance } from './abundance/abundance.ts'
import { checkEvidence } from './evidence/evidence.ts'
import { convertSteps } from './conversions/convert.ts'
import { historySteps } from './history/computeHistory.ts'
import { solveSteps } from './inverse/solveFor.ts'
import { attributeSteps } from './sensitivity/computeAttribution.ts'
import { laboratorySteps } from './laboratory/laboratory.ts'
import { propagateSteps } from './sensitivity/propagation.ts'
import { atOnce } from './steps/steps.ts'
import type { Steps } from './steps/steps.ts'

/** Each throws InputError or ConvergenceError on the way, and returns what the `compute…` of that name returns. */
export const QUESTIONS = {
  history: historySteps,
  abundance: (input) => atOnce(() => computeAbundance(input)),
  evidence: (input) => atOnce(() => checkEvidence(input)),
  solve: solveSteps,
  attribute: attributeSteps,
  propagate: propagateSteps,
  convert: convertSteps,
  laboratory: laboratorySteps,
} satisfies Record<string, (input: unknown) => Steps<unknown>>

export type Question = keyof typeof QUESTIONS
