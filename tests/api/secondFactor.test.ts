import { newSecondFactor, recoveryCodeList } from '#core/wire/index'
import { stepOfCode } from '#api/secrets/oneTimeCode'
import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { PASSWORD, makeGroup } from '../db/support/groups.ts'
import type { Member } from '../db/support/groups.ts'
import { codeAt } from '../support/oneTimeCode.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
let groups = 0
beforeAll(async () => {
  harness = await startHarness()
})
afterAll(() => harness.stop())

describe('a code', () => {
  // RFC 6238, Appendix B, SHA-1: the last six of the eight digits printed there; base32 of "12345678901234567890".
  const SECRET = 'GEZDGNBVGY3TQOJQGEZDGNBVGY3TQOJQ'
  it.each([
    [59, '287082'],
    [1_111_111_109, '081804'],
    [1_111_111_111, '050471'],
    [1_234_567_890, '005924'],
    [2_000_000_000, '279037'],
    [20_000_000_000, '353130'],
  ])('of the second %d is the one RFC 6238 prints', (seconds, code) => {
    expect(stepOfCode(SECRET, code, seconds * 1000)).toBe(Math.floor(seconds / 30))
    expect(codeAt(SECRET, seconds * 1000)).toBe(code)
  })

  it('is good one step early and one late, and no further', () => {
    const code = codeAt(SECRET, 1_000_000_020_000)
    const at = (seconds: number) => stepOfCode(SECRET, code, 1_000_000_020_000 + seconds * 1000)
    expect(at(30)).toBe(at(0))
    expect(at(-30)).toBe(at(0))
    expect(at(60)).toBeNull()
    expect(at(-60)).toBeNull()
  })

  it.each(['', '12345', '1234567', 'abcdef', '28708２'])('is refused in another form: %s', (code) =>
    expect(stepOfCode(SECRET, code, 59_000)).toBeNull(),
  )
})

async function freshMember(): Promise<{ member: Member; agent: TestAgent }> {
  const { author } = await makeGroup(harness.owner, `Fresh${(groups += 1)}`)
  return { member: author, agent: await harness.signIn(author) }
}

const begin = async (agent: TestAgent) =>
  newSecondFactor.parse(
    (await agent.post('/api/v1/account/second-factor').send({ currentPassword: PASSWORD })).body,
  )
const confirm = (agent: TestAgent, code: string) =>
  agent.post('/api/v1/account/second-factor/confirm').send({ code })
const signIn = (member: Member, code?: string) =>
  request(harness.app)
    .post('/api/v1/session')
    .send({ email: member.email, password: PASSWORD, ...(code === undefined ? {} : { code }) })

async function protectedMember() {
  const { member, agent } = await freshMember()
  const { secret } = await begin(agent)
  const now = Date.now()
  const { recoveryCodes } = recoveryCodeList.parse((await confirm(agent, codeAt(secret, now))).body)
  return {
    member,
    agent,
    recoveryCodes,
    used: codeAt(secret, now),
    next: codeAt(secret, now + 30_000),
    secret,
  }
}

