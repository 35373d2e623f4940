import { cleanup, fireEvent, screen, waitFor, within } from '@testing-library/react'
import { toast } from 'sonner'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { aCandidate } from '../records/support.tsx'
import { omegaShown, openBench, picked, startServer, startWorkers, typeMass } from './support.tsx'
import type { FakeServer } from './support.tsx'

let server: FakeServer
const said = { success: vi.spyOn(toast, 'success'), error: vi.spyOn(toast, 'error') }

beforeEach(() => {
  server = startServer()
  startWorkers()
})
afterEach(() => {
  cleanup()
  sessionStorage.clear()
  history.replaceState(null, '', '/')
  vi.clearAllMocks()
  vi.unstubAllGlobals()
})

async function openChanged(mass = '250'): Promise<void> {
  openBench()
  await screen.findByTestId('omega')
  const before = omegaShown()
  typeMass(mass)
  await waitFor(() => expect(omegaShown()).not.toBe(before))
}

async function openDialog(button: string): Promise<HTMLElement> {
  fireEvent.click(screen.getByRole('button', { name: button }))
  return screen.findByRole('dialog')
}

const save = (dialog: HTMLElement): void => {
  fireEvent.click(within(dialog).getByRole('button', { name: 'Save' }))
}
const closed = (): Promise<void> => waitFor(() => expect(screen.queryByRole('dialog')).toBeNull())
const pathsPosted = (): string[] => server.posted.map(({ path }) => path)

describe('saving from the Bench', () => {
  it('stores the evaluation alone when nothing was changed, with the number that was shown', async () => {
    openBench()
    await screen.findByTestId('omega')
    save(await openDialog('Save evaluation'))
    await closed()
    expect(server.posted).toEqual([
      {
        path: '/evaluations',
        body: {
          historyRevisionId: server.histories[0]!.head.id,
          candidateRevisionId: server.candidates[0]!.head.id,
          shownOmegaH2: omegaShown(),
        },
      },
    ])
    expect(said.success).toHaveBeenCalledOnce()
  })

  it('stores a changed candidate as the next revision under its note, and stands on it afterwards', async () => {
    await openChanged()
    const dialog = await openDialog('Save revision')
    fireEvent.change(within(dialog).getByLabelText('Note'), { target: { value: 'heavier' } })
    const wimp = server.candidates[0]!
    const parentId = wimp.head.id
    save(dialog)
    await closed()
    expect(pathsPosted()).toEqual([`/candidates/${wimp.id}/revisions`, '/evaluations'])
    expect(server.posted[0]!.body).toMatchObject({ parentId, note: 'heavier', input: { massGeV: 250 } })
    expect(server.posted[1]!.body).toMatchObject({ candidateRevisionId: wimp.head.id })
    await waitFor(() => expect(screen.queryByText(/changed, not saved/)).toBeNull())
  })

  it('stores a changed candidate as a record of its own, which is then on the Bench', async () => {
    await openChanged()
    const dialog = await openDialog('Save revision')
    fireEvent.click(within(dialog).getByLabelText('A record of its own'))
    const name = within(dialog).getByLabelText('Name of the new candidate')
    fireEvent.change(name, { target: { value: 'Quarter TeV' } })
    save(dialog)
    await closed()
    expect(pathsPosted()).toEqual(['/candidates', '/evaluations'])
    await waitFor(() => expect(picked('Candidate')).toBe('Quarter TeV'))
  })

  it('tells who saved meanwhile and saves on top when asked, losing nothing', async () => {
    await openChanged()
    const wimp = server.candidates[0]!
    server.appendElsewhere(wimp, aCandidate({ massGeV: 130 }), 'from the new fit')
    const dialog = await openDialog('Save revision')
    save(dialog)
    expect(
      await within(dialog).findByText(/Ines Aalto saved revision 2 of “WIMP”.*“from the new fit”/),
    ).toBeTruthy()
    fireEvent.click(within(dialog).getByRole('button', { name: 'Save mine on top, as revision 3' }))
    await closed()
    expect(wimp.head).toMatchObject({ number: 3, input: { massGeV: 250 } })
    expect(wimp.revisions).toHaveLength(3)
  })

  it('does not store a revision twice when only the evaluation failed', async () => {
    await openChanged()
    const dialog = await openDialog('Save revision')
    server.unreachable.add('/evaluations')
    save(dialog)
    expect(
      await within(dialog).findByText(/candidate revision 2 are stored; the evaluation is not/),
    ).toBeTruthy()
    server.unreachable.clear()
    save(dialog)
    await closed()
    expect(pathsPosted()).toEqual([`/candidates/${server.candidates[0]!.id}/revisions`, '/evaluations'])
    expect(server.candidates[0]!.revisions).toHaveLength(2)
  })

  it('says loudly when the server found another number', async () => {
    server.disagreement = 3e-7
    openBench()
    await screen.findByTestId('omega')
    save(await openDialog('Save evaluation'))
    await closed()
    expect(said.error.mock.lastCall![0]).toMatch(/differs by 3\.0e-7, allowed is 1\.0e-9/)
    expect(said.success).not.toHaveBeenCalled()
  })

  it('makes the next revision from an older one knowingly', async () => {
    const [fit] = server.histories
    openBench(`?history=${fit!.id}@1`)
    await screen.findByTestId('omega')
    fireEvent.click(screen.getByRole('button', { name: /^Bath/ }))
    fireEvent.change(screen.getByLabelText('Place in the band'), { target: { value: '1' } })
    await waitFor(() => expect(screen.getByText(/changed, not saved/)).toBeTruthy())
    const dialog = await openDialog('Save revision')
    expect(within(dialog).getByLabelText('Revision 3 of “2018 fit”, made from revision 1')).toBeTruthy()
    save(dialog)
    await closed()
    expect(fit!.head).toMatchObject({ number: 3, input: { bath: { band: 1 } } })
  })
})
