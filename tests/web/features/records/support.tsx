/** Stands in for the server, and for the frame around a page. */
import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { render } from '@testing-library/react'
import type { ComponentType } from 'react'
import { createMemoryRouter, RouterProvider } from 'react-router-dom'
import { vi } from 'vitest'
import { candidateInput, historyInput } from '#core/wire/index'
import type {
  CandidateInput,
  CandidateRecord,
  CandidateRevision,
  Evaluation,
  HistoryInput,
  HistoryRecord,
  HistoryRevision,
  SessionInfo,
} from '#core/wire/index'

export const uuid = (number: number): string => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`

const AUTHOR = { id: uuid(900), name: 'Ines Aalto' }
const DIGEST = 'ab12'.repeat(16)

type Answer = { body: unknown; status?: number }

/** Answers each path under /api/v1 with what is given; anything else with 404. */
export function serve(answers: Record<string, Answer>): ReturnType<typeof vi.fn> {
  const fetched = vi.fn((address: string) => {
    const [path, search] = address.replace('/api/v1', '').split('?')
    const answer = answers[`${path}?${search}`] ?? answers[path!]
    const body = answer?.body ?? { type: 'about:blank', title: 'Not found', status: 404 }
    return Promise.resolve(
      new Response(JSON.stringify(body), { status: answer ? (answer.status ?? 200) : 404 }),
    )
  })
  vi.stubGlobal('fetch', fetched)
  return fetched
}

export function renderPage(Page: ComponentType, path: string, address: string) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } })
  const router = createMemoryRouter([{ path, Component: Page }], { initialEntries: [address] })
  return render(
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  )
}

export const aHistory = (over: object = {}): HistoryInput => historyInput.parse(over)

export const aCandidate = (over: object = {}): CandidateInput =>
  candidateInput.parse({
    mechanism: 'freeze-out',
    massGeV: 100,
    degreesOfFreedom: 2,
    statistics: 'fermion',
    annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
    ...over,
  })

const revision = <T,>(id: number, number: number, input: T) => ({
  id: uuid(id),
  number,
  parentId: null,
  author: AUTHOR,
  createdAt: `2026-03-0${number}T09:30:00Z`,
  note: `note of ${number}`,
  digest: DIGEST,
  input,
})

function recordOf<T>(id: number, name: string, inputs: T[]) {
  const revisions = inputs.map((input, index) => revision(id + index + 1, index + 1, input)).reverse()
  const head = revisions[0]!
  const { createdAt } = revisions.at(-1)!
  return {
    id: uuid(id),
    name,
    createdAt,
    updatedAt: head.createdAt,
    revisionCount: inputs.length,
    head,
    revisions,
  }
}

/** A history whose revisions hold those inputs, the first one first; their ids follow the record's. */
export const historyRecordOf = (id: number, name: string, ...inputs: HistoryInput[]): HistoryRecord =>
  recordOf<HistoryRevision['input']>(id, name, inputs)

export const candidateRecordOf = (id: number, name: string, ...inputs: CandidateInput[]): CandidateRecord =>
  recordOf<CandidateRevision['input']>(id, name, inputs)

export const sessionOf = (baselineRevisionId: string | null): SessionInfo => ({
  user: { ...AUTHOR, email: 'ines@example.org' },
  group: { id: uuid(901), name: 'Larch Valley group', baselineRevisionId },
  role: 'author',
  expiresAt: '2027-01-01T00:00:00Z',
})

/** Evaluation `id` of the first revisions of history 100 and candidate 200. */
export const evaluationOf = (id: number, result: Partial<Evaluation['result']> = {}): Evaluation => ({
  id: uuid(id),
  history: { id: uuid(101), number: 1, recordId: uuid(100), name: 'Standard' },
  candidate: { id: uuid(201), number: 1, recordId: uuid(200), name: 'Thermal fermion' },
  author: AUTHOR,
  createdAt: '2026-03-05T12:00:00Z',
  coreVersion: '0.1.0',
  inputDigest: DIGEST,
  result: { omegaH2: 0.1205, yieldToday: 4.366e-12, numericalError: 4e-8, guards: [], ...result },
})
