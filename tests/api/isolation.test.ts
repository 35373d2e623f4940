import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { candidate, history, saveOneOfEach } from '../db/support/records.ts'
import type { Saved } from './support/calls.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
let theirs: Saved
let ours: Saved
let lead: TestAgent
beforeAll(async () => {
  harness = await startHarness()
  ours = await saveOneOfEach(harness.serverUrl, harness.alder)
  theirs = await saveOneOfEach(harness.serverUrl, harness.birch)
  lead = await harness.signIn(harness.alder.lead)
})
afterAll(() => harness.stop())

describe('another group’s data', () => {
  it.each([
    ['history', () => `/api/v1/histories/${theirs.history.recordId}`],
    ['candidate', () => `/api/v1/candidates/${theirs.candidate.recordId}`],
    ['evaluation', () => `/api/v1/evaluations/${theirs.evaluationId}`],
  ])('cannot be read: their %s is not found', async (_what, address) => {
    const answer = await lead.get(address())
    expectProblem(answer, 'not-found')
    expect(answer.text).not.toContain('Birch')
  })

  it.each(['histories', 'candidates', 'evaluations'])('stays out of the list of %s', async (plural) => {
    const { body } = await lead.get(`/api/v1/${plural}`)
    expect((body as { items: unknown[] }).items).toHaveLength(1)
    expect(JSON.stringify(body)).not.toContain('Birch')
  })

  it('leaves their keys and their audit log out of sight, and their keys in force', async () => {
    const keys = await lead.get('/api/v1/keys?of=group')
    expect((keys.body as { items: { id: string }[] }).items.map(({ id }) => id)).toEqual([ours.keyId])
    expectProblem(await lead.delete(`/api/v1/keys/${theirs.keyId}`), 'not-found')
    const { rows } = await harness.owner.query('select revoked_at from api_keys where id = $1', [
      theirs.keyId,
    ])
    expect(rows).toEqual([{ revoked_at: null }])
    const log = await lead.get('/api/v1/audit')
    expect(log.status).toBe(200)
    expect(log.text).not.toContain(theirs.keyId)
    expect(log.text).not.toContain(harness.birch.id)
  })

  it('cannot be shown to guests, nor their links seen or ended', async () => {
    for (const [kind, subjectId] of [
      ['evaluation', theirs.evaluationId],
      ['history-revision', theirs.history.revisionId],
    ])
      expectProblem(await lead.post('/api/v1/guest-links').send({ kind, subjectId }), 'not-found')
    const links = await lead.get(`/api/v1/guest-links?subjectId=${theirs.evaluationId}`)
    expect(links.body).toEqual({ items: [] })
    expectProblem(await lead.delete(`/api/v1/guest-links/${theirs.guestLinkId}`), 'not-found')
    expectProblem(await lead.get(`/api/v1/evaluations/${theirs.evaluationId}/evidence`), 'not-found')
  })

  it('cannot be revised', async () => {
    const history2 = { parentId: theirs.history.revisionId, input: history }
    const candidate2 = { parentId: theirs.candidate.revisionId, input: candidate }
    expectProblem(
      await lead.post(`/api/v1/histories/${theirs.history.recordId}/revisions`).send(history2),
      'not-found',
    )
    expectProblem(
      await lead.post(`/api/v1/candidates/${theirs.candidate.recordId}/revisions`).send(candidate2),
      'not-found',
    )
  })

  it('cannot be the parent of a revision here', async () => {
    const revision = { parentId: theirs.history.revisionId, input: history }
    expectProblem(
      await lead.post(`/api/v1/histories/${ours.history.recordId}/revisions`).send(revision),
      'stale-parent',
    )
  })

  it('cannot be evaluated, neither their history nor their candidate', async () => {
    const evaluate = (historyRevisionId: string, candidateRevisionId: string) =>
      lead.post('/api/v1/evaluations').send({ historyRevisionId, candidateRevisionId })
    expectProblem(await evaluate(theirs.history.revisionId, ours.candidate.revisionId), 'not-found')
    expectProblem(await evaluate(ours.history.revisionId, theirs.candidate.revisionId), 'not-found')
  })

  it('does not leak through the filters of a list', async () => {
    const { body } = await lead.get(`/api/v1/evaluations?historyId=${theirs.history.recordId}`)
    expect(body).toEqual({ items: [], next: null })
  })
})
