import { cleanup, fireEvent, screen, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import EvaluationPage from '../../../../web/src/features/evaluations/EvaluationPage.tsx'
import type { Evaluation } from '#core/wire/index'
import type { RecomputeReply, RecomputeRequest } from '../../../../web/src/workers/recompute.worker.ts'
import {
  aCandidate,
  aHistory,
  candidateRecordOf,
  evaluationOf,
  historyRecordOf,
  renderPage,
  serve,
  uuid,
} from '../records/support.tsx'

const GUARD = {
  code: 'unitarity',
  message: 'The annihilation is faster than unitarity allows.',
  value: 3.2e-22,
  limit: 1.5e-22,
  unit: 'cm³/s',
  source: 'Griest & Kamionkowski 1990',
}

function show(evaluation: Evaluation): void {
  serve({
    [`/evaluations/${evaluation.id}`]: { body: evaluation },
    [`/histories/${uuid(100)}`]: { body: historyRecordOf(100, 'Standard', aHistory()) },
    [`/candidates/${uuid(200)}`]: { body: candidateRecordOf(200, 'Thermal fermion', aCandidate()) },
  })
  renderPage(EvaluationPage, '/evaluations/:id', `/evaluations/${evaluation.id}`)
}

/** A worker that answers what it is told to, and keeps what it was asked. */
function standInWorker(answer: RecomputeReply): RecomputeRequest[] {
  const asked: RecomputeRequest[] = []
  class StandIn {
    onmessage: ((event: { data: RecomputeReply }) => void) | null = null
    postMessage(request: RecomputeRequest): void {
      asked.push(request)
      queueMicrotask(() => this.onmessage?.({ data: answer }))
    }
    terminate(): void {
      this.onmessage = null
    }
  }
  vi.stubGlobal('Worker', StandIn)
  return asked
}

const recomputeHere = async (): Promise<void> => {
  fireEvent.click(await screen.findByRole('button', { name: 'Recompute here' }))
}

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

describe('the page of an evaluation', () => {
  it('shows every guard with the number found, its limit, its unit and its source', async () => {
    show(evaluationOf(1, { guards: [GUARD] }))
    const guards = await screen.findByRole('region', { name: 'Guards' })
    expect(guards.textContent).toContain(GUARD.message)
    expect(guards.textContent).toContain('found 3.2 × 10−22 cm³/s, limit 1.5 × 10−22 cm³/s')
    expect(guards.textContent).toContain(GUARD.source)
  })

  it('says so when no guard was raised', async () => {
    show(evaluationOf(1))
    expect((await screen.findByRole('region', { name: 'Guards' })).textContent).toContain('None was raised.')
  })

  it('gives the number, its numerical error and how it stands against the measured density', async () => {
    show(evaluationOf(1))
    expect(await screen.findByRole('button', { name: 'Copy 0.1205' })).toBeDefined()
    expect(screen.getByText('0.42 % above, 0.42 σ')).toBeDefined()
    expect(document.body.textContent).toContain('numerical error 4 × 10−8')
  })

  it('names every number that came out, with its unit', async () => {
    show(
      evaluationOf(1, {
        freezeOutTemperatureGeV: 4.35,
        parentFreezeOut: { yieldToday: 1e-9, omegaH2IfStable: 12, widthOverHubble: 0.25 },
      }),
    )
    const outputs = await screen.findByRole('region', { name: 'What came out' })
    const row = (name: string) => within(outputs).getByRole('row', { name: new RegExp(`^${name}`) })
    expect(row('Temperature at freeze-out').textContent).toContain('4.35 GeV')
    expect(row('Parent: width over expansion at freeze-out').textContent).toContain('0.25')
  })

  it('tells what went in by its paths, and opens the same revisions on the Bench', async () => {
    show(evaluationOf(1))
    expect(
      (await screen.findByRole('rowheader', { name: 'candidate.massGeV' })).closest('tr')!.textContent,
    ).toContain('100 GeV')
    expect(screen.getByRole('rowheader', { name: 'history.bath.treatment' })).toBeDefined()
    expect(screen.getByRole('link', { name: 'Open these revisions on the Bench' }).getAttribute('href')).toBe(
      `/bench?history=${uuid(100)}@1&candidate=${uuid(200)}@1`,
    )
  })
})

describe('recomputing in the browser', () => {
  it('asks the core with the stored inputs and says that it agrees within the stated error', async () => {
    const asked = standInWorker({ omegaH2: 0.1205 * (1 + 3e-8), numericalError: 4e-8, coreVersion: '0.1.0' })
    show(evaluationOf(1))
    await recomputeHere()
    expect(await screen.findByText('It agrees.')).toBeDefined()
    expect(asked).toEqual([{ history: aHistory(), candidate: aCandidate() }])
  })

  it('says that it differs when the number lies outside the stated error', async () => {
    standInWorker({ omegaH2: 0.1205 * (1 + 5e-8), numericalError: 4e-8, coreVersion: '0.2.0' })
    show(evaluationOf(1))
    await recomputeHere()
    expect((await screen.findByText('It differs.')).parentElement!.textContent).toContain('core 0.2.0')
  })

  it('says why when the core reaches no number', async () => {
    standInWorker({ error: 'the integrator used up its budget of steps.' })
    show(evaluationOf(1))
    await recomputeHere()
    expect(await screen.findByText(/budget of steps/)).toBeDefined()
  })
})
