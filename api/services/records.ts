import { digestOf } from '#core/wire/index'
import type { CandidateInput, HistoryInput } from '#core/wire/index'
import { withGroup } from '#db/database'
import type { Database, GroupTransaction } from '#db/database'
import { candidateQueries } from '#db/queries/candidates'
import { historyQueries } from '#db/queries/histories'
import type { RecordQueries } from '#db/queries/records'
import type { RevisionDraft, StoredRecord, StoredRevision, StoredSummary } from '#db/queries/storedRecord'
import { ProblemError, notFound } from '../errors/problemError.ts'
import type { Caller } from '../middleware/caller.ts'
import { audit } from './audit.ts'
import { pageAnswer, pageRequest } from './cursor.ts'

const writeRevision = <Input>(revision: StoredRevision<Input>) => ({
  ...revision,
  createdAt: revision.createdAt.toISOString(),
})

const writeSummary = <Input>({
  id,
  name,
  createdAt,
  updatedAt,
  revisionCount,
  head,
}: StoredSummary<Input>) => ({
  id,
  name,
  createdAt: createdAt.toISOString(),
  updatedAt: updatedAt.toISOString(),
  revisionCount,
  head: writeRevision(head),
})

const writeRecord = <Input>(record: StoredRecord<Input>) => ({
  ...writeSummary(record),
  revisions: record.revisions.map((revision) => writeRevision(revision)),
})

interface Content<Input> {
  note: string
  input: Input
}

/** Histories and candidates differ in their input alone: this is what a group does with either. */
function recordService<Input>(db: Database, noun: 'history' | 'candidate', queries: RecordQueries<Input>) {
  const draftOf = (caller: Caller, { note, input }: Content<Input>): RevisionDraft<Input> => ({
    groupId: caller.group.id,
    authorId: caller.user.id,
    note,
    digest: digestOf(input),
    input,
  })

  const readIn = async (tx: GroupTransaction, id: string) => {
    const record = await queries.find(tx, id)
    if (record === null) throw notFound(noun)
    return writeRecord(record)
  }

  return {
    async list(caller: Caller, query: { limit: number; cursor?: string | undefined }) {
      const request = pageRequest(query)
      const page = await withGroup(db, caller.group.id, (tx) => queries.list(tx, request))
      return pageAnswer(page, (row) => writeSummary(row))
    },

    read: (caller: Caller, id: string) => withGroup(db, caller.group.id, (tx) => readIn(tx, id)),

    create: (caller: Caller, request: Content<Input> & { name: string }) =>
      withGroup(db, caller.group.id, async (tx) => {
        const { recordId } = await queries.create(tx, request.name, draftOf(caller, request))
        await audit(tx, caller, `${noun}.create`, recordId, { name: request.name })
        return readIn(tx, recordId)
      }),

    revise: (caller: Caller, id: string, request: Content<Input> & { parentId: string }) =>
      withGroup(db, caller.group.id, async (tx) => {
        const appended = await queries.append(tx, id, request.parentId, draftOf(caller, request))
        if (appended.outcome === 'no-such-record') throw notFound(noun)
        if (appended.outcome === 'stale-parent') throw staleParent(noun, appended.newest)
        const record = await readIn(tx, id)
        await audit(tx, caller, `${noun}.revise`, id, {
          name: record.name,
          revision: record.head.number,
        })
        return record
      }),
  }
}

function staleParent(noun: string, newest: { id: string; number: number }): ProblemError {
  return new ProblemError(
    'stale-parent',
    `Revision ${newest.number} (${newest.id}) is now the newest of this ${noun}. Nothing was saved and what you typed is still yours: look at that revision, then save on top of it.`,
  )
}

export const historyService = (db: Database) => recordService<HistoryInput>(db, 'history', historyQueries)
export const candidateService = (db: Database) =>
  recordService<CandidateInput>(db, 'candidate', candidateQueries)
