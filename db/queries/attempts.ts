import { sql } from 'drizzle-orm'
import type { Database } from '../database.ts'

/** So many attempts, of one kind by one party, within the period. */
export interface Budget {
  key: string
  limit: number
}

/** Ids to forgive the attempt by, or how long to wait because a budget is used up. */
export type Taken = { waitSeconds: number } | { attemptIds: readonly string[] }

/** Counts an attempt against every budget, all or none. */
export async function takeAttempt(
  db: Database,
  budgets: readonly Budget[],
  periodSeconds: number,
): Promise<Taken> {
  const keys = sql.param(budgets.map(({ key }) => key))
  const limits = sql.param(budgets.map(({ limit }) => limit))
  const { rows } = await db.execute<{ wait_seconds: number; attempt_ids: string[] }>(
    sql`select * from take_attempt(${keys}::text[], ${limits}::integer[], make_interval(secs => ${periodSeconds}))`,
  )
  const [row] = rows
  if (row === undefined) throw new Error('take_attempt answered nothing')
  return row.wait_seconds > 0 ? { waitSeconds: row.wait_seconds } : { attemptIds: row.attempt_ids }
}

export async function forgiveAttempt(db: Database, attemptIds: readonly string[]): Promise<void> {
  await db.execute(sql`select forgive_attempt(${sql.param([...attemptIds])}::bigint[])`)
}
