import { connect } from '#db/database'
import { firstGroupLink } from '#api/services/firstGroup'
import { linksFrom } from '#api/services/links'
import request from 'supertest'
import { afterAll, beforeEach, expect, it } from 'vitest'
import { ORIGIN, startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { tokenIn } from './support/mails.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
beforeEach(async () => {
  await harness?.stop()
  harness = await startHarness()
  for (const table of ['memberships', 'users', 'groups']) await harness.owner.query(`delete from ${table}`)
})
afterAll(() => harness.stop())

const FOUNDING = {
  groupName: 'Willow group',
  name: 'Ida Lindqvist',
  email: 'Ida@Willow.example',
  password: 'a password to begin with',
}

async function printedToken(): Promise<string | null> {
  const { db, close } = connect(harness.serverUrl, () => undefined)
  const link = await firstGroupLink(
    db,
    linksFrom(() => ORIGIN),
  )
  await close()
  return link === null ? null : (link.split('#')[1] ?? '')
}

const found = (token: string | null, changed: object = {}) =>
  request(harness.app)
    .post('/api/v1/first-group')
    .send({ token, ...FOUNDING, ...changed })
const awaits = async () =>
  ((await request(harness.app).get('/api/v1/info')).body as { awaitsFirstGroup: boolean }).awaitsFirstGroup

it('an empty database offers its first group to whoever has the token printed, once', async () => {
  expect(await awaits()).toBe(true)
  const token = await printedToken()
  const answer = await found(token)
  expect(answer.status).toBe(201)
  expect(answer.body).toMatchObject({
    user: { name: 'Ida Lindqvist', email: 'ida@willow.example' },
    group: { name: 'Willow group' },
    role: 'lead',
  })
  expect(await awaits()).toBe(false)
  expect(await printedToken()).toBeNull()
  expectProblem(await found(token, { email: 'second@willow.example' }), 'link-not-valid')
})

it('the lead is asked to verify the address', async () => {
  await found(await printedToken())
  const token = tokenIn((await harness.mailsTo('ida@willow.example')).at(-1), '/confirm-email')
  expect((await request(harness.app).post('/api/v1/email-confirmations').send({ token })).status).toBe(204)
})

it('a wrong token founds nothing, a common password neither', async () => {
  const token = await printedToken()
  expectProblem(await found('x'.repeat(64)), 'link-not-valid')
  expectProblem(await found(token, { password: 'willow group' }), 'invalid-input')
  expect(await awaits()).toBe(true)
  expect((await found(token)).status).toBe(201)
})

it('two tokens printed by two servers found one group between them', async () => {
  const [first, second] = [await printedToken(), await printedToken()]
  const answers = await Promise.all([found(first), found(second, { email: 'other@willow.example' })])
  expect(answers.map(({ status }) => status).sort()).toEqual([201, 410])
  const { rows } = await harness.owner.query<{ groups: number; users: number }>(
    'select (select count(*)::int from groups) as groups, (select count(*)::int from users) as users',
  )
  expect(rows).toEqual([{ groups: 1, users: 1 }])
})
