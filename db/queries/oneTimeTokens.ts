import { and, eq, gt, isNull, sql } from 'drizzle-orm'
import type { Database, GroupTransaction } from '../database.ts'
import { oneTimeTokens } from '../schema/oneTimeTokens.ts'

/** What a token sent to a person allows. */
export type PersonalPurpose = 'verify-email' | 'change-email' | 'reset-password'
export type TokenPurpose = PersonalPurpose | 'first-group'

export interface NewToken {
  id: string
  secretHash: string
  purpose: PersonalPurpose
  userId: string
  email: string
  expiresAt: Date
}

export interface LiveToken {
  purpose: TokenPurpose
  userId: string | null
  email: string | null
  secretHash: string
}

/** Keeps a token of the person the transaction names. */
export async function insertToken(tx: GroupTransaction, token: NewToken): Promise<void> {
  await tx.insert(oneTimeTokens).values(token)
}

/** The token of this id, neither used nor expired; whoever asks has still to show the secret. */
export async function findToken(db: Database, id: string): Promise<LiveToken | null> {
  const { rows } = await db.execute<{
    purpose: TokenPurpose
    user_id: string | null
    email: string | null
    secret_hash: string
  }>(sql`select purpose, user_id, email, secret_hash from live_token(${id})`)
  const [row] = rows
  return row === undefined
    ? null
    : { purpose: row.purpose, userId: row.user_id, email: row.email, secretHash: row.secret_hash }
}

const unused = () => and(isNull(oneTimeTokens.usedAt), gt(oneTimeTokens.expiresAt, sql`now()`))

/** Uses the person's token up; false when it was used meanwhile. */
export async function useToken(tx: GroupTransaction, id: string): Promise<boolean> {
  const used = await tx
    .update(oneTimeTokens)
    .set({ usedAt: new Date() })
    .where(and(eq(oneTimeTokens.id, id), unused()))
    .returning({ id: oneTimeTokens.id })
  return used.length > 0
}

/** Uses up all the person's tokens for a purpose, as when a newer one replaces them. */
export async function withdrawTokens(tx: GroupTransaction, purpose: PersonalPurpose): Promise<void> {
  await tx
    .update(oneTimeTokens)
    .set({ usedAt: new Date() })
    .where(and(eq(oneTimeTokens.purpose, purpose), unused()))
}
