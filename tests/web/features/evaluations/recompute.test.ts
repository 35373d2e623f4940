import { afterEach, describe, expect, it, vi } from 'vitest'
import { computeAbundance, CORE_VERSION } from '#core/index'
import { agreement } from '../../../../web/src/features/evaluations/recompute.ts'
import type { RecomputeRequest } from '../../../../web/src/workers/recompute.worker.ts'
import { aCandidate, aHistory } from '../records/support.tsx'

describe('agreement', () => {
  it('allows the stated numerical error', () => {
    const stored = { omegaH2: 0.12, numericalError: 1e-6 }
    expect(agreement(0.12 * (1 + 0.9e-6), stored)).toMatchObject({ agrees: true, allowed: 1e-6 })
    expect(agreement(0.12 * (1 - 1.1e-6), stored).agrees).toBe(false)
  })
  it('allows a part in a thousand million where the stated error is smaller still', () => {
    const stored = { omegaH2: 0.12, numericalError: 1e-13 }
    expect(agreement(0.12 * (1 + 0.9e-9), stored)).toMatchObject({ agrees: true, allowed: 1e-9 })
  })
  it('takes nothing for the same as nothing, and for nothing else', () => {
    const nothing = { omegaH2: 0, numericalError: 1e-8 }
    expect(agreement(0, nothing)).toMatchObject({ agrees: true, relativeDifference: 0 })
    expect(agreement(1e-300, nothing).agrees).toBe(false)
  })
})

describe('the worker that recomputes', () => {
  afterEach(() => vi.unstubAllGlobals())

  async function ask(request: RecomputeRequest): Promise<unknown> {
    vi.resetModules()
    const scope = {
      postMessage: vi.fn(),
      onmessage: null as ((event: { data: RecomputeRequest }) => void) | null,
    }
    vi.stubGlobal('self', scope)
    await import('../../../../web/src/workers/recompute.worker.ts')
    scope.onmessage?.({ data: request })
    return scope.postMessage.mock.lastCall?.[0]
  }

  it('answers with the number of the core, its error and its version', async () => {
    const request = { history: aHistory(), candidate: aCandidate() }
    const { omegaH2, numericalError } = computeAbundance(request)
    expect(await ask(request)).toEqual({ omegaH2, numericalError, coreVersion: CORE_VERSION })
  })
  it('answers with the reason when there is no number', async () => {
    const candidate = { ...aCandidate(), massGeV: -1 }
    expect(await ask({ history: aHistory(), candidate })).toEqual({
      error: expect.stringContaining('candidate.massGeV') as unknown,
    })
  })
})
