import { problem } from '#core/wire/index'
import type { Problem } from '#core/wire/index'
import type { ZodOpenApiResponsesObject } from 'zod-openapi'
import type { Endpoint } from '../endpoints/endpoint.ts'
import { PROBLEMS, problemType } from '../errors/problems.ts'
import type { ProblemKind } from '../errors/problems.ts'
import { rolesThatMay, scopeFor } from '../permissions.ts'

const EVERY_ROLE = rolesThatMay('read').length

/** The problems an endpoint can answer with: those of its shape, and those it names. */
function problemKindsOf(endpoint: Endpoint): ProblemKind[] {
  const { may, method, body, query, params } = endpoint
  const kinds: ProblemKind[] = ['internal', 'too-many-requests', ...(endpoint.problems ?? [])]
  if (may !== 'anyone') {
    kinds.push('not-signed-in', 'bad-key')
    if (scopeFor(may) !== 'read') kinds.push('key-scope')
    if (rolesThatMay(may).length < EVERY_ROLE) kinds.push('not-allowed')
  }
  if (method !== 'get') kinds.push('other-site')
  if (body !== undefined) kinds.push('malformed-body', 'not-json', 'too-large')
  if (body !== undefined || query !== undefined) kinds.push('invalid-input')
  if (params !== undefined) kinds.push('not-found')
  return [...new Set(kinds)]
}

function exampleOf(kind: ProblemKind): Problem {
  const { status, title } = PROBLEMS[kind]
  const fault = { path: 'limit', value: 0, message: 'Too small: expected number to be >=1' }
  return {
    type: problemType(kind),
    title,
    status,
    detail: 'What happened, what was kept, and what to do, in a sentence or two.',
    instance: '7a1c0e52-6f0d-4a4e-9a53-7d1f6c1f2a10',
    ...(kind === 'invalid-input' ? { faults: [fault] } : {}),
  }
}

const RETRY_AFTER = {
  'Retry-After': { description: 'Seconds to wait', schema: { type: 'integer' as const } },
}

function responseOf(kinds: ProblemKind[]): ZodOpenApiResponsesObject[`4${string}`] {
  const examples = Object.fromEntries(kinds.map((kind) => [kind, { value: exampleOf(kind) }]))
  return {
    description: kinds.map((kind) => PROBLEMS[kind].title).join(', or '),
    content: { 'application/problem+json': { schema: problem, examples } },
    ...(kinds.some((kind) => PROBLEMS[kind].status === 429) ? { headers: RETRY_AFTER } : {}),
  }
}

/** One response per status, each with an example of every problem that has it. */
export function problemResponses(endpoint: Endpoint): ZodOpenApiResponsesObject {
  const kinds = problemKindsOf(endpoint)
  const statuses = [...new Set(kinds.map((kind) => PROBLEMS[kind].status))]
  return Object.fromEntries(
    statuses.map((status) => [
      String(status),
      responseOf(kinds.filter((kind) => PROBLEMS[kind].status === status)),
    ]),
  )
}
