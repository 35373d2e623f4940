import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { freshDatabase } from '../support/database.ts'
import { makeGroup } from './support/groups.ts'
import type { TestGroup } from './support/groups.ts'
import { connectOwner } from './support/owner.ts'
import { saveOneOfEach } from './support/records.ts'

let database: Awaited<ReturnType<typeof freshDatabase>>
let owner: pg.Client
let server: pg.Client
let group: TestGroup
let saved: Awaited<ReturnType<typeof saveOneOfEach>>
beforeAll(async () => {
  database = await freshDatabase()
  owner = await connectOwner(database.ownerUrl)
  group = await makeGroup(owner, 'Stone')
  saved = await saveOneOfEach(database.serverUrl, group)
  server = new pg.Client({ connectionString: database.serverUrl })
  await server.connect()
  await server.query("select set_config('emberline.group_id', $1, false)", [group.id])
})
afterAll(async () => {
  await server.end()
  await owner.end()
  await database.drop()
})

describe.each([
  ['history_revisions', 'note'],
  ['candidate_revisions', 'note'],
  ['evaluations', 'core_version'],
  ['audit_entries', 'action'],
])('a row of %s', (table, column) => {
  const attempts = [
    `update ${table} set ${column} = 'rewritten'`,
    `delete from ${table}`,
    `truncate ${table} cascade`,
    `insert into ${table} select * from ${table} on conflict (id) do update set ${column} = 'rewritten'`,
  ]
  const content = async () => (await owner.query(`select * from ${table}`)).rows

  it.each(attempts)('stays as written when the server’s role tries: %s', async (sql) => {
    const before = await content()
    await expect(server.query(sql)).rejects.toThrow('permission denied')
    expect(await content()).toEqual(before)
    expect(before).toHaveLength(1)
  })

  it.each(attempts)('stays as written when the owner tries: %s', async (sql) => {
    const before = await content()
    await expect(owner.query(sql)).rejects.toThrow('is written once')
    expect(await content()).toEqual(before)
  })

  it('stays as written even where row-level security hides it from the owner', async () => {
    const plainOwner = new pg.Client({ connectionString: database.ownerUrl })
    await plainOwner.connect()
    await expect(plainOwner.query(`delete from ${table}`)).rejects.toThrow('is written once')
    await plainOwner.end()
  })
})

describe('a revision', () => {
  const insert = (values: { recordId: string; number: number; parentId: string | null }) =>
    server.query(
      `insert into history_revisions (group_id, history_id, number, parent_id, author_id, note, digest, input)
       values ($1, $2, $3, $4, $5, '', repeat('0', 64), '{}')`,
      [group.id, values.recordId, values.number, values.parentId, group.lead.id],
    )

  it('takes a number its record has not given yet', async () => {
    const { recordId, revisionId } = saved.history
    await insert({ recordId, number: 2, parentId: revisionId })
    await expect(insert({ recordId, number: 2, parentId: revisionId })).rejects.toThrow(
      'history_revisions_number_unique',
    )
  })

  it('descends from a revision of the same record only', async () => {
    const other = await saveOneOfEach(database.serverUrl, group)
    const { recordId } = saved.history
    await expect(insert({ recordId, number: 3, parentId: other.history.revisionId })).rejects.toThrow(
      'history_revisions_parent_fk',
    )
  })

  it('has a parent unless it is the first', async () => {
    const { recordId } = saved.history
    await expect(insert({ recordId, number: 4, parentId: null })).rejects.toThrow(
      'history_revisions_first_has_no_parent',
    )
  })

  it('must exist for a record to call it its newest', async () => {
    await expect(
      server.query('update histories set latest_number = 99 where id = $1', [saved.history.recordId]),
    ).rejects.toThrow('histories_latest_revision_fk')
  })

  it('carries a SHA-256 in hexadecimal as its digest', async () => {
    const { recordId, revisionId } = saved.history
    await expect(
      server.query(
        `insert into history_revisions (group_id, history_id, number, parent_id, author_id, note, digest, input)
         values ($1, $2, 5, $3, $4, '', 'short', '{}')`,
        [group.id, recordId, revisionId, group.lead.id],
      ),
    ).rejects.toThrow('history_revisions_digest_sha256')
  })
})
