import { bigserial, index, pgTable, text } from 'drizzle-orm/pg-core'
import { moment } from './columns.ts'

/** An attempt that failed or is not yet known to have succeeded, counted against a budget; budgets are hashes. */
export const attempts = pgTable(
  'attempts',
  {
    id: bigserial('id', { mode: 'number' }).primaryKey(),
    budget: text('budget').notNull(),
    at: moment('at').notNull().defaultNow(),
  },
  (t) => [index('attempts_of_budget').on(t.budget, t.at), index('attempts_by_age').on(t.at)],
)
