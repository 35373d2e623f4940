import pg from 'pg'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { freshDatabase } from '../support/database.ts'
import { makeGroup } from './support/groups.ts'
import type { TestGroup } from './support/groups.ts'
import { connectOwner } from './support/owner.ts'
import { saveOneOfEach } from './support/records.ts'

let database: Awaited<ReturnType<typeof freshDatabase>>
let owner: pg.Client
let server: pg.Client
let ours: TestGroup
let theirs: TestGroup
let theirSaved: Awaited<ReturnType<typeof saveOneOfEach>>
beforeAll(async () => {
  database = await freshDatabase()
  owner = await connectOwner(database.ownerUrl)
  server = new pg.Client({ connectionString: database.serverUrl })
  await server.connect()
  ours = await makeGroup(owner, 'Ours')
  theirs = await makeGroup(owner, 'Theirs')
  await saveOneOfEach(database.serverUrl, ours)
  theirSaved = await saveOneOfEach(database.serverUrl, theirs)
  await owner.query(
    "insert into sessions (group_id, user_id, expires_at) values ($1, $2, now() + interval '1 day'), ($3, $4, now() + interval '1 day')",
    [ours.id, ours.lead.id, theirs.id, theirs.lead.id],
  )
})
beforeEach(() => server.query('reset all'))
afterAll(async () => {
  await server.end()
  await owner.end()
  await database.drop()
})

const setGroup = (client: pg.Client, id: string) =>
  client.query("select set_config('emberline.group_id', $1, false)", [id])

const TABLES: [table: string, group: string, columns: string, each: number][] = [
  ['groups', 'id', '*', 1],
  ['memberships', 'group_id', '*', 3],
  ['invitations', 'group_id', 'id, group_id, email', 1],
  ['histories', 'group_id', '*', 1],
  ['history_revisions', 'group_id', '*', 1],
  ['candidates', 'group_id', '*', 1],
  ['candidate_revisions', 'group_id', '*', 1],
  ['evaluations', 'group_id', '*', 1],
  ['api_keys', 'group_id', 'id, user_id, name', 1],
  ['guest_links', 'group_id', 'id, created_by, subject_id', 1],
  ['audit_entries', 'group_id', '*', 1],
  ['users', 'id', 'id, name, email', 3],
]

describe.each(TABLES)(
  'the table %s, asked in plain SQL by the server’s role',
  (table, _group, columns, each) => {
    const read = () => server.query<Record<string, string>>(`select ${columns} from ${table}`)

    it('shows nothing while no group is set', async () => {
      expect((await read()).rows).toEqual([])
    })

    it('shows one group’s rows and never the other’s', async () => {
      await setGroup(server, ours.id)
      const mine = (await read()).rows
      await setGroup(server, theirs.id)
      const others = (await read()).rows
      expect(mine).toHaveLength(each)
      expect(others).toHaveLength(each)
      const key = (row: Record<string, string>) => JSON.stringify(row)
      expect(mine.map(key).filter((row) => others.map(key).includes(row))).toEqual([])
    })

    it('shows nothing for a group that does not exist', async () => {
      await setGroup(server, '00000000-0000-4000-8000-000000000000')
      expect((await read()).rows).toEqual([])
    })

    it('shows nothing more for the setting that is the owner’s', async () => {
      await server.query("select set_config('emberline.across_groups', 'on', false)")
      expect((await read()).rows).toEqual([])
    })

    it('shows its owner nothing either, without a group or that setting', async () => {
      const plainOwner = new pg.Client({ connectionString: database.ownerUrl })
      await plainOwner.connect()
      const { rows } = await plainOwner.query(`select 1 from ${table}`)
      await plainOwner.end()
      expect(rows).toEqual([])
    })
  },
)

describe('writing into another group', () => {
  it('is refused: a row must carry the group that is set', async () => {
    await setGroup(server, ours.id)
    await expect(
      server.query("insert into histories (group_id, name, latest_number) values ($1, 'planted', 1)", [
        theirs.id,
      ]),
    ).rejects.toThrow('row-level security')
  })

  it('changes nothing: rows of another group are not there to update', async () => {
    await setGroup(server, ours.id)
    const { rowCount } = await server.query('update histories set latest_number = 7 where id = $1', [
      theirSaved.history.recordId,
    ])
    expect(rowCount).toBe(0)
  })

  it('is refused for a revision of our own group that hangs on their record', async () => {
    await setGroup(server, ours.id)
    await expect(
      server.query(
        `insert into history_revisions (group_id, history_id, number, author_id, note, digest, input)
         values ($1, $2, 1, $3, '', repeat('0', 64), '{}')`,
        [ours.id, theirSaved.history.recordId, ours.lead.id],
      ),
    ).rejects.toThrow('history_revisions_record_fk')
  })

  it('is refused for an evaluation of their revision', async () => {
    await setGroup(server, ours.id)
    await expect(
      server.query(
        `insert into evaluations (group_id, history_id, history_revision_id, candidate_id, candidate_revision_id,
           author_id, core_version, input_digest, omega_h2, result)
         values ($1, $2, $3, $4, $5, $6, 'x', repeat('0', 64), 0.1, '{}')`,
        [
          ours.id,
          theirSaved.history.recordId,
          theirSaved.history.revisionId,
          theirSaved.candidate.recordId,
          theirSaved.candidate.revisionId,
          ours.lead.id,
        ],
      ),
    ).rejects.toThrow('evaluations_history_revision_fk')
  })

  it('is refused for a guest link to their evaluation or their revision', async () => {
    await setGroup(server, ours.id)
    for (const [kind, subject] of [
      ['evaluation', theirSaved.evaluationId],
      ['history-revision', theirSaved.history.revisionId],
    ])
      await expect(
        server.query(
          `insert into guest_links (group_id, kind, subject_id, note, token_hash, created_by)
           values ($1, $2, $3, '', repeat('0', 64), $4)`,
          [ours.id, kind, subject, ours.lead.id],
        ),
      ).rejects.toThrow('guest_links_subject')
  })

  it('is refused for an author who is no member', async () => {
    await setGroup(server, theirs.id)
    await expect(
      server.query(
        `insert into history_revisions (group_id, history_id, number, parent_id, author_id, note, digest, input)
         values ($1, $2, 2, $3, $4, '', repeat('0', 64), '{}')`,
        [theirs.id, theirSaved.history.recordId, theirSaved.history.revisionId, ours.lead.id],
      ),
    ).rejects.toThrow('history_revisions_author_fk')
  })

  it('is refused for a baseline: a group adopts a revision of its own', async () => {
    await expect(
      owner.query('update groups set baseline_revision_id = $1 where id = $2', [
        theirSaved.history.revisionId,
        ours.id,
      ]),
    ).rejects.toThrow('groups_baseline_revision_fk')
  })
})
