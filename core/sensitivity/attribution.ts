/** How much of a change in ln Ωh² between two histories each group of assumptions makes. */
import { ASSUMPTION_GROUPS } from '../wire/history.ts'
import type { AssumptionGroup, HistoryInput } from '../wire/history.ts'
import { complete } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { shapleyValues } from './shapley.ts'

export interface Attribution {
  /** ln of the whole ratio Ωh²(variant)/Ωh²(baseline). */
  lnRatio: number
  /** Exact Shapley part of each group, 0 for a group that does not differ; they add up to lnRatio. */
  lnFactors: Record<AssumptionGroup, number>
  /** ln of the ratio when this group alone is taken from the variant. */
  oneAtATime: Record<AssumptionGroup, number>
}

/** The groups in which two parsed histories differ. */
export function differingGroups(baseline: HistoryInput, variant: HistoryInput): AssumptionGroup[] {
  return ASSUMPTION_GROUPS.filter(
    (group) => JSON.stringify(baseline[group]) !== JSON.stringify(variant[group]),
  )
}

/** The baseline with the given groups taken from the variant. */
export function withGroups(
  baseline: HistoryInput,
  variant: HistoryInput,
  groups: readonly AssumptionGroup[],
): HistoryInput {
  return { ...baseline, ...Object.fromEntries(groups.map((group) => [group, variant[group]])) }
}

const zeros = (): Record<AssumptionGroup, number> =>
  Object.fromEntries(ASSUMPTION_GROUPS.map((group) => [group, 0])) as Record<AssumptionGroup, number>

/**
 * Attributes the ratio by all subsets of the groups that differ.
 * @param omegaH2Of abundance in a history
 */
export function* attributionSteps(
  baseline: HistoryInput,
  variant: HistoryInput,
  omegaH2Of: (history: HistoryInput) => number,
): Steps<Attribution> {
  const groups = differingGroups(baseline, variant)
  const subsets = 2 ** groups.length
  const values = new Float64Array(subsets)
  for (let subset = 0; subset < subsets; subset++) {
    const taken = groups.filter((_group, i) => (subset >> i) & 1)
    values[subset] = Math.log(omegaH2Of(withGroups(baseline, variant, taken)))
    yield { done: subset + 1, of: subsets }
  }
  const parts = shapleyValues(groups.length, (subset) => values[subset]!)
  const lnFactors = zeros()
  const oneAtATime = zeros()
  groups.forEach((group, i) => {
    lnFactors[group] = parts[i]!
    oneAtATime[group] = values[1 << i]! - values[0]!
  })
  return { lnRatio: values.at(-1)! - values[0]!, lnFactors, oneAtATime }
}

/** The same at once. */
export const attribute = (...question: Parameters<typeof attributionSteps>): Attribution =>
  complete(attributionSteps(...question))
