import { abundance } from '../abundance/abundance.ts'
import { buildHistory } from '../history/thermalHistory.ts'
import { attributeRequest } from '../wire/attribution.ts'
import type { AttributeResult } from '../wire/attribution.ts'
import { parseInput } from '../wire/fault.ts'
import { ASSUMPTION_GROUPS } from '../wire/history.ts'
import type { AssumptionGroup, HistoryInput } from '../wire/history.ts'
import { complete, part } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { attributionSteps, differingGroups } from './attribution.ts'
import { EVALUATIONS, continuousPaths, elasticitiesSteps } from './elasticity.ts'

const partsOf = (lnFactors: Record<AssumptionGroup, number>): AttributeResult['parts'] =>
  ASSUMPTION_GROUPS.map((group) => ({
    group,
    lnFactor: lnFactors[group],
    factor: Math.exp(lnFactors[group]),
  }))

/** Attributes the ratio of two abundances from the wire: parses, fills defaults in, computes every subset. */
export function* attributeSteps(input: unknown): Steps<AttributeResult> {
  const { baseline, variant, candidate } = parseInput(attributeRequest, input)
  const omegaH2Of = (history: HistoryInput): number => abundance(buildHistory(history), candidate).omegaH2
  const request = { history: variant, candidate }
  const subsets = 2 ** differingGroups(baseline, variant).length
  const moves = EVALUATIONS * continuousPaths(request).length
  const of = subsets + moves
  const { lnRatio, lnFactors, oneAtATime } = yield* part(
    attributionSteps(baseline, variant, omegaH2Of),
    0,
    subsets,
    of,
  )
  const baselineOmegaH2 = omegaH2Of(baseline)
  return {
    baselineOmegaH2,
    variantOmegaH2: baselineOmegaH2 * Math.exp(lnRatio),
    ratio: Math.exp(lnRatio),
    parts: partsOf(lnFactors),
    oneAtATime: partsOf(oneAtATime),
    elasticities: yield* part(elasticitiesSteps(request), subsets, moves, of),
  }
}

export const computeAttribution = (input: unknown): AttributeResult => complete(attributeSteps(input))
