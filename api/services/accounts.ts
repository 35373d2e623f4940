import { InputError } from '#core/wire/index'
import type { Account } from '#core/wire/index'
import { withMember, withPerson } from '#db/database'
import type { Database, GroupTransaction } from '#db/database'
import { hashPassword, passwordMatches } from '#db/passwordHash'
import { changeAccount, ownPasswordHash, readAccount, saysEmailTaken } from '#db/queries/accounts'
import type { OwnAccount } from '#db/queries/accounts'
import { findToken, insertToken, useToken, withdrawTokens } from '#db/queries/oneTimeTokens'
import type { LiveToken, PersonalPurpose } from '#db/queries/oneTimeTokens'
import { listOwnGroups, revokeSessions } from '#db/queries/sessions'
import type { JobQueue } from '#db/queue/jobQueue'
import { linkNotValid } from '../errors/problemError.ts'
import type { QueueMail } from '../mail/mailQueue.ts'
import { emailChangedMail, passwordChangedMail, verifyEmailMail } from '../mail/messages.ts'
import type { Caller, RequestOrigin } from '../middleware/caller.ts'
import { mintToken, readToken } from '../secrets/linkToken.ts'
import type { Sealer } from '../secrets/sealer.ts'
import { budget } from './attempts.ts'
import type { Attempts } from './attempts.ts'
import { audit } from './audit.ts'
import type { AuditAction } from './audit.ts'
import type { Links } from './links.ts'
import { requireGoodPassword } from './passwordPolicy.ts'
import type { SecondFactorService } from './secondFactor.ts'
import type { Visitor } from './visitor.ts'

const HOUR_MS = 3_600_000
export const TOKEN_LIFETIME_MS: Record<PersonalPurpose, number> = {
  'verify-email': 24 * HOUR_MS,
  'change-email': 24 * HOUR_MS,
  'reset-password': 2 * HOUR_MS,
}

const PASSWORD_CHECKS = 10
const RESETS_PER_ADDRESS = 20
const MAILS_PER_PERSON = 5

/** What is asked for without being told whether it can be done; worked off by `answerAccountRequests`. */
export type AccountRequest =
  { kind: 'forgotten-password'; email: string } | { kind: 'change-email'; userId: string; email: string }

export interface AccountParts {
  db: Database
  queue: JobQueue
  sealer: Sealer
  mail: QueueMail
  links: Links
  attempts: Attempts
  factors: SecondFactorService
}

/** Keeps a new token of a person in place of those before, and returns what goes into the link. */
export async function issueToken(
  tx: GroupTransaction,
  purpose: PersonalPurpose,
  { userId, email }: { userId: string; email: string },
): Promise<string> {
  const { id, secretHash, token } = mintToken()
  await withdrawTokens(tx, purpose)
  const expiresAt = new Date(Date.now() + TOKEN_LIFETIME_MS[purpose])
  await insertToken(tx, { id, secretHash, purpose, userId, email, expiresAt })
  return token
}

const ASK_AGAIN = 'Ask for a new one.'

interface PersonalToken {
  id: string
  purpose: PersonalPurpose
  userId: string
  email: string
}

const isPersonal = (token: LiveToken): token is LiveToken & PersonalToken =>
  token.purpose !== 'first-group' && token.userId !== null && token.email !== null

const writeAccount = (
  account: OwnAccount,
  passwordHash: string | null,
  secondFactor: Account['secondFactor'],
): Account => ({
  id: account.id,
  name: account.name,
  email: account.email,
  emailVerified: account.emailVerifiedAt !== null,
  hasPassword: passwordHash !== null,
  secondFactor,
  createdAt: account.createdAt.toISOString(),
})

