/** The published values this core is held against, each with ours and the reason for what is between them. */
import type { PublishedValue } from '../wire/published.ts'
import { compared } from './comparison.ts'
import { EFFECTIVE_NUMBERS } from './effectiveNumbers.ts'
import { EXPANSION } from './expansion.ts'
import { FREEZE_IN } from './freezeIn.ts'
import { RELICS } from './relics.ts'
import { TODAY } from './today.ts'

let values: readonly PublishedValue[] | null = null

/** All of them, computed on the first call: a fifth of a second. */
export function publishedValues(): readonly PublishedValue[] {
  values ??= [...EFFECTIVE_NUMBERS, ...TODAY, ...EXPANSION, ...RELICS, ...FREEZE_IN].map(compared)
  return values
}
