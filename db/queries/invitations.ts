import type { Role } from '#core/wire/index'
import { and, eq, gt, isNull, sql } from 'drizzle-orm'
import type { Database, GroupTransaction } from '../database.ts'
import { invitations } from '../schema/invitations.ts'
import { users } from '../schema/users.ts'
import { cutPage, newestFirst, older } from './page.ts'
import type { Page, PageRequest } from './page.ts'

export interface StoredInvitation {
  id: string
  email: string
  role: Role
  inviter: { id: string; name: string }
  createdAt: Date
  expiresAt: Date
  withdrawnAt: Date | null
  acceptedAt: Date | null
}

const COLUMNS = {
  id: invitations.id,
  email: invitations.email,
  role: invitations.role,
  inviter: { id: users.id, name: users.name },
  createdAt: invitations.createdAt,
  expiresAt: invitations.expiresAt,
  withdrawnAt: invitations.withdrawnAt,
  acceptedAt: invitations.acceptedAt,
}

const selectFrom = (tx: GroupTransaction) =>
  tx.select(COLUMNS).from(invitations).innerJoin(users, eq(users.id, invitations.invitedBy))

export async function listInvitations(
  tx: GroupTransaction,
  { limit, after }: PageRequest,
): Promise<Page<StoredInvitation>> {
  const rows = await selectFrom(tx)
    .where(older(invitations, after))
    .orderBy(...newestFirst(invitations))
    .limit(limit + 1)
  return cutPage(rows, limit)
}

export interface NewInvitation {
  id: string
  groupId: string
  email: string
  role: Role
  invitedBy: string
  secretHash: string
  expiresAt: Date
}

export async function insertInvitation(
  tx: GroupTransaction,
  invitation: NewInvitation,
): Promise<StoredInvitation> {
  await tx.insert(invitations).values(invitation)
  const [row] = await selectFrom(tx).where(eq(invitations.id, invitation.id))
  if (row === undefined) throw new Error('an invitation just made is not there')
  return row
}

const open = () =>
  and(isNull(invitations.acceptedAt), isNull(invitations.withdrawnAt), gt(invitations.expiresAt, sql`now()`))

/** Withdraws an open invitation of the group; false when there is none of this id. */
export async function withdrawInvitation(tx: GroupTransaction, id: string): Promise<boolean> {
  const withdrawn = await tx
    .update(invitations)
    .set({ withdrawnAt: new Date() })
    .where(and(eq(invitations.id, id), open()))
    .returning({ id: invitations.id })
  return withdrawn.length > 0
}

/** Withdraws the group's open invitations of an address, which a new one replaces. */
export async function withdrawInvitationsOf(tx: GroupTransaction, email: string): Promise<void> {
  await tx
    .update(invitations)
    .set({ withdrawnAt: new Date() })
    .where(and(eq(invitations.email, email), open()))
}

export interface LiveInvitation {
  email: string
  role: Role
  secretHash: string
  groupName: string
  inviterName: string
  account: { id: string; passwordHash: string | null } | null
}

/** The open invitation of this id; whoever asks has still to show the secret. */
export async function findInvitation(db: Database, id: string): Promise<LiveInvitation | null> {
  const { rows } = await db.execute<{
    email: string
    role: Role
    secret_hash: string
    group_name: string
    inviter_name: string
    account_id: string | null
    password_hash: string | null
  }>(sql`select * from live_invitation(${id})`)
  const [row] = rows
  if (row === undefined) return null
  return {
    email: row.email,
    role: row.role,
    secretHash: row.secret_hash,
    groupName: row.group_name,
    inviterName: row.inviter_name,
    account: row.account_id === null ? null : { id: row.account_id, passwordHash: row.password_hash },
  }
}

export interface Acceptance {
  invitationId: string
  /** Whose password was checked; null for a new account. */
  accountId: string | null
  name: string | null
  passwordHash: string | null
}

/** Makes account and membership; null when the invitation is no longer open, or an account was made meanwhile. */
export async function acceptInvitation(
  db: Database,
  { invitationId, accountId, name, passwordHash }: Acceptance,
): Promise<{ userId: string; groupId: string } | null> {
  const { rows } = await db.execute<{ user_id: string; group_id: string }>(
    sql`select user_id, group_id from accept_invitation(${invitationId}, ${accountId}, ${name}, ${passwordHash})`,
  )
  const [row] = rows
  return row === undefined ? null : { userId: row.user_id, groupId: row.group_id }
}
