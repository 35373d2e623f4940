/** Evidence of an evaluation: one file that says what went in and what came out, and can be repeated and checked. */
import { computeAbundance } from '../abundance/abundance.ts'
import { CORE_VERSION } from '../version.ts'
import { digestOf } from '../wire/digest.ts'
import { evidenceBundle } from '../wire/evidence.ts'
import type { EvidenceBundle, EvidenceCheck } from '../wire/evidence.ts'
import { parseInput } from '../wire/fault.ts'
import type { Evaluation } from '../wire/records.ts'

/** Two machines may round differently below this, relative, however exact the method claims to be. */
export const LEAST_ALLOWED_DIFFERENCE = 1e-9

/** The bundle of a stored evaluation. */
export function evidenceOf(
  evaluation: Evaluation,
  input: EvidenceBundle['input'],
  group: string,
): EvidenceBundle {
  return {
    format: 'emberline evidence',
    formatVersion: 1,
    evaluationId: evaluation.id,
    group,
    author: evaluation.author.name,
    evaluatedAt: evaluation.createdAt,
    coreVersion: evaluation.coreVersion,
    history: { name: evaluation.history.name, revision: evaluation.history.number },
    candidate: { name: evaluation.candidate.name, revision: evaluation.candidate.number },
    input,
    result: evaluation.result,
    digests: {
      input: evaluation.inputDigest,
      history: digestOf(input.history),
      candidate: digestOf(input.candidate),
      result: digestOf(evaluation.result),
    },
    datasets: [],
    repeat: 'npm run --silent compute -- evidence < evidence.json',
  }
}

/**
 * Repeats a bundle with this core.
 * @throws InputError when it is no bundle, ConvergenceError when its abundance is not found
 */
export function checkEvidence(bundle: unknown): EvidenceCheck {
  // The digests are of what stands in the file, not of what parsing makes of it.
  const { input, result, digests, coreVersion } = parseInput(evidenceBundle, bundle)
  const written = bundle as EvidenceBundle
  const again = computeAbundance(input)
  const allowed = Math.max(LEAST_ALLOWED_DIFFERENCE, result.numericalError)
  const relativeDifference = Math.abs(again.omegaH2 / result.omegaH2 - 1)
  return {
    digestsMatch:
      digestOf(written.input) === digests.input &&
      digestOf(written.input.history) === digests.history &&
      digestOf(written.input.candidate) === digests.candidate &&
      digestOf(written.result) === digests.result,
    omegaH2: again.omegaH2,
    storedOmegaH2: result.omegaH2,
    relativeDifference,
    allowed,
    agrees: relativeDifference <= allowed,
    coreVersion: CORE_VERSION,
    storedCoreVersion: coreVersion,
  }
}
