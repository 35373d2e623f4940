import { setTimeout as sleep } from 'node:timers/promises'
import type { Database } from '#db/database'
import { removeExpired } from '#db/queries/housekeeping'
import type { JobQueue } from '#db/queue/jobQueue'
import type { Logger } from 'pino'
import { mailQueue, sendQueuedMail } from '../mail/mailQueue.ts'
import type { MailSender } from '../mail/sender.ts'
import type { Sealer } from '../secrets/sealer.ts'
import type { Attempts } from '../services/attempts.ts'
import type { Links } from '../services/links.ts'
import { answerAccountRequests } from './accountRequests.ts'

export interface JobDependencies {
  db: Database
  queue: JobQueue
  sealer: Sealer
  links: Links
  attempts: Attempts
  /** Null when no mail server is set: mails wait in the queue until there is one. */
  sender: MailSender | null
  logger: Logger
}

const RETRY_MS = 5_000

async function untilStarted(queue: JobQueue, logger: Logger, ended: AbortSignal): Promise<void> {
  while (!ended.aborted) {
    try {
      await queue.start()
      return
    } catch (error) {
      logger.error({ err: error }, 'the queue could not be started; trying again')
      await sleep(RETRY_MS, undefined, { signal: ended }).catch(() => undefined)
    }
  }
}

/** Starts the queue, as soon as the database is there, and does its jobs until `ended`. */
export async function runJobs(dependencies: JobDependencies, ended: AbortSignal): Promise<void> {
  const { db, queue, sealer, links, attempts, sender, logger } = dependencies
  await untilStarted(queue, logger, ended)
  if (ended.aborted) return
  queue.work('housekeeping', { atOnce: 1, pollingMs: 30_000 }, async () => {
    logger.info({ removed: await removeExpired(db) }, 'removed what had expired')
  })
  answerAccountRequests({ db, queue, sealer, mail: mailQueue(queue, sealer), links, attempts })
  if (sender === null) logger.warn('no mail server is set: mails wait in the queue')
  else sendQueuedMail(queue, sealer, sender, logger)
}
