import type { HistoryInput } from '../../wire/history.ts'
import type { Radiation } from '../radiation.ts'
import { earlyMatter } from './earlyMatter.ts'
import { entropyStep } from './entropyStep.ts'
import { RADIATION } from './expansion.ts'
import type { Expansion } from './expansion.ts'
import { fluid } from './fluid.ts'

/** The expansion of a history, given its radiation. */
export function expansionOf({ expansion }: HistoryInput, radiation: Radiation): Expansion {
  switch (expansion.kind) {
    case 'radiation':
      return RADIATION
    case 'fluid':
      return fluid(expansion, radiation)
    case 'entropy-step':
      return entropyStep(expansion)
    case 'early-matter':
      return earlyMatter(expansion, radiation)
  }
}
