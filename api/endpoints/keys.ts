import { apiKey, createKeyRequest, createKeyResult, keyList, keyQuery } from '#core/wire/index'
import { endpoint } from './endpoint.ts'
import { byId } from './records.ts'

const tag = 'keys'

export const listKeysEndpoint = endpoint({
  id: 'listKeys',
  method: 'get',
  path: '/keys',
  tag,
  summary: 'List API keys, newest first: one’s own, or for a lead the whole group’s',
  may: 'own-keys',
  query: keyQuery,
  status: 200,
  answer: keyList,
  answerIs: 'The keys, without their secrets',
})

export const createKeyEndpoint = endpoint({
  id: 'createKey',
  method: 'post',
  path: '/keys',
  tag,
  summary: 'Make an API key; its secret is in the answer and nowhere else',
  may: 'own-keys',
  body: createKeyRequest,
  status: 201,
  answer: createKeyResult,
  answerIs: 'The key with its secret',
})

export const revokeKeyEndpoint = endpoint({
  id: 'revokeKey',
  method: 'delete',
  path: '/keys/{id}',
  tag,
  summary: 'Revoke an API key: one’s own, or for a lead anyone’s; it ends at once',
  may: 'own-keys',
  params: byId,
  status: 200,
  answer: apiKey,
  answerIs: 'The key, revoked',
})
