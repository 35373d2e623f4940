import type { ApiKey, CreateKeyResult } from '#core/wire/index'
import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { candidate, history } from '../db/support/records.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
let reader: TestAgent
let author: TestAgent
let lead: TestAgent
beforeAll(async () => {
  harness = await startHarness()
  reader = await harness.signIn(harness.alder.reader)
  author = await harness.signIn(harness.alder.author)
  lead = await harness.signIn(harness.alder.lead)
})
afterAll(() => harness.stop())

async function makeKey(agent: TestAgent, scope: string, name = 'a script'): Promise<CreateKeyResult> {
  const answer = await agent.post('/api/v1/keys').send({ name, scope })
  if (answer.status !== 201) throw new Error(`no key was made: ${answer.text}`)
  return answer.body as CreateKeyResult
}

const withKey = (secret: string, method: 'get' | 'post' | 'delete', path: string) =>
  request(harness.app)[method](`/api/v1${path}`).set('authorization', `Bearer ${secret}`)

const create = (secret: string) =>
  withKey(secret, 'post', '/histories').send({ name: 'By a script', input: history })

describe('a key', () => {
  it('is told once and kept as a hash alone', async () => {
    const { key, secret } = await makeKey(reader, 'read', 'told once')
    expect(secret).toMatch(/^ember_[\w-]{43}$/)
    expect(secret.startsWith(key.beginning)).toBe(true)
    expect(key.beginning.length).toBeLessThan(12)
    const { rows } = await harness.owner.query<Record<string, unknown>>(
      'select * from api_keys where id = $1',
      [key.id],
    )
    expect(JSON.stringify(rows)).not.toContain(secret)
    expect((await reader.get('/api/v1/keys')).text).not.toContain(secret)
  })

  it('reads with the scope read, computes with compute, saves with write, and each does what the lesser do', async () => {
    const secrets = {
      read: (await makeKey(author, 'read')).secret,
      compute: (await makeKey(author, 'compute')).secret,
      write: (await makeKey(author, 'write')).secret,
    }
    const compute = (secret: string) =>
      withKey(secret, 'post', '/compute/abundance').send({ history, candidate })
    for (const secret of Object.values(secrets))
      expect((await withKey(secret, 'get', '/histories')).status).toBe(200)
    expectProblem(await compute(secrets.read), 'key-scope')
    expect((await compute(secrets.compute)).status).toBe(200)
    expect((await compute(secrets.write)).status).toBe(200)
    expectProblem(await create(secrets.read), 'key-scope')
    expectProblem(await create(secrets.compute), 'key-scope')
    expect((await create(secrets.write)).status).toBe(201)
  })

  it('makes and revokes no keys: that is done by a person', async () => {
    const { key, secret } = await makeKey(lead, 'write')
    expectProblem(await withKey(secret, 'post', '/keys').send({ name: 'x', scope: 'read' }), 'key-scope')
    expectProblem(await withKey(secret, 'delete', `/keys/${key.id}`), 'key-scope')
    expectProblem(await withKey(secret, 'get', '/keys'), 'key-scope')
  })

  it('that saves is not for a reader, and stops saving when its holder becomes one', async () => {
    expectProblem(await reader.post('/api/v1/keys').send({ name: 'x', scope: 'write' }), 'not-allowed')
    const { secret } = await makeKey(author, 'write')
    const setRole = (role: string) =>
      harness.owner.query('update memberships set role = $1 where user_id = $2', [
        role,
        harness.alder.author.id,
      ])
    await setRole('reader')
    try {
      expectProblem(await create(secret), 'not-allowed')
    } finally {
      await setRole('author')
    }
  })

  it('ends at once when revoked, by its holder or by a lead, and by nobody else', async () => {
    const mine = await makeKey(author, 'read')
    expectProblem(await reader.delete(`/api/v1/keys/${mine.key.id}`), 'not-found')
    expect((await withKey(mine.secret, 'get', '/histories')).status).toBe(200)
    const revoked = await author.delete(`/api/v1/keys/${mine.key.id}`)
    expect((revoked.body as ApiKey).revokedAt).not.toBeNull()
    expectProblem(await withKey(mine.secret, 'get', '/histories'), 'bad-key')
    const other = await makeKey(author, 'read')
    expect((await lead.delete(`/api/v1/keys/${other.key.id}`)).status).toBe(200)
    expectProblem(await withKey(other.secret, 'get', '/histories'), 'bad-key')
  })

  it('ends when it expires', async () => {
    const { key, secret } = await makeKey(author, 'read')
    await harness.owner.query("update api_keys set expires_at = now() - interval '1 second' where id = $1", [
      key.id,
    ])
    expectProblem(await withKey(secret, 'get', '/histories'), 'bad-key')
  })

  it('shows when it was last used', async () => {
    const { key, secret } = await makeKey(author, 'read')
    expect(key.lastUsedAt).toBeNull()
    await withKey(secret, 'get', '/histories')
    const { body } = await author.get('/api/v1/keys')
    const listed = (body as { items: ApiKey[] }).items.find(({ id }) => id === key.id)
    expect(Date.now() - Date.parse(listed?.lastUsedAt ?? '')).toBeLessThan(60_000)
  })

  it.each(['Basic abc', 'Bearer', 'Bearer a b', `Bearer ember_${'x'.repeat(43)}`, 'Bearer x'])(
    'that is none is refused, and no cookie stands in for it: %j',
    async (header) => {
      const answer = await author.get('/api/v1/histories').set('authorization', header)
      expectProblem(answer, 'bad-key')
    },
  )

  it('is refused with its path for a name, a scope or a time that does not fit', async () => {
    const answer = await author.post('/api/v1/keys').send({ name: ' ', scope: 'all', days: 400 })
    const paths = expectProblem(answer, 'invalid-input').faults?.map(({ path }) => path)
    expect(paths).toEqual(['name', 'scope', 'days'])
  })
})

describe('the list of keys', () => {
  it('shows one’s own, to a lead everyone’s, to others nothing of the rest', async () => {
    const { key } = await makeKey(reader, 'read', 'the reader’s')
    const ids = async (agent: TestAgent, of: string) =>
      ((await agent.get(`/api/v1/keys?of=${of}`)).body as { items: ApiKey[] }).items.map(({ id }) => id)
    expect(await ids(reader, 'me')).toContain(key.id)
    expect(await ids(lead, 'me')).not.toContain(key.id)
    expect(await ids(lead, 'group')).toContain(key.id)
    expectProblem(await author.get('/api/v1/keys?of=group'), 'not-allowed')
  })
})

describe('too many requests', () => {
  it('are refused apart for each key, and a key may have a number of its own', async () => {
    const small = harness.appWith({ requestsPerMinute: 3 })
    const [one, other, raised] = [
      await makeKey(author, 'read'),
      await makeKey(author, 'read'),
      await makeKey(author, 'read'),
    ]
    await harness.owner.query('update api_keys set requests_per_minute = 100 where id = $1', [raised.key.id])
    const ask = (secret: string) =>
      request(small).get('/api/v1/histories').set('authorization', `Bearer ${secret}`)
    for (let i = 0; i < 3; i++) expect((await ask(one.secret)).status).toBe(200)
    const refused = await ask(one.secret)
    expectProblem(refused, 'too-many-requests')
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0)
    expect((await ask(other.secret)).status).toBe(200)
    for (let i = 0; i < 5; i++) expect((await ask(raised.secret)).status).toBe(200)
  })
})
