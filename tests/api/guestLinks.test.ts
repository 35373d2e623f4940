import { checkEvidence } from '#core/index'
import type { CreateGuestLinkResult, GuestView } from '#core/wire/index'
import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { saveOneOfEach } from '../db/support/records.ts'
import type { Saved } from './support/calls.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
let saved: Saved
let author: TestAgent
let lead: TestAgent
beforeAll(async () => {
  harness = await startHarness()
  saved = await saveOneOfEach(harness.serverUrl, harness.alder)
  author = await harness.signIn(harness.alder.author)
  lead = await harness.signIn(harness.alder.lead)
})
afterAll(() => harness.stop())

async function link(agent: TestAgent, over: object = {}): Promise<CreateGuestLinkResult> {
  const body = { kind: 'evaluation', subjectId: saved.evaluationId, ...over }
  const answer = await agent.post('/api/v1/guest-links').send(body)
  if (answer.status !== 201) throw new Error(answer.text)
  return answer.body as CreateGuestLinkResult
}

/** As a guest: no cookie, no key. */
const open = (token: string) => request(harness.app).post('/api/v1/guest').send({ token })

describe('a guest link', () => {
  it('shows one evaluation with its inputs to whoever has it, and can be repeated from its evidence', async () => {
    const { token } = await link(author)
    const view = (await open(token)).body as Extract<GuestView, { kind: 'evaluation' }>
    expect(view.evaluation.id).toBe(saved.evaluationId)
    expect(view.history.bath.treatment).toBe('thresholds')
    expect(checkEvidence(view.evidence)).toMatchObject({ digestsMatch: true, agrees: true })
  })

  it('shows one revision of a history, and neither its other revisions nor the group’s people', async () => {
    const { token } = await link(author, {
      kind: 'history-revision',
      subjectId: saved.history.revisionId,
    })
    const answer = await open(token)
    const view = answer.body as Extract<GuestView, { kind: 'history-revision' }>
    expect(view.revision.id).toBe(saved.history.revisionId)
    expect(answer.text).not.toContain('@alder.example')
    expect(answer.text).not.toContain(harness.alder.id)
  })

  it('is kept as a hash alone', async () => {
    const { token, link: made } = await link(author)
    const { rows } = await harness.owner.query('select * from guest_links where id = $1', [made.id])
    expect(JSON.stringify(rows)).not.toContain(token)
    expect((await author.get('/api/v1/guest-links')).text).not.toContain(token)
  })

  it.each(['x', 'A'.repeat(43), 'A'.repeat(200)])('that nobody made opens nothing: %s', async (token) => {
    expectProblem(await open(token), 'guest-link-closed')
  })

  it('ends at once when revoked, by whoever made it or a lead', async () => {
    const mine = await link(author)
    expect((await author.delete(`/api/v1/guest-links/${mine.link.id}`)).status).toBe(200)
    const closed = expectProblem(await open(mine.token), 'guest-link-closed')
    const other = await link(author)
    expect((await lead.delete(`/api/v1/guest-links/${other.link.id}`)).status).toBe(200)
    expect(expectProblem(await open(other.token), 'guest-link-closed').detail).toBe(closed.detail)
    const leads = await link(lead)
    expectProblem(await author.delete(`/api/v1/guest-links/${leads.link.id}`), 'not-allowed')
    expect((await open(leads.token)).status).toBe(200)
  })

  it('ends when it expires, and says the same as one that never was', async () => {
    const { token, link: made } = await link(author, { days: 1 })
    expect((await open(token)).status).toBe(200)
    await harness.owner.query(
      "update guest_links set expires_at = now() - interval '1 second' where id = $1",
      [made.id],
    )
    expect(expectProblem(await open(token), 'guest-link-closed').detail).toBe(
      expectProblem(await open('never'), 'guest-link-closed').detail,
    )
  })

  it('shows when it was last used, and is noted in the log when made and ended', async () => {
    const { token, link: made } = await link(author)
    expect(made.lastUsedAt).toBeNull()
    await open(token)
    await author.delete(`/api/v1/guest-links/${made.id}`)
    const { body } = await author.get(`/api/v1/guest-links?subjectId=${saved.evaluationId}`)
    const listed = (body as { items: CreateGuestLinkResult['link'][] }).items.find(({ id }) => id === made.id)
    expect(listed?.lastUsedAt).not.toBeNull()
    const log = await lead.get(`/api/v1/audit?subjectId=${made.id}`)
    expect((log.body as { items: { action: string }[] }).items.map(({ action }) => action)).toEqual([
      'guest-link.revoke',
      'guest-link.create',
    ])
  })

  it('is opened so often a minute and no oftener', async () => {
    const app = harness.appWith({})
    const { token } = await link(author)
    const ask = () => request(app).post('/api/v1/guest').send({ token })
    const statuses: number[] = []
    for (let i = 0; i < 61; i++) statuses.push((await ask()).status)
    expect(statuses.slice(0, 60).every((status) => status === 200)).toBe(true)
    expect(statuses[60]).toBe(429)
  })
})

describe('the evidence of an evaluation', () => {
  it('is the same to a member as to a guest', async () => {
    const { token } = await link(author)
    const view = (await open(token)).body as Extract<GuestView, { kind: 'evaluation' }>
    const { body } = await author.get(`/api/v1/evaluations/${saved.evaluationId}/evidence`)
    expect(body).toEqual(view.evidence)
  })
})
