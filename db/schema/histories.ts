import { recordTable } from './recordTable.ts'

export const histories = recordTable('histories')
