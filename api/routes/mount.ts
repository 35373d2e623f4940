import { parseInput } from '#core/wire/index'
import type { Request, RequestHandler, Response, Router } from 'express'
import type { z } from 'zod'
import type { Endpoint } from '../endpoints/endpoint.ts'
import { notFound } from '../errors/problemError.ts'
import { jsonBody } from '../middleware/jsonBody.ts'
import { requireAction } from '../middleware/caller.ts'

/** What a handler gets: the parsed parts of the request, and express's own pair for the few that set cookies. */
export interface Call<Params, Query, Body> {
  params: Params
  query: Query
  body: Body
  req: Request
  res: Response
}

/** An address with a malformed id leads nowhere, like one with an unknown id. */
function parseParams<S extends z.ZodObject>(schema: S, params: unknown): z.output<S> {
  const parsed = schema.safeParse(params)
  if (!parsed.success) throw notFound('record')
  return parsed.data
}

const expressPath = (path: string): string => path.replaceAll(/\{(\w+)\}/g, ':$1')

/** Schemas a description leaves out parse to nothing, and its handler has no type to read it by. */
const parseIf = <S extends z.ZodType>(schema: S | undefined, value: unknown): z.output<S> =>
  (schema === undefined ? undefined : parseInput(schema, value)) as z.output<S>

/**
 * Serves an endpoint: role, then body, then `before`, then the schemas, then the handler; the answer goes out
 * with the status the endpoint states.
 */
export function mount<
  Params extends z.ZodObject,
  Query extends z.ZodObject,
  Body extends z.ZodType,
  Answer extends z.ZodType,
>(
  router: Router,
  endpoint: Endpoint<Params, Query, Body, Answer>,
  handler: (call: Call<z.output<Params>, z.output<Query>, z.output<Body>>) => Promise<z.output<Answer>>,
  before: RequestHandler[] = [],
): void {
  const { method, path, may, status, params, query, body } = endpoint
  router[method](
    expressPath(path),
    ...(may === 'anyone' ? [] : [requireAction(may)]),
    ...(body === undefined ? [] : jsonBody),
    ...before,
    async (req: Request, res: Response) => {
      const answer = await handler({
        params: (params === undefined ? undefined : parseParams(params, req.params)) as z.output<Params>,
        query: parseIf(query, req.query),
        body: parseIf(body, req.body),
        req,
        res,
      })
      // Answered already, line by line; or nobody is there any more.
      if (res.writableEnded || res.destroyed) return
      res.status(status)
      if (status === 204) res.end()
      else res.json(answer)
    },
  )
}
