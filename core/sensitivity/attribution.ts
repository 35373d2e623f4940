/** How much of a change in ln Ωh² between two inputs each group of differences makes. */
import { complete } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { ASSUMPTION_GROUPS } from '../wire/history.ts'
import type { AssumptionGroup, HistoryInput } from '../wire/history.ts'
import { shapleyValues } from './shapley.ts'

/** A split of ln Ωh²(variant)/Ωh²(baseline) over groups, in their order. */
export interface Split {
  lnRatio: number
  /** Exact Shapley part of each group; they add up to lnRatio. */
  lnFactors: number[]
  /** ln of the ratio when this group alone is taken from the variant. */
  oneAtATime: number[]
}

/**
 * Splits the change by all subsets of the groups.
 * @param omegaH2With abundance of the baseline with these groups, by their index, taken from the variant
 */
export function* splitSteps(groups: number, omegaH2With: (taken: readonly number[]) => number): Steps<Split> {
  const values = new Float64Array(2 ** groups)
  const all = Array.from({ length: groups }, (_, i) => i)
  for (let subset = 0; subset < values.length; subset++) {
    values[subset] = Math.log(omegaH2With(all.filter((i) => (subset >> i) & 1)))
    yield { done: subset + 1, of: values.length }
  }
  return {
    lnRatio: values.at(-1)! - values[0]!,
    lnFactors: shapleyValues(groups, (subset) => values[subset]!),
    oneAtATime: all.map((i) => values[1 << i]! - values[0]!),
  }
}

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

const byGroup = (
  groups: readonly AssumptionGroup[],
  values: readonly number[],
): Record<AssumptionGroup, number> =>
  Object.fromEntries(ASSUMPTION_GROUPS.map((group) => [group, values[groups.indexOf(group)] ?? 0])) as Record<
    AssumptionGroup,
    number
  >

/**
 * Attributes the ratio between two histories to their groups.
 * @param omegaH2Of abundance in a history
 */
export function attribute(
  baseline: HistoryInput,
  variant: HistoryInput,
  omegaH2Of: (history: HistoryInput) => number,
): Attribution {
  const groups = differingGroups(baseline, variant)
  const { lnRatio, lnFactors, oneAtATime } = complete(
    splitSteps(groups.length, (taken) =>
      omegaH2Of(
        withGroups(
          baseline,
          variant,
          taken.map((i) => groups[i]!),
        ),
      ),
    ),
  )
  return { lnRatio, lnFactors: byGroup(groups, lnFactors), oneAtATime: byGroup(groups, oneAtATime) }
}
