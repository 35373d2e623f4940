import { randomUUID } from 'node:crypto'
import type { SessionInfo } from '#core/wire/index'
import { withGroup } from '#db/database'
import type { Database } from '#db/database'
import { hashPassword, passwordMatches } from '#db/passwordHash'
import { findAccount, insertSession, revokeSession, useSession } from '#db/queries/sessions'
import type { LiveSession } from '#db/queries/sessions'
import { ProblemError } from '../errors/problemError.ts'
import type { SessionTokens } from './token.ts'

const LIFETIME_DAYS = 14
const DAY_MS = 86_400_000

export interface SignedIn {
  info: SessionInfo
  token: string
  expiresAt: Date
}

export interface SessionService {
  signIn(email: string, password: string): Promise<SignedIn>
  find(token: string): Promise<LiveSession | null>
  signOut(session: LiveSession): Promise<void>
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

  const openSession = async (groupId: string, userId: string): Promise<SignedIn> => {
    const expiresAt = new Date(Date.now() + LIFETIME_DAYS * DAY_MS)
    const id = await withGroup(db, groupId, (tx) => insertSession(tx, { groupId, userId, expiresAt }))
    const session = await useSession(db, id)
    if (session === null) throw new Error('a session just opened is not there')
    return { info: sessionInfoOf(session), token: await tokens.issue(id, expiresAt), expiresAt }
  }

  return {
    async signIn(email, password) {
      const account = await findAccount(db, email)
      const matches = await passwordMatches(account?.passwordHash ?? (await decoy), password)
      if (account === null || !matches) {
        throw new ProblemError(
          'wrong-credentials',
          'No account has this e-mail address with this password. Check both and try again.',
        )
      }
      return openSession(account.groupId, account.userId)
    },

    async find(token) {
      const id = await tokens.read(token)
      return id === null ? null : useSession(db, id)
    },

    signOut: (session) => withGroup(db, session.group.id, (tx) => revokeSession(tx, session.id)),
  }
}
