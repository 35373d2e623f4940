import type { z } from 'zod'
import type { ProblemKind } from '../errors/problems.ts'
import type { Action } from '../permissions.ts'

/** An address of the API: what it takes, what it answers, who may call it. Routes and the API document both read it. */
export interface Endpoint<
  Params extends z.ZodObject = z.ZodObject,
  Query extends z.ZodObject = z.ZodObject,
  Body extends z.ZodType = z.ZodType,
  Answer extends z.ZodType = z.ZodType,
> {
  id: string
  method: 'get' | 'post' | 'delete'
  /** As OpenAPI writes it, below /api/v1: `/histories/{id}`. */
  path: string
  tag: string
  summary: string
  may: Action | 'anyone'
  params?: Params
  query?: Query
  body?: Body
  status: 200 | 201 | 204
  answer?: Answer
  answerIs: string
  /** Problems beside those that follow from the shape: signing in, role, body, address. */
  problems?: readonly ProblemKind[]
}

/** Keeps the exact types of the schemas, so that a handler's request and answer are checked against them. */
export const endpoint = <
  Params extends z.ZodObject,
  Query extends z.ZodObject,
  Body extends z.ZodType,
  Answer extends z.ZodType,
>(
  description: Endpoint<Params, Query, Body, Answer>,
): Endpoint<Params, Query, Body, Answer> => description
