import { digestOf } from '#core/wire/index'
import { connect, withGroup } from '#db/database'
import type { DatabaseConnection } from '#db/database'
import { historyQueries } from '#db/queries/histories'
import type { Appended } from '#db/queries/storedRecord'
import type pg from 'pg'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { freshDatabase } from '../support/database.ts'
import { makeGroup } from './support/groups.ts'
import type { TestGroup } from './support/groups.ts'
import { connectOwner } from './support/owner.ts'
import { history, saveOneOfEach } from './support/records.ts'

let database: Awaited<ReturnType<typeof freshDatabase>>
let owner: pg.Client
let connection: DatabaseConnection
let group: TestGroup
beforeAll(async () => {
  database = await freshDatabase()
  owner = await connectOwner(database.ownerUrl)
  connection = connect(database.serverUrl, () => undefined)
  group = await makeGroup(owner, 'Count')
})
afterAll(async () => {
  await connection.close()
  await owner.end()
  await database.drop()
})

const append = (recordId: string, parentId: string): Promise<Appended> =>
  withGroup(connection.db, group.id, (tx) =>
    historyQueries.append(tx, recordId, parentId, {
      groupId: group.id,
      authorId: group.author.id,
      note: '',
      digest: digestOf(history),
      input: history,
    }),
  )

/** Saves until it is not beaten to it, each time on top of the revision that beat it. */
async function appendStubbornly(recordId: string, parentId: string): Promise<void> {
  const outcome = await append(recordId, parentId)
  if (outcome.outcome === 'stale-parent') await appendStubbornly(recordId, outcome.newest.id)
}

it('numbers without gap or double, however many save at once', async () => {
  const saved = await saveOneOfEach(database.serverUrl, group)
  const { recordId, revisionId } = saved.history
  await Promise.all(Array.from({ length: 8 }, () => appendStubbornly(recordId, revisionId)))
  const { rows } = await owner.query<{ number: number; parent: number | null }>(
    `select r.number, p.number as parent from history_revisions r left join history_revisions p on p.id = r.parent_id
     where r.history_id = $1 order by r.number`,
    [recordId],
  )
  expect(rows).toEqual(
    Array.from({ length: 9 }, (_, index) => ({ number: index + 1, parent: index === 0 ? null : index })),
  )
})

it('says so for a record that is not there', async () => {
  const nowhere = '00000000-0000-4000-8000-000000000000'
  expect(await append(nowhere, nowhere)).toEqual({ outcome: 'no-such-record' })
})

it('a transaction’s group does not stay with its connection', async () => {
  const single = connect(`${database.serverUrl}`, () => undefined)
  await saveOneOfEach(database.serverUrl, group)
  const inside = await withGroup(single.db, group.id, (tx) =>
    historyQueries.list(tx, { limit: 5, after: null }),
  )
  const outside = await single.db.transaction((tx) => historyQueries.list(tx, { limit: 5, after: null }))
  await single.close()
  expect(inside.rows.length).toBeGreaterThan(0)
  expect(outside.rows).toEqual([])
})
