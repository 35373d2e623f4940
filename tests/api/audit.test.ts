import type { AuditEntry, CreateKeyResult } from '#core/wire/index'
import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { candidate, history } from '../db/support/records.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
let author: TestAgent
let lead: TestAgent
let key: CreateKeyResult
let historyId: string
beforeAll(async () => {
  harness = await startHarness()
  author = await harness.signIn(harness.alder.author)
  lead = await harness.signIn(harness.alder.lead)
  key = (await author.post('/api/v1/keys').send({ name: 'a script', scope: 'write' })).body as CreateKeyResult
  const made = await author.post('/api/v1/histories').send({ name: 'Logged', input: history })
  const record = made.body as { id: string; head: { id: string } }
  historyId = record.id
  await author
    .post(`/api/v1/histories/${historyId}/revisions`)
    .send({ parentId: record.head.id, note: 'again', input: history })
  await request(harness.app)
    .post('/api/v1/candidates')
    .set('authorization', `Bearer ${key.secret}`)
    .set('user-agent', 'a script/1')
    .send({ name: 'By key', input: candidate })
})
afterAll(() => harness.stop())

async function entries(query = ''): Promise<AuditEntry[]> {
  const answer = await lead.get(`/api/v1/audit?${query}`)
  if (answer.status !== 200) throw new Error(answer.text)
  return (answer.body as { items: AuditEntry[] }).items
}

describe('the audit log', () => {
  it('tells who did what to which record, when and from where, newest first', async () => {
    const all = await entries(`subjectId=${historyId}`)
    expect(all.map(({ action }) => action)).toEqual(['history.revise', 'history.create'])
    const [revised] = all
    expect(revised).toMatchObject({
      actor: { id: harness.alder.author.id, name: harness.alder.author.name },
      apiKeyId: null,
      detail: { name: 'Logged', revision: 2 },
      fromAddress: expect.stringMatching(/127\.0\.0\.1$/),
    })
    expect(revised?.requestId).toMatch(/^[0-9a-f-]{36}$/)
    expect(Math.abs(Date.now() - Date.parse(revised?.createdAt ?? ''))).toBeLessThan(60_000)
  })

  it('tells by which key something was done', async () => {
    const [made] = await entries('action=candidate.create')
    expect(made).toMatchObject({ apiKeyId: key.key.id, fromAgent: 'a script/1', detail: { name: 'By key' } })
  })

  it('holds signing in, and no secret', async () => {
    expect((await entries('action=session')).map(({ action }) => action)).toContain('session.open')
    expect(JSON.stringify(await entries('limit=200'))).not.toContain(key.secret)
  })

  it('filters by person, kind of record and time, and pages', async () => {
    const byAuthor = await entries(`actorId=${harness.alder.author.id}&action=history`)
    expect(byAuthor).toHaveLength(2)
    expect(await entries(`actorId=${harness.alder.reader.id}`)).toEqual([])
    expect(await entries('until=2020-01-01T00:00:00Z')).toEqual([])
    const { body } = await lead.get('/api/v1/audit?limit=1')
    const page = body as { items: AuditEntry[]; next: string }
    const following = await entries(`limit=1&cursor=${page.next}`)
    expect(following[0]?.id).not.toBe(page.items[0]?.id)
    expectProblem(await lead.get('/api/v1/audit?action=Drop%20table'), 'invalid-input')
  })

  it('is the lead’s alone', async () => {
    expectProblem(await author.get('/api/v1/audit'), 'not-allowed')
  })

  it('notes nothing for what was refused', async () => {
    const before = await entries('limit=200')
    const answer = await author
      .post(`/api/v1/histories/${historyId}/revisions`)
      .send({ parentId: '00000000-0000-4000-8000-000000000000', input: history })
    expect(answer.status).toBeGreaterThanOrEqual(400)
    expect(await entries('limit=200')).toHaveLength(before.length)
  })
})
