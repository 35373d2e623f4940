import { randomUUID } from 'node:crypto'
import type { SessionInfo } from '#core/wire/index'
import { withGroup } from '#db/database'
import type { Database } from '#db/database'
import { hashPassword, passwordMatches } from '#db/passwordHash'
import { findAccount, insertSession, revokeSession, useSession } from '#db/queries/sessions'
import type { LiveSession } from '#db/queries/sessions'
import { ProblemError } from '../errors/problemError.ts'
import type { Caller, RequestOrigin } from '../middleware/caller.ts'
import { audit } from './audit.ts'
import type { SessionTokens } from './token.ts'

const LIFETIME_DAYS = 14
const DAY_MS = 86_400_000

export interface SignedIn {
  info: SessionInfo
  token: string
  expiresAt: Date
}

export interface SessionService {
  signIn(email: string, password: string, from: RequestOrigin): Promise<SignedIn>
  find(token: string): Promise<LiveSession | null>
  signOut(caller: Caller): Promise<void>
}

export const sessionInfoOf = ({ user, group, role, expiresAt }: LiveSession): SessionInfo => ({
  user,
  group,
  role,
  expiresAt: expiresAt.toISOString(),
})

export function sessionService(db: Database, tokens: SessionTokens): SessionService {
  /** Checked in place of an unknown account's password, so that the answer takes the same work and time. */
  const decoy = hashPassword(randomUUID())

  const openSession = async (groupId: string, userId: string, from: RequestOrigin): Promise<SignedIn> => {
    const expiresAt = new Date(Date.now() + LIFETIME_DAYS * DAY_MS)
    const id = await withGroup(db, groupId, (tx) => insertSession(tx, { groupId, userId, expiresAt }))
    const session = await useSession(db, id)
    if (session === null) throw new Error('a session just opened is not there')
    await withGroup(db, groupId, (tx) => audit(tx, { ...session, key: null, from }, 'session.open', id))
    return { info: sessionInfoOf(session), token: await tokens.issue(id, expiresAt), expiresAt }
  }

  return {
    async signIn(email, password, from) {
      const account = await findAccount(db, email)
      const matches = await passwordMatches(account?.passwordHash ?? (await decoy), password)
      if (account === null || !matches) {
        throw new ProblemError(
          'wrong-credentials',
          'No account has this e-mail address with this password. Check both and try again.',
        )
      }
      return openSession(account.groupId, account.userId, from)
    },

    async find(token) {
      const id = await tokens.read(token)
      return id === null ? null : useSession(db, id)
    },

    signOut: (caller) =>
      withGroup(db, caller.group.id, async (tx) => {
        await revokeSession(tx, caller.id)
        await audit(tx, caller, 'session.close', caller.id)
      }),
  }
}
