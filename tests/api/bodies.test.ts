import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { saveOneOfEach } from '../db/support/records.ts'
import { addressOf, endpointsWithBody } from './support/calls.ts'
import type { Saved } from './support/calls.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
let lead: TestAgent
let saved: Saved
beforeAll(async () => {
  harness = await startHarness()
  lead = await harness.signIn(harness.alder.lead)
  saved = await saveOneOfEach(harness.serverUrl, harness.alder)
})
afterAll(() => harness.stop())

describe.each(endpointsWithBody)('the body of $method $path', (endpoint) => {
  const post = (type: string, body: string) => {
    const id = endpoint.tag === 'candidates' ? saved.candidate.recordId : saved.history.recordId
    return lead.post(addressOf(endpoint, id)).set('Content-Type', type).send(body)
  }

  it('is refused above one mebibyte', async () => {
    const body = JSON.stringify({ padding: 'x'.repeat(1_048_576) })
    expect(expectProblem(await post('application/json', body), 'too-large').detail).toContain('1048576 bytes')
  })

  it('is refused when it is not JSON', async () => {
    expectProblem(await post('application/json', '{"name": '), 'malformed-body')
  })

  it('is refused when it calls itself something else', async () => {
    expectProblem(await post('text/plain', '{}'), 'not-json')
    expectProblem(await post('application/x-www-form-urlencoded', 'a=b'), 'not-json')
  })

  it('is refused in a character set other than UTF-8', async () => {
    expectProblem(await post('application/json; charset=iso-8859-1', '{}'), 'not-json')
  })

  it('is refused with the path of each unknown name', async () => {
    const { faults } = expectProblem(await post('application/json', '{"colour": "plum"}'), 'invalid-input')
    expect(faults).toContainEqual({
      path: 'colour',
      message: 'not a name known here; remove it or correct its spelling',
    })
  })

  it('is refused when it is empty', async () => {
    expectProblem(await post('application/json', ''), 'invalid-input')
  })
})

it('an unknown name deep inside is named by its whole path', async () => {
  const answer = await lead.post('/api/v1/histories').send({
    name: 'Misspelt',
    input: { bath: { treatment: 'fit-2018', bend: 0.5 }, extraSpecies: [{ name: 'x', mass: 1 }] },
  })
  const paths = expectProblem(answer, 'invalid-input').faults?.map(({ path }) => path)
  expect(paths).toContain('input.bath.bend')
  expect(paths).toContain('input.extraSpecies[0].mass')
})

it('a parameter that the chosen treatment does not use is refused, not ignored', async () => {
  const answer = await lead.post('/api/v1/histories').send({
    name: 'Too much',
    input: { bath: { treatment: 'lattice-2016', transitionTemperatureGeV: 0.15 } },
  })
  expect(expectProblem(answer, 'invalid-input').faults).toMatchObject([
    { path: 'input.bath.transitionTemperatureGeV' },
  ])
})

it('an oversized body is refused before it is read when nobody has signed in', async () => {
  const body = JSON.stringify({ padding: 'x'.repeat(1_048_576) })
  const answer = await request(harness.app)
    .post('/api/v1/compute/abundance')
    .set('Content-Type', 'application/json')
    .send(body)
  expectProblem(answer, 'not-signed-in')
})
