import { CORE_VERSION } from '#core/index'
import { createDocument } from 'zod-openapi'
import type { ZodOpenApiOperationObject, ZodOpenApiPathsObject } from 'zod-openapi'
import { CATALOGUE } from '../endpoints/catalogue.ts'
import type { Endpoint } from '../endpoints/endpoint.ts'
import { scopeFor } from '../permissions.ts'
import { examples } from './examples.ts'
import type { EndpointExample } from './examples.ts'
import { problemResponses } from './problemResponses.ts'

const DESCRIPTION = `Thermal histories, dark-matter candidates and their abundances. Units stand in the names of the
fields; natural units otherwise. Sign in by cookie, or send an API key as \`Authorization: Bearer SECRET\`. Lists are cut into pages: pass the \`next\` of one as the \`cursor\` of the following.
Errors are RFC 9457 problem documents.`

/** By cookie; by key too, unless the action is a person's in a browser. */
function securityOf(may: Endpoint['may']): Record<string, string[]>[] {
  if (may === 'anyone') return []
  return scopeFor(may) === null ? [{ session: [] }] : [{ session: [] }, { key: [] }]
}

function operation(endpoint: Endpoint, example: EndpointExample): ZodOpenApiOperationObject {
  const { id, tag, summary, may, params, query, body, status, answer, answerIs } = endpoint
  const parameters = { ...(params ? { path: params } : {}), ...(query ? { query } : {}) }
  const content = answer && { 'application/json': { schema: answer, example: example.answer } }
  return {
    operationId: id,
    tags: [tag],
    summary,
    security: securityOf(may),
    requestParams: parameters,
    ...(body
      ? {
          requestBody: {
            required: true,
            content: { 'application/json': { schema: body, example: example.body } },
          },
        }
      : {}),
    responses: {
      [`${status}`]: { description: answerIs, ...(content ? { content } : {}) },
      ...problemResponses(endpoint),
    },
  }
}

function paths(): ZodOpenApiPathsObject {
  const shown = examples()
  const all: Record<string, Record<string, ZodOpenApiOperationObject>> = {}
  for (const endpoint of CATALOGUE) {
    const path = (all[endpoint.path] ??= {})
    path[endpoint.method] = operation(endpoint, shown[endpoint.id] ?? {})
  }
  return all
}

const build = () =>
  createDocument({
    openapi: '3.1.0',
    info: { title: 'Emberline', version: CORE_VERSION, description: DESCRIPTION },
    servers: [{ url: '/api/v1' }],
    paths: paths(),
    components: {
      securitySchemes: {
        session: { type: 'apiKey', in: 'cookie', name: 'emberline_session' },
        key: { type: 'http', scheme: 'bearer' },
      },
    },
  })

let built: ReturnType<typeof build> | undefined

/** The API's description, OpenAPI 3.1, made from the endpoints' own schemas; built when first asked for. */
export function apiDocument(): ReturnType<typeof build> {
  built ??= build()
  return built
}
