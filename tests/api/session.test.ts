import { sessionInfo } from '#core/wire/index'
import { SignJWT, decodeProtectedHeader, generateKeyPair } from 'jose'
import type { CryptoKey } from 'jose'
import { connect } from '#db/database'
import { keyRing } from '#api/secrets/keyRing'
import { sealer } from '#api/secrets/sealer'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { PASSWORD } from '../db/support/groups.ts'
import { SESSION_SECRET, signInTo, startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
beforeAll(async () => {
  harness = await startHarness()
})
afterAll(() => harness.stop())

const whoAmI = (cookie: string) =>
  request(harness.app).get('/api/v1/session').set('Cookie', `emberline_session=${cookie}`)

async function sessionIdOf(userId: string): Promise<string> {
  const { rows } = await harness.owner.query<{ id: string }>(
    'select id from sessions where user_id = $1 order by created_at desc limit 1',
    [userId],
  )
  return rows[0]?.id ?? ''
}

const part = (value: unknown) => Buffer.from(JSON.stringify(value)).toString('base64url')

/** The token a member's browser is given. */
async function tokenOf({ email }: { email: string }): Promise<string> {
  const answer = await request(harness.app).post('/api/v1/session').send({ email, password: PASSWORD })
  return (answer.get('Set-Cookie')?.[0] ?? '').split(';')[0]?.split('=')[1] ?? ''
}

/** Signs as the server does, with the key it signs with or another one. */
async function forge(sid: string, changed: { kid?: string; key?: CryptoKey; issuer?: string } = {}) {
  const { db, close } = connect(harness.serverUrl, () => undefined)
  const { kid, key } = await keyRing(db, sealer(SESSION_SECRET)).current()
  await close()
  return new SignJWT({ sid })
    .setProtectedHeader({ alg: 'EdDSA', kid: changed.kid ?? kid })
    .setIssuer(changed.issuer ?? 'emberline')
    .setIssuedAt()
    .setExpirationTime('1h')
    .sign(changed.key ?? key)
}

const otherKey = async () => (await generateKeyPair('EdDSA')).privateKey

describe('signing in', () => {
  it('answers who has signed in, and sets a cookie that scripts cannot read', async () => {
    const { email, name } = harness.alder.author
    const answer = await request(harness.app).post('/api/v1/session').send({ email, password: PASSWORD })
    expect(answer.status).toBe(201)
    expect(sessionInfo.parse(answer.body)).toMatchObject({
      user: { name, email },
      group: { id: harness.alder.id, name: 'Alder', baselineRevisionId: null },
      role: 'author',
    })
    const [cookie] = answer.get('Set-Cookie') ?? []
    expect(cookie).toMatch(/^emberline_session=.+; Path=\/; Expires=.+; HttpOnly; SameSite=Lax$/)
  })

  it('takes the e-mail address in any case', async () => {
    const email = harness.alder.author.email.toUpperCase()
    const answer = await request(harness.app).post('/api/v1/session').send({ email, password: PASSWORD })
    expect(answer.status).toBe(201)
  })

  it('lasts fourteen days', async () => {
    const agent = await harness.signIn(harness.alder.reader)
    const { body } = await agent.get('/api/v1/session')
    const days = (Date.parse(sessionInfo.parse(body).expiresAt) - Date.now()) / 86_400_000
    expect(days).toBeGreaterThan(13.9)
    expect(days).toBeLessThanOrEqual(14)
  })

  it('names a secure cookie bound to the host when the public address is https', async () => {
    const app = harness.appWith({ publicUrl: new URL('https://emberline.example') })
    const { email } = harness.alder.author
    const answer = await request(app).post('/api/v1/session').send({ email, password: PASSWORD })
    const [cookie] = answer.get('Set-Cookie') ?? []
    expect(cookie).toMatch(/^__Host-emberline_session=.+; Path=\/; .*HttpOnly; Secure; SameSite=Lax$/)
  })

  it('answers a wrong password and an unknown account alike', async () => {
    const attempt = (email: string) =>
      request(harness.app).post('/api/v1/session').send({ email, password: 'not the password' })
    const wrong = expectProblem(await attempt(harness.alder.author.email), 'wrong-credentials')
    const unknown = expectProblem(await attempt('nobody@alder.example'), 'wrong-credentials')
    expect({ ...unknown, instance: '' }).toEqual({ ...wrong, instance: '' })
  })

  it('sets no cookie when it fails', async () => {
    const answer = await request(harness.app)
      .post('/api/v1/session')
      .send({ email: harness.alder.author.email, password: 'not the password' })
    expect(answer.get('Set-Cookie')).toBeUndefined()
  })
})

describe('a session', () => {
  it('is refused to those who bring no cookie', async () => {
    expectProblem(await request(harness.app).get('/api/v1/session'), 'not-signed-in')
  })

  it('ends with signing out, even for a copy of the cookie', async () => {
    const answer = await request(harness.app)
      .post('/api/v1/session')
      .send({ email: harness.alder.lead.email, password: PASSWORD })
    const cookie = (answer.get('Set-Cookie')?.[0] ?? '').split(';')[0]?.split('=')[1] ?? ''
    expect((await whoAmI(cookie)).status).toBe(200)
    const out = await request(harness.app)
      .delete('/api/v1/session')
      .set('Cookie', `emberline_session=${cookie}`)
    expect(out.status).toBe(204)
    expect(out.get('Set-Cookie')?.[0]).toMatch(/^emberline_session=; Path=\/; Expires=Thu, 01 Jan 1970/)
    expectProblem(await whoAmI(cookie), 'not-signed-in')
  })

  it('leaves the other sessions of the same person alone when it ends', async () => {
    const first = await harness.signIn(harness.alder.lead)
    const second = await harness.signIn(harness.alder.lead)
    await first.delete('/api/v1/session')
    expect((await second.get('/api/v1/session')).status).toBe(200)
  })

  it('is over once revoked in the database', async () => {
    const agent = await harness.signIn(harness.alder.author)
    const id = await sessionIdOf(harness.alder.author.id)
    await harness.owner.query('update sessions set revoked_at = now() where id = $1', [id])
    expectProblem(await agent.get('/api/v1/session'), 'not-signed-in')
  })

  it('is over once expired, however long the token says', async () => {
    const agent = await harness.signIn(harness.alder.author)
    const id = await sessionIdOf(harness.alder.author.id)
    await harness.owner.query("update sessions set expires_at = now() - interval '1 second' where id = $1", [
      id,
    ])
    expectProblem(await agent.get('/api/v1/session'), 'not-signed-in')
    expectProblem(await agent.get('/api/v1/histories'), 'not-signed-in')
  })

  it('notes when it was last used', async () => {
    const agent = await harness.signIn(harness.alder.author)
    const id = await sessionIdOf(harness.alder.author.id)
    await harness.owner.query("update sessions set last_used_at = now() - interval '1 hour' where id = $1", [
      id,
    ])
    await agent.get('/api/v1/session')
    const { rows } = await harness.owner.query<{ fresh: boolean }>(
      "select last_used_at > now() - interval '1 minute' as fresh from sessions where id = $1",
      [id],
    )
    expect(rows).toEqual([{ fresh: true }])
  })

  it('follows a change of role at once', async () => {
    const { birch } = harness
    const agent = await harness.signIn(birch.author)
    await harness.owner.query("update memberships set role = 'reader' where user_id = $1", [birch.author.id])
    const { body } = await agent.get('/api/v1/session')
    await harness.owner.query("update memberships set role = 'author' where user_id = $1", [birch.author.id])
    expect(sessionInfo.parse(body).role).toBe('reader')
  })
})

describe('a token', () => {
  it('signed with the right key opens its session, so that the forgeries below differ in one thing each', async () => {
    await harness.signIn(harness.alder.author)
    const id = await sessionIdOf(harness.alder.author.id)
    expect((await whoAmI(await forge(id))).status).toBe(200)
  })

  it.each([
    [
      'signed with another key under the same name',
      async (id: string) => forge(id, { key: await otherKey() }),
    ],
    ['signed with a key nobody knows', async (id: string) => forge(id, { kid: 'x', key: await otherKey() })],
    ['of another issuer', (id: string) => forge(id, { issuer: 'someone-else' })],
    ['of a session that never was', () => forge('00000000-0000-4000-8000-000000000000')],
    [
      'that claims to need no signature',
      async (id: string) => {
        const [header = ''] = (await forge(id)).split('.')
        const { kid } = JSON.parse(Buffer.from(header, 'base64url').toString()) as { kid: string }
        return `${part({ alg: 'none', kid })}.${part({ sid: id, iss: 'emberline', exp: 4_000_000_000 })}.`
      },
    ],
    ['that names no key', async (id: string) => `${part({ alg: 'EdDSA' })}.${part({ sid: id })}.x`],
    ['that is no token', async () => 'x'.repeat(80)],
  ])('%s is refused', async (_what, make) => {
    await signInTo(harness.app, harness.alder.author)
    expectProblem(await whoAmI(await make(await sessionIdOf(harness.alder.author.id))), 'not-signed-in')
  })
})

describe('the keys that sign sessions', () => {
  const kidOf = (token: string) => decodeProtectedHeader(token).kid
  const age = (days: number) =>
    harness.owner.query('update signing_keys set created_at = created_at - make_interval(days => $1)', [days])
  const kept = async () => (await harness.owner.query('select 1 from signing_keys')).rowCount

  it('are replaced after a month; what the one before signed is still believed, until it has run out', async () => {
    const before = await tokenOf(harness.birch.reader)
    await age(31)
    const app = harness.appWith({})
    const answer = await request(app)
      .post('/api/v1/session')
      .send({ email: harness.birch.reader.email, password: PASSWORD })
    const after = (answer.get('Set-Cookie')?.[0] ?? '').split(';')[0]?.split('=')[1] ?? ''
    expect(kidOf(after)).not.toBe(kidOf(before))
    const asks = (token: string) =>
      request(app).get('/api/v1/session').set('Cookie', `emberline_session=${token}`)
    expect((await asks(before)).status).toBe(200)
    expect((await asks(after)).status).toBe(200)
    // A server that has been up all the while learns of the new key from the token that names it.
    await new Promise((resolve) => setTimeout(resolve, 2_100))
    expect((await whoAmI(after)).status).toBe(200)
    await age(20)
    const later = harness.appWith({})
    const old = request(later).get('/api/v1/session').set('Cookie', `emberline_session=${before}`)
    expectProblem(await old, 'not-signed-in')
  })

  it('are one, when several servers start at once', async () => {
    await harness.owner.query('delete from signing_keys')
    const apps = [harness.appWith({}), harness.appWith({}), harness.appWith({})]
    const answers = await Promise.all(
      apps.map((app) =>
        request(app).post('/api/v1/session').send({ email: harness.birch.lead.email, password: PASSWORD }),
      ),
    )
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201])
    expect(await kept()).toBe(1)
  })

  it('sealed by another secret are passed over for a new one', async () => {
    const { email } = harness.birch.lead
    const app = harness.appWith({ sessionSecret: `${SESSION_SECRET} and another` })
    expect((await request(app).post('/api/v1/session').send({ email, password: PASSWORD })).status).toBe(201)
  })

  it('cannot be read in the database', async () => {
    const { rows } = await harness.owner.query<{ row: string }>(
      'select row_to_json(k)::text as row from signing_keys k',
    )
    expect(rows.length).toBeGreaterThan(0)
    for (const { row } of rows) expect(row).not.toMatch(/"d"|"crv"|Ed25519/)
  })
})