describe('a second factor', () => {
  it('is set up with a picture for the app, and is in force once a code was shown', async () => {
    const { member, agent } = await freshMember()
    const { secret, uri, qrSvg } = await begin(agent)
    expect(uri).toMatch(/^otpauth:\/\/totp\/Emberline:/)
    expect(uri).toContain(`secret=${secret}`)
    expect(qrSvg).toContain('<svg')
    expect((await signIn(member)).status).toBe(201)
    expectProblem(await confirm(agent, '000000'), 'wrong-code')
    const answer = await confirm(agent, codeAt(secret, Date.now()))
    const { recoveryCodes } = recoveryCodeList.parse(answer.body)
    expect(new Set(recoveryCodes).size).toBe(10)
    for (const code of recoveryCodes) expect(code).toMatch(/^[0-9a-z]{4}(-[0-9a-z]{4}){3}$/)
    expect((await agent.get('/api/v1/account')).body).toMatchObject({
      secondFactor: { inForce: true, recoveryCodesLeft: 10 },
    })
    expect((await harness.mailsTo(member.email)).at(-1)?.subject).toContain('second factor protects')
  })

  it('is asked for beside the right password, and only then', async () => {
    const { member, next } = await protectedMember()
    const wrong = await request(harness.app)
      .post('/api/v1/session')
      .send({ email: member.email, password: 'a guess', code: next })
    expectProblem(wrong, 'wrong-credentials')
    const asked = await signIn(member)
    expectProblem(asked, 'second-factor-needed')
    expect(asked.get('Set-Cookie')).toBeUndefined()
    expectProblem(await signIn(member, '000000'), 'wrong-code')
    expect((await signIn(member, next)).status).toBe(201)
  })

  it('takes no code twice', async () => {
    const { member, used, next } = await protectedMember()
    expectProblem(await signIn(member, used), 'wrong-code')
    expect((await signIn(member, next)).status).toBe(201)
    expectProblem(await signIn(member, next), 'wrong-code')
    expectProblem(await signIn(member, used), 'wrong-code')
  })

  it('takes one code for one of two sign-ins at once', async () => {
    const { member, next } = await protectedMember()
    const answers = await Promise.all([signIn(member, next), signIn(member, next)])
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 401])
  })

  it('is stood in for by each recovery code once, however it is typed', async () => {
    const { member, agent, recoveryCodes } = await protectedMember()
    const [first = '', second = ''] = recoveryCodes
    expect((await signIn(member, first.toUpperCase().replaceAll('-', ' '))).status).toBe(201)
    expectProblem(await signIn(member, first), 'wrong-code')
    expect((await signIn(member, second)).status).toBe(201)
    expect((await agent.get('/api/v1/account')).body).toMatchObject({
      secondFactor: { recoveryCodesLeft: 8 },
    })
  })

  it('has its recovery codes made void by new ones', async () => {
    const { member, agent, recoveryCodes, next } = await protectedMember()
    const answer = await agent
      .post('/api/v1/account/recovery-codes')
      .send({ currentPassword: PASSWORD, code: next })
    const renewed = recoveryCodeList.parse(answer.body).recoveryCodes
    expectProblem(await signIn(member, recoveryCodes[0]), 'wrong-code')
    expect((await signIn(member, renewed[0])).status).toBe(201)
  })

  it('is given up by password and code together', async () => {
    const { member, agent, recoveryCodes, next } = await protectedMember()
    const giveUp = (currentPassword: string, code: string) =>
      agent.post('/api/v1/account/second-factor/give-up').send({ currentPassword, code })
    expectProblem(await giveUp('a guess', next), 'invalid-input')
    expectProblem(await giveUp(PASSWORD, '000000'), 'wrong-code')
    expect((await giveUp(PASSWORD, next)).status).toBe(204)
    expect((await signIn(member)).status).toBe(201)
    expect((await agent.get('/api/v1/account')).body).toMatchObject({
      secondFactor: { inForce: false, recoveryCodesLeft: 0 },
    })
    expectProblem(await giveUp(PASSWORD, recoveryCodes[0] ?? ''), 'wrong-code')
  })

  it('is not replaced while it is in force', async () => {
    const { agent } = await protectedMember()
    const answer = await agent.post('/api/v1/account/second-factor').send({ currentPassword: PASSWORD })
    expectProblem(answer, 'second-factor-set')
  })

  it('cannot be guessed: wrong codes count as failed attempts', async () => {
    const { member } = await protectedMember()
    const app = harness.appWith({ attemptLimits: { perAddress: 1000, perAccount: 3 } })
    const guess = () =>
      request(app).post('/api/v1/session').send({ email: member.email, password: PASSWORD, code: '000000' })
    for (let time = 0; time < 3; time += 1) expectProblem(await guess(), 'wrong-code')
    expectProblem(await guess(), 'too-many-attempts')
  })

  it('is asked for when an invitation is accepted, too', async () => {
    const { member, next } = await protectedMember()
    const group = await makeGroup(harness.owner, `Fresh${(groups += 1)}`)
    const lead = await harness.signIn(group.lead)
    await lead.post('/api/v1/invitations').send({ email: member.email, role: 'reader' })
    const mail = (await harness.mailsTo(member.email)).at(-1)
    const part = mail?.parts.find((each) => 'url' in each)
    const token = part && 'url' in part ? part.url.split('#')[1] : ''
    const accept = (code?: string) =>
      request(harness.app)
        .post('/api/v1/invitations/accept')
        .send({ token, password: PASSWORD, ...(code === undefined ? {} : { code }) })
    expectProblem(await accept(), 'second-factor-needed')
    expect((await accept(next)).status).toBe(201)
  })

  it('is kept in a form that opens nothing', async () => {
    const { secret, recoveryCodes } = await protectedMember()
    const { rows } = await harness.owner.query(
      'select row_to_json(f)::text as row from second_factors f union all select row_to_json(c)::text from recovery_codes c',
    )
    const text = JSON.stringify(rows)
    expect(text).not.toContain(secret)
    for (const code of recoveryCodes) expect(text).not.toContain(code.replaceAll('-', ''))
  })
})
