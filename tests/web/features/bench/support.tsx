/** A server that keeps what it is given, a worker that answers from the real core, and the Bench before them. */
import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { fireEvent, render, screen } from '@testing-library/react'
import { createMemoryRouter, RouterProvider } from 'react-router-dom'
import { vi } from 'vitest'
import { benchAnswer } from '#core/index'
import type { Role } from '#core/wire/index'
import type { BenchQuestion, BenchReply } from '../../../../web/src/workers/bench.worker.ts'
import BenchPage from '../../../../web/src/features/bench/BenchPage.tsx'
import { layOut } from '../../components/layOut.ts'
import { aCandidate, aHistory, uuid } from '../records/support.tsx'

interface StoredRevision {
  id: string
  number: number
  parentId: string | null
  author: { id: string; name: string }
  createdAt: string
  note: string
  digest: string
  input: unknown
}

interface StoredRecord {
  id: string
  name: string
  createdAt: string
  updatedAt: string
  revisionCount: number
  head: StoredRevision
  revisions: StoredRevision[]
}

const MOMENT = '2026-03-01T09:30:00Z'
export const INES = { id: uuid(900), name: 'Ines Aalto' }
export const ME = { id: uuid(901), name: 'Tove Brandt' }

let nextId = 1
const newId = (): string => uuid(nextId++)

function append(record: StoredRecord, input: unknown, author = INES, note = ''): void {
  const number = record.revisions.length + 1
  record.head = {
    id: newId(),
    number,
    parentId: record.head?.id ?? null,
    author,
    createdAt: MOMENT,
    note,
    digest: 'ab12'.repeat(16),
    input,
  }
  record.revisions.unshift(record.head)
  record.revisionCount = number
}

function recordOf(name: string, inputs: readonly unknown[]): StoredRecord {
  const record = {
    id: newId(),
    name,
    createdAt: MOMENT,
    updatedAt: MOMENT,
    revisions: [] as StoredRevision[],
  }
  const filled = record as unknown as StoredRecord
  for (const input of inputs) append(filled, input)
  return filled
}

export interface Posted {
  path: string
  body: Record<string, unknown>
}

export interface FakeServer {
  histories: StoredRecord[]
  candidates: StoredRecord[]
  /** What was posted, in order. */
  posted: Posted[]
  /** Someone else saves a revision. */
  appendElsewhere(record: StoredRecord, input: unknown, note: string): void
  /** Paths that answer with a lost connection. */
  unreachable: Set<string>
  /** Added to the number the server finds. */
  disagreement: number
}

const problem = (status: number, title: string) => ({ type: 'about:blank', title, status, detail: title })

