import { problem } from '#core/wire/index'
import type { Problem } from '#core/wire/index'
import { PROBLEMS, problemType } from '#api/errors/problems'
import type { ProblemKind } from '#api/errors/problems'
import type { Response } from 'supertest'
import { expect } from 'vitest'

/** Asserts that an answer is the problem document of this kind, in form and status, and returns it. */
export function expectProblem(answer: Response, kind: ProblemKind): Problem {
  expect(answer.headers['content-type']).toMatch(/^application\/problem\+json/)
  const document = problem.parse(JSON.parse(answer.text))
  expect(document).toMatchObject({
    type: problemType(kind),
    status: PROBLEMS[kind].status,
    instance: answer.headers['x-request-id'],
  })
  expect(answer.status).toBe(PROBLEMS[kind].status)
  return document
}
