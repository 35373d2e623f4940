import { histories } from './histories.ts'
import { revisionTable } from './revisionTable.ts'

export const historyRevisions = revisionTable('history', histories)
