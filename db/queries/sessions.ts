import type { Role } from '#core/wire/index'
import { and, desc, eq, gt, isNull, ne, sql } from 'drizzle-orm'
import type { Database, GroupTransaction } from '../database.ts'
import { groups } from '../schema/groups.ts'
import { memberships } from '../schema/memberships.ts'
import { sessions } from '../schema/sessions.ts'

/** A session in force, with all that answers "who is signed in, in which group, as what". */
export interface LiveSession {
  id: string
  expiresAt: Date
  user: { id: string; name: string; email: string }
  group: { id: string; name: string; baselineRevisionId: string | null }
  role: Role
}

export interface NewSession {
  groupId: string
  userId: string
  expiresAt: Date
  userAgent: string
  address: string
}

/** Opens a session and returns its id. */
export async function insertSession(tx: GroupTransaction, session: NewSession): Promise<string> {
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

const inForce = () => and(isNull(sessions.revokedAt), gt(sessions.expiresAt, sql`now()`))

/** The person's sessions in force, used last first. */
export const listSessions = (tx: GroupTransaction) =>
  tx
    .select({
      id: sessions.id,
      group: groups.name,
      userAgent: sessions.userAgent,
      address: sessions.address,
      createdAt: sessions.createdAt,
      lastUsedAt: sessions.lastUsedAt,
      expiresAt: sessions.expiresAt,
    })
    .from(sessions)
    .innerJoin(groups, eq(groups.id, sessions.groupId))
    .where(inForce())
    .orderBy(desc(sessions.lastUsedAt), sessions.id)

/** Ends one of the person's sessions; false when they have none of this id in force. */
export async function revokeSession(tx: GroupTransaction, id: string): Promise<boolean> {
  const ended = await tx
    .update(sessions)
    .set({ revokedAt: new Date() })
    .where(and(eq(sessions.id, id), inForce()))
    .returning({ id: sessions.id })
  return ended.length > 0
}

/** Ends all the person's sessions, but for the one to keep. */
export async function revokeSessions(tx: GroupTransaction, keptId: string | null): Promise<void> {
  const others = keptId === null ? undefined : ne(sessions.id, keptId)
  await tx.update(sessions).set({ revokedAt: new Date() }).where(and(inForce(), others))
}

/** The groups the person belongs to, by name. */
export const listOwnGroups = (tx: GroupTransaction, userId: string) =>
  tx
    .select({ id: groups.id, name: groups.name, role: memberships.role })
    .from(memberships)
    .innerJoin(groups, eq(groups.id, memberships.groupId))
    .where(eq(memberships.userId, userId))
    .orderBy(groups.name, groups.id)

/** Turns a session to another of the person's groups; the caller has seen that it is one. */
export async function moveSession(tx: GroupTransaction, id: string, groupId: string): Promise<void> {
  await tx.update(sessions).set({ groupId }).where(eq(sessions.id, id))
}
