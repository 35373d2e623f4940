import { recordTable } from './recordTable.ts'

export const candidates = recordTable('candidates')
