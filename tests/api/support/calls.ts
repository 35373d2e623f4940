import { CATALOGUE } from '#api/endpoints/catalogue'
import type { Endpoint } from '#api/endpoints/endpoint'
import { examples } from '#api/openapi/examples'
import type { Test } from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import type { saveOneOfEach } from '../../db/support/records.ts'

/** Ids of things that exist, to put in the place of the made-up ones of the examples. */
export type Saved = Awaited<ReturnType<typeof saveOneOfEach>>

export const endpointsWithBody = CATALOGUE.filter(({ body }) => body !== undefined)
export const endpointsOfMembers = CATALOGUE.filter(({ may }) => may !== 'anyone')

export const addressOf = (endpoint: Endpoint, id = ''): string =>
  `/api/v1${endpoint.path.replace('{id}', id)}`

function recordOf(endpoint: Endpoint, saved: Saved): { id: string; revisionId?: string } {
  if (endpoint.tag === 'keys') return { id: saved.keyId }
  if (endpoint.tag === 'guest-links') return { id: saved.guestLinkId }
  if (endpoint.tag === 'evaluations') return { id: saved.evaluationId }
  const { recordId, revisionId } = endpoint.tag === 'histories' ? saved.history : saved.candidate
  return { id: recordId, revisionId }
}

/** Calls an endpoint as its documented example does, with ids that exist. */
export function callByExample(agent: TestAgent, endpoint: Endpoint, saved: Saved): Test {
  const { id, revisionId } = recordOf(endpoint, saved)
  const call = agent[endpoint.method](addressOf(endpoint, id))
  const body = examples()[endpoint.id]?.body
  if (body === undefined) return call
  const ids: Record<string, unknown> = {
    parentId: revisionId,
    historyRevisionId: saved.history.revisionId,
    candidateRevisionId: saved.candidate.revisionId,
    subjectId: saved.evaluationId,
  }
  const real = Object.entries(body as object).map(([key, value]) => [key, ids[key] ?? value] as const)
  return call.send(Object.fromEntries(real))
}
