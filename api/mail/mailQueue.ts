import type { GroupTransaction } from '#db/database'
import type { JobQueue } from '#db/queue/jobQueue'
import type { Logger } from 'pino'
import type { Sealer } from '../secrets/sealer.ts'
import type { Mail } from './mail.ts'
import type { MailSender } from './sender.ts'

/** Puts a mail into the queue with the transaction that wants it; sealed, for it may carry a token. */
export type QueueMail = (tx: GroupTransaction, mail: Mail) => Promise<void>

export const mailQueue =
  (queue: JobQueue, sealer: Sealer): QueueMail =>
  async (tx, mail) =>
    queue.send(tx, 'mail', { sealed: await sealer.seal(JSON.stringify(mail)) })

/** A mail server's refusal for good, as of an address that does not exist: trying again would not help. */
function isFinal(error: unknown): boolean {
  const { responseCode, command } = error as { responseCode?: number; command?: string }
  return responseCode !== undefined && responseCode >= 500 && (command === 'RCPT TO' || command === 'DATA')
}

/** Sends the mails of the queue. */
export function sendQueuedMail(queue: JobQueue, sealer: Sealer, sender: MailSender, logger: Logger): void {
  queue.work('mail', { atOnce: 5, pollingMs: 1000 }, async ({ id, data }) => {
    const mail = JSON.parse(await sealer.open(data.sealed)) as Mail
    try {
      await sender.send(mail, id)
    } catch (error) {
      if (!isFinal(error)) throw error
      const { responseCode } = error as { responseCode: number }
      logger.warn({ job: id, responseCode }, 'a mail was refused for good by the mail server')
    }
  })
}
