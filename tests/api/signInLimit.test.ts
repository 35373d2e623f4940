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
    const app = harness.appWith({ signInLimits: { perAddress: 100, perAccount: 2 } })
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
    const app = harness.appWith({ signInLimits: { perAddress: 100, perAccount: 1 } })
    await attempt(app, harness.alder.author.email, 'a guess')
    expectProblem(await attempt(app, harness.alder.author.email, PASSWORD), 'too-many-attempts')
    expect((await attempt(app, harness.alder.lead.email, PASSWORD)).status).toBe(201)
  })

  it('closes an address that tries many accounts, and no other', async () => {
    const app = harness.appWith({ signInLimits: { perAddress: 2, perAccount: 100 } })
    await attempt(app, 'one@alder.example', 'a guess', '198.51.100.7')
    await attempt(app, 'two@alder.example', 'a guess', '198.51.100.7')
    expectProblem(await attempt(app, harness.alder.lead.email, PASSWORD, '198.51.100.7'), 'too-many-attempts')
    expect((await attempt(app, harness.alder.lead.email, PASSWORD, '198.51.100.8')).status).toBe(201)
  })

  it('does not count attempts that succeed', async () => {
    const app = harness.appWith({ signInLimits: { perAddress: 2, perAccount: 2 } })
    for (let time = 0; time < 5; time += 1) {
      expect((await attempt(app, harness.alder.lead.email, PASSWORD)).status).toBe(201)
    }
  })
})
