import { sql } from 'drizzle-orm'
import { drizzle } from 'drizzle-orm/node-postgres'
import type { NodePgDatabase } from 'drizzle-orm/node-postgres'
import pg from 'pg'

export type Database = NodePgDatabase
/** A transaction that sees one group, or what belongs to one person. */
export type GroupTransaction = Parameters<Parameters<Database['transaction']>[0]>[0]

export interface DatabaseConnection {
  db: Database
  close(): Promise<void>
}

/** Opens a pool of connections; `onIdleError` hears of a connection lost while nobody used it. */
export function connect(url: string, onIdleError: (error: Error) => void): DatabaseConnection {
  const pool = new pg.Pool({ connectionString: url, max: 10, connectionTimeoutMillis: 5_000 })
  pool.on('error', onIdleError)
  return { db: drizzle(pool), close: () => pool.end() }
}

/**
 * Runs `work` in one transaction that sees the rows of `groupId` alone: the setting row-level security reads
 * ends with the transaction, so a pooled connection carries no group over to the next request.
 */
export function withGroup<T>(
  db: Database,
  groupId: string,
  work: (transaction: GroupTransaction) => Promise<T>,
): Promise<T> {
  return db.transaction(async (transaction) => {
    await transaction.execute(sql`select set_config('emberline.group_id', ${groupId}, true)`)
    return work(transaction)
  })
}

/** Runs `work` in one transaction that sees what belongs to one person, in whichever group; no group's records. */
export function withPerson<T>(
  db: Database,
  personId: string,
  work: (transaction: GroupTransaction) => Promise<T>,
): Promise<T> {
  return db.transaction(async (transaction) => {
    await transaction.execute(sql`select set_config('emberline.person_id', ${personId}, true)`)
    return work(transaction)
  })
}

/** Runs `work` in one transaction that sees a group, and what belongs to one of its members. */
export function withMember<T>(
  db: Database,
  { group, user }: { group: { id: string }; user: { id: string } },
  work: (transaction: GroupTransaction) => Promise<T>,
): Promise<T> {
  return withPerson(db, user.id, async (transaction) => {
    await transaction.execute(sql`select set_config('emberline.group_id', ${group.id}, true)`)
    return work(transaction)
  })
}

/** Throws unless the database answers. */
export async function ping(db: Database): Promise<void> {
  await db.execute(sql`select 1`)
}
