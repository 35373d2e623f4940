import { cleanup, fireEvent, screen, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { candidateInput } from '#core/wire/index'
import CandidatesPage from '../../../../web/src/features/records/CandidatesPage.tsx'
import HistoriesPage from '../../../../web/src/features/records/HistoriesPage.tsx'
import {
  aCandidate,
  aHistory,
  candidateRecordOf,
  historyRecordOf,
  renderPage,
  serve,
  sessionOf,
  uuid,
} from './support.tsx'

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const page = (items: unknown[]) => ({ body: { items, next: null } })
const showHistories = () => renderPage(HistoriesPage, '/histories', '/histories')
const kination = { kind: 'fluid', index: 2, equalityTemperatureGeV: 0.5 }

describe('the list of histories', () => {
  it('tells each history’s assumptions in a line and marks the baseline of the group', async () => {
    serve({
      '/histories': page([
        historyRecordOf(100, 'Standard', aHistory()),
        historyRecordOf(110, 'Kination', aHistory({ expansion: kination, maximumTemperatureGeV: 2000 })),
      ]),
      '/session': { body: sessionOf(uuid(101)) },
    })
    showHistories()
    const row = (await screen.findByRole('link', { name: 'Kination' })).closest('tr')!
    expect(row.textContent).toContain('2018 fit, middle of its band; kination, equal to radiation at 500 MeV')
    expect(row.textContent).toContain('at most 2 TeV')
    const marked = (await screen.findByText('baseline')).closest('tr')!
    expect(within(marked).getByRole('link').getAttribute('href')).toBe(`/histories/${uuid(100)}`)
    expect(document.title).toBe('Histories · Emberline')
  })

  it('shows that it is waiting', () => {
    vi.stubGlobal('fetch', () => new Promise(() => undefined))
    showHistories()
    expect(screen.getByRole('status', { name: 'Loading histories' })).toBeDefined()
  })

  it('says what the server said when it fails, and asks again when told to', async () => {
    serve({
      '/histories': {
        status: 503,
        body: { title: 'Out of reach', status: 503, detail: 'The store is down.' },
      },
    })
    showHistories()
    expect((await screen.findByRole('alert')).textContent).toContain('The store is down.')
    serve({ '/histories': page([historyRecordOf(100, 'Standard', aHistory())]) })
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }))
    expect(await screen.findByRole('link', { name: 'Standard' })).toBeDefined()
    expect(screen.queryByRole('alert')).toBeNull()
  })

  it.each([
    ['author', 1],
    ['lead', 1],
    ['reader', 0],
  ] as const)('leads the %s to the Bench for a new one, if they may save one', async (role, links) => {
    serve({
      '/histories': page([historyRecordOf(100, 'Standard', aHistory())]),
      '/session': { body: { ...sessionOf(uuid(101)), role } },
    })
    showHistories()
    await screen.findByText('baseline')
    const found = screen.queryAllByRole('link', { name: 'New history on the Bench' })
    expect(found.map((link) => link.getAttribute('href'))).toEqual(Array<string>(links).fill('/bench'))
  })

  it('points to the Bench while it is empty', async () => {
    serve({ '/histories': page([]) })
    showHistories()
    expect((await screen.findByRole('link', { name: 'Open the Bench' })).getAttribute('href')).toBe('/bench')
  })
})

describe('the list of candidates', () => {
  it('describes each candidate and can be filtered by mechanism', async () => {
    const relic = candidateInput.parse({
      mechanism: 'hot-relic',
      massGeV: 1e-8,
      degreesOfFreedom: 2,
      statistics: 'fermion',
      decouplingTemperatureGeV: 0.002,
    })
    serve({
      '/candidates': page([
        candidateRecordOf(200, 'Thermal', aCandidate()),
        candidateRecordOf(210, 'Light', relic),
      ]),
    })
    renderPage(CandidatesPage, '/candidates', '/candidates')
    expect((await screen.findByRole('link', { name: 'Light' })).closest('tr')!.textContent).toContain(
      '10 eV fermion',
    )
    fireEvent.change(screen.getByRole('searchbox'), { target: { value: 'freeze-out' } })
    expect(screen.queryByRole('link', { name: 'Light' })).toBeNull()
    expect(screen.getByRole('link', { name: 'Thermal' })).toBeDefined()
  })
})
