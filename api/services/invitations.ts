import { InputError } from '#core/wire/index'
import type { Invitation, ReceivedInvitation, Role } from '#core/wire/index'
import { withGroup, withMember } from '#db/database'
import type { Database } from '#db/database'
import { hashPassword, passwordMatches } from '#db/passwordHash'
import {
  acceptInvitation,
  findInvitation,
  insertInvitation,
  listInvitations,
  withdrawInvitation,
  withdrawInvitationsOf,
} from '#db/queries/invitations'
import type { Acceptance, LiveInvitation, StoredInvitation } from '#db/queries/invitations'
import { linkNotValid, notFound } from '../errors/problemError.ts'
import type { Caller } from '../middleware/caller.ts'
import type { QueueMail } from '../mail/mailQueue.ts'
import { invitationMail } from '../mail/messages.ts'
import { mintToken, readToken } from '../secrets/linkToken.ts'
import { budget } from './attempts.ts'
import type { Attempts } from './attempts.ts'
import { audit } from './audit.ts'
import { pageAnswer, pageRequest } from './cursor.ts'
import type { Links } from './links.ts'
import { requireGoodPassword } from './passwordPolicy.ts'
import type { SecondFactorService } from './secondFactor.ts'
import type { SessionService, SignedIn } from './sessions.ts'
import type { Visitor } from './visitor.ts'

const LIFETIME_DAYS = 7
const DAY_MS = 86_400_000
const INVITATIONS_PER_GROUP = 50
const PASSWORD_CHECKS = 10
const ASK_THE_LEAD = 'Ask whoever invited you for a new invitation.'

export interface InvitationParts {
  db: Database
  mail: QueueMail
  links: Links
  attempts: Attempts
  sessions: SessionService
  factors: SecondFactorService
}

export interface AcceptRequest {
  token: string
  name?: string | undefined
  password: string
  code?: string | undefined
}

function stateOf({ acceptedAt, withdrawnAt, expiresAt }: StoredInvitation): Invitation['state'] {
  if (acceptedAt !== null) return 'accepted'
  if (withdrawnAt !== null) return 'withdrawn'
  return expiresAt.getTime() <= Date.now() ? 'expired' : 'open'
}

const writeInvitation = (row: StoredInvitation): Invitation => ({
  id: row.id,
  email: row.email,
  role: row.role,
  invitedBy: row.inviter,
  createdAt: row.createdAt.toISOString(),
  expiresAt: row.expiresAt.toISOString(),
  state: stateOf(row),
})

export function invitationService({ db, mail, links, attempts, sessions, factors }: InvitationParts) {
  const openInvitation = async (token: string): Promise<LiveInvitation & { id: string }> => {
    const shown = readToken(token)
    const invitation = shown && (await findInvitation(db, shown.id))
    if (!shown || !invitation || !shown.matches(invitation.secretHash)) throw linkNotValid(ASK_THE_LEAD)
    return { ...invitation, id: shown.id }
  }

  const ofNewAccount = async (
    invitation: LiveInvitation & { id: string },
    { name, password }: AcceptRequest,
  ): Promise<Acceptance> => {
    if (name === undefined)
      throw new InputError([{ path: 'name', message: 'missing; the name your group knows you by' }])
    requireGoodPassword(password, 'password', [invitation.email, name, invitation.groupName])
    return { invitationId: invitation.id, accountId: null, name, passwordHash: await hashPassword(password) }
  }

  /** The link alone does not open an account that is there already: a mailbox may be shared, a password is not. */
  const ofAccount = async (
    invitation: LiveInvitation & { id: string },
    account: { id: string; passwordHash: string | null },
    { password, code }: AcceptRequest,
  ): Promise<Acceptance> => {
    const forgive = await attempts.take([budget('password check', account.id, PASSWORD_CHECKS)])
    if (account.passwordHash === null || !(await passwordMatches(account.passwordHash, password)))
      throw new InputError([{ path: 'password', message: 'this is not the password of your account' }])
    if (code === undefined) await forgive()
    await factors.check(account.id, code)
    if (code !== undefined) await forgive()
    return { invitationId: invitation.id, accountId: account.id, name: null, passwordHash: null }
  }

  return {
    async list({ group }: Caller, query: { limit: number; cursor?: string | undefined }) {
      const page = await withGroup(db, group.id, (tx) => listInvitations(tx, pageRequest(query)))
      return pageAnswer(page, writeInvitation)
    },

    /** Sends an invitation; one that was open for the address is withdrawn. Whether it has an account is not told. */
    async invite(caller: Caller, { email, role }: { email: string; role: Role }): Promise<Invitation> {
      const { group, user } = caller
      await attempts.take([budget('invitations', group.id, INVITATIONS_PER_GROUP)])
      const to = email.toLowerCase()
      const { id, secretHash, token } = mintToken()
      const expiresAt = new Date(Date.now() + LIFETIME_DAYS * DAY_MS)
      const row = { id, groupId: group.id, email: to, role, invitedBy: user.id, secretHash, expiresAt }
      const stored = await withGroup(db, group.id, async (tx) => {
        await withdrawInvitationsOf(tx, to)
        const inserted = await insertInvitation(tx, row)
        const url = links('invitation', token)
        const words = { to, groupName: group.name, inviterName: user.name, role, url, days: LIFETIME_DAYS }
        await mail(tx, invitationMail(words))
        await audit(tx, caller, 'invitation.create', id, { email: to, role })
        return inserted
      })
      return writeInvitation(stored)
    },

    withdraw: (caller: Caller, id: string): Promise<void> =>
      withGroup(db, caller.group.id, async (tx) => {
        if (!(await withdrawInvitation(tx, id))) throw notFound('open invitation')
        await audit(tx, caller, 'invitation.withdraw', id)
      }),

    async read(token: string): Promise<ReceivedInvitation> {
      const { email, role, groupName, inviterName, account } = await openInvitation(token)
      return { email, role, groupName, inviterName, hasAccount: account !== null }
    },

    /** Makes the account if there is none, and the membership, and signs in. */
    async accept(request: AcceptRequest, visitor: Visitor): Promise<SignedIn> {
      const invitation = await openInvitation(request.token)
      const acceptance =
        invitation.account === null
          ? await ofNewAccount(invitation, request)
          : await ofAccount(invitation, invitation.account, request)
      const accepted = await acceptInvitation(db, acceptance)
      if (accepted === null) throw linkNotValid(ASK_THE_LEAD)
      const member = { user: { id: accepted.userId }, group: { id: accepted.groupId } }
      await withMember(db, member, (tx) =>
        audit(tx, { ...member, key: null, from: visitor.from }, 'invitation.accept', invitation.id),
      )
      return sessions.open({ ...accepted, email: invitation.email }, visitor)
    },
  }
}

export type InvitationService = ReturnType<typeof invitationService>
