import { connect } from '#db/database'
import type { DatabaseConnection } from '#db/database'
import { removeExpired } from '#db/queries/housekeeping'
import { jobQueue } from '#db/queue/jobQueue'
import type { JobQueue } from '#db/queue/jobQueue'
import { QUEUES } from '#db/queue/queues'
import type pg from 'pg'
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { freshDatabase } from '../support/database.ts'
import { until } from '../support/until.ts'
import { makeGroup } from './support/groups.ts'
import { connectOwner } from './support/owner.ts'

let database: Awaited<ReturnType<typeof freshDatabase>>
let owner: pg.Client
let connection: DatabaseConnection
let queue: JobQueue
const errors: Error[] = []
beforeAll(async () => {
  database = await freshDatabase()
  owner = await connectOwner(database.ownerUrl)
  connection = connect(database.serverUrl, () => undefined)
})
beforeEach(async () => {
  await owner.query('delete from pgboss.job')
  errors.length = 0
  queue = jobQueue(database.serverUrl, (error) => errors.push(error))
  await queue.start()
})
afterEach(() => queue.stop(1000))
afterAll(async () => {
  await connection.close()
  await owner.end()
  await database.drop()
})

const send = (sealed: string) => connection.db.transaction((tx) => queue.send(tx, 'mail', { sealed }))
const jobs = async (name = 'mail') =>
  (
    await owner.query<{ state: string; retry_count: number; output: unknown }>(
      'select state, retry_count, output from pgboss.job where name = $1',
      [name],
    )
  ).rows

describe('a job', () => {
  it('is done once its transaction has committed', async () => {
    const done: string[] = []
    queue.work('mail', { atOnce: 5, pollingMs: 20 }, async ({ data }) => void done.push(data.sealed))
    await send('one')
    await until(() => done.length === 1)
    await until(async () => (await jobs())[0]?.state === 'completed')
    expect(done).toEqual(['one'])
    expect(errors).toEqual([])
  })

  it('never was when its transaction is rolled back', async () => {
    const gone = connection.db.transaction(async (tx) => {
      await queue.send(tx, 'mail', { sealed: 'one' })
      throw new Error('changed my mind')
    })
    await expect(gone).rejects.toThrow('changed my mind')
    expect(await jobs()).toEqual([])
  })

  it('that fails waits to be tried again, and keeps nothing of the message but its code', async () => {
    queue.work('mail', { atOnce: 5, pollingMs: 20 }, async () => {
      throw Object.assign(new Error('hana@larchvalley.example is away'), { code: 'ECONNECTION' })
    })
    await send('one')
    await until(async () => (await jobs())[0]?.state === 'retry')
    expect(await jobs()).toMatchObject([{ state: 'retry', output: { name: 'Error', code: 'ECONNECTION' } }])
    expect(JSON.stringify(await jobs())).not.toContain('hana')
  })

  it('does not fail for another of the same batch', async () => {
    await send('bad')
    await send('good')
    queue.work('mail', { atOnce: 5, pollingMs: 20 }, async ({ data }) => {
      if (data.sealed === 'bad') throw new Error('no')
    })
    await until(async () => (await jobs()).every(({ state }) => state === 'retry' || state === 'completed'))
    expect((await jobs()).map(({ state }) => state).sort()).toEqual(['completed', 'retry'])
  })

  it('of a worker that died is given back after its time, and done by another', async () => {
    const dead = jobQueue(database.serverUrl, () => undefined)
    await dead.start()
    let taken = false
    dead.work('mail', { atOnce: 1, pollingMs: 20 }, () => {
      taken = true
      return new Promise(() => undefined)
    })
    await send('one')
    await until(() => taken)
    const done: string[] = []
    queue.work('mail', { atOnce: 1, pollingMs: 20 }, async ({ data }) => void done.push(data.sealed))
    await queue.maintain()
    expect((await jobs()).map(({ state }) => state)).toEqual(['active'])
    const { expireInSeconds } = QUEUES.find(({ name }) => name === 'mail')?.options ?? {}
    await owner.query('update pgboss.job set started_on = started_on - make_interval(secs => $1)', [
      expireInSeconds,
    ])
    await queue.maintain()
    await owner.query('update pgboss.job set start_after = now()')
    await until(() => done.length === 1)
    expect(done).toEqual(['one'])
    await dead.stop(1)
  })

  it('under way when the server stops is given back', async () => {
    const stopped = jobQueue(database.serverUrl, () => undefined)
    await stopped.start()
    stopped.work('mail', { atOnce: 1, pollingMs: 20 }, () => new Promise(() => undefined))
    await send('one')
    await until(async () => (await jobs())[0]?.state === 'active')
    await stopped.stop(50)
    expect((await jobs()).map(({ state }) => state)).toEqual(['retry'])
  })
})

describe('housekeeping', () => {
  it('is put in once an hour, however many servers there are', async () => {
    const another = jobQueue(database.serverUrl, () => undefined)
    await another.start()
    await another.stop(1)
    expect(await jobs('housekeeping')).toHaveLength(1)
  })

  it('removes sessions that ended a month ago, and no other', async () => {
    const { id, lead } = await makeGroup(owner, 'Housekept')
    await owner.query(
      `insert into sessions (group_id, user_id, expires_at, revoked_at) values
         ($1, $2, now() - interval '31 days', null), ($1, $2, now() + interval '1 day', now() - interval '31 days'),
         ($1, $2, now() - interval '29 days', null), ($1, $2, now() + interval '1 day', null)`,
      [id, lead.id],
    )
    expect(await removeExpired(connection.db)).toBe(2)
    const { rows } = await owner.query('select 1 from sessions where group_id = $1', [id])
    expect(rows).toHaveLength(2)
  })
})

describe('the queue’s tables', () => {
  const asServer = (statement: string) => connection.db.execute(statement)
  const cause = (promise: Promise<unknown>) =>
    promise.then(
      () => 'allowed',
      (error: Error) => String((error.cause as Error).message),
    )

  it.each([
    "select pgboss.create_queue('mine', '{}')",
    "select pgboss.delete_queue('mail')",
    'truncate pgboss.job',
    'drop table pgboss.job',
    "update pgboss.queue set retry_limit = 0 where name = 'mail'",
    'update pgboss.version set version = 1',
    'create table pgboss.mine (id int)',
  ])('refuse the server’s role: %s', async (statement) => {
    expect(await cause(asServer(statement))).toMatch(/permission denied|must be owner/)
  })
})
