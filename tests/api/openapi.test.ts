import { CATALOGUE } from '#api/endpoints/catalogue'
import { apiDocument } from '#api/openapi/document'
import { examples } from '#api/openapi/examples'
import type { Express, Router } from 'express'
import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { z } from 'zod'
import { PASSWORD } from '../db/support/groups.ts'
import { saveOneOfEach } from '../db/support/records.ts'
import { callByExample, endpointsOfMembers } from './support/calls.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'

let harness: Harness
beforeAll(async () => {
  harness = await startHarness()
})
afterAll(() => harness.stop())

interface Layer {
  route?: { path: string; methods: Record<string, boolean> }
  handle: { stack?: Layer[] }
}

/** Every route of a router and of the routers in it, as `get /histories/{id}`; prefixes are not in the layers. */
function mountedRoutes(router: Router | Express['router']): string[] {
  return (router.stack as unknown as Layer[]).flatMap(({ route, handle }) => {
    if (route !== undefined) {
      const path = route.path.replaceAll(/:(\w+)/g, '{$1}')
      return Object.keys(route.methods).map((method) => `${method} ${path}`)
    }
    return handle.stack === undefined ? [] : mountedRoutes(handle as unknown as Router)
  })
}

const documented = (): string[] =>
  Object.entries(apiDocument().paths ?? {}).flatMap(([path, methods]) =>
    Object.keys(methods).map((method) => `${method} ${path}`),
  )

function everyRef(value: unknown): string[] {
  if (value === null || typeof value !== 'object') return []
  return Object.entries(value).flatMap(([key, inner]) => (key === '$ref' ? [String(inner)] : everyRef(inner)))
}

const OUTSIDE_V1 = ['get /openapi.json', 'get /healthz', 'get /readyz', 'get /{*page}']

/** What OpenAPI 3.1 demands of the parts used here. */
const operationShape = z.object({
  operationId: z.string().min(1),
  summary: z.string().min(1),
  parameters: z
    .array(
      z.looseObject({
        name: z.string(),
        in: z.enum(['path', 'query', 'header', 'cookie']),
        schema: z.looseObject({}),
      }),
    )
    .optional(),
  responses: z.record(z.string().regex(/^[1-5]\d\d$/), z.looseObject({ description: z.string().min(1) })),
})
const documentShape = z.object({
  openapi: z.string().regex(/^3\.1\.\d+$/),
  info: z.looseObject({ title: z.string(), version: z.string() }),
  paths: z.record(
    z.string().startsWith('/'),
    z.partialRecord(z.enum(['get', 'post', 'delete']), operationShape.loose()),
  ),
})

describe('/api/openapi.json', () => {
  it('is served to anyone and has the shape OpenAPI 3.1 asks for', async () => {
    const answer = await request(harness.app).get('/api/openapi.json')
    expect(answer.status).toBe(200)
    expect(() => documentShape.loose().parse(answer.body)).not.toThrow()
    expect(answer.body).toEqual(JSON.parse(JSON.stringify(apiDocument())))
  })

  it('describes exactly the routes that are mounted', () => {
    const mounted = mountedRoutes(harness.app.router).filter((route) => !OUTSIDE_V1.includes(route))
    expect([...mounted].sort()).toEqual(documented().sort())
    expect(mounted.length).toBeGreaterThan(15)
  })

  it('refers only to schemas it contains', () => {
    const refs = everyRef(apiDocument())
    expect(refs.length).toBeGreaterThan(30)
    const schemas = apiDocument().components?.schemas ?? {}
    for (const ref of refs) expect(schemas).toHaveProperty([ref.replace('#/components/schemas/', '')])
  })

  it('gives each operation an id of its own', () => {
    const ids = CATALOGUE.map(({ id }) => id)
    expect(new Set(ids).size).toBe(ids.length)
  })

  it('shows an example of every answer, error documents included', () => {
    for (const methods of Object.values(apiDocument().paths ?? {})) {
      for (const operation of Object.values(
        methods as Record<string, { responses: Record<string, unknown> }>,
      )) {
        for (const [status, response] of Object.entries(operation.responses)) {
          if (status === '204') continue
          const [media] = Object.values((response as { content: Record<string, object> }).content)
          expect(media !== undefined && ('example' in media || 'examples' in media)).toBe(true)
        }
      }
    }
  })
})

describe('the example', () => {
  let lead: TestAgent
  beforeAll(async () => {
    lead = await harness.signIn(harness.alder.lead)
  })

  it.each(endpointsOfMembers)(
    'of $method $path is accepted, and the answer is as described',
    async (endpoint) => {
      const saved = await saveOneOfEach(harness.serverUrl, harness.alder)
      const answer = await callByExample(lead, endpoint, saved)
      expect(answer.status).toBe(endpoint.status)
      expect(() => endpoint.answer?.parse(answer.body)).not.toThrow()
    },
  )

  it('of signing in is accepted once it names a real account', async () => {
    const body = examples()['signIn']?.body as object
    const answer = await request(harness.app)
      .post('/api/v1/session')
      .send({ ...body, email: harness.alder.lead.email, password: PASSWORD })
    expect(answer.status).toBe(201)
  })

  it.each(CATALOGUE.filter(({ answer }) => answer !== undefined))(
    'answer of $method $path fits its schema',
    ({ id, answer }) => {
      const shown = examples()[id]?.answer
      expect(shown).toBeDefined()
      expect(() => answer?.parse(JSON.parse(JSON.stringify(shown)))).not.toThrow()
    },
  )
})
