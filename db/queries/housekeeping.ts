import { sql } from 'drizzle-orm'
import type { Database } from '../database.ts'

/** Removes what has expired, in every group; returns how many rows went. */
export async function removeExpired(db: Database): Promise<number> {
  const { rows } = await db.execute<{ removed: number }>(sql`select remove_expired() as removed`)
  return rows[0]?.removed ?? 0
}
