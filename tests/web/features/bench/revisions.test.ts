import { QueryClient } from '@tanstack/react-query'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { candidatesQuery } from '../../../../web/src/api/records.ts'
import { chosenCandidateQuery, chosenHistoryQuery } from '../../../../web/src/features/bench/revisions.ts'
import { aCandidate, uuid } from '../records/support.tsx'
import { startServer } from './support.tsx'
import type { FakeServer } from './support.tsx'

let server: FakeServer
let client: QueryClient
beforeEach(() => {
  server = startServer()
  client = new QueryClient({ defaultOptions: { queries: { retry: false } } })
})
afterEach(() => vi.unstubAllGlobals())

const candidate = (choice: { recordId: string; number: number } | null) =>
  client.fetchQuery(chosenCandidateQuery(client, choice))
const history = (baselineId: string | null) => client.fetchQuery(chosenHistoryQuery(client, null, baselineId))

describe('what the Bench opens', () => {
  it('is the best-known bath in a history that is not the baseline itself, when none is chosen', async () => {
    expect((await history(server.histories[2]!.head.id))?.name).toBe('2018 fit')
    client.clear()
    expect((await history(server.histories[0]!.head.id))?.name).toBe('Kination')
  })

  it('is the s-wave nearest to 100 GeV, when no candidate is chosen', async () => {
    server.candidates.reverse()
    expect((await candidate(null))?.name).toBe('WIMP')
  })

  it('is an older revision when that is chosen, with the newest beside it', async () => {
    const [wimp] = server.candidates
    server.appendElsewhere(wimp!, aCandidate({ massGeV: 130 }), '')
    const found = await candidate({ recordId: wimp!.id, number: 1 })
    expect(found).toMatchObject({ revision: { number: 1 }, newest: { number: 2 }, missing: null })
  })

  it('is a revision saved after the list was fetched', async () => {
    const [wimp] = server.candidates
    await client.fetchQuery(candidatesQuery)
    server.appendElsewhere(wimp!, aCandidate({ massGeV: 130 }), '')
    const found = await candidate({ recordId: wimp!.id, number: 2 })
    expect(found).toMatchObject({ revision: { number: 2, input: { massGeV: 130 } }, missing: null })
  })

  it('says what is missing and stands in for it', async () => {
    const [wimp] = server.candidates
    expect(await candidate({ recordId: uuid(555), number: 1 })).toMatchObject({
      name: 'WIMP',
      missing: 'record',
    })
    expect(await candidate({ recordId: wimp!.id, number: 9 })).toMatchObject({
      revision: { number: 1 },
      missing: 'revision',
    })
  })

  it('is nothing in a group that has nothing', async () => {
    server.candidates.length = 0
    expect(await candidate(null)).toBeNull()
  })
})
