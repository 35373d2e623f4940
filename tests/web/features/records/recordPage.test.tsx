import { cleanup, fireEvent, screen, within } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import CandidatePage from '../../../../web/src/features/records/CandidatePage.tsx'
import HistoryPage from '../../../../web/src/features/records/HistoryPage.tsx'
import {
  aCandidate,
  aHistory,
  candidateRecordOf,
  evaluationOf,
  historyRecordOf,
  renderPage,
  serve,
  sessionOf,
  uuid,
} from './support.tsx'

const KINATION = { expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 0.5 } }
const region = (name: string | RegExp) => screen.findByRole('region', { name })

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

describe('the page of a history', () => {
  beforeEach(() => {
    const kination = aHistory(KINATION)
    const later = aHistory({ ...KINATION, maximumTemperatureGeV: 50 })
    serve({
      [`/histories/${uuid(100)}`]: { body: historyRecordOf(100, 'Stiff start', aHistory(), kination, later) },
      '/session': { body: sessionOf(uuid(102)) },
      '/evaluations': { body: { items: [evaluationOf(1)], next: null } },
    })
  })
  const show = (search = '') => renderPage(HistoryPage, '/histories/:id', `/histories/${uuid(100)}${search}`)

  it('tells the newest revision in words and in numbers', async () => {
    show()
    const assumptions = await region('Assumptions of revision 3')
    expect(assumptions.textContent).toContain('kination, equal to radiation at 500 MeV')
    const bound = within(assumptions).getByRole('rowheader', { name: 'maximumTemperatureGeV' })
    expect(bound.closest('tr')!.textContent).toContain('50 GeV')
  })

  it('tells an older revision when its number is in the address', async () => {
    show('?revision=1')
    expect((await region('Assumptions of revision 1')).textContent).toContain('not bounded')
  })

  it('does not print the thousands of rows in which two tables differ', async () => {
    const table = (shift: number) =>
      aHistory({
        bath: {
          treatment: 'uploaded',
          points: Array.from({ length: 2000 }, (_, i) => ({
            temperatureGeV: 0.01 * 1.006 ** i,
            gS: 11 + 90 * (i / 2000) + shift,
          })),
        },
      })
    serve({
      [`/histories/${uuid(100)}`]: { body: historyRecordOf(100, 'Own table', table(0), table(0.1)) },
      '/session': { body: sessionOf(uuid(102)) },
      '/evaluations': { body: { items: [], next: null } },
    })
    show()
    const comparison = await screen.findByRole('table', { name: /^What differs between revisions/ })
    expect(within(comparison).getAllByRole('row').length).toBeLessThan(60)
    fireEvent.click(within(comparison).getByRole('button', { name: 'Show 400 more of 2000 that differ' }))
    expect(within(comparison).getAllByRole('row').length).toBeGreaterThan(400)
  })

  it('lists every revision with its note and the way to the Bench, and marks the baseline', async () => {
    show()
    const items = within(await region('Revisions')).getAllByRole('listitem')
    expect(items.map((item) => within(item).getByText(/^note of/).textContent)).toEqual([
      'note of 3',
      'note of 2',
      'note of 1',
    ])
    expect(within(items[1]!).getByRole('link', { name: 'open on the Bench' }).getAttribute('href')).toBe(
      `/bench?history=${uuid(100)}@2`,
    )
    const mark = await screen.findByText('baseline of the group')
    expect(items.map((item) => item.contains(mark))).toEqual([false, true, false])
  })

  it('holds the newest two revisions side by side, or any two chosen', async () => {
    show()
    const changed = within(await region('What changed'))
    const paths = () => changed.getAllByRole('rowheader').map((cell) => cell.textContent)
    expect(paths()).toEqual(['Maximum temperature', 'maximumTemperatureGeV'])
    fireEvent.change(changed.getByRole('combobox', { name: 'From' }), { target: { value: '1' } })
    expect(paths()).toContain('expansion.equalityTemperatureGeV')
    fireEvent.change(changed.getByRole('combobox', { name: 'To' }), { target: { value: '1' } })
    expect(changed.getByText('These two are the same in every field.')).toBeDefined()
  })

  it('says in words what the fields that differ come to, and leaves out what is the same', async () => {
    show()
    const changed = within(await region('What changed'))
    fireEvent.change(changed.getByRole('combobox', { name: 'From' }), { target: { value: '1' } })
    fireEvent.change(changed.getByRole('combobox', { name: 'To' }), { target: { value: '2' } })
    const words = changed.getByRole('rowheader', { name: 'Expansion' }).closest('tr')!
    expect(
      within(words)
        .getAllByRole('cell')
        .map((cell) => cell.textContent),
    ).toEqual(['radiation', '→ kination, equal to radiation at 500 MeV'])
    const absent = changed.getByRole('rowheader', { name: 'expansion.index' }).closest('tr')!
    expect(absent.textContent).toContain('not part of it')
    expect(changed.queryByRole('rowheader', { name: 'Bath' })).toBeNull()
  })

  it('lists the evaluations that use it', async () => {
    show()
    const uses = await region('Evaluations that use it')
    expect(await within(uses).findByRole('link', { name: '0.1205' })).toBeDefined()
  })

  it('copies a whole digest', async () => {
    const writeText = vi.fn(() => Promise.resolve())
    vi.stubGlobal('navigator', { clipboard: { writeText } })
    show()
    const revisions = within(await region('Revisions'))
    fireEvent.click(revisions.getAllByRole('button', { name: /Copy the whole digest/ })[0]!)
    expect(await revisions.findByText('copied')).toBeDefined()
    expect(writeText).toHaveBeenCalledWith('ab12'.repeat(16))
  })

  it('shows the whole digest to be selected when the browser does not let it copy', async () => {
    vi.stubGlobal('navigator', {})
    show()
    const revisions = within(await region('Revisions'))
    fireEvent.click(revisions.getAllByRole('button', { name: /Copy the whole digest/ })[0]!)
    expect(await revisions.findByText('ab12'.repeat(16))).toBeDefined()
    expect(revisions.getByText(/select it instead/)).toBeDefined()
  })
})

