/** The real router and cache around a stand-in for the server that can lose its session. */
import './browser.ts'
import { QueryClientProvider } from '@tanstack/react-query'
import { render } from '@testing-library/react'
import { createElement } from 'react'
import { RouterProvider } from 'react-router-dom'
import { vi } from 'vitest'
import { queryClient } from '../../../web/src/app/queryClient.ts'
import { router } from '../../../web/src/app/router.tsx'
import { sessionOf } from '../features/records/support.tsx'

const problem = (status: number, kind: string, title: string): Response =>
  new Response(
    JSON.stringify({ type: `urn:emberline:problem:${kind}`, title, detail: `${title}.`, status }),
    { status },
  )

const ok = (body: unknown): Response => new Response(JSON.stringify(body))

const PASSWORD = 'seven quiet larches'

const INFO = {
  coreVersion: '0.1.0',
  demo: true,
  demoSignIns: [{ name: 'Ines Aalto', role: 'author', email: 'ines@example.org', password: PASSWORD }],
}

export interface StandInServer {
  signedIn: boolean
  /** The connection is cut from here on. */
  away: boolean
  asked: string[]
}

/** A server with one account and nothing stored. */
export function standInServer(signedIn: boolean): StandInServer {
  const server: StandInServer = { signedIn, away: false, asked: [] }
  const answer = (method: string, path: string, body: string): Response => {
    if (path === '/info') return ok(INFO)
    if (method === 'POST' && path === '/session') {
      if ((JSON.parse(body) as { password: string }).password !== PASSWORD)
        return problem(401, 'wrong-credentials', 'E-mail address and password do not go together')
      server.signedIn = true
      return ok(sessionOf(null))
    }
    if (!server.signedIn) return problem(401, 'not-signed-in', 'Nobody is signed in')
    if (method === 'DELETE' && path === '/session') {
      server.signedIn = false
      return new Response(null, { status: 204 })
    }
    return path === '/session' ? ok(sessionOf(null)) : ok({ items: [], next: null })
  }
  vi.stubGlobal('fetch', (address: string, { method, body = '' }: { method: string; body?: string }) => {
    const path = address.replace('/api/v1', '').split('?')[0]!
    server.asked.push(`${method} ${path}`)
    return server.away ? Promise.reject(new TypeError('cut')) : Promise.resolve(answer(method, path, body))
  })
  return server
}

/** The whole product at an address. */
export async function openAt(address: string): Promise<void> {
  queryClient.clear()
  await router.navigate(address)
  render(
    createElement(QueryClientProvider, { client: queryClient }, createElement(RouterProvider, { router })),
  )
}

export const whereNow = (): string => router.state.location.pathname + router.state.location.search
