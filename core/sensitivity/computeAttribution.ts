import { abundance } from '../abundance/abundance.ts'
import { buildHistory } from '../history/thermalHistory.ts'
import { complete, part } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { attributeRequest } from '../wire/attribution.ts'
import type { AttributeRequest, AttributeResult } from '../wire/attribution.ts'
import { InputError, parseInput } from '../wire/fault.ts'
import { ASSUMPTION_GROUPS } from '../wire/history.ts'
import { differingGroups, splitSteps, withGroups } from './attribution.ts'
import { differingFields, withFields } from './candidateFields.ts'
import { EVALUATIONS, continuousPaths, elasticitiesSteps } from './elasticity.ts'

/** All subsets of more groups than these take too long. */
const MOST_GROUPS = 10

function refuseTooMany(groups: readonly string[]): void {
  if (groups.length <= MOST_GROUPS) return
  const message = `allowed: at most ${MOST_GROUPS} groups that differ; these are ${groups.length}: ${groups.join(', ')}`
  throw new InputError([{ path: 'variantCandidate', message }])
}

/** The parts of all groups of the history, those that do not differ with nothing, and of the fields of the candidate. */
function partsOf(
  groups: readonly string[],
  fields: readonly string[],
  lnFactors: readonly number[],
): AttributeResult['parts'] {
  return [...ASSUMPTION_GROUPS, ...fields].map((group) => {
    const lnFactor = lnFactors[groups.indexOf(group)] ?? 0
    return { group, lnFactor, factor: Math.exp(lnFactor) }
  })
}

/** Attributes a parsed request: computes every subset of the groups that differ, then the elasticities. */
function* attributionSteps(request: AttributeRequest): Steps<AttributeResult> {
  const { baseline, variant, candidate, variantCandidate = candidate } = request
  const assumptions = differingGroups(baseline, variant)
  const fields = differingFields(candidate, variantCandidate)
  const groups = [...assumptions, ...fields]
  refuseTooMany(groups)
  const omegaH2With = (taken: readonly number[]): number => {
    const ofHistory = assumptions.filter((_group, i) => taken.includes(i))
    const ofCandidate = fields.filter((_field, i) => taken.includes(assumptions.length + i))
    const mixed = ofCandidate.length > 0 ? withFields(candidate, variantCandidate, ofCandidate) : candidate
    return abundance(buildHistory(withGroups(baseline, variant, ofHistory)), mixed).omegaH2
  }
  const asked = { history: variant, candidate: variantCandidate }
  const subsets = 2 ** groups.length
  const moves = EVALUATIONS * continuousPaths(asked).length
  const of = subsets + moves
  const { lnRatio, lnFactors, oneAtATime } = yield* part(
    splitSteps(groups.length, omegaH2With),
    0,
    subsets,
    of,
  )
  const baselineOmegaH2 = omegaH2With([])
  return {
    baselineOmegaH2,
    variantOmegaH2: baselineOmegaH2 * Math.exp(lnRatio),
    ratio: Math.exp(lnRatio),
    parts: partsOf(groups, fields, lnFactors),
    oneAtATime: partsOf(groups, fields, oneAtATime),
    elasticities: yield* part(elasticitiesSteps(asked), subsets, moves, of),
  }
}

/** The same from the wire: parses, fills defaults in. */
export function* attributeSteps(input: unknown): Steps<AttributeResult> {
  return yield* attributionSteps(parseInput(attributeRequest, input))
}

export const computeAttribution = (input: unknown): AttributeResult => complete(attributeSteps(input))
