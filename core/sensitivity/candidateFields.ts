/** The fields in which two candidates differ, as finely as each can be exchanged by itself. */
import { readPath, substitute, valueAt } from '../variation/jsonPath.ts'
import type { JsonPath } from '../variation/jsonPath.ts'
import { candidateInput } from '../wire/candidate.ts'
import type { CandidateInput } from '../wire/candidate.ts'
import { InputError, parseInput, pathText } from '../wire/fault.ts'
import { z } from 'zod'

/** Fields that say which others there are. */
const KINDS = ['mechanism', 'kind', 'against'] as const

const isObject = (value: unknown): value is Record<string, unknown> =>
  value !== null && typeof value === 'object' && !Array.isArray(value)

/** Whether two objects have the same fields and are of the same kind, so that their fields can be exchanged one by one. */
function areAlike(first: Record<string, unknown>, second: Record<string, unknown>): boolean {
  const fields = (value: Record<string, unknown>): string => Object.keys(value).sort().join()
  return fields(first) === fields(second) && KINDS.every((kind) => first[kind] === second[kind])
}

function differences(first: unknown, second: unknown, path: JsonPath): JsonPath[] {
  if (JSON.stringify(first) === JSON.stringify(second)) return []
  if (!isObject(first) || !isObject(second) || !areAlike(first, second)) return [path]
  return Object.keys(first).flatMap((key) => differences(first[key], second[key], [...path, key]))
}

/** Paths as `candidate.parent.lifetimeS`, or of whole parts that are of another kind, up to `candidate` itself. */
export function differingFields(baseline: CandidateInput, variant: CandidateInput): string[] {
  return differences(baseline, variant, ['candidate']).map(pathText)
}

const candidatePart = z.object({ candidate: candidateInput })

/**
 * The baseline with these fields taken from the variant.
 * @throws InputError when the mixture is no candidate
 */
export function withFields(
  baseline: CandidateInput,
  variant: CandidateInput,
  fields: readonly string[],
): CandidateInput {
  const mixed = fields
    .map(readPath)
    .reduce<unknown>((whole, path) => substitute(whole, path, valueAt({ candidate: variant }, path)), {
      candidate: baseline,
    })
  try {
    return parseInput(candidatePart, mixed).candidate
  } catch (error) {
    if (!(error instanceof InputError)) throw error
    const taken = fields.join(', ')
    throw new InputError(
      error.faults.map(({ path, message }) => ({
        path: 'variantCandidate',
        message: `the baseline with ${taken} of the variant is no candidate, so their parts cannot be told apart: ${path}: ${message}`,
      })),
    )
  }
}
