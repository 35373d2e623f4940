import { sql } from 'drizzle-orm'
import { check, foreignKey, index, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, moment, primaryId } from './columns.ts'
import { memberships } from './memberships.ts'

/** What a guest may be shown: one evaluation, or one revision of a history. */
export const guestLinkKind = pgEnum('guest_link_kind', ['evaluation', 'history-revision'])

/** A way in for someone outside the group, to one thing. Only the SHA-256 of its token is kept. */
export const guestLinks = pgTable(
  'guest_links',
  {
    id: primaryId(),
    groupId: uuid('group_id').notNull(),
    kind: guestLinkKind('kind').notNull(),
    /** The evaluation, or the history's revision. */
    subjectId: uuid('subject_id').notNull(),
    note: text('note').notNull(),
    tokenHash: text('token_hash').notNull().unique('guest_links_token_hash_unique'),
    createdBy: uuid('created_by').notNull(),
    createdAt: createdAt(),
    /** Never, when null. */
    expiresAt: moment('expires_at'),
    lastUsedAt: moment('last_used_at'),
    revokedAt: moment('revoked_at'),
  },
  (t) => [
    foreignKey({
      name: 'guest_links_member_fk',
      columns: [t.groupId, t.createdBy],
      foreignColumns: [memberships.groupId, memberships.userId],
    }),
    index('guest_links_newest_first').on(t.groupId, t.createdAt, t.id),
    index('guest_links_of_subject').on(t.groupId, t.subjectId),
    check('guest_links_token_sha256', sql`${t.tokenHash} ~ '^[0-9a-f]{64}$'`),
  ],
)
