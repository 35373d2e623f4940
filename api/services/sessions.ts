import { randomUUID } from 'node:crypto'
import type { OwnGroup, OwnSession, SessionInfo } from '#core/wire/index'
import { withMember, withPerson } from '#db/database'
import type { Database } from '#db/database'
import { hashPassword, passwordMatches } from '#db/passwordHash'
import { findAccount } from '#db/queries/accounts'
import type { SignInAccount } from '#db/queries/accounts'
import type { Budget } from '#db/queries/attempts'
import {
  insertSession,
  listOwnGroups,
  listSessions,
  moveSession,
  revokeSession,
  revokeSessions,
  useSession,
} from '#db/queries/sessions'
import type { LiveSession } from '#db/queries/sessions'
import { ProblemError, notFound } from '../errors/problemError.ts'
import type { Caller } from '../middleware/caller.ts'
import { budget } from './attempts.ts'
import { audit } from './audit.ts'
import type { AttemptLimits, Attempts } from './attempts.ts'
import type { KnownDevices } from './knownDevices.ts'
import type { SecondFactorService } from './secondFactor.ts'
import type { SessionTokens } from './token.ts'
import type { Visitor } from './visitor.ts'

const LIFETIME_DAYS = 14
const DAY_MS = 86_400_000
const USER_AGENT_LENGTH = 300

export interface SignedIn {
  info: SessionInfo
  token: string
  expiresAt: Date
  /** By which this browser is known from now on. */
  deviceToken: string
}

export interface SignInRequest {
  email: string
  password: string
  code?: string | undefined
}

/** A person whose password, or link, has been checked. */
export interface Proven {
  userId: string
  groupId: string
  email: string
}

export interface SessionService {
  signIn(request: SignInRequest, visitor: Visitor): Promise<SignedIn>
  open(person: Proven, visitor: Visitor): Promise<SignedIn>
  find(token: string): Promise<LiveSession | null>
  signOut(caller: Caller): Promise<void>
  groups(caller: Caller): Promise<OwnGroup[]>
  chooseGroup(caller: Caller, groupId: string): Promise<SessionInfo>
  list(caller: Caller): Promise<OwnSession[]>
  revoke(caller: Caller, id: string): Promise<void>
  revokeOthers(caller: Caller): Promise<void>
}

export const sessionInfoOf = ({ user, group, role, expiresAt }: LiveSession): SessionInfo => ({
  user,
  group,
  role,
  expiresAt: expiresAt.toISOString(),
})

export interface SessionParts {
  db: Database
  tokens: SessionTokens
  attempts: Attempts
  limits: AttemptLimits
  devices: KnownDevices
  factors: SecondFactorService
}

const wrongCredentials = (): ProblemError =>
  new ProblemError(
    'wrong-credentials',
    'No account has this e-mail address with this password. Check both and try again.',
  )

export function sessionService({
  db,
  tokens,
  attempts,
  limits,
  devices,
  factors,
}: SessionParts): SessionService {
  /** Checked in place of an unknown account's password, so that the answer takes the same work and time. */
  const decoy = hashPassword(randomUUID())

  /** A device the account was used on has a budget of its own, which nobody else can use up. */
  const budgetsOf = async (email: string, { address, deviceToken }: Visitor): Promise<Budget[]> => {
    const account = email.toLowerCase()
    const device = await devices.read(deviceToken)
    if (device?.knows(account)) return [budget('device', `${device.id} ${account}`, limits.perAccount)]
    return [budget('address', address, limits.perAddress), budget('account', account, limits.perAccount)]
  }

  const checkPassword = async ({ email, password }: SignInRequest): Promise<SignInAccount> => {
    const account = await findAccount(db, email)
    const matches = await passwordMatches(account?.passwordHash ?? (await decoy), password)
    if (account === null || account.passwordHash === null || !matches) throw wrongCredentials()
    return account
  }

  const open = async ({ userId, groupId, email }: Proven, visitor: Visitor): Promise<SignedIn> => {
    const expiresAt = new Date(Date.now() + LIFETIME_DAYS * DAY_MS)
    const { address } = visitor
    const userAgent = visitor.userAgent.slice(0, USER_AGENT_LENGTH)
    const id = await withPerson(db, userId, (tx) =>
      insertSession(tx, { groupId, userId, expiresAt, userAgent, address }),
    )
    const session = await useSession(db, id)
    if (session === null) throw new Error('a session just opened is not there')
    const caller = { ...session, key: null, from: visitor.from }
    await withMember(db, session, (tx) => audit(tx, caller, 'session.open', id))
    return {
      info: sessionInfoOf(session),
      token: await tokens.issue(id, expiresAt),
      expiresAt,
      deviceToken: await devices.remember(visitor.deviceToken, email),
    }
  }

  return {
    async signIn(request, visitor) {
      const forgive = await attempts.take(await budgetsOf(request.email, visitor))
      const { userId, groupId } = await checkPassword(request)
      // To be asked for the code is no failed attempt; a wrong code is.
      if (request.code === undefined) await forgive()
      await factors.check(userId, request.code)
      if (request.code !== undefined) await forgive()
      if (groupId === null) {
        throw new ProblemError(
          'no-group',
          'E-mail address and password are right, but you are in no group any more. Ask a lead to invite you.',
        )
      }
      return open({ userId, groupId, email: request.email }, visitor)
    },

    open,

    async find(token) {
      const id = await tokens.read(token)
      return id === null ? null : useSession(db, id)
    },

    signOut: (caller) =>
      withMember(db, caller, async (tx) => {
        await revokeSession(tx, caller.id)
        await audit(tx, caller, 'session.close', caller.id)
      }),

    groups: ({ user }) => withPerson(db, user.id, (tx) => listOwnGroups(tx, user.id)),

    async chooseGroup({ id, user, key, from }, groupId) {
      await withPerson(db, user.id, async (tx) => {
        const groups = await listOwnGroups(tx, user.id)
        if (!groups.some((group) => group.id === groupId)) throw notFound('group of yours')
        await moveSession(tx, id, groupId)
      })
      const moved = await useSession(db, id)
      if (moved === null) throw new ProblemError('not-signed-in', 'Your session has ended. Sign in again.')
      await withMember(db, moved, (tx) => audit(tx, { ...moved, key, from }, 'session.turn', id))
      return sessionInfoOf(moved)
    },

    async list({ id, user }) {
      const rows = await withPerson(db, user.id, (tx) => listSessions(tx))
      return rows.map((row) => ({
        ...row,
        current: row.id === id,
        createdAt: row.createdAt.toISOString(),
        lastUsedAt: row.lastUsedAt.toISOString(),
        expiresAt: row.expiresAt.toISOString(),
      }))
    },

    revoke: (caller, id) =>
      withMember(db, caller, async (tx) => {
        if (!(await revokeSession(tx, id))) throw notFound('session of yours')
        await audit(tx, caller, 'session.end', id)
      }),

    revokeOthers: (caller) =>
      withMember(db, caller, async (tx) => {
        await revokeSessions(tx, caller.id)
        await audit(tx, caller, 'session.end', null, { which: 'all others' })
      }),
  }
}
