import { connect } from '#db/database'
import { jobQueue } from '#db/queue/jobQueue'
import { createApp } from '#api/app'
import type { AppDependencies } from '#api/dependencies'
import { createLogger } from '#api/logger'
import type { Express } from 'express'
import type pg from 'pg'
import request from 'supertest'
import type TestAgent from 'supertest/lib/agent.js'
import { makeGroup, PASSWORD } from '../../db/support/groups.ts'
import type { Member, TestGroup } from '../../db/support/groups.ts'
import { connectOwner } from '../../db/support/owner.ts'
import { freshDatabase } from '../../support/database.ts'

export const SESSION_SECRET = 'a secret for tests only, 32 characters or more'

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
      signInLimits: { perAddress: 100, perAccount: 100 },
      requestsPerMinute: 10_000,
      ...changed,
    })
  const app = appWith({})
  return {
    app,
    serverUrl: database.serverUrl,
    ownerUrl: database.ownerUrl,
    owner,
    alder: await makeGroup(owner, 'Alder'),
    birch: await makeGroup(owner, 'Birch'),
    appWith,
    signIn: (member) => signInTo(app, member),
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
