import type { KeyScope, Role } from '#core/wire/index'
import { and, desc, eq, isNull, sql } from 'drizzle-orm'
import type { Database, GroupTransaction } from '../database.ts'
import { apiKeys } from '../schema/apiKeys.ts'
import { users } from '../schema/users.ts'
import type { LiveSession } from './sessions.ts'

export interface StoredKey {
  id: string
  owner: { id: string; name: string }
  name: string
  scope: KeyScope
  beginning: string
  createdAt: Date
  expiresAt: Date
  lastUsedAt: Date | null
  revokedAt: Date | null
}

export interface KeyDraft {
  groupId: string
  userId: string
  name: string
  scope: KeyScope
  /** SHA-256 of the secret, hexadecimal. */
  secretHash: string
  beginning: string
  expiresAt: Date
}

const columns = {
  id: apiKeys.id,
  owner: { id: users.id, name: users.name },
  name: apiKeys.name,
  scope: apiKeys.scope,
  beginning: apiKeys.beginning,
  createdAt: apiKeys.createdAt,
  expiresAt: apiKeys.expiresAt,
  lastUsedAt: apiKeys.lastUsedAt,
  revokedAt: apiKeys.revokedAt,
}

const select = (tx: GroupTransaction) =>
  tx.select(columns).from(apiKeys).innerJoin(users, eq(users.id, apiKeys.userId))

/** The group's keys, newest first; one member's when named. */
export const listKeys = (tx: GroupTransaction, userId: string | null): Promise<StoredKey[]> =>
  select(tx)
    .where(userId === null ? undefined : eq(apiKeys.userId, userId))
    .orderBy(desc(apiKeys.createdAt), desc(apiKeys.id))

export async function findKey(tx: GroupTransaction, id: string): Promise<StoredKey | null> {
  const [row] = await select(tx).where(eq(apiKeys.id, id))
  return row ?? null
}

export async function insertKey(tx: GroupTransaction, draft: KeyDraft): Promise<string> {
  const [row] = await tx.insert(apiKeys).values(draft).returning({ id: apiKeys.id })
  if (row === undefined) throw new Error('an insert that raised nothing returned nothing')
  return row.id
}

/** Ends a key at once; one that has ended keeps its first end. */
export async function revokeKey(tx: GroupTransaction, id: string): Promise<void> {
  await tx
    .update(apiKeys)
    .set({ revokedAt: new Date() })
    .where(and(eq(apiKeys.id, id), isNull(apiKeys.revokedAt)))
}

/** Who comes with a key, and what the key allows. */
export interface KeyHolder extends LiveSession {
  key: { id: string; scope: KeyScope; requestsPerMinute: number | null }
}

interface HolderRow extends Record<string, unknown> {
  key_id: string
  expires_at: string
  scope: KeyScope
  requests_per_minute: number | null
  user_id: string
  user_name: string
  user_email: string
  group_id: string
  group_name: string
  baseline_revision_id: string | null
  role: Role
}

/** The holder of the key whose secret has this hash, its use noted; null when there is none in force. */
export async function useKey(db: Database, secretHash: string): Promise<KeyHolder | null> {
  const { rows } = await db.execute<HolderRow>(sql`select * from use_api_key(${secretHash})`)
  const [row] = rows
  if (row === undefined) return null
  return {
    id: row.key_id,
    expiresAt: new Date(row.expires_at),
    user: { id: row.user_id, name: row.user_name, email: row.user_email },
    group: { id: row.group_id, name: row.group_name, baselineRevisionId: row.baseline_revision_id },
    role: row.role,
    key: { id: row.key_id, scope: row.scope, requestsPerMinute: row.requests_per_minute },
  }
}
