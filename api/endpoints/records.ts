import {
  candidateRecord,
  candidateSummary,
  createCandidateRequest,
  createHistoryRequest,
  historyRecord,
  historySummary,
  listQuery,
  pageOf,
  reviseCandidateRequest,
  reviseHistoryRequest,
} from '#core/wire/index'
import { z } from 'zod'
import { endpoint } from './endpoint.ts'

export const byId = z.object({ id: z.uuid() })

interface RecordSchemas<
  Summary extends z.ZodType,
  Full extends z.ZodType,
  Create extends z.ZodType,
  Revise extends z.ZodType,
> {
  noun: string
  plural: string
  summary: Summary
  full: Full
  create: Create
  revise: Revise
}

function recordEndpoints<
  Summary extends z.ZodType,
  Full extends z.ZodType,
  Create extends z.ZodType,
  Revise extends z.ZodType,
>({ noun, plural, summary, full, create, revise }: RecordSchemas<Summary, Full, Create, Revise>) {
  const capital = noun.charAt(0).toUpperCase() + noun.slice(1)
  const path = `/${plural}`
  return {
    list: endpoint({
      id: `list${capital}Records`,
      method: 'get',
      path,
      tag: plural,
      summary: `List the group’s ${plural}, newest first, each with its newest revision`,
      may: 'read',
      query: listQuery,
      status: 200,
      answer: pageOf(summary),
      answerIs: `One page of ${plural}`,
    }),
    read: endpoint({
      id: `read${capital}`,
      method: 'get',
      path: `${path}/{id}`,
      tag: plural,
      summary: `Read one ${noun} with all its revisions`,
      may: 'read',
      params: byId,
      status: 200,
      answer: full,
      answerIs: `The ${noun}`,
    }),
    create: endpoint({
      id: `create${capital}`,
      method: 'post',
      path,
      tag: plural,
      summary: `Save a new ${noun} as its first revision`,
      may: 'save-revision',
      body: create,
      status: 201,
      answer: full,
      answerIs: `The ${noun} as saved`,
    }),
    revise: endpoint({
      id: `revise${capital}`,
      method: 'post',
      path: `${path}/{id}/revisions`,
      tag: plural,
      summary: `Save the next revision of a ${noun}`,
      may: 'save-revision',
      params: byId,
      body: revise,
      status: 201,
      answer: full,
      answerIs: `The ${noun} with its new revision as head`,
      problems: ['stale-parent'],
    }),
  }
}

export const historyEndpoints = recordEndpoints({
  noun: 'history',
  plural: 'histories',
  summary: historySummary,
  full: historyRecord,
  create: createHistoryRequest,
  revise: reviseHistoryRequest,
})

export const candidateEndpoints = recordEndpoints({
  noun: 'candidate',
  plural: 'candidates',
  summary: candidateSummary,
  full: candidateRecord,
  create: createCandidateRequest,
  revise: reviseCandidateRequest,
})