export function accountService({ db, queue, sealer, mail, links, attempts, factors }: AccountParts) {
  const ownTransaction = <T>(caller: Caller, work: (tx: GroupTransaction) => Promise<T>): Promise<T> =>
    withMember(db, caller, work)

  const read = async (caller: Caller): Promise<Account> => {
    const secondFactor = await factors.state(caller)
    return ownTransaction(caller, async (tx) =>
      writeAccount(await readAccount(tx, caller.user.id), await ownPasswordHash(tx), secondFactor),
    )
  }

  /** A session left open is not enough for what would lock its owner out. */
  const requirePassword = async (caller: Caller, password: string): Promise<void> => {
    const forgive = await attempts.take([budget('password check', caller.user.id, PASSWORD_CHECKS)])
    const hash = await ownTransaction(caller, ownPasswordHash)
    if (hash === null || !(await passwordMatches(hash, password)))
      throw new InputError([{ path: 'currentPassword', message: 'this is not your password' }])
    await forgive()
  }

  /** For what is done by a link, without a session: noted in each of the person's groups, and only there. */
  const auditEverywhere = async (userId: string, from: RequestOrigin, action: AuditAction): Promise<void> => {
    const groups = await withPerson(db, userId, (tx) => listOwnGroups(tx, userId))
    for (const group of groups) {
      const member = { user: { id: userId }, group }
      await withMember(db, member, (tx) => audit(tx, { ...member, key: null, from }, action, userId))
    }
  }

  const request = async (wanted: AccountRequest): Promise<void> => {
    const sealed = await sealer.seal(JSON.stringify(wanted))
    await db.transaction((tx) => queue.send(tx, 'account-requests', { sealed }))
  }

  const personalToken = async (
    text: string,
    purposes: readonly PersonalPurpose[],
  ): Promise<PersonalToken> => {
    const shown = readToken(text)
    const token = shown && (await findToken(db, shown.id))
    if (!shown || !token || !shown.matches(token.secretHash) || !isPersonal(token))
      throw linkNotValid(ASK_AGAIN)
    if (!purposes.includes(token.purpose)) throw linkNotValid(ASK_AGAIN)
    return { ...token, id: shown.id }
  }

  const choosePassword = async (
    tx: GroupTransaction,
    userId: string,
    { password, keptSession }: { password: string; keptSession: string | null },
  ): Promise<void> => {
    const { email, name } = await readAccount(tx, userId)
    requireGoodPassword(password, 'newPassword', [email, name])
    await changeAccount(tx, userId, { passwordHash: await hashPassword(password) })
    await revokeSessions(tx, keptSession)
    await withdrawTokens(tx, 'reset-password')
    await mail(tx, passwordChangedMail({ to: email }))
  }

  return {
    read,
    requirePassword,

    async rename(caller: Caller, name: string): Promise<Account> {
      await ownTransaction(caller, async (tx) => {
        await changeAccount(tx, caller.user.id, { name })
        await audit(tx, caller, 'account.rename', caller.user.id, { name, before: caller.user.name })
      })
      return read(caller)
    },

    async changePassword(
      caller: Caller,
      { currentPassword, newPassword }: { currentPassword: string; newPassword: string },
    ): Promise<void> {
      await requirePassword(caller, currentPassword)
      await ownTransaction(caller, async (tx) => {
        await choosePassword(tx, caller.user.id, { password: newPassword, keptSession: caller.id })
        await audit(tx, caller, 'account.password', caller.user.id)
      })
    },

    /** Whether the address is free is told to its owner by mail, and to nobody else. */
    async changeEmail(
      caller: Caller,
      { email, currentPassword }: { email: string; currentPassword: string },
    ): Promise<void> {
      await requirePassword(caller, currentPassword)
      await attempts.take([budget('change of address', caller.user.id, MAILS_PER_PERSON)])
      await request({ kind: 'change-email', userId: caller.user.id, email: email.toLowerCase() })
    },

    async sendVerification(caller: Caller): Promise<void> {
      const { id: userId, email } = caller.user
      await attempts.take([budget('verification', userId, MAILS_PER_PERSON)])
      await ownTransaction(caller, async (tx) => {
        const token = await issueToken(tx, 'verify-email', { userId, email })
        await mail(tx, verifyEmailMail({ to: email, url: links('confirm-email', token) }))
      })
    },

    /** Opens the link of a verification or of a change of address. */
    async confirmEmail(text: string, { from }: Visitor): Promise<void> {
      const { id, purpose, userId, email } = await personalToken(text, ['verify-email', 'change-email'])
      const confirm = async (tx: GroupTransaction): Promise<void> => {
        const before = await readAccount(tx, userId)
        const isUsable = purpose === 'change-email' || before.email === email
        if (!isUsable || !(await useToken(tx, id))) throw linkNotValid(ASK_AGAIN)
        await changeAccount(tx, userId, { email, emailVerifiedAt: new Date() })
        if (before.email === email) return
        await withdrawTokens(tx, 'reset-password')
        await mail(tx, emailChangedMail({ to: before.email, newEmail: email }))
      }
      try {
        await withPerson(db, userId, confirm)
        if (purpose === 'change-email') await auditEverywhere(userId, from, 'account.email')
      } catch (error) {
        if (saysEmailTaken(error)) throw linkNotValid('Another account has this address by now.')
        throw error
      }
    },

    /** Answers alike, at once, whether or not the address has an account. */
    async forgotPassword(email: string, { address }: Visitor): Promise<void> {
      await attempts.take([budget('forgotten password', address, RESETS_PER_ADDRESS)])
      await request({ kind: 'forgotten-password', email: email.toLowerCase() })
    },

    async resetPassword(
      { token, newPassword }: { token: string; newPassword: string },
      { from }: Visitor,
    ): Promise<void> {
      const { id, userId } = await personalToken(token, ['reset-password'])
      await withPerson(db, userId, async (tx) => {
        if (!(await useToken(tx, id))) throw linkNotValid(ASK_AGAIN)
        await choosePassword(tx, userId, { password: newPassword, keptSession: null })
      })
      await auditEverywhere(userId, from, 'account.password')
    },
  }
}

export type AccountService = ReturnType<typeof accountService>
