import { sql } from 'drizzle-orm'
import PgBoss from 'pg-boss'
import type { GroupTransaction } from '../database.ts'
import { CLOCK, QUEUE_SCHEMA } from './queues.ts'
import type { JobData, QueueName } from './queues.ts'
import { startWorker } from './worker.ts'
import type { Worker, WorkerOptions } from './worker.ts'

/** A dead worker's job is found within this, on top of what its queue allows a job. */
const MAINTENANCE_SECONDS = 30
const HOUR_SECONDS = 3600
const CLOCK_CHECK_MS = 60_000

export interface QueuedJob<Name extends QueueName> {
  id: string
  data: JobData[Name]
}

/** Jobs kept in PostgreSQL: put in with the transaction that wants them, done by whichever server is free. */
export interface JobQueue {
  /** The job is there once `tx` commits, and never was when it does not. */
  send<Name extends QueueName>(tx: GroupTransaction, name: Name, data: JobData[Name]): Promise<void>
  /** Rejects when the database is away or was never migrated. */
  start(): Promise<void>
  isRunning(): boolean
  /** Does the jobs of a queue from now on; a job whose promise rejects is tried again. */
  work<Name extends QueueName>(
    name: Name,
    options: WorkerOptions,
    handle: (job: QueuedJob<Name>) => Promise<void>,
  ): void
  /** Gives back what dead workers left, and clears what is done; runs by itself once started. */
  maintain(): Promise<void>
  /** Takes no more jobs, and lets those under way finish or gives them back. */
  stop(patienceMs: number): Promise<void>
}

const PLACEHOLDER = /\$(\d+)/

/** Runs the package's statements inside one of our transactions. */
const within = (tx: GroupTransaction): PgBoss.Db => ({
  async executeSql(text, values) {
    const parts = text
      .split(PLACEHOLDER)
      .map((part, index) => (index % 2 === 0 ? sql.raw(part) : sql`${values[Number(part) - 1] ?? null}`))
    const { rows } = await tx.execute(sql.join(parts))
    return { rows }
  },
})

/** Puts in what is due by the clock: one job a period, however many servers look. */
const sendDue = (boss: PgBoss): Promise<void> =>
  boss.insert(
    CLOCK.map(({ name, everySeconds }) => ({
      name,
      data: {},
      singletonKey: 'clock',
      singletonSeconds: everySeconds,
    })),
  )

/** The queue as the server's role uses it; its tables are made by `installQueue`. */
export function jobQueue(url: string, onError: (error: Error) => void): JobQueue {
  const boss = new PgBoss({
    connectionString: url,
    schema: QUEUE_SCHEMA,
    application_name: 'emberline queue',
    max: 3,
    migrate: false,
    schedule: false,
    maintenanceIntervalSeconds: MAINTENANCE_SECONDS,
    archiveCompletedAfterSeconds: HOUR_SECONDS,
    deleteAfterDays: 7,
  })
  boss.on('error', onError)
  const workers: Worker[] = []
  let clock: NodeJS.Timeout | undefined
  let running = false
  return {
    send: (tx, name, data) => boss.insert([{ name, data }], { db: within(tx) }),
    async start() {
      await boss.start()
      await sendDue(boss)
      clock = setInterval(() => void sendDue(boss).catch(onError), CLOCK_CHECK_MS)
      running = true
    },
    isRunning: () => running,
    work(name, options, handle) {
      workers.push(
        startWorker(boss, name, options, onError, ({ id, data }) =>
          handle({ id, data: data as JobData[typeof name] }),
        ),
      )
    },
    maintain: () => boss.maintain(),
    async stop(patienceMs) {
      running = false
      clearInterval(clock)
      await Promise.all(workers.map((worker) => worker.stop(patienceMs)))
      await boss.stop({ graceful: false })
    },
  }
}
