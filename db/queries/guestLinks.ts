import type { GuestLinkKind } from '#core/wire/index'
import { and, desc, eq, isNull, sql } from 'drizzle-orm'
import type { Database, GroupTransaction } from '../database.ts'
import { guestLinks } from '../schema/guestLinks.ts'
import { users } from '../schema/users.ts'

export interface StoredGuestLink {
  id: string
  kind: GuestLinkKind
  subjectId: string
  note: string
  createdBy: { id: string; name: string }
  createdAt: Date
  expiresAt: Date | null
  lastUsedAt: Date | null
  revokedAt: Date | null
}

export interface GuestLinkDraft {
  groupId: string
  kind: GuestLinkKind
  subjectId: string
  note: string
  /** SHA-256 of the token, hexadecimal. */
  tokenHash: string
  createdBy: string
  expiresAt: Date | null
}

const select = (tx: GroupTransaction) =>
  tx
    .select({
      id: guestLinks.id,
      kind: guestLinks.kind,
      subjectId: guestLinks.subjectId,
      note: guestLinks.note,
      createdBy: { id: users.id, name: users.name },
      createdAt: guestLinks.createdAt,
      expiresAt: guestLinks.expiresAt,
      lastUsedAt: guestLinks.lastUsedAt,
      revokedAt: guestLinks.revokedAt,
    })
    .from(guestLinks)
    .innerJoin(users, eq(users.id, guestLinks.createdBy))

/** The group's links, newest first; those to one thing when named. */
export const listGuestLinks = (tx: GroupTransaction, subjectId: string | null): Promise<StoredGuestLink[]> =>
  select(tx)
    .where(subjectId === null ? undefined : eq(guestLinks.subjectId, subjectId))
    .orderBy(desc(guestLinks.createdAt), desc(guestLinks.id))

export async function findGuestLink(tx: GroupTransaction, id: string): Promise<StoredGuestLink | null> {
  const [row] = await select(tx).where(eq(guestLinks.id, id))
  return row ?? null
}

export async function insertGuestLink(tx: GroupTransaction, draft: GuestLinkDraft): Promise<string> {
  const [row] = await tx.insert(guestLinks).values(draft).returning({ id: guestLinks.id })
  if (row === undefined) throw new Error('an insert that raised nothing returned nothing')
  return row.id
}

/** Ends a link at once; one that has ended keeps its first end. */
export async function revokeGuestLink(tx: GroupTransaction, id: string): Promise<void> {
  await tx
    .update(guestLinks)
    .set({ revokedAt: new Date() })
    .where(and(eq(guestLinks.id, id), isNull(guestLinks.revokedAt)))
}

/** What a token opens. */
export interface OpenedLink {
  linkId: string
  group: { id: string; name: string }
  kind: GuestLinkKind
  subjectId: string
  expiresAt: Date | null
}

interface OpenedRow extends Record<string, unknown> {
  link_id: string
  group_id: string
  group_name: string
  kind: GuestLinkKind
  subject_id: string
  expires_at: string | null
}

/** What the link whose token has this hash opens, its use noted; null when there is none in force. */
export async function useGuestLink(db: Database, tokenHash: string): Promise<OpenedLink | null> {
  const { rows } = await db.execute<OpenedRow>(sql`select * from use_guest_link(${tokenHash})`)
  const [row] = rows
  if (row === undefined) return null
  return {
    linkId: row.link_id,
    group: { id: row.group_id, name: row.group_name },
    kind: row.kind,
    subjectId: row.subject_id,
    expiresAt: row.expires_at === null ? null : new Date(row.expires_at),
  }
}
