import pg from 'pg'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { freshDatabase } from '../support/database.ts'
import { makeGroup } from './support/groups.ts'
import type { TestGroup } from './support/groups.ts'
import { connectOwner } from './support/owner.ts'

let database: Awaited<ReturnType<typeof freshDatabase>>
let owner: pg.Client
let server: pg.Client
let alder: TestGroup
let birch: TestGroup
beforeAll(async () => {
  database = await freshDatabase()
  owner = await connectOwner(database.ownerUrl)
  server = new pg.Client({ connectionString: database.serverUrl })
  await server.connect()
  alder = await makeGroup(owner, 'Alder')
  birch = await makeGroup(owner, 'Birch')
  await owner.query("insert into memberships (group_id, user_id, role) values ($1, $2, 'reader')", [
    birch.id,
    alder.lead.id,
  ])
  for (const { id, lead, reader } of [alder, birch]) {
    for (const person of [lead, reader]) {
      await owner.query(
        "insert into sessions (group_id, user_id, expires_at) values ($1, $2, now() + interval '1 day')",
        [id, person.id],
      )
      await owner.query(
        "insert into one_time_tokens (purpose, user_id, email, secret_hash, expires_at) values ('verify-email', $1, $2, repeat('0', 64), now() + interval '1 day')",
        [person.id, person.email],
      )
    }
  }
})
beforeEach(() => server.query('reset all'))
afterAll(async () => {
  await server.end()
  await owner.end()
  await database.drop()
})

const asPerson = (id: string) => server.query("select set_config('emberline.person_id', $1, false)", [id])
const count = async (table: string) => (await server.query(`select 1 from ${table}`)).rowCount

describe('a person’s own rows, in plain SQL by the server’s role', () => {
  it.each([
    ['sessions', 1],
    ['one_time_tokens', 1],
    ['users', 1],
    ['memberships', 2],
    ['groups', 2],
  ])('in %s are seen by naming the person, and no others', async (table, rows) => {
    expect(await count(table)).toBe(0)
    await asPerson(alder.lead.id)
    expect(await count(table)).toBe(rows)
    await asPerson('00000000-0000-4000-8000-000000000000')
    expect(await count(table)).toBe(0)
  })

  it.each(['histories', 'candidates', 'evaluations', 'invitations', 'attempts'])(
    'do not include the groups’ %s',
    async (table) => {
      await asPerson(alder.lead.id)
      if (table === 'attempts') await expect(count(table)).rejects.toThrow('permission denied')
      else expect(await count(table)).toBe(0)
    },
  )

  it('can be changed by naming the person, and nobody else’s', async () => {
    await asPerson(alder.reader.id)
    const rename = (id: string) => server.query("update users set name = 'Renamed' where id = $1", [id])
    expect((await rename(birch.reader.id)).rowCount).toBe(0)
    expect((await rename(alder.reader.id)).rowCount).toBe(1)
    const revoke = await server.query('update sessions set revoked_at = now()')
    expect(revoke.rowCount).toBe(1)
  })

  it('cannot be changed by naming the group', async () => {
    await server.query("select set_config('emberline.group_id', $1, false)", [alder.id])
    expect((await server.query('select 1 from users')).rowCount).toBe(3)
    expect((await server.query("update users set password_hash = '$argon2id$x'")).rowCount).toBe(0)
    expect((await server.query('select 1 from sessions')).rowCount).toBe(0)
  })

  it('cannot be made for somebody else', async () => {
    await asPerson(alder.reader.id)
    await expect(
      server.query(
        "insert into sessions (group_id, user_id, expires_at) values ($1, $2, now() + interval '1 day')",
        [birch.id, birch.lead.id],
      ),
    ).rejects.toThrow('row-level security')
  })

  it('do not open a group one is not in: a session is of a member', async () => {
    await asPerson(alder.reader.id)
    await expect(server.query('update sessions set group_id = $1', [birch.id])).rejects.toThrow(
      'sessions_member_fk',
    )
  })
})
