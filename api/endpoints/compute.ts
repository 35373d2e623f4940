import {
  abundanceRequest,
  abundanceResult,
  attributeRequest,
  attributeResult,
  batchRequest,
  batchResult,
  convertRequest,
  convertResult,
  historyRequest,
  historyResult,
  laboratoryRequest,
  laboratoryResult,
  propagateRequest,
  propagateResult,
  publishedResult,
  solveRequest,
  solveResult,
} from '#core/wire/index'
import type { z } from 'zod'
import { endpoint } from './endpoint.ts'

const tag = 'compute'

/** A question of the core as an address: what it takes is what the command of the same name takes. */
function question<Body extends z.ZodType, Answer extends z.ZodType>(description: {
  what: string
  summary: string
  body: Body
  answer: Answer
  answerIs: string
}) {
  const { what, summary, ...rest } = description
  return endpoint({
    id: `compute${what.charAt(0).toUpperCase()}${what.slice(1)}`,
    method: 'post',
    path: `/compute/${what}`,
    tag,
    summary: `${summary}, without saving. With “Accept: application/x-ndjson” the answer comes as lines: {"progress": …} while it works, then {"result": …} or {"problem": …}`,
    may: 'compute',
    status: 200,
    problems: ['no-convergence', 'busy'],
    ...rest,
  })
}

export const computeHistoryEndpoint = question({
  what: 'history',
  summary: 'Derive a thermal history at given temperatures',
  body: historyRequest,
  answer: historyResult,
  answerIs: 'One row per temperature, in the order asked',
})

export const computeAbundanceEndpoint = question({
  what: 'abundance',
  summary: 'Compute the abundance of a candidate in a history',
  body: abundanceRequest,
  answer: abundanceResult,
  answerIs: 'Ω_χh², its numerical error, and the guards',
})

export const computeSolveEndpoint = question({
  what: 'solve',
  summary: 'Find every value of one number that gives the wanted abundance',
  body: solveRequest,
  answer: solveResult,
  answerIs: 'All solutions in the bracket, or what happened when there is none',
})

export const computeAttributeEndpoint = question({
  what: 'attribute',
  summary: 'Split the change of an abundance between two histories over what differs',
  body: attributeRequest,
  answer: attributeResult,
  answerIs: 'Exact Shapley parts, one at a time, and elasticities',
})

export const computePropagateEndpoint = question({
  what: 'propagate',
  summary: 'Propagate uncertain inputs to the abundance by Latin hypercube samples',
  body: propagateRequest,
  answer: propagateResult,
  answerIs: 'Quantiles and rank correlations',
})

export const computeConvertEndpoint = question({
  what: 'convert',
  summary: 'Convert between the numbers that tell a moment of a history',
  body: convertRequest,
  answer: convertResult,
  answerIs: 'One row per value',
})

export const computeLaboratoryEndpoint = question({
  what: 'laboratory',
  summary: 'Predict the density from a measured decay and hold it against the sky',
  body: laboratoryRequest,
  answer: laboratoryResult,
  answerIs: 'The predicted density as a distribution, its pull, and the share explained',
})

export const computeBatchEndpoint = endpoint({
  id: 'computeBatch',
  method: 'post',
  path: '/compute/batch',
  tag,
  summary: 'Answer several questions in one request, each with a result or an error of its own',
  may: 'compute',
  body: batchRequest,
  status: 200,
  answer: batchResult,
  answerIs: 'One answer per item, in their order',
  problems: ['busy'],
})

export const publishedValuesEndpoint = endpoint({
  id: 'publishedValues',
  method: 'get',
  path: '/published-values',
  tag,
  summary: 'The published values this core is held against, with ours and the reason for each difference',
  may: 'read',
  status: 200,
  answer: publishedResult,
  answerIs: 'Every value, computed by this core when first asked',
})
