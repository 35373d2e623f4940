import { writeAddress } from '../bench/draft.ts'
import type { RevisionChoice } from '../bench/draft.ts'

/** Where the Bench opens with those revisions. */
export const benchLink = (chosen: { history?: RevisionChoice; candidate?: RevisionChoice }): string =>
  `/bench${writeAddress({ history: null, candidate: null, ...chosen, draft: {}, window: null })}`
