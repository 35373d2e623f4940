import type { CandidateInput } from '#core/wire/index'
import { candidateRevisions } from '../schema/candidateRevisions.ts'
import { candidates } from '../schema/candidates.ts'
import { recordQueries } from './records.ts'

export const candidateQueries = recordQueries<CandidateInput>({
  records: candidates,
  revisions: candidateRevisions,
})
