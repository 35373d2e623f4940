import { CORE_VERSION, computeAbundance } from '#core/index'
import { createEvaluationResult, digestOf, evaluation } from '#core/wire/index'
import { compareShown } from '#api/services/evaluations'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { candidate, history, saveOneOfEach } from '../db/support/records.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

const PATH = '/api/v1/evaluations'
const UNKNOWN = '00000000-0000-4000-8000-000000000000'

let harness: Harness
let author: TestAgent
let saved: Awaited<ReturnType<typeof saveOneOfEach>>
beforeAll(async () => {
  harness = await startHarness()
  author = await harness.signIn(harness.alder.author)
  saved = await saveOneOfEach(harness.serverUrl, harness.alder)
})
afterAll(() => harness.stop())

const evaluate = (more: object = {}) =>
  author.post(PATH).send({
    historyRevisionId: saved.history.revisionId,
    candidateRevisionId: saved.candidate.revisionId,
    ...more,
  })

describe('storing an evaluation', () => {
  it('recomputes on the server and keeps numbers, guards, core version and input digest', async () => {
    const answer = await evaluate()
    expect(answer.status).toBe(201)
    const { evaluation: stored, shown } = createEvaluationResult.parse(answer.body)
    expect(shown).toBeNull()
    expect(stored).toMatchObject({
      history: {
        id: saved.history.revisionId,
        recordId: saved.history.recordId,
        number: 1,
        name: 'Alder history',
      },
      candidate: { id: saved.candidate.revisionId, recordId: saved.candidate.recordId, number: 1 },
      author: { id: harness.alder.author.id },
      coreVersion: CORE_VERSION,
      inputDigest: digestOf({ history, candidate }),
    })
    expect(stored.result).toEqual(computeAbundance({ history, candidate }))
  })

  it('agrees with a browser that shows the same number', async () => {
    const { omegaH2 } = computeAbundance({ history, candidate })
    const { body } = await evaluate({ shownOmegaH2: omegaH2 })
    expect(createEvaluationResult.parse(body).shown).toMatchObject({ relativeDifference: 0, agrees: true })
  })

  it('says how far off a browser is that shows another', async () => {
    const { omegaH2 } = computeAbundance({ history, candidate })
    const { body } = await evaluate({ shownOmegaH2: omegaH2 * 1.01 })
    const { shown } = createEvaluationResult.parse(body)
    expect(shown?.relativeDifference).toBeCloseTo(0.01, 10)
    expect(shown?.agrees).toBe(false)
  })

  it.each(['historyRevisionId', 'candidateRevisionId'])('answers an unknown %s with 404', async (name) => {
    expectProblem(await evaluate({ [name]: UNKNOWN }), 'not-found')
  })
})

describe('the difference allowed from what the browser showed', () => {
  const result = (numericalError: number) => ({
    omegaH2: 0.12,
    yieldToday: 1e-12,
    numericalError,
    guards: [],
  })

  it('is the stated numerical error', () => {
    expect(compareShown(0.12 * (1 + 9e-8), result(1e-7))).toMatchObject({ allowed: 1e-7, agrees: true })
    expect(compareShown(0.12 * (1 + 2e-7), result(1e-7))).toMatchObject({ agrees: false })
  })

  it('is never below 1e-9', () => {
    expect(compareShown(0.12 * (1 + 5e-10), result(1e-14))).toMatchObject({ allowed: 1e-9, agrees: true })
    expect(compareShown(0.12 * (1 - 2e-9), result(1e-14))).toMatchObject({ agrees: false })
  })
})

describe('reading evaluations', () => {
  it('reads one back as it was stored', async () => {
    const { body } = await evaluate()
    const { evaluation: stored } = createEvaluationResult.parse(body)
    const answer = await author.get(`${PATH}/${stored.id}`)
    expect(answer.status).toBe(200)
    expect(evaluation.parse(answer.body)).toEqual(stored)
  })

  it('answers an unknown id with 404', async () => {
    expectProblem(await author.get(`${PATH}/${UNKNOWN}`), 'not-found')
  })

  it('lists those of one history, or of one candidate, and pages through them', async () => {
    const lead = await harness.signIn(harness.birch.lead)
    const first = await saveOneOfEach(harness.serverUrl, harness.birch)
    const second = await saveOneOfEach(harness.serverUrl, harness.birch)
    const idsOf = async (query: string) => {
      const { body } = await lead.get(`${PATH}?${query}`)
      return (body as { items: { id: string }[] }).items.map(({ id }) => id)
    }
    expect(await idsOf('')).toEqual([second.evaluationId, first.evaluationId])
    expect(await idsOf(`historyId=${first.history.recordId}`)).toEqual([first.evaluationId])
    expect(await idsOf(`candidateId=${second.candidate.recordId}`)).toEqual([second.evaluationId])
    const { body } = await lead.get(`${PATH}?limit=1`)
    expect(await idsOf(`limit=1&cursor=${(body as { next: string }).next}`)).toEqual([first.evaluationId])
  })

  it('names the filter at fault', async () => {
    const problem = expectProblem(await author.get(`${PATH}?historyId=mine`), 'invalid-input')
    expect(problem.faults).toMatchObject([{ path: 'historyId', value: 'mine' }])
  })
})
