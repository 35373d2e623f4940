import type { Role } from '#core/wire/index'
import { and, eq, isNull, sql } from 'drizzle-orm'
import type { Database, GroupTransaction } from '../database.ts'
import { sessions } from '../schema/sessions.ts'

export interface Account {
  userId: string
  groupId: string
  passwordHash: string
}

/** A session in force, with all that answers "who is signed in, in which group, as what". */
export interface LiveSession {
  id: string
  expiresAt: Date
  user: { id: string; name: string; email: string }
  group: { id: string; name: string; baselineRevisionId: string | null }
  role: Role
}

/** The account of an e-mail address in the first group its owner joined; null for an unknown address. */
export async function findAccount(db: Database, email: string): Promise<Account | null> {
  const { rows } = await db.execute<{ user_id: string; password_hash: string; group_id: string }>(
    sql`select user_id, password_hash, group_id from account_for_sign_in(${email})`,
  )
  const [row] = rows
  return row === undefined
    ? null
    : { userId: row.user_id, groupId: row.group_id, passwordHash: row.password_hash }
}

/** Opens a session and returns its id. */
export async function insertSession(
  tx: GroupTransaction,
  session: { groupId: string; userId: string; expiresAt: Date },
): Promise<string> {
  const [row] = await tx.insert(sessions).values(session).returning({ id: sessions.id })
  if (row === undefined) throw new Error('an insert that raised nothing returned nothing')
  return row.id
}

interface SessionRow extends Record<string, unknown> {
  session_id: string
  expires_at: string
  user_id: string
  user_name: string
  user_email: string
  group_id: string
  group_name: string
  baseline_revision_id: string | null
  role: Role
}

/** The session of this id, its use noted; null when there is none, or it has been revoked or has expired. */
export async function useSession(db: Database, id: string): Promise<LiveSession | null> {
  const { rows } = await db.execute<SessionRow>(sql`select * from use_session(${id})`)
  const [row] = rows
  if (row === undefined) return null
  return {
    id: row.session_id,
    expiresAt: new Date(row.expires_at),
    user: { id: row.user_id, name: row.user_name, email: row.user_email },
    group: { id: row.group_id, name: row.group_name, baselineRevisionId: row.baseline_revision_id },
    role: row.role,
  }
}

export async function revokeSession(tx: GroupTransaction, id: string): Promise<void> {
  await tx
    .update(sessions)
    .set({ revokedAt: new Date() })
    .where(and(eq(sessions.id, id), isNull(sessions.revokedAt)))
}
