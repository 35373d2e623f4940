import type { AbundanceResult } from '#core/wire/index'
import { sql } from 'drizzle-orm'
import { check, doublePrecision, foreignKey, index, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { candidateRevisions } from './candidateRevisions.ts'
import { createdAt, primaryId } from './columns.ts'
import { historyRevisions } from './historyRevisions.ts'
import { memberships } from './memberships.ts'

/** What one version of the core made of one history revision and one candidate revision. */
export const evaluations = pgTable(
  'evaluations',
  {
    id: primaryId(),
    groupId: uuid('group_id').notNull(),
    historyId: uuid('history_id').notNull(),
    historyRevisionId: uuid('history_revision_id').notNull(),
    candidateId: uuid('candidate_id').notNull(),
    candidateRevisionId: uuid('candidate_revision_id').notNull(),
    authorId: uuid('author_id').notNull(),
    createdAt: createdAt(),
    coreVersion: text('core_version').notNull(),
    inputDigest: text('input_digest').notNull(),
    omegaH2: doublePrecision('omega_h2').notNull(),
    result: jsonb('result').$type<AbundanceResult>().notNull(),
  },
  (t) => [
    foreignKey({
      name: 'evaluations_history_revision_fk',
      columns: [t.groupId, t.historyId, t.historyRevisionId],
      foreignColumns: [historyRevisions.groupId, historyRevisions.recordId, historyRevisions.id],
    }),
    foreignKey({
      name: 'evaluations_candidate_revision_fk',
      columns: [t.groupId, t.candidateId, t.candidateRevisionId],
      foreignColumns: [candidateRevisions.groupId, candidateRevisions.recordId, candidateRevisions.id],
    }),
    foreignKey({
      name: 'evaluations_author_fk',
      columns: [t.groupId, t.authorId],
      foreignColumns: [memberships.groupId, memberships.userId],
    }),
    index('evaluations_newest_first').on(t.groupId, t.createdAt, t.id),
    index('evaluations_of_history').on(t.groupId, t.historyId, t.createdAt, t.id),
    index('evaluations_of_candidate').on(t.groupId, t.candidateId, t.createdAt, t.id),
    check('evaluations_digest_sha256', sql`${t.inputDigest} ~ '^[0-9a-f]{64}$'`),
  ],
)
