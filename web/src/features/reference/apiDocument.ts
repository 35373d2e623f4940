/** The parts of an OpenAPI 3.1 document that the reference page shows. */
interface Content {
  'application/json'?: { schema?: unknown; example?: unknown }
}

interface Parameter {
  name: string
  in: string
  required?: boolean
  description?: string
  schema?: { type?: string; enum?: unknown[]; default?: unknown; description?: string }
}

export interface ApiOperation {
  operationId: string
  summary: string
  tags: string[]
  security: Record<string, unknown>[]
  parameters?: Parameter[]
  requestBody?: { content: Content }
  responses: Record<string, { description: string; content?: Content }>
}

export interface ApiDocument {
  info: { version: string; description: string }
  servers: { url: string }[]
  paths: Record<string, Record<string, ApiOperation>>
}

/** One address of the API with its method. */
export interface Call {
  method: string
  /** Below the server's address, as `/histories/{id}`. */
  path: string
  operation: ApiOperation
}

/** Every call of the document, in its order, under its tag. */
export function callsByTag(document: ApiDocument): Map<string, Call[]> {
  const tags = new Map<string, Call[]>()
  for (const [path, methods] of Object.entries(document.paths))
    for (const [method, operation] of Object.entries(methods)) {
      const tag = operation.tags[0] ?? 'other'
      tags.set(tag, [...(tags.get(tag) ?? []), { method, path, operation }])
    }
  return tags
}

export const takesKey = ({ operation }: Call): boolean =>
  operation.security.some((way) => Object.hasOwn(way, 'key'))

export const exampleBody = ({ operation }: Call): unknown =>
  operation.requestBody?.content['application/json']?.example

/** The answer when all is well: its status, what it is, and an example. */
export function goodAnswer({ operation }: Call): { status: string; is: string; example: unknown } | null {
  const [status, answer] = Object.entries(operation.responses).find(([code]) => code.startsWith('2')) ?? []
  if (status === undefined || answer === undefined) return null
  return { status, is: answer.description, example: answer.content?.['application/json']?.example }
}
