import { computeSolve } from '#core/index'
import type { BatchResult } from '#core/wire/index'
import { computing } from '#api/services/computing'
import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { examples } from '#api/openapi/examples'
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

const bodyOf = (id: string): object => examples()[id]?.body as object

/** A question that takes seconds: many samples. */
const LONG = () => ({ ...bodyOf('computePropagate'), samples: 20_000 })

describe('every question of the core', () => {
  it.each(['solve', 'attribute', 'propagate', 'convert', 'laboratory'])(
    '%s is answered as the core answers it',
    async (what) => {
      const id = `compute${what.charAt(0).toUpperCase()}${what.slice(1)}`
      const answer = await reader.post(`/api/v1/compute/${what}`).send(bodyOf(id))
      expect(answer.status).toBe(200)
      expect(answer.body).toEqual(JSON.parse(JSON.stringify(examples()[id]?.answer)))
    },
  )

  it('is refused with the path of what is wrong', async () => {
    const answer = await reader
      .post('/api/v1/compute/solve')
      .send({ ...bodyOf('computeSolve'), solveFor: 'candidate.nothing' })
    expect(expectProblem(answer, 'invalid-input').faults?.[0]?.path).toMatch(/solveFor|candidate/)
  })
})

describe('an answer by lines', () => {
  const lines = async (body: object) => {
    const answer = await reader
      .post('/api/v1/compute/propagate')
      .set('accept', 'application/x-ndjson')
      .buffer(true)
      .parse((res, done) => {
        let text = ''
        res.on('data', (chunk: Buffer) => (text += chunk.toString()))
        res.on('end', () => done(null, text))
      })
      .send(body)
    return (answer.body as string)
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line) as Record<string, { done?: number; of?: number; status?: number }>)
  }

  it('tells how far it has come, then the result', async () => {
    const all = await lines({ ...bodyOf('computePropagate'), samples: 2000 })
    expect(all.at(-1)).toHaveProperty('result')
    const progress = all.slice(0, -1).map((line) => line['progress']!)
    expect(progress.length).toBeGreaterThan(0)
    for (const { done, of } of progress) expect(done!).toBeLessThanOrEqual(of!)
  })
})

describe('a long computation', () => {
  it('lets other requests through while it runs', async () => {
    const long = reader.post('/api/v1/compute/propagate').send({ ...LONG(), samples: 4000 })
    let over = false
    const ended = long.then((answer) => {
      over = true
      return answer
    })
    const other = await request(harness.app).get('/api/v1/info')
    expect(other.status).toBe(200)
    expect(over).toBe(false)
    expect((await ended).status).toBe(200)
  })
})

describe('the line of computations', () => {
  const places = computing({ running: 1, waiting: 1 })
  const ask = (signal?: AbortSignal) => places.answer('propagate', LONG(), signal ? { signal } : {})

  it('is ended by its signal, refuses who finds it full, and goes on afterwards', async () => {
    const first = new AbortController()
    const second = new AbortController()
    const running = ask(first.signal)
    const waiting = ask(second.signal)
    await expect(ask()).rejects.toMatchObject({ kind: 'busy' })
    first.abort(new Error('gone'))
    await expect(running).rejects.toThrow('gone')
    second.abort(new Error('gone too'))
    await expect(waiting).rejects.toThrow('gone too')
    const body = bodyOf('computeSolve')
    expect(await places.answer('solve', body)).toEqual(computeSolve(body))
  })
})

describe('a batch', () => {
  it('answers each item with its result or its own error, in their order', async () => {
    const good = { what: 'convert', input: bodyOf('computeConvert') }
    const bad = { what: 'abundance', input: { history: { bath: { treatment: 'steam' } } } }
    const answer = await reader.post('/api/v1/compute/batch').send({ items: [good, bad, good] })
    expect(answer.status).toBe(200)
    const { items } = answer.body as BatchResult
    expect(items.map(({ status }) => status)).toEqual(['done', 'failed', 'done'])
    const failed = items[1] as Extract<BatchResult['items'][number], { status: 'failed' }>
    expect(failed.problem.faults?.map(({ path }) => path)).toContain('history.bath.treatment')
  })

  it('refuses an unknown question, none, and too many, by path', async () => {
    const ask = async (items: object[]) =>
      expectProblem(await reader.post('/api/v1/compute/batch').send({ items }), 'invalid-input').faults?.[0]
        ?.path
    expect(await ask([{ what: 'guess', input: {} }])).toBe('items[0].what')
    expect(await ask([])).toBe('items')
    expect(await ask(Array.from({ length: 501 }, () => ({ what: 'convert', input: {} })))).toBe('items')
  })
})

describe('the published values', () => {
  it('are told with ours, the difference and its reason', async () => {
    const { body } = await reader.get('/api/v1/published-values')
    const { values } = body as { values: { id: string; deviation: string; source: string }[] }
    expect(values.length).toBeGreaterThan(20)
    for (const value of values) expect(value.source).not.toBe('')
  })
})
