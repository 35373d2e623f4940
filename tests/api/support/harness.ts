import { connect } from '#db/database'
import { jobQueue } from '#db/queue/jobQueue'
import { createApp } from '#api/app'
import type { AppDependencies } from '#api/dependencies'
import { createLogger } from '#api/logger'
import { answerAccountRequest } from '#api/jobs/accountRequests'
import type { Mail } from '#api/mail/mail'
import { mailQueue } from '#api/mail/mailQueue'
import { sealer } from '#api/secrets/sealer'
import type { AccountRequest } from '#api/services/accounts'
import { attemptCounter } from '#api/services/attempts'
import { linksFrom } from '#api/services/links'
import type { Express } from 'express'
import type pg from 'pg'
import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { makeGroup, PASSWORD } from '../../db/support/groups.ts'
import type { Member, TestGroup } from '../../db/support/groups.ts'
import { connectOwner } from '../../db/support/owner.ts'
import { freshDatabase } from '../../support/database.ts'

export const SESSION_SECRET = 'a secret for tests only, 32 characters or more'

/** Where the links in mails lead. */
export const ORIGIN = 'http://emberline.test'

export interface Harness {
  app: Express
  serverUrl: string
  ownerUrl: string
  /** The database's owner, to set the stage with. */
  owner: pg.Client
  alder: TestGroup
  birch: TestGroup
  /** Another app on the same database, with other dependencies. */
  appWith(changed: Partial<AppDependencies>): Express
  signIn(member: Member): Promise<TestAgent>
  /** The mails queued for an address so far, newest last; what was asked for without an answer is done first. */
  mailsTo(address: string): Promise<Mail[]>
  stop(): Promise<void>
}

/** A server on a database of its own with two groups, Alder and Birch. */
export async function startHarness(): Promise<Harness> {
  const database = await freshDatabase()
  const owner = await connectOwner(database.ownerUrl)
  const { db, close } = connect(database.serverUrl, () => undefined)
  const queue = jobQueue(database.serverUrl, () => undefined)
  const appWith = (changed: Partial<AppDependencies>): Express =>
    createApp({
      db,
      queue,
      logger: createLogger('silent'),
      sessionSecret: SESSION_SECRET,
      publicUrl: null,
      mailSink: null,
      webRoot: 'no-such-folder',
      demoSignIns: null,
      requestsPerMinute: 10_000,
      computeLimits: { running: 4, waiting: 64 },
      attemptLimits: { perAddress: 1000, perAccount: 1000 },
      origin: () => ORIGIN,
      ...changed,
    })
  const app = appWith({})
  const { seal, open } = sealer(SESSION_SECRET)
  const sealedIn = async (name: string): Promise<{ id: string; sealed: string }[]> => {
    const { rows } = await owner.query<{ id: string; sealed: string }>(
      "select id, data->>'sealed' as sealed from pgboss.job where name = $1 and state = 'created' order by created_on",
      [name],
    )
    return rows
  }
  const answerRequests = async (): Promise<void> => {
    const parts = {
      db,
      mail: mailQueue(queue, { seal, open }),
      links: linksFrom(() => ORIGIN),
      attempts: attemptCounter(db),
    }
    for (const { id, sealed } of await sealedIn('account-requests')) {
      await answerAccountRequest(parts, JSON.parse(await open(sealed)) as AccountRequest)
      await owner.query("update pgboss.job set state = 'completed' where id = $1", [id])
    }
  }
  return {
    app,
    serverUrl: database.serverUrl,
    ownerUrl: database.ownerUrl,
    owner,
    alder: await makeGroup(owner, 'Alder'),
    birch: await makeGroup(owner, 'Birch'),
    appWith,
    signIn: (member) => signInTo(app, member),
    async mailsTo(address) {
      await answerRequests()
      const mails = await Promise.all((await sealedIn('mail')).map(({ sealed }) => open(sealed)))
      return mails.map((text) => JSON.parse(text) as Mail).filter(({ to }) => to === address)
    },
    async stop() {
      await close()
      await owner.end()
      await database.drop()
    },
  }
}

/** An agent that carries the session's cookie of a member who has signed in. */
export async function signInTo(app: Express, member: Member): Promise<TestAgent> {
  const agent = request.agent(app)
  const answer = await agent.post('/api/v1/session').send({ email: member.email, password: PASSWORD })
  if (answer.status !== 201) throw new Error(`${member.email} could not sign in: ${answer.text}`)
  return agent
}
