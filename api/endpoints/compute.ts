import { abundanceRequest, abundanceResult, historyRequest, historyResult } from '#core/wire/index'
import { endpoint } from './endpoint.ts'

const tag = 'compute'

export const computeHistoryEndpoint = endpoint({
  id: 'computeHistory',
  method: 'post',
  path: '/compute/history',
  tag,
  summary: 'Derive a thermal history at given temperatures, without saving',
  may: 'compute',
  body: historyRequest,
  status: 200,
  answer: historyResult,
  answerIs: 'One row per temperature or age, in the order asked; N_eff and ΔN_eff at 1 keV',
})

export const computeAbundanceEndpoint = endpoint({
  id: 'computeAbundance',
  method: 'post',
  path: '/compute/abundance',
  tag,
  summary: 'Compute the abundance of a candidate in a history, without saving',
  may: 'compute',
  body: abundanceRequest,
  status: 200,
  answer: abundanceResult,
  answerIs: 'Ω_χh², its numerical error, and the guards',
  problems: ['no-convergence'],
})