/** The API as far as the Bench uses it. */
export function startServer({ role = 'author' as Role } = {}): FakeServer {
  nextId = 1
  const steps = recordOf('Textbook steps', [
    aHistory({ bath: { treatment: 'thresholds' }, neutrinos: { treatment: 'instantaneous' } }),
  ])
  const server: FakeServer = {
    histories: [
      recordOf('2018 fit', [aHistory({ bath: { treatment: 'fit-2018', band: 0.5 } }), aHistory()]),
      recordOf('Kination', [
        aHistory({ expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 1.15 } }),
      ]),
      steps,
    ],
    candidates: [recordOf('WIMP', [aCandidate()]), recordOf('Heavy', [aCandidate({ massGeV: 900 })])],
    posted: [],
    appendElsewhere: (record, input, note) => append(record, input, INES, note),
    unreachable: new Set(),
    disagreement: 0,
  }
  const session = {
    user: { ...ME, email: 'tove@example.org' },
    group: { id: uuid(800), name: 'Group', baselineRevisionId: steps.head.id },
    role,
    expiresAt: MOMENT,
  }

  const get = (path: string): unknown => {
    if (path === '/session') return session
    for (const kind of ['histories', 'candidates'] as const) {
      if (path === `/${kind}`) return { items: server[kind], next: null }
      const found = server[kind].find((record) => path === `/${kind}/${record.id}`)
      if (found) return found
    }
    return undefined
  }
  const post = (path: string, body: Record<string, unknown>): { status: number; body: unknown } => {
    const [, kind, id] = path.split('/') as [string, 'histories' | 'candidates' | 'evaluations', string?]
    if (kind === 'evaluations') return { status: 201, body: evaluationOf(body, server.disagreement) }
    if (id === undefined) {
      const record = recordOf(String(body['name']), [body['input']])
      server[kind].unshift(record)
      return { status: 201, body: record }
    }
    const record = server[kind].find((each) => each.id === id)!
    if (record.head.id !== body['parentId'])
      return { status: 409, body: problem(409, 'A newer revision was saved meanwhile') }
    append(record, body['input'], ME, String(body['note']))
    return { status: 201, body: record }
  }
  vi.stubGlobal('fetch', (address: string, request?: RequestInit) => {
    const path = address.replace('/api/v1', '').split('?')[0]!
    if (server.unreachable.has(path)) return Promise.reject(new TypeError('Failed to fetch'))
    if (request?.method === 'POST') {
      const body = JSON.parse(String(request.body)) as Record<string, unknown>
      server.posted.push({ path, body })
      const answer = post(path, body)
      return Promise.resolve(new Response(JSON.stringify(answer.body), { status: answer.status }))
    }
    const found = get(path)
    return Promise.resolve(
      new Response(JSON.stringify(found ?? problem(404, 'Not found')), { status: found ? 200 : 404 }),
    )
  })
  return server
}

const evaluationOf = (body: Record<string, unknown>, disagreement: number) => ({
  evaluation: { id: uuid(700), ...body },
  shown: { relativeDifference: disagreement, allowed: 1e-9, agrees: Math.abs(disagreement) <= 1e-9 },
})

/** How the workers of a test behave, and how many there were. */
export interface Workers {
  started: number
  /** They break down at the next question instead of answering it. */
  broken: boolean
}

/** Workers that answer from the core, each a task later. */
export function startWorkers(): Workers {
  const workers: Workers = { started: 0, broken: false }
  vi.stubGlobal(
    'Worker',
    class {
      onmessage: ((event: { data: BenchReply }) => void) | null = null
      onerror: ((event: { message: string }) => void) | null = null
      #ended = false
      constructor() {
        workers.started++
      }
      postMessage({ id, request }: BenchQuestion): void {
        setTimeout(() => {
          if (this.#ended) return
          if (workers.broken) this.onerror?.({ message: '' })
          else this.onmessage?.({ data: { id, answer: benchAnswer(request) } })
        })
      }
      terminate(): void {
        this.#ended = true
      }
    },
  )
  return workers
}

export function openBench(search = '') {
  layOut(1000)
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } })
  const router = createMemoryRouter(
    [
      { path: '/bench', Component: BenchPage },
      { path: '*', element: <p>another page</p> },
    ],
    { initialEntries: [`/bench${search}`] },
  )
  render(
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  )
  return { router }
}

/** Ω_χh² on screen, at full precision. */
export const omegaShown = (): number => Number(screen.getByTestId('omega').dataset['value'])

export const pick = (kind: 'History' | 'Candidate', name: string): void => {
  const list = screen.getByLabelText<HTMLSelectElement>(`${kind} on the Bench`)
  const option = [...list.options].find((each) => each.text === name)!
  fireEvent.change(list, { target: { value: option.value } })
}

export const picked = (kind: 'History' | 'Candidate'): string => {
  const list = screen.getByLabelText<HTMLSelectElement>(`${kind} on the Bench`)
  return list.options[list.selectedIndex]!.text
}

export const typeMass = (text: string): void => {
  fireEvent.change(screen.getByLabelText('Mass', { exact: true }), { target: { value: text } })
}