describe('the page of a candidate', () => {
  it('says in a line what changed about the particle', async () => {
    const heavier = aCandidate({ massGeV: 250 })
    serve({
      [`/candidates/${uuid(200)}`]: { body: candidateRecordOf(200, 'Thermal', aCandidate(), heavier) },
    })
    renderPage(CandidatePage, '/candidates/:id', `/candidates/${uuid(200)}`)
    const changed = within(await region('What changed'))
    const words = changed.getByRole('rowheader', { name: 'Particle' }).closest('tr')!
    expect(words.textContent).toMatch(/100 GeV .*→ 250 GeV /)
    expect(changed.getAllByRole('rowheader')[1]!.textContent).toBe('massGeV')
  })

  it('tells its particle with units', async () => {
    serve({ [`/candidates/${uuid(200)}`]: { body: candidateRecordOf(200, 'Thermal', aCandidate()) } })
    renderPage(CandidatePage, '/candidates/:id', `/candidates/${uuid(200)}`)
    const particle = within(await region('Particle of revision 1'))
    const rate = particle.getByRole('rowheader', { name: 'annihilation.sWaveCm3PerS' }).closest('tr')!
    expect(rate.textContent).toContain('2.2 × 10−26 cm³/s')
  })

  it('says what is wrong when there is no such candidate', async () => {
    serve({})
    renderPage(CandidatePage, '/candidates/:id', `/candidates/${uuid(200)}`)
    expect((await screen.findByRole('alert')).textContent).toContain('Not found')
    expect(screen.queryByRole('button', { name: 'Try again' })).toBeNull()
  })
})
