import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { saveOneOfEach } from '../db/support/records.ts'
import { addressOf, callByExample, endpointsOfMembers } from './support/calls.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
const agents: Record<string, TestAgent> = {}
beforeAll(async () => {
  harness = await startHarness()
  for (const role of ['reader', 'author', 'lead'] as const)
    agents[role] = await harness.signIn(harness.alder[role])
})
afterAll(() => harness.stop())

/** Written out rather than read from api/permissions.ts: this is the promise that file has to keep. */
const WRITES = [
  'createHistory',
  'reviseHistory',
  'createCandidate',
  'reviseCandidate',
  'createEvaluation',
  'createGuestLink',
  'revokeGuestLink',
]

const FOR_LEADS = ['listAuditEntries', 'listInvitations', 'invite', 'withdrawInvitation']

const allowed = (role: string, id: string): boolean =>
  FOR_LEADS.includes(id) ? role === 'lead' : role !== 'reader' || !WRITES.includes(id)

describe.each(endpointsOfMembers)('$method $path', (endpoint) => {
  it.each(['reader', 'author', 'lead'])('decides by role: %s', async (role) => {
    const agent = agents[role]
    if (agent === undefined) throw new Error(`no agent for ${role}`)
    const holder = harness.alder[role as 'reader' | 'author' | 'lead']
    const saved = await saveOneOfEach(harness.serverUrl, harness.alder, holder)
    const answer = await callByExample(agent, endpoint, saved)
    if (allowed(role, endpoint.id)) expect(answer.status).toBe(endpoint.status)
    else expect(expectProblem(answer, 'not-allowed').detail).toContain(`you are a ${role}`)
  })

  it('is closed to those who have not signed in', async () => {
    const address = addressOf(endpoint, '00000000-0000-4000-8000-000000000000')
    expectProblem(await request(harness.app)[endpoint.method](address).send(), 'not-signed-in')
  })
})

it('a refused reader leaves nothing behind', async () => {
  const count = async () => {
    const { rows } = await harness.owner.query<{ n: string }>(
      `select (select count(*) from histories) + (select count(*) from history_revisions)
            + (select count(*) from candidates) + (select count(*) from candidate_revisions)
            + (select count(*) from evaluations) as n`,
    )
    return rows[0]?.n
  }
  const saved = await saveOneOfEach(harness.serverUrl, harness.alder)
  const before = await count()
  for (const endpoint of endpointsOfMembers.filter(({ id }) => WRITES.includes(id))) {
    await callByExample(agents['reader'] as TestAgent, endpoint, saved)
  }
  expect(await count()).toBe(before)
})
