/** A published value with the recipe for ours, and the two side by side. */
import type { PublishedValue } from '../wire/published.ts'

/** What is known of a value before ours is computed. */
export interface Comparison extends Omit<PublishedValue, 'ours' | 'relativeDifference' | 'agrees'> {
  ours(): number
}

/** Computes ours and holds it against the published value. */
export function compared({ ours: compute, ...known }: Comparison): PublishedValue {
  const ours = compute()
  const relativeDifference = known.published === null ? null : ours / known.published - 1
  return {
    ...known,
    ours,
    relativeDifference,
    agrees: relativeDifference === null ? null : Math.abs(relativeDifference) <= known.within,
  }
}

/** Words that several comparisons share. */
export const ROUNDED = 'the published value is rounded to the digits printed'
export const ROUNDING_ALONE = 'Rounding of the published value alone.'
