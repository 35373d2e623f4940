import type PgBoss from 'pg-boss'

/** PostgreSQL schema of the queue's own tables. */
export const QUEUE_SCHEMA = 'pgboss'

/** What each queue carries. Whatever tells of a person is sealed: the queue's tables know no groups. */
export interface JobData {
  /** A mail to be sent: a sealed `QueuedMail`. */
  mail: { sealed: string }
  /** What an account is asked for, sealed, answered by mail alone. */
  'account-requests': { sealed: string }
  /** Removal of what has expired. */
  housekeeping: Record<string, never>
}

export type QueueName = keyof JobData

const MINUTES_PER_DAY = 24 * 60

type QueueOptions = Omit<PgBoss.Queue, 'name'>

const MAIL_RETRY_SECONDS = 30
const MAIL_PATIENCE_DAYS = 14

/** Where mails end that no server took for a fortnight. */
export const UNDELIVERED = 'mail-undelivered'

/**
 * Every queue with how long a job may take before its worker counts as dead, and how often it is tried again.
 * A queue stands below those it names as its dead letter.
 */
export const QUEUES: readonly { name: string; options: QueueOptions }[] = [
  { name: UNDELIVERED, options: { retentionMinutes: 90 * MINUTES_PER_DAY } },
  {
    name: 'mail',
    options: {
      expireInSeconds: 60,
      retryDelay: MAIL_RETRY_SECONDS,
      retryLimit: (MAIL_PATIENCE_DAYS * MINUTES_PER_DAY * 60) / MAIL_RETRY_SECONDS,
      retentionMinutes: 30 * MINUTES_PER_DAY,
      deadLetter: UNDELIVERED,
    },
  },
  { name: 'account-requests', options: { expireInSeconds: 60, retryLimit: 100, retryDelay: 10 } },
  { name: 'housekeeping', options: { expireInSeconds: 300, retryLimit: 3, retryDelay: 60 } },
]

/** What is done by the clock: how often, and so how far apart at least, whichever server thinks of it. */
export const CLOCK: readonly { name: QueueName; everySeconds: number }[] = [
  { name: 'housekeeping', everySeconds: 3600 },
]
