import { afterEach, describe, expect, it, vi } from 'vitest'
import { api } from '../../../web/src/lib/api.ts'
import { ApiProblem, ConnectionLost, saysSignedOut } from '../../../web/src/lib/apiProblem.ts'

const answerWith = (body: string | null, status: number): ReturnType<typeof vi.fn> => {
  const fetched = vi.fn(() => Promise.resolve(new Response(body, { status })))
  vi.stubGlobal('fetch', fetched)
  return fetched
}

const refusalOf = async (call: Promise<unknown>): Promise<unknown> => {
  try {
    await call
  } catch (error) {
    return error
  }
  throw new Error('It was answered.')
}

afterEach(() => vi.unstubAllGlobals())

describe('asking the server', () => {
  it('sends JSON to its own address, with the cookie of the session', async () => {
    const fetched = answerWith('{"id":1}', 201)
    expect(await api('POST', '/histories', { name: 'Standard' })).toEqual({ id: 1 })
    expect(fetched).toHaveBeenCalledWith('/api/v1/histories', {
      method: 'POST',
      credentials: 'same-origin',
      headers: { 'content-type': 'application/json' },
      body: '{"name":"Standard"}',
    })
  })

  it('takes an answer without a body', async () => {
    answerWith(null, 204)
    expect(await api('DELETE', '/session')).toBeUndefined()
  })

  it('turns a problem document into an error that tells what it tells', async () => {
    const faults = [{ path: 'massGeV', message: 'allowed: above 0' }]
    const document = {
      type: 'urn:emberline:problem:invalid-input',
      title: 'The input is at fault',
      detail: 'One number is.',
      status: 422,
      instance: 'request-1',
      faults,
    }
    answerWith(JSON.stringify(document), 422)
    const error = await refusalOf(api('POST', '/candidates', {}))
    expect(error).toBeInstanceOf(ApiProblem)
    expect(error).toMatchObject({
      type: document.type,
      title: document.title,
      message: 'One number is.',
      status: 422,
      requestId: 'request-1',
      faults,
    })
  })

  it('names the status when the error is no problem document, as from a proxy', async () => {
    answerWith('<html>Bad gateway</html>', 502)
    expect(await refusalOf(api('GET', '/info'))).toMatchObject({
      name: 'ApiProblem',
      status: 502,
      title: 'The server answered with an error',
    })
  })

  it('says that the connection was lost when nothing was answered', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')))
    expect(await refusalOf(api('GET', '/info'))).toBeInstanceOf(ConnectionLost)
  })
})

describe('a problem', () => {
  const of = (kind: string): ApiProblem =>
    new ApiProblem({ type: `urn:emberline:problem:${kind}`, title: kind, status: 401 })

  it('says that nobody is signed in, which wrong credentials do not', () => {
    expect(saysSignedOut(of('not-signed-in'))).toBe(true)
    expect(saysSignedOut(of('wrong-credentials'))).toBe(false)
    expect(saysSignedOut(new ConnectionLost())).toBe(false)
  })
})
