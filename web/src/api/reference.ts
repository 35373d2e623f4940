import { queryOptions } from '@tanstack/react-query'
import type { ApiDocument } from '../features/reference/apiDocument.ts'
import { api } from '../lib/api.ts'

/** The API's own description, which does not change while a server runs. */
export const apiDocumentQuery = queryOptions({
  queryKey: ['api-document'],
  // It lies beside the version's addresses, not below them.
  queryFn: () => api<ApiDocument>('GET', '/../openapi.json'),
  staleTime: Infinity,
})
