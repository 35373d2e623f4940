import { candidates } from './candidates.ts'
import { revisionTable } from './revisionTable.ts'

export const candidateRevisions = revisionTable('candidate', candidates)
