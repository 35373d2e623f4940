import type { ComputeLimits } from './services/computing.ts'
import type { PublicInfo } from '#core/wire/index'
import type { Database } from '#db/database'
import type { JobQueue } from '#db/queue/jobQueue'
import type { Logger } from 'pino'
import type { MailSink } from './mail/sink.ts'
import type { AttemptLimits } from './services/attempts.ts'

/** What the server is built from; tests give their own. */
export interface AppDependencies {
  /** Signed in as the server's own role. */
  db: Database
  queue: JobQueue
  logger: Logger
  sessionSecret: string
  /** The address people type, when a proxy stands in front; null for the address listened on. */
  publicUrl: URL | null
  /** Where mails are caught to be read on a page; null outside demo and development. */
  mailSink: MailSink | null
  webRoot: string
  /** The sign-ins to offer on the sign-in page; null outside demo mode. */
  demoSignIns: PublicInfo['demoSignIns'] | null
  /** Requests a minute taken of one person, key or address; a key may carry a number of its own. */
  requestsPerMinute: number
  computeLimits: ComputeLimits
  attemptLimits: AttemptLimits
  /** Where people reach the product, for the links in mails; never taken from a request, which could claim any. */
  origin: () => string
}
