import { invitation, receivedInvitation, sessionInfo } from '#core/wire/index'
import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { PASSWORD, makeGroup } from '../db/support/groups.ts'
import type { TestGroup } from '../db/support/groups.ts'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { tokenIn } from './support/mails.ts'
import { expectProblem } from './support/problems.ts'

const NEW_PASSWORD = 'a password for the invited'

let harness: Harness
let groups = 0
beforeAll(async () => {
  harness = await startHarness()
})
afterAll(() => harness.stop())

const freshGroup = (): Promise<TestGroup> => makeGroup(harness.owner, `Fresh${(groups += 1)}`)
const invite = (agent: TestAgent, email: string, role = 'author') =>
  agent.post('/api/v1/invitations').send({ email, role })
const read = (token: string) => request(harness.app).post('/api/v1/invitations/read').send({ token })
const accept = (body: object) => request(harness.app).post('/api/v1/invitations/accept').send(body)
const tokenFor = async (email: string) => tokenIn((await harness.mailsTo(email)).at(-1), '/invitation')

describe('an invitation', () => {
  it('brings somebody new into the group with the role it names, signed in and with a verified address', async () => {
    const group = await freshGroup()
    const lead = await harness.signIn(group.lead)
    const answer = await invite(lead, 'Ida@Somewhere.example')
    expect(answer.status).toBe(201)
    expect(invitation.parse(answer.body)).toMatchObject({
      email: 'ida@somewhere.example',
      role: 'author',
      invitedBy: { name: group.lead.name },
      state: 'open',
    })
    const token = await tokenFor('ida@somewhere.example')
    expect(JSON.stringify(answer.body)).not.toContain(token)
    expect(receivedInvitation.parse((await read(token)).body)).toEqual({
      email: 'ida@somewhere.example',
      role: 'author',
      groupName: group.name,
      inviterName: group.lead.name,
      hasAccount: false,
    })
    const agent = request.agent(harness.app)
    const entered = await agent
      .post('/api/v1/invitations/accept')
      .send({ token, name: 'Ida Lindqvist', password: NEW_PASSWORD })
    expect(entered.status).toBe(201)
    expect(sessionInfo.parse(entered.body)).toMatchObject({
      user: { name: 'Ida Lindqvist', email: 'ida@somewhere.example' },
      group: { id: group.id },
      role: 'author',
    })
    expect((await agent.get('/api/v1/account')).body).toMatchObject({ emailVerified: true })
    expect((await lead.get('/api/v1/invitations')).body).toMatchObject({ items: [{ state: 'accepted' }] })
    expectProblem(await accept({ token, name: 'Again', password: NEW_PASSWORD }), 'link-not-valid')
    expectProblem(await read(token), 'link-not-valid')
  })

  it('brings somebody who has an account in by their own password, and by no other', async () => {
    const [group, other] = [await freshGroup(), await freshGroup()]
    await invite(await harness.signIn(group.lead), other.reader.email, 'lead')
    const token = await tokenFor(other.reader.email)
    expect((await read(token)).body).toMatchObject({ hasAccount: true })
    const wrong = await accept({ token, name: 'Mallory', password: NEW_PASSWORD })
    expect(expectProblem(wrong, 'invalid-input').faults).toMatchObject([{ path: 'password' }])
    const right = await accept({ token, password: PASSWORD })
    expect(right.body).toMatchObject({ user: { id: other.reader.id, name: other.reader.name }, role: 'lead' })
    expect(right.body).toMatchObject({ group: { id: group.id } })
    const again = await harness.signIn(other.reader)
    expect((await again.get('/api/v1/session/groups')).body).toMatchObject({
      items: [{ id: group.id }, { id: other.id }],
    })
  })

  it('tells the lead nothing of whether the address has an account', async () => {
    const [group, other] = [await freshGroup(), await freshGroup()]
    const lead = await harness.signIn(group.lead)
    const known = (await invite(lead, other.reader.email)).body as object
    const unknown = (await invite(lead, 'nobody@known.example')).body as object
    expect(Object.keys(known)).toEqual(Object.keys(unknown))
    expect((await invite(lead, other.reader.email)).status).toBe(201)
  })

  it('does not raise the role of somebody who is in the group already', async () => {
    const group = await freshGroup()
    await invite(await harness.signIn(group.lead), group.reader.email, 'lead')
    const answer = await accept({ token: await tokenFor(group.reader.email), password: PASSWORD })
    expect(answer.body).toMatchObject({ role: 'reader' })
  })

  it('needs a name and a good password for a new account, and stays good until they are given', async () => {
    const group = await freshGroup()
    const email = `new@${group.name.toLowerCase()}.example`
    await invite(await harness.signIn(group.lead), email)
    const token = await tokenFor(email)
    const noName = await accept({ token, password: NEW_PASSWORD })
    expect(expectProblem(noName, 'invalid-input').faults).toMatchObject([{ path: 'name' }])
    const common = await accept({ token, name: 'New', password: 'password1' })
    expect(expectProblem(common, 'invalid-input').faults).toMatchObject([{ path: 'password' }])
    expect((await accept({ token, name: 'New', password: NEW_PASSWORD })).status).toBe(201)
  })

  it('is void once withdrawn, once expired, and once another is sent to the address', async () => {
    const group = await freshGroup()
    const lead = await harness.signIn(group.lead)
    const email = `void@${group.name.toLowerCase()}.example`
    const { body } = await invite(lead, email)
    const withdrawn = await tokenFor(email)
    const address = `/api/v1/invitations/${(body as { id: string }).id}`
    expect((await lead.delete(address)).status).toBe(204)
    expectProblem(await read(withdrawn), 'link-not-valid')
    expectProblem(await lead.delete(address), 'not-found')
    await invite(lead, email)
    const replaced = await tokenFor(email)
    await invite(lead, email)
    const last = await tokenFor(email)
    expectProblem(await read(replaced), 'link-not-valid')
    expect((await read(last)).status).toBe(200)
    await harness.owner.query(
      "update invitations set expires_at = now() - interval '1 second' where email = $1",
      [email],
    )
    expectProblem(await accept({ token: last, name: 'Late', password: NEW_PASSWORD }), 'link-not-valid')
    const { items } = (await lead.get('/api/v1/invitations')).body as { items: { state: string }[] }
    expect(items.map(({ state }) => state)).toEqual(['expired', 'withdrawn', 'withdrawn'])
  })

  it('of another group is neither seen nor withdrawn', async () => {
    const [group, other] = [await freshGroup(), await freshGroup()]
    const theirs = await harness.signIn(other.lead)
    const email = `theirs@${other.name.toLowerCase()}.example`
    const { body } = await invite(theirs, email)
    const lead = await harness.signIn(group.lead)
    expect((await lead.get('/api/v1/invitations')).body).toEqual({ items: [], next: null })
    expectProblem(await lead.delete(`/api/v1/invitations/${(body as { id: string }).id}`), 'not-found')
    expect((await read(await tokenFor(email))).status).toBe(200)
  })

  it('used twice at once makes one account', async () => {
    const group = await freshGroup()
    const email = `twice@${group.name.toLowerCase()}.example`
    await invite(await harness.signIn(group.lead), email)
    const token = await tokenFor(email)
    const answers = await Promise.all(
      ['One', 'Two'].map((name) => accept({ token, name, password: NEW_PASSWORD })),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 410])
  })
})
