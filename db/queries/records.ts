import { and, desc, eq, sql } from 'drizzle-orm'
import type { GroupTransaction } from '../database.ts'
import type { RecordTable } from '../schema/recordTable.ts'
import type { RevisionTable } from '../schema/revisionTable.ts'
import { users } from '../schema/users.ts'
import { cutPage, newestFirst, older } from './page.ts'
import type { Page, PageRequest } from './page.ts'
import type {
  Appended,
  RevisionContent,
  RevisionDraft,
  StoredRecord,
  StoredRevision,
  StoredSummary,
} from './storedRecord.ts'

/** The two tables behind histories, or behind candidates. */
interface RecordTables {
  records: RecordTable
  revisions: RevisionTable
}

const revisionColumns = (revisions: RevisionTable) => ({
  id: revisions.id,
  number: revisions.number,
  parentId: revisions.parentId,
  authorId: users.id,
  authorName: users.name,
  createdAt: revisions.createdAt,
  note: revisions.note,
  digest: revisions.digest,
  input: revisions.input,
})

type RevisionRow = Omit<StoredRevision<unknown>, 'author'> & { authorId: string; authorName: string }

/** The one place where a stored input is given its type: nothing is stored that its schema has not parsed. */
function toRevision<Input>({ authorId, authorName, ...row }: RevisionRow): StoredRevision<Input> {
  return { ...row, author: { id: authorId, name: authorName }, input: row.input as Input }
}

function selectSummaries({ records, revisions }: RecordTables, tx: GroupTransaction) {
  const isHead = and(eq(revisions.recordId, records.id), eq(revisions.number, records.latestNumber))
  return tx
    .select({
      id: records.id,
      name: records.name,
      createdAt: records.createdAt,
      updatedAt: records.updatedAt,
      revisionCount: records.latestNumber,
      head: revisionColumns(revisions),
    })
    .from(records)
    .innerJoin(revisions, isHead)
    .innerJoin(users, eq(users.id, revisions.authorId))
}

async function insertRevision(
  { revisions }: RecordTables,
  tx: GroupTransaction,
  at: { recordId: string; number: number; parentId: string | null },
  draft: RevisionDraft<unknown>,
): Promise<string> {
  const [row] = await tx
    .insert(revisions)
    .values({ ...draft, ...at })
    .returning({ id: revisions.id })
  if (row === undefined) throw new Error('an insert that raised nothing returned nothing')
  return row.id
}

/** Reads and writes of records with revisions, the same for histories and for candidates. */
export function recordQueries<Input>(tables: RecordTables) {
  const { records, revisions } = tables

  const revisionsOf = async (tx: GroupTransaction, recordId: string): Promise<StoredRevision<Input>[]> => {
    const rows = await tx
      .select(revisionColumns(revisions))
      .from(revisions)
      .innerJoin(users, eq(users.id, revisions.authorId))
      .where(eq(revisions.recordId, recordId))
      .orderBy(desc(revisions.number))
    return rows.map((row) => toRevision<Input>(row))
  }

  return {
    async list(tx: GroupTransaction, page: PageRequest): Promise<Page<StoredSummary<Input>>> {
      const rows = await selectSummaries(tables, tx)
        .where(older(records, page.after))
        .orderBy(...newestFirst(records))
        .limit(page.limit + 1)
      return cutPage(
        rows.map((row) => ({ ...row, head: toRevision<Input>(row.head) })),
        page.limit,
      )
    },

    async find(tx: GroupTransaction, recordId: string): Promise<StoredRecord<Input> | null> {
      const [row] = await selectSummaries(tables, tx).where(eq(records.id, recordId))
      if (row === undefined) return null
      return {
        ...row,
        head: toRevision<Input>(row.head),
        revisions: await revisionsOf(tx, recordId),
      }
    },

    async findRevision(tx: GroupTransaction, revisionId: string): Promise<RevisionContent<Input> | null> {
      const [row] = await tx
        .select({ id: revisions.id, recordId: revisions.recordId, input: revisions.input })
        .from(revisions)
        .where(eq(revisions.id, revisionId))
      return row === undefined ? null : { ...row, input: row.input as Input }
    },

    /** Makes a record with its first revision. */
    async create(
      tx: GroupTransaction,
      name: string,
      first: RevisionDraft<Input>,
    ): Promise<{ recordId: string; revisionId: string }> {
      const { groupId, createdAt } = first
      const [record] = await tx
        .insert(records)
        .values({ groupId, name, latestNumber: 1, createdAt, updatedAt: createdAt })
        .returning({ id: records.id })
      if (record === undefined) throw new Error('an insert that raised nothing returned nothing')
      const recordId = record.id
      const revisionId = await insertRevision(tables, tx, { recordId, number: 1, parentId: null }, first)
      return { recordId, revisionId }
    },

    /**
     * Adds the next revision, made from `parentId`, if that is still the newest. The record's row is locked
     * first, so that two who save at once get two numbers or one of them the news that the parent is stale.
     */
    async append(
      tx: GroupTransaction,
      recordId: string,
      parentId: string,
      draft: RevisionDraft<Input>,
    ): Promise<Appended> {
      const [record] = await tx
        .select({ latestNumber: records.latestNumber })
        .from(records)
        .where(eq(records.id, recordId))
        .for('update')
      if (record === undefined) return { outcome: 'no-such-record' }
      const [newest] = await tx
        .select({ id: revisions.id, number: revisions.number })
        .from(revisions)
        .where(and(eq(revisions.recordId, recordId), eq(revisions.number, record.latestNumber)))
      if (newest === undefined) throw new Error(`record ${recordId} has lost its newest revision`)
      if (newest.id !== parentId) return { outcome: 'stale-parent', newest }
      const number = newest.number + 1
      const revisionId = await insertRevision(tables, tx, { recordId, number, parentId }, draft)
      await tx
        .update(records)
        .set({ latestNumber: number, updatedAt: draft.createdAt ?? sql`now()` })
        .where(eq(records.id, recordId))
      return { outcome: 'appended', revisionId }
    },
  }
}

export type RecordQueries<Input> = ReturnType<typeof recordQueries<Input>>
