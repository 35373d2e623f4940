import { digestOf } from '#core/wire/index'
import type { RecordQueries } from '../queries/records.ts'
import type { RevisionContent, RevisionDraft } from '../queries/storedRecord.ts'
import type { DemoRecord } from './demoData.ts'
import type { SeedScope } from './seedGroup.ts'

/** The revisions just written, by the record's name and their number. */
export interface SeededRevisions<Input> {
  get(name: string, number: number): RevisionContent<Input>
}

/** Writes records with their revisions, oldest first, through the same queries as the API. */
export async function seedRecords<Input>(
  scope: SeedScope,
  queries: RecordQueries<Input>,
  records: DemoRecord<Input>[],
): Promise<SeededRevisions<Input>> {
  const written = new Map<string, RevisionContent<Input>>()
  for (const record of records) {
    for (const [number, revision] of (await seedRecord(scope, queries, record)).entries()) {
      written.set(`${record.name} ${number + 1}`, revision)
    }
  }
  return {
    get(name, number) {
      const revision = written.get(`${name} ${number}`)
      if (revision === undefined) throw new Error(`data-demo has no revision ${number} of “${name}”`)
      return revision
    },
  }
}

async function seedRecord<Input>(
  { tx, groupId, idOfPerson }: SeedScope,
  queries: RecordQueries<Input>,
  record: DemoRecord<Input>,
): Promise<RevisionContent<Input>[]> {
  const [first, ...later] = record.revisions.map(({ author, at, note, input }): RevisionDraft<Input> => ({
    groupId,
    authorId: idOfPerson(author),
    note,
    digest: digestOf(input),
    input,
    createdAt: new Date(at),
  }))
  if (first === undefined) throw new Error(`“${record.name}” has no revision`)
  const created = await queries.create(tx, record.name, first)
  const revisions = [{ id: created.revisionId, recordId: created.recordId, input: first.input }]
  for (const draft of later) {
    const parentId = revisions.at(-1)?.id ?? created.revisionId
    const appended = await queries.append(tx, created.recordId, parentId, draft)
    if (appended.outcome !== 'appended') throw new Error(`“${record.name}”: ${appended.outcome}`)
    revisions.push({ id: appended.revisionId, recordId: created.recordId, input: draft.input })
  }
  return revisions
}
