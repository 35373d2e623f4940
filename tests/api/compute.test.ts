import { computeAbundance, computeHistory } from '#core/index'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { candidate, history } from '../db/support/records.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
let reader: TestAgent
beforeAll(async () => {
  harness = await startHarness()
  reader = await harness.signIn(harness.alder.reader)
})
afterAll(() => harness.stop())

describe('computing without saving', () => {
  it('gives the abundance the core gives, to the last digit', async () => {
    const answer = await reader.post('/api/v1/compute/abundance').send({ history, candidate })
    expect(answer.status).toBe(200)
    expect(answer.body).toEqual(computeAbundance({ history, candidate }))
  })

  it('gives the history the core gives, row by row in the order asked', async () => {
    const request = { history, temperaturesGeV: [0.001, 10, 0.2] }
    const answer = await reader.post('/api/v1/compute/history').send(request)
    expect(answer.status).toBe(200)
    expect(answer.body).toEqual(JSON.parse(JSON.stringify(computeHistory(request))))
    expect(
      (answer.body as { rows: { temperatureGeV: number }[] }).rows.map((row) => row.temperatureGeV),
    ).toEqual([0.001, 10, 0.2])
  })

  it('stores nothing', async () => {
    await reader.post('/api/v1/compute/abundance').send({ history, candidate })
    const { rows } = await harness.owner.query('select id from evaluations')
    expect(rows).toEqual([])
  })

  it('names every field at fault by its path, with what was found', async () => {
    const answer = await reader.post('/api/v1/compute/abundance').send({
      history: { bath: { treatment: 'fit-2018', band: 3 } },
      candidate: { ...candidate, massGeV: -1 },
    })
    expect(expectProblem(answer, 'invalid-input').faults).toMatchObject([
      { path: 'history.bath.band', value: 3 },
      { path: 'candidate.massGeV', value: -1 },
    ])
  })

  it('names the row of a list at fault', async () => {
    const answer = await reader
      .post('/api/v1/compute/history')
      .send({ history, temperaturesGeV: [1, 2, 1e20] })
    expect(expectProblem(answer, 'invalid-input').faults).toMatchObject([
      { path: 'temperaturesGeV[2]', value: 1e20 },
    ])
  })
})
