import { cleanup, fireEvent, screen, waitFor } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { uuid } from '../records/support.tsx'
import { omegaShown, openBench, pick, picked, startServer, startWorkers, typeMass } from './support.tsx'
import type { FakeServer, Workers } from './support.tsx'

let server: FakeServer
let workers: Workers

beforeEach(() => {
  server = startServer()
  workers = startWorkers()
})
afterEach(() => {
  cleanup()
  sessionStorage.clear()
  history.replaceState(null, '', '/')
  vi.restoreAllMocks()
  vi.unstubAllGlobals()
})

const changedFrom = (before: number): Promise<number> =>
  waitFor(() => {
    expect(omegaShown()).not.toBe(before)
    return omegaShown()
  })

async function ready(search = '') {
  const opened = openBench(search)
  await screen.findByTestId('omega')
  return opened
}

const choice = (record: { id: string }, number = 1): string => `${record.id}@${number}`

describe('the Bench', () => {
  it('opens with something to see: a history that differs from the baseline, the answer, its verdict and what moved it', async () => {
    await ready()
    expect(picked('History')).toBe('2018 fit')
    expect(picked('Candidate')).toBe('WIMP')
    expect(omegaShown()).toBeCloseTo(0.1156, 3)
    expect(screen.getByTestId('verdict').textContent).toBe('3.7 % below, 3.7 σ')
    expect(screen.getByText('Nothing raised.')).toBeTruthy()
    expect(screen.getByRole('button', { name: /^Bath.*× 0\.96/ })).toBeTruthy()
    expect(screen.getByRole('button', { name: /^Today.*× 1$/ })).toBeTruthy()
    expect(
      screen.getByRole('img', { name: /^From 0\.1195 in the baseline to 0\.1156; bath times/ }),
    ).toBeTruthy()
    for (const chart of ['Yield Y = n/s', 'Effective degrees of freedom', 'Annihilation rate over expansion'])
      expect(screen.getByRole('figure', { name: chart })).toBeTruthy()
  })

  it('answers a typed number without a button', async () => {
    await ready()
    const before = omegaShown()
    typeMass('0.25 TeV')
    expect(await changedFrom(before)).toBeGreaterThan(0)
    expect(screen.getByText(/changed, not saved/)).toBeTruthy()
  })

  it('says beside the field what the core refused, and keeps the last number', async () => {
    await ready()
    const before = omegaShown()
    typeMass('-5')
    const field = screen.getByLabelText('Mass', { exact: true })
    await waitFor(() => expect(field.getAttribute('aria-invalid')).toBe('true'))
    const described = field.getAttribute('aria-describedby')!
    expect(document.getElementById(described.split(' ').at(-1)!)?.textContent).toContain('allowed: above 0')
    expect(screen.getByText(/This input cannot be computed\. What is shown below is the last/)).toBeTruthy()
    expect(omegaShown()).toBe(before)
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Save revision' }).disabled).toBe(true)
  })

  it('shows the old answer until another history has its own, and starts no second worker', async () => {
    await ready()
    const before = omegaShown()
    const list = screen.getByLabelText('History on the Bench')
    const seen = new Set<number>()
    const observer = new MutationObserver(() => seen.add(screen.queryByTestId('omega') ? omegaShown() : NaN))
    observer.observe(document.body, { subtree: true, childList: true, attributes: true })
    pick('History', 'Kination')
    await changedFrom(before)
    observer.disconnect()
    expect([...seen].filter(Number.isNaN)).toEqual([])
    expect(screen.getByLabelText('History on the Bench')).toBe(list)
    expect(workers.started).toBe(1)
  })

  it('keeps the changes of the candidate when another history is picked, and drops those of the history', async () => {
    await ready()
    const before = omegaShown()
    typeMass('250')
    const heavier = await changedFrom(before)
    pick('History', 'Kination')
    await changedFrom(heavier)
    expect(screen.getByLabelText<HTMLInputElement>('Mass', { exact: true }).value).toBe('250')
    expect(screen.getAllByText(/changed, not saved/)).toHaveLength(1)
  })

  it('undoes and redoes, dropped changes included', async () => {
    await ready()
    const stored = omegaShown()
    typeMass('250')
    const changed = await changedFrom(stored)
    fireEvent.click(screen.getByRole('button', { name: 'Drop changes' }))
    expect(await changedFrom(changed)).toBe(stored)
    fireEvent.keyDown(document.body, { key: 'z', ctrlKey: true })
    expect(await changedFrom(stored)).toBe(changed)
    fireEvent.keyDown(document.body, { key: 'Z', ctrlKey: true, shiftKey: true })
    expect(await changedFrom(changed)).toBe(stored)
  })

  it('keeps its whole state in the address, and for the person when the page is left', async () => {
    const { router } = await ready()
    typeMass('250')
    await waitFor(() => expect(location.search).toContain('draft='))
    expect(location.search).toContain(`history=${choice(server.histories[0]!, 2)}`)
    await router.navigate('/elsewhere')
    await screen.findByText('another page')
    await router.navigate('/bench')
    await screen.findByTestId('omega')
    expect(screen.getByLabelText<HTMLInputElement>('Mass', { exact: true }).value).toBe('250')
  })

  it('returns along its trail to what stood there, the picked history included', async () => {
    await ready()
    const first = await screen.findByTestId('omega').then(omegaShown)
    // A step counts once it has stood a moment.
    await new Promise((resolve) => setTimeout(resolve, 1400))
    pick('History', 'Kination')
    const second = await changedFrom(first)
    const step = await screen.findByRole('button', { name: /^2018 fit\s*0\.1156/ }, { timeout: 5000 })
    fireEvent.click(step)
    expect(await changedFrom(second)).toBe(first)
    expect(picked('History')).toBe('2018 fit')
    expect(screen.queryByText(/changed, not saved/)).toBeNull()
  }, 15_000)

  it('tells that an older revision stands on it', async () => {
    await ready(`?history=${choice(server.histories[0]!)}`)
    expect(screen.getByRole('link', { name: 'revision 1 of 2' })).toBeTruthy()
  })

  it('says what an address names that is not there, instead of showing something else in silence', async () => {
    await ready(`?history=${uuid(555)}@1&candidate=${choice(server.candidates[0]!, 9)}&draft=kept.abc`)
    const notes = screen.getAllByRole('status').map((note) => note.textContent)
    expect(notes[0]).toMatch(/^The history this address names is not in your group; “2018 fit”/)
    expect(notes[1]).toMatch(/^The revision this address names does not exist; the newest of “WIMP”/)
    expect(notes[2]).toMatch(/^The changes this address names were too long for it/)
  })

  it('says that the worker stopped, and answers again once it can', async () => {
    await ready()
    const before = omegaShown()
    workers.broken = true
    typeMass('250')
    expect((await screen.findByRole('alert')).textContent).toMatch(/has stopped: it could not be loaded/)
    expect(omegaShown()).toBe(before)
    workers.broken = false
    typeMass('260')
    await changedFrom(before)
    expect(screen.queryByRole('alert')).toBeNull()
    expect(workers.started).toBe(2)
  })

  it('lets a reader compute and says who saves', async () => {
    vi.unstubAllGlobals()
    server = startServer({ role: 'reader' })
    workers = startWorkers()
    await ready()
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Save evaluation' }).disabled).toBe(true)
    expect(screen.getByText(/Readers compute freely/)).toBeTruthy()
  })

  it('opens the inputs over the page of a phone and closes them at Escape', async () => {
    await ready()
    const button = screen.getByRole('button', { name: 'Change the inputs' })
    fireEvent.click(button)
    expect(button.getAttribute('aria-expanded')).toBe('true')
    fireEvent.keyDown(document.body, { key: 'Escape' })
    expect(button.getAttribute('aria-expanded')).toBe('false')
  })
})
