import { candidateRecord, digestOf, historyRecord } from '#core/wire/index'
import type { z } from 'zod'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { candidate, history } from '../db/support/records.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
beforeAll(async () => {
  harness = await startHarness()
})
afterAll(() => harness.stop())

interface Kind {
  path: string
  record: typeof historyRecord | typeof candidateRecord
  /** As a client writes it, and as it is stored with the defaults filled in. */
  written: unknown
  stored: unknown
  changed: unknown
}

const KINDS: Kind[] = [
  {
    path: '/api/v1/histories',
    record: historyRecord,
    written: { bath: { treatment: 'thresholds' } },
    stored: history,
    changed: { bath: { treatment: 'fit-2018', band: 0.5 } },
  },
  {
    path: '/api/v1/candidates',
    record: candidateRecord,
    written: {
      mechanism: 'freeze-out',
      massGeV: 100,
      degreesOfFreedom: 2,
      statistics: 'fermion',
      annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
    },
    stored: candidate,
    changed: {
      mechanism: 'freeze-out',
      massGeV: 250,
      degreesOfFreedom: 2,
      statistics: 'fermion',
      annihilation: { kind: 'partial-waves', sWaveCm3PerS: 3e-26 },
    },
  },
]

describe.each(KINDS)('$path', ({ path, record, written, stored, changed }) => {
  let author: TestAgent
  beforeAll(async () => {
    author = await harness.signIn(harness.alder.author)
  })

  const create = async (name: string): Promise<z.output<typeof record>> => {
    const answer = await author.post(path).send({ name, note: 'first', input: written })
    expect(answer.status).toBe(201)
    return record.parse(answer.body)
  }

  it('saves a first revision with its author, note, digest and every default written out', async () => {
    const saved = await create('A new one')
    expect(saved).toMatchObject({ name: 'A new one', revisionCount: 1 })
    expect(saved.head).toMatchObject({
      number: 1,
      parentId: null,
      author: { id: harness.alder.author.id, name: harness.alder.author.name },
      note: 'first',
      digest: digestOf(stored),
    })
    expect(saved.head.input).toEqual(stored)
    expect(saved.revisions).toEqual([saved.head])
  })

  it('reads back what was saved', async () => {
    const saved = await create('Read me')
    const answer = await author.get(`${path}/${saved.id}`)
    expect(answer.status).toBe(200)
    expect(answer.body).toEqual(saved)
  })

  it('adds a revision on top of the newest, and keeps the older one as it was', async () => {
    const saved = await create('Revised')
    const answer = await author
      .post(`${path}/${saved.id}/revisions`)
      .send({ parentId: saved.head.id, note: 'second', input: changed })
    expect(answer.status).toBe(201)
    const revised = record.parse(answer.body)
    expect(revised.revisionCount).toBe(2)
    expect(revised.head).toMatchObject({ number: 2, parentId: saved.head.id, note: 'second' })
    expect(revised.head.input).toMatchObject(changed as object)
    expect(revised.revisions).toEqual([revised.head, saved.head])
  })

  it('refuses a revision made from an older one, names the newest, and saves nothing', async () => {
    const saved = await create('Stale')
    const revise = (note: string) =>
      author.post(`${path}/${saved.id}/revisions`).send({ parentId: saved.head.id, note, input: changed })
    const revised = record.parse((await revise('mine')).body)
    const problem = expectProblem(await revise('too late'), 'stale-parent')
    expect(problem.detail).toContain(`Revision 2 (${revised.head.id})`)
    expect((await author.get(`${path}/${saved.id}`)).body).toEqual(revised)
  })

  it('gives one of several who save at once the number, and the others the news', async () => {
    const saved = await create('Contended')
    const answers = await Promise.all(
      Array.from({ length: 6 }, () =>
        author.post(`${path}/${saved.id}/revisions`).send({ parentId: saved.head.id, input: changed }),
      ),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409, 409, 409])
    const { body } = await author.get(`${path}/${saved.id}`)
    expect(record.parse(body).revisions.map(({ number }) => number)).toEqual([2, 1])
  })

  it('answers an id that is unknown, or no id at all, with 404', async () => {
    expectProblem(await author.get(`${path}/00000000-0000-4000-8000-000000000000`), 'not-found')
    expectProblem(await author.get(`${path}/not-an-id`), 'not-found')
    const revision = { parentId: '00000000-0000-4000-8000-000000000000', input: changed }
    expectProblem(await author.post(`${path}/${revision.parentId}/revisions`).send(revision), 'not-found')
  })

  it('pages through all of them, newest first, each once', async () => {
    const lead = await harness.signIn(harness.birch.lead)
    for (const name of ['one', 'two', 'three', 'four', 'five']) {
      await lead.post(path).send({ name, input: written })
    }
    const seen: string[] = []
    let address = `${path}?limit=2`
    for (let pages = 0; pages < 3; pages += 1) {
      const { body } = await lead.get(address)
      seen.push(...(body as { items: { name: string }[] }).items.map(({ name }) => name))
      const { next } = body as { next: string | null }
      address = `${path}?limit=2&cursor=${next ?? ''}`
      expect(next === null).toBe(pages === 2)
    }
    expect(seen).toEqual(['five', 'four', 'three', 'two', 'one'])
  })

  it.each([
    ['cursor', 'cursor=made-up'],
    ['limit', 'limit=0'],
    ['limit', 'limit=many'],
  ])('names the query parameter %s at fault in ?%s', async (name, query) => {
    const problem = expectProblem(await author.get(`${path}?${query}`), 'invalid-input')
    expect(problem.faults?.map((fault) => fault.path)).toEqual([name])
  })
})
