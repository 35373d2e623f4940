import { CATALOGUE } from '#api/endpoints/catalogue'
import { newSecondFactor, sessionInfo } from '#core/wire/index'
import type { SessionInfo } from '#core/wire/index'
import type { Endpoint } from '#api/endpoints/endpoint'
import { examples } from '#api/openapi/examples'
import type { Response } from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { PASSWORD } from '../../db/support/groups.ts'
import { codeAt } from '../../support/oneTimeCode.ts'
import type { saveOneOfEach } from '../../db/support/records.ts'

/** Ids of things that exist, to put in the place of the made-up ones of the examples. */
export type Saved = Awaited<ReturnType<typeof saveOneOfEach>>

export const endpointsWithBody = CATALOGUE.filter(({ body }) => body !== undefined)
export const endpointsOfMembers = CATALOGUE.filter(({ may }) => may !== 'anyone')

export const addressOf = (endpoint: Endpoint, id = ''): string =>
  `/api/v1${endpoint.path.replace('{id}', id)}`

const whoIs = async (agent: TestAgent): Promise<SessionInfo> =>
  sessionInfo.parse((await agent.get('/api/v1/session')).body)

/** Signs the agent in once more, and returns the id of the session it had. */
async function earlierSession(agent: TestAgent): Promise<string> {
  const { user } = await whoIs(agent)
  await agent.post('/api/v1/session').send({ email: user.email, password: PASSWORD })
  const { body } = await agent.get('/api/v1/account/sessions')
  const other = (body as { items: { id: string; current: boolean }[] }).items.find(({ current }) => !current)
  return other?.id ?? 'no other session'
}

async function idFor(agent: TestAgent, endpoint: Endpoint, saved: Saved): Promise<string> {
  switch (endpoint.tag) {
    case 'evaluations':
      return saved.evaluationId
    case 'histories':
      return saved.history.recordId
    case 'keys':
      return saved.keyId
    case 'guest-links':
      return saved.guestLinkId
    case 'invitations':
      return saved.invitationId
    case 'account':
      return endpoint.path.includes('{id}') ? earlierSession(agent) : ''
    default:
      return saved.candidate.recordId
  }
}

const BY_CODE = ['confirmSecondFactor', 'giveUpSecondFactor', 'renewRecoveryCodes']

/** Sets a second factor up as far as the endpoint needs it, and returns a code it takes. */
async function codeFor(agent: TestAgent, { id }: Endpoint): Promise<string> {
  const begun = await agent.post('/api/v1/account/second-factor').send({ currentPassword: PASSWORD })
  const { secret } = newSecondFactor.parse(begun.body)
  const now = Date.now()
  if (id === 'confirmSecondFactor') return codeAt(secret, now)
  await agent.post('/api/v1/account/second-factor/confirm').send({ code: codeAt(secret, now) })
  return codeAt(secret, now + 30_000)
}

/** Gives the factor up again, by one of the recovery codes just handed out. */
async function giveUpFactor(agent: TestAgent, answer: Response): Promise<void> {
  const { recoveryCodes = [] } = answer.body as { recoveryCodes?: string[] }
  if (recoveryCodes[0] === undefined) return
  const body = { currentPassword: PASSWORD, code: recoveryCodes[0] }
  await agent.post('/api/v1/account/second-factor/give-up').send(body)
}

/** Calls an endpoint as its documented example does, with ids and passwords that exist. */
export async function callByExample(agent: TestAgent, endpoint: Endpoint, saved: Saved): Promise<Response> {
  const call = agent[endpoint.method](addressOf(endpoint, await idFor(agent, endpoint, saved)))
  const body = examples()[endpoint.id]?.body
  if (body === undefined) return call
  const real: Record<string, unknown> = {
    parentId: endpoint.tag === 'histories' ? saved.history.revisionId : saved.candidate.revisionId,
    historyRevisionId: saved.history.revisionId,
    candidateRevisionId: saved.candidate.revisionId,
    subjectId: saved.evaluationId,
    groupId: saved.groupId,
    currentPassword: PASSWORD,
    newPassword: PASSWORD,
    ...(BY_CODE.includes(endpoint.id) ? { code: await codeFor(agent, endpoint) } : {}),
  }
  const entries = Object.entries(body as object).map(([key, value]) => [key, real[key] ?? value] as const)
  const answer = await call.send(Object.fromEntries(entries))
  if (BY_CODE.includes(endpoint.id)) await giveUpFactor(agent, answer)
  return answer
}
