import { withPerson } from '#db/database'
import type { Database } from '#db/database'
import { findAccount } from '#db/queries/accounts'
import type { JobQueue } from '#db/queue/jobQueue'
import { ProblemError } from '../errors/problemError.ts'
import type { QueueMail } from '../mail/mailQueue.ts'
import { changeEmailMail, emailTakenMail, forgottenPasswordMail } from '../mail/messages.ts'
import type { Sealer } from '../secrets/sealer.ts'
import { issueToken } from '../services/accounts.ts'
import type { AccountRequest } from '../services/accounts.ts'
import { budget } from '../services/attempts.ts'
import type { Attempts } from '../services/attempts.ts'
import type { Links } from '../services/links.ts'

export interface AccountRequestParts {
  db: Database
  queue: JobQueue
  sealer: Sealer
  mail: QueueMail
  links: Links
  attempts: Attempts
}

const RESETS_PER_ACCOUNT = 3

/** Mails are not sent by the dozen to somebody whose address a stranger knows. */
async function isWithinBudget(attempts: Attempts, email: string): Promise<boolean> {
  try {
    await attempts.take([budget('mails of requests', email, RESETS_PER_ACCOUNT)])
    return true
  } catch (error) {
    if (error instanceof ProblemError) return false
    throw error
  }
}

/** Does what was asked for, where what happens must not show in the answer. */
export async function answerAccountRequest(
  { db, mail, links, attempts }: Omit<AccountRequestParts, 'queue' | 'sealer'>,
  request: AccountRequest,
): Promise<void> {
  const { email } = request
  if (!(await isWithinBudget(attempts, email))) return
  const account = await findAccount(db, email)
  if (request.kind === 'forgotten-password') {
    if (account === null) return
    const { userId } = account
    await withPerson(db, userId, async (tx) => {
      const token = await issueToken(tx, 'reset-password', { userId, email })
      await mail(tx, forgottenPasswordMail({ to: email, url: links('reset-password', token) }))
    })
    return
  }
  const { userId } = request
  await withPerson(db, userId, async (tx) => {
    if (account !== null && account.userId !== userId) return mail(tx, emailTakenMail({ to: email }))
    const token = await issueToken(tx, 'change-email', { userId, email })
    return mail(tx, changeEmailMail({ to: email, url: links('confirm-email', token) }))
  })
}

export function answerAccountRequests({ queue, sealer, ...parts }: AccountRequestParts): void {
  queue.work('account-requests', { atOnce: 5, pollingMs: 1000 }, async ({ data }) =>
    answerAccountRequest(parts, JSON.parse(await sealer.open(data.sealed)) as AccountRequest),
  )
}
