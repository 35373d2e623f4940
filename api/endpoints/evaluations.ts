import {
  createEvaluationRequest,
  createEvaluationResult,
  evaluation,
  evaluationQuery,
  evidenceBundle,
  pageOf,
} from '#core/wire/index'
import { endpoint } from './endpoint.ts'
import { byId } from './records.ts'

const tag = 'evaluations'

export const listEvaluationsEndpoint = endpoint({
  id: 'listEvaluations',
  method: 'get',
  path: '/evaluations',
  tag,
  summary: 'List stored evaluations, newest first, of one history or candidate if asked',
  may: 'read',
  query: evaluationQuery,
  status: 200,
  answer: pageOf(evaluation),
  answerIs: 'One page of evaluations',
})

export const readEvaluationEndpoint = endpoint({
  id: 'readEvaluation',
  method: 'get',
  path: '/evaluations/{id}',
  tag,
  summary: 'Read one stored evaluation',
  may: 'read',
  params: byId,
  status: 200,
  answer: evaluation,
  answerIs: 'The evaluation',
})

export const createEvaluationEndpoint = endpoint({
  id: 'createEvaluation',
  method: 'post',
  path: '/evaluations',
  tag,
  summary: 'Compute a history revision and a candidate revision on the server and store the result',
  may: 'save-evaluation',
  body: createEvaluationRequest,
  status: 201,
  answer: createEvaluationResult,
  answerIs: 'The stored evaluation, and how far it lies from what the browser had shown',
  problems: ['not-found', 'no-convergence'],
})

export const readEvidenceEndpoint = endpoint({
  id: 'readEvidence',
  method: 'get',
  path: '/evaluations/{id}/evidence',
  tag,
  summary: 'The evidence bundle of an evaluation: inputs, result, digests, and the command that repeats it',
  may: 'read',
  params: byId,
  status: 200,
  answer: evidenceBundle,
  answerIs: 'One file that can be repeated and checked without the group',
})
