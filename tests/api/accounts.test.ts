import { account, ownSessions } from '#core/wire/index'
import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { PASSWORD, makeGroup } from '../db/support/groups.ts'
import type { Member, TestGroup } from '../db/support/groups.ts'
import { signInTo, startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { tokenIn } from './support/mails.ts'
import { expectProblem } from './support/problems.ts'

const NEW_PASSWORD = 'another password of the tests'

let harness: Harness
let groups = 0
beforeAll(async () => {
  harness = await startHarness()
})
afterAll(() => harness.stop())

/** Each test has a group of its own: accounts are changed here. */
const freshGroup = (): Promise<TestGroup> => makeGroup(harness.owner, `Fresh${(groups += 1)}`)

const signInWith = (email: string, password: string) =>
  request(harness.app).post('/api/v1/session').send({ email, password })
const isSignedIn = async (agent: TestAgent) => (await agent.get('/api/v1/session')).status === 200
const newest = async (address: string) => (await harness.mailsTo(address)).at(-1)

describe('an account', () => {
  it('shows what belongs to its owner', async () => {
    const { reader } = await freshGroup()
    const agent = await harness.signIn(reader)
    const { body } = await agent.get('/api/v1/account')
    expect(account.parse(body)).toMatchObject({
      id: reader.id,
      name: reader.name,
      email: reader.email,
      emailVerified: false,
      hasPassword: true,
    })
  })

  it('takes another name, which the group sees', async () => {
    const { reader } = await freshGroup()
    const agent = await harness.signIn(reader)
    const answer = await agent.post('/api/v1/account/name').send({ name: '  Hana K.  ' })
    expect(answer.body).toMatchObject({ name: 'Hana K.' })
    expect((await agent.get('/api/v1/session')).body).toMatchObject({ user: { name: 'Hana K.' } })
    expectProblem(await agent.post('/api/v1/account/name').send({ name: 'two\nlines' }), 'invalid-input')
    expectProblem(await agent.post('/api/v1/account/name').send({ name: 'nul\0' }), 'invalid-input')
  })
})

describe('a change of password', () => {
  it('needs the present one, ends every other session, and is told by mail', async () => {
    const { author } = await freshGroup()
    const agent = await harness.signIn(author)
    const other = await harness.signIn(author)
    const wrong = await agent
      .post('/api/v1/account/password')
      .send({ currentPassword: 'not mine', newPassword: NEW_PASSWORD })
    expect(expectProblem(wrong, 'invalid-input').faults).toMatchObject([{ path: 'currentPassword' }])
    const right = await agent
      .post('/api/v1/account/password')
      .send({ currentPassword: PASSWORD, newPassword: NEW_PASSWORD })
    expect(right.status).toBe(204)
    expect(await isSignedIn(agent)).toBe(true)
    expect(await isSignedIn(other)).toBe(false)
    expectProblem(await signInWith(author.email, PASSWORD), 'wrong-credentials')
    expect((await signInWith(author.email, NEW_PASSWORD)).status).toBe(201)
    expect((await newest(author.email))?.subject).toBe('Your password was changed')
  })

  it('refuses a common one, and then nothing has changed', async () => {
    const { author } = await freshGroup()
    const agent = await harness.signIn(author)
    const other = await harness.signIn(author)
    const answer = await agent
      .post('/api/v1/account/password')
      .send({ currentPassword: PASSWORD, newPassword: 'password123' })
    expect(expectProblem(answer, 'invalid-input').faults).toMatchObject([{ path: 'newPassword' }])
    expect(JSON.stringify(answer.body)).not.toContain('password123')
    expect(await isSignedIn(other)).toBe(true)
    expect(await harness.mailsTo(author.email)).toEqual([])
  })

  it('cannot be guessed at from a session left open', async () => {
    const { author } = await freshGroup()
    const agent = await harness.signIn(author)
    const attempt = () =>
      agent.post('/api/v1/account/password').send({ currentPassword: 'a guess', newPassword: NEW_PASSWORD })
    for (let time = 0; time < 10; time += 1) expect((await attempt()).status).toBe(422)
    expectProblem(await attempt(), 'too-many-attempts')
  })
})

describe('a forgotten password', () => {
  const forget = (email: string) => request(harness.app).post('/api/v1/forgotten-passwords').send({ email })
  const reset = (token: string, newPassword = NEW_PASSWORD) =>
    request(harness.app).post('/api/v1/password-resets').send({ token, newPassword })

  it('is replaced by the link in a mail, once; every session ends', async () => {
    const { author } = await freshGroup()
    const agent = await harness.signIn(author)
    expect((await forget(author.email.toUpperCase())).status).toBe(204)
    const token = tokenIn(await newest(author.email), '/reset-password')
    expectProblem(await reset(token, 'password'), 'invalid-input')
    expect((await reset(token)).status).toBe(204)
    expect(await isSignedIn(agent)).toBe(false)
    expect((await signInWith(author.email, NEW_PASSWORD)).status).toBe(201)
    expectProblem(await reset(token, 'yet another password'), 'link-not-valid')
  })

  it('is answered alike for an address without an account, to which nothing is sent', async () => {
    const answer = await forget('nobody@nowhere.example')
    expect(answer.status).toBe(204)
    expect(answer.text).toBe('')
    expect(await harness.mailsTo('nobody@nowhere.example')).toEqual([])
  })

  it('makes an earlier link void by a later one', async () => {
    const { author } = await freshGroup()
    await forget(author.email)
    const first = tokenIn(await newest(author.email), '/reset-password')
    await forget(author.email)
    const second = tokenIn(await newest(author.email), '/reset-password')
    expectProblem(await reset(first), 'link-not-valid')
    expect((await reset(second)).status).toBe(204)
  })

  it('sends an account three mails in a quarter of an hour, however often it is asked', async () => {
    const { author } = await freshGroup()
    for (let time = 0; time < 5; time += 1) expect((await forget(author.email)).status).toBe(204)
    expect(await harness.mailsTo(author.email)).toHaveLength(3)
  })

  it.each([
    ['expired', "update one_time_tokens set expires_at = now() - interval '1 second'"],
    ['of another purpose', "update one_time_tokens set purpose = 'verify-email'"],
  ])('is not replaced by a link %s', async (_what, spoil) => {
    const { author } = await freshGroup()
    await forget(author.email)
    const token = tokenIn(await newest(author.email), '/reset-password')
    await harness.owner.query(`${spoil} where user_id = $1`, [author.id])
    expectProblem(await reset(token), 'link-not-valid')
  })

  it('is not replaced by a link with another secret, nor by rubbish', async () => {
    const { author } = await freshGroup()
    await forget(author.email)
    const token = tokenIn(await newest(author.email), '/reset-password')
    const swapped = token.slice(0, -1) + (token.endsWith('A') ? 'B' : 'A')
    for (const wrong of [swapped, token.slice(0, 40), 'x'.repeat(64), "' or 1=1 --"])
      expectProblem(await reset(wrong), 'link-not-valid')
    expect((await reset(token)).status).toBe(204)
  })

  it('is kept nowhere in a form that opens anything', async () => {
    const { author } = await freshGroup()
    await forget(author.email)
    const token = tokenIn(await newest(author.email), '/reset-password')
    const { rows } = await harness.owner.query(
      'select row_to_json(t)::text as row from one_time_tokens t union all select row_to_json(j)::text from pgboss.job j',
    )
    const secret = Buffer.from(token, 'base64url').subarray(16)
    const text = JSON.stringify(rows)
    for (const form of [token, secret.toString('hex'), secret.toString('base64url')])
      expect(text).not.toContain(form)
  })
})

describe('an e-mail address', () => {
  const change = (agent: TestAgent, email: string, currentPassword = PASSWORD) =>
    agent.post('/api/v1/account/email').send({ email, currentPassword })
  const confirm = (token: string) => request(harness.app).post('/api/v1/email-confirmations').send({ token })

  it('changes once the link sent to the new one is opened, and the old one is told', async () => {
    const { author } = await freshGroup()
    const agent = await harness.signIn(author)
    const newEmail = `New.${author.email}`
    expectProblem(await change(agent, newEmail, 'not mine'), 'invalid-input')
    expect((await change(agent, newEmail)).status).toBe(204)
    expect((await agent.get('/api/v1/account')).body).toMatchObject({ email: author.email })
    const token = tokenIn(await newest(newEmail.toLowerCase()), '/confirm-email')
    expect((await confirm(token)).status).toBe(204)
    const changed = { email: newEmail.toLowerCase(), emailVerified: true }
    expect((await agent.get('/api/v1/account')).body).toMatchObject(changed)
    const told = await newest(author.email)
    expect(told?.subject).toBe('Your address was changed')
    expect(JSON.stringify(told)).toContain(newEmail.toLowerCase())
    expect((await signInWith(newEmail, PASSWORD)).status).toBe(201)
    expectProblem(await signInWith(author.email, PASSWORD), 'wrong-credentials')
    expectProblem(await confirm(token), 'link-not-valid')
  })

  it('of somebody else is answered alike, and its owner alone is told', async () => {
    const { author, lead } = await freshGroup()
    const agent = await harness.signIn(author)
    const answer = await change(agent, lead.email)
    expect(answer.status).toBe(204)
    const told = await newest(lead.email)
    expect(told?.subject).toBe('You have an account already')
    expect(told?.parts.some((part) => 'url' in part)).toBe(false)
  })

  it('taken by another account meanwhile is not taken twice', async () => {
    const { author, reader } = await freshGroup()
    const agent = await harness.signIn(author)
    const wanted = `wanted.${author.email}`
    await change(agent, wanted)
    const token = tokenIn(await newest(wanted), '/confirm-email')
    await harness.owner.query('update users set email = $1 where id = $2', [wanted, reader.id])
    expectProblem(await confirm(token), 'link-not-valid')
    expect((await agent.get('/api/v1/account')).body).toMatchObject({ email: author.email })
  })

  it('is verified by a link sent to it on request', async () => {
    const { reader } = await freshGroup()
    const agent = await harness.signIn(reader)
    expect((await agent.post('/api/v1/account/email/verification')).status).toBe(204)
    const token = tokenIn(await newest(reader.email), '/confirm-email')
    expect((await confirm(token)).status).toBe(204)
    expect((await agent.get('/api/v1/account')).body).toMatchObject({ emailVerified: true })
  })

  it('changed since is not verified by the link sent before', async () => {
    const { reader } = await freshGroup()
    const agent = await harness.signIn(reader)
    await agent.post('/api/v1/account/email/verification')
    const token = tokenIn(await newest(reader.email), '/confirm-email')
    await harness.owner.query('update users set email = $1 where id = $2', [
      `later.${reader.email}`,
      reader.id,
    ])
    expectProblem(await confirm(token), 'link-not-valid')
    expect((await agent.get('/api/v1/account')).body).toMatchObject({ emailVerified: false })
  })
})

describe('one’s sessions', () => {
  const FIREFOX = 'Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0'
  const listOf = async (agent: TestAgent) =>
    ownSessions.parse((await agent.get('/api/v1/account/sessions')).body).items

  async function signInFrom(member: Member, userAgent: string, address: string): Promise<TestAgent> {
    const agent = request.agent(harness.app)
    await agent
      .post('/api/v1/session')
      .set('User-Agent', userAgent)
      .set('X-Forwarded-For', address)
      .send({ email: member.email, password: PASSWORD })
    return agent
  }

  it('are listed with device, address and last use, the one asking marked; nobody else’s', async () => {
    const { author, reader, name } = await freshGroup()
    await harness.signIn(reader)
    const agent = await signInFrom(author, FIREFOX, '192.0.2.7')
    await signInFrom(author, 'curl/8', '198.51.100.3')
    const sessions = await listOf(agent)
    expect(sessions).toHaveLength(2)
    const [own] = sessions.filter(({ current }) => current)
    expect(own).toMatchObject({ userAgent: FIREFOX, address: '192.0.2.7', group: name })
    expect(Date.now() - Date.parse(own?.lastUsedAt ?? '')).toBeLessThan(60_000)
  })

  it('keep no more of a device’s name than anybody reads', async () => {
    const { author } = await freshGroup()
    const agent = await signInFrom(author, 'x'.repeat(5000), '192.0.2.7')
    expect((await listOf(agent))[0]?.userAgent).toHaveLength(300)
  })

  it('are ended one by one', async () => {
    const { author } = await freshGroup()
    const agent = await harness.signIn(author)
    const other = await harness.signIn(author)
    const [found] = (await listOf(agent)).filter(({ current }) => !current)
    const address = `/api/v1/account/sessions/${found?.id}`
    expect((await agent.delete(address)).status).toBe(204)
    expect(await isSignedIn(other)).toBe(false)
    expect(await isSignedIn(agent)).toBe(true)
    expectProblem(await agent.delete(address), 'not-found')
  })

  it('are ended all at once, but for the one asking', async () => {
    const { author, reader } = await freshGroup()
    const agent = await harness.signIn(author)
    const others = [await harness.signIn(author), await harness.signIn(author)]
    const somebodyElse = await harness.signIn(reader)
    expect((await agent.delete('/api/v1/account/sessions')).status).toBe(204)
    for (const other of others) expect(await isSignedIn(other)).toBe(false)
    expect(await isSignedIn(agent)).toBe(true)
    expect(await isSignedIn(somebodyElse)).toBe(true)
  })

  it('of somebody else are not found', async () => {
    const { author, lead } = await freshGroup()
    const theirs = await harness.signIn(author)
    const [session] = await listOf(theirs)
    const agent = await harness.signIn(lead)
    expectProblem(await agent.delete(`/api/v1/account/sessions/${session?.id}`), 'not-found')
    expect(await isSignedIn(theirs)).toBe(true)
  })
})

describe('somebody in several groups', () => {
  const join = (group: TestGroup, member: Member, role: string) =>
    harness.owner.query('insert into memberships (group_id, user_id, role) values ($1, $2, $3)', [
      group.id,
      member.id,
      role,
    ])

  it('turns the session to another group, with the role held there, and comes back to it at the next sign-in', async () => {
    const [first, second] = [await freshGroup(), await freshGroup()]
    await join(second, first.lead, 'reader')
    const agent = await harness.signIn(first.lead)
    expect((await agent.get('/api/v1/session')).body).toMatchObject({ group: { id: first.id }, role: 'lead' })
    expect((await agent.get('/api/v1/session/groups')).body).toEqual({
      items: [
        { id: first.id, name: first.name, role: 'lead' },
        { id: second.id, name: second.name, role: 'reader' },
      ],
    })
    const turned = await agent.post('/api/v1/session/group').send({ groupId: second.id })
    expect(turned.body).toMatchObject({ group: { id: second.id, name: second.name }, role: 'reader' })
    expectProblem(await agent.get('/api/v1/invitations'), 'not-allowed')
    const again = await signInTo(harness.app, first.lead)
    expect((await again.get('/api/v1/session')).body).toMatchObject({ group: { id: second.id } })
  })

  it('cannot turn it to a group they are not in, nor to one that is not', async () => {
    const [first, second] = [await freshGroup(), await freshGroup()]
    const agent = await harness.signIn(first.lead)
    for (const groupId of [second.id, '00000000-0000-4000-8000-000000000000'])
      expectProblem(await agent.post('/api/v1/session/group').send({ groupId }), 'not-found')
    expect((await agent.get('/api/v1/session')).body).toMatchObject({ group: { id: first.id } })
  })

  it('is told so when they are in none any more, once the password is right', async () => {
    const { reader } = await freshGroup()
    await harness.owner.query('delete from memberships where user_id = $1', [reader.id])
    expectProblem(await signInWith(reader.email, 'a guess'), 'wrong-credentials')
    expectProblem(await signInWith(reader.email, PASSWORD), 'no-group')
  })
})
