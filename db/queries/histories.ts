import type { HistoryInput } from '#core/wire/index'
import { histories } from '../schema/histories.ts'
import { historyRevisions } from '../schema/historyRevisions.ts'
import { recordQueries } from './records.ts'

export const historyQueries = recordQueries<HistoryInput>({ records: histories, revisions: historyRevisions })
