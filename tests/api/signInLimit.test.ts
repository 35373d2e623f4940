import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { PASSWORD } from '../db/support/groups.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
beforeAll(async () => {
  harness = await startHarness()
})
afterAll(() => harness.stop())

describe('guessing passwords', () => {
  const attempt = (app: Harness['app'], email: string, password: string, address = '192.0.2.1') =>
    request(app).post('/api/v1/session').set('X-Forwarded-For', address).send({ email, password })

  it('closes an account to further attempts, from any address, and says for how long', async () => {
    const app = harness.appWith({ attemptLimits: { perAddress: 100, perAccount: 2 } })
    const { email } = harness.alder.author
    await attempt(app, email, 'first guess', '192.0.2.1')
    await attempt(app, email.toUpperCase(), 'second guess', '192.0.2.2')
    const answer = await attempt(app, email, PASSWORD, '192.0.2.3')
    expectProblem(answer, 'too-many-attempts')
    const wait = Number(answer.headers['retry-after'])
    expect(wait).toBeGreaterThan(0)
    expect(wait).toBeLessThanOrEqual(15 * 60)
  })

  it('leaves other accounts open meanwhile', async () => {
    const app = harness.appWith({ attemptLimits: { perAddress: 100, perAccount: 1 } })
    await attempt(app, harness.alder.author.email, 'a guess')
    expectProblem(await attempt(app, harness.alder.author.email, PASSWORD), 'too-many-attempts')
    expect((await attempt(app, harness.alder.lead.email, PASSWORD)).status).toBe(201)
  })

  it('closes an address that tries many accounts, and no other', async () => {
    const app = harness.appWith({ attemptLimits: { perAddress: 2, perAccount: 100 } })
    await attempt(app, 'one@alder.example', 'a guess', '198.51.100.7')
    await attempt(app, 'two@alder.example', 'a guess', '198.51.100.7')
    expectProblem(await attempt(app, harness.alder.lead.email, PASSWORD, '198.51.100.7'), 'too-many-attempts')
    expect((await attempt(app, harness.alder.lead.email, PASSWORD, '198.51.100.8')).status).toBe(201)
  })

  it('does not count attempts that succeed', async () => {
    const app = harness.appWith({ attemptLimits: { perAddress: 2, perAccount: 2 } })
    for (let time = 0; time < 5; time += 1) {
      expect((await attempt(app, harness.alder.lead.email, PASSWORD)).status).toBe(201)
    }
  })
})

describe('a known device', () => {
  const known = async (app: Harness['app'], email: string) => {
    const agent = request.agent(app)
    await agent.post('/api/v1/session').send({ email, password: PASSWORD })
    await agent.delete('/api/v1/session')
    return agent
  }
  const guess = (app: Harness['app'], email: string) =>
    request(app).post('/api/v1/session').send({ email, password: 'a guess' })

  it('is not locked out by a stranger, on whatever address', async () => {
    const { email } = harness.birch.author
    const app = harness.appWith({ attemptLimits: { perAddress: 3, perAccount: 2 } })
    const device = await known(app, email)
    for (let time = 0; time < 4; time += 1) await guess(app, email)
    expectProblem(await guess(app, email), 'too-many-attempts')
    expect((await device.post('/api/v1/session').send({ email, password: PASSWORD })).status).toBe(201)
  })

  it('has so many guesses of its own, and no more', async () => {
    const { email } = harness.birch.reader
    const app = harness.appWith({ attemptLimits: { perAddress: 100, perAccount: 2 } })
    const device = await known(app, email)
    for (let time = 0; time < 2; time += 1)
      await device.post('/api/v1/session').send({ email, password: 'a guess' })
    expectProblem(
      await device.post('/api/v1/session').send({ email, password: PASSWORD }),
      'too-many-attempts',
    )
  })

  it('is known for the accounts it was used with, and not for another', async () => {
    const app = harness.appWith({ attemptLimits: { perAddress: 100, perAccount: 1 } })
    const device = await known(app, harness.alder.reader.email)
    const { email } = harness.birch.lead
    await guess(app, email)
    expectProblem(
      await device.post('/api/v1/session').send({ email, password: PASSWORD }),
      'too-many-attempts',
    )
  })

  it('cannot be made up', async () => {
    const { email } = harness.alder.reader
    const app = harness.appWith({ attemptLimits: { perAddress: 100, perAccount: 1 } })
    await guess(app, email)
    const answer = await request(app)
      .post('/api/v1/session')
      .set('Cookie', 'emberline_device=eyJhbGciOiJub25lIn0.eyJkaWQiOiJ4IiwibWFya3MiOltdfQ.')
      .send({ email, password: PASSWORD })
    expectProblem(answer, 'too-many-attempts')
  })
})

describe('many attempts at once', () => {
  it('do not pass together: the budget is counted before the password is checked', async () => {
    const app = harness.appWith({ attemptLimits: { perAddress: 100, perAccount: 3 } })
    const answers = await Promise.all(
      Array.from({ length: 8 }, () =>
        request(app).post('/api/v1/session').send({ email: 'at-once@alder.example', password: 'a guess' }),
      ),
    )
    expect(answers.filter(({ status }) => status === 401)).toHaveLength(3)
    expect(answers.filter(({ status }) => status === 429)).toHaveLength(5)
  })
})

describe('the answer to a wrong password', () => {
  it('takes as long for an address without an account as for one with', async () => {
    const times: Record<string, number[]> = { known: [], unknown: [] }
    for (let round = 0; round < 15; round += 1) {
      for (const kind of ['known', 'unknown'] as const) {
        const email = kind === 'known' ? harness.alder.lead.email : `nobody${round}@alder.example`
        const start = performance.now()
        await request(harness.app).post('/api/v1/session').send({ email, password: 'a guess' })
        times[kind]?.push(performance.now() - start)
      }
    }
    // The least of many: what the machine does besides only adds. Without the decoy's hash, most of the work is
    // left out for an unknown account, and the ratio is about a fifth.
    const least = (all: number[] = []) => Math.min(...all)
    expect(least(times['unknown']) / least(times['known'])).toBeGreaterThan(0.6)
    expect(least(times['unknown']) / least(times['known'])).toBeLessThan(1.6)
  })
})
