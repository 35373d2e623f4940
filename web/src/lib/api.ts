import type { Problem } from '#core/wire/index'
import { ApiProblem, ConnectionLost } from './apiProblem.ts'

async function call(method: string, path: string, body?: unknown): Promise<Response> {
  try {
    return await fetch(`/api/v1${path}`, {
      method,
      credentials: 'same-origin',
      ...(body === undefined
        ? {}
        : { headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) }),
    })
  } catch {
    throw new ConnectionLost()
  }
}

async function problemOf(response: Response): Promise<ApiProblem> {
  try {
    return new ApiProblem((await response.json()) as Problem)
  } catch {
    return new ApiProblem({
      type: 'about:blank',
      title: 'The server answered with an error',
      status: response.status,
    })
  }
}

/**
 * Asks the server and returns what it answers; its schemas live in core/wire and are checked on the server's side.
 * @throws ApiProblem, ConnectionLost
 */
export async function api<T>(method: 'GET' | 'POST' | 'DELETE', path: string, body?: unknown): Promise<T> {
  const response = await call(method, path, body)
  if (!response.ok) throw await problemOf(response)
  return response.status === 204 ? (undefined as T) : ((await response.json()) as T)
}
