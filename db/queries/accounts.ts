import { eq, sql } from 'drizzle-orm'
import type { Database, GroupTransaction } from '../database.ts'
import { users } from '../schema/users.ts'

export interface SignInAccount {
  userId: string
  /** Null when the person is in no group at present. */
  groupId: string | null
  passwordHash: string | null
}

/** The account of an e-mail address with the group used last; null for an unknown address. */
export async function findAccount(db: Database, email: string): Promise<SignInAccount | null> {
  const { rows } = await db.execute<{
    user_id: string
    password_hash: string | null
    group_id: string | null
  }>(sql`select user_id, password_hash, group_id from account_for_sign_in(${email})`)
  const [row] = rows
  return row === undefined
    ? null
    : { userId: row.user_id, groupId: row.group_id, passwordHash: row.password_hash }
}

export interface OwnAccount {
  id: string
  name: string
  email: string
  emailVerifiedAt: Date | null
  createdAt: Date
}

const own = (id: string) => eq(users.id, id)

/** The account of the person the transaction names. */
export async function readAccount(tx: GroupTransaction, id: string): Promise<OwnAccount> {
  const { name, email, emailVerifiedAt, createdAt } = users
  const [row] = await tx
    .select({ id: users.id, name, email, emailVerifiedAt, createdAt })
    .from(users)
    .where(own(id))
  if (row === undefined) throw new Error('a person signed in has no account')
  return row
}

/** The password's hash of the person the transaction names; null when they have none. */
export async function ownPasswordHash(tx: GroupTransaction): Promise<string | null> {
  const { rows } = await tx.execute<{ hash: string | null }>(sql`select own_password_hash() as hash`)
  return rows[0]?.hash ?? null
}

export type AccountChange = Partial<{
  name: string
  email: string
  emailVerifiedAt: Date
  passwordHash: string
}>

export async function changeAccount(tx: GroupTransaction, id: string, change: AccountChange): Promise<void> {
  await tx.update(users).set(change).where(own(id))
}

/** Whether an error says that another account has this address. */
export function saysEmailTaken(error: unknown): boolean {
  const cause = error instanceof Error ? (error.cause as { constraint?: string } | undefined) : undefined
  return cause?.constraint === 'users_email_unique'
}
