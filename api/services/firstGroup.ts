import { withMember } from '#db/database'
import type { Database } from '#db/database'
import { hashPassword } from '#db/passwordHash'
import { awaitsFirstGroup, foundFirstGroup, issueFirstGroupToken } from '#db/queries/firstGroup'
import { findToken } from '#db/queries/oneTimeTokens'
import { linkNotValid } from '../errors/problemError.ts'
import type { QueueMail } from '../mail/mailQueue.ts'
import { verifyEmailMail } from '../mail/messages.ts'
import { mintToken, readToken } from '../secrets/linkToken.ts'
import { issueToken } from './accounts.ts'
import { audit } from './audit.ts'
import type { Links } from './links.ts'
import { requireGoodPassword } from './passwordPolicy.ts'
import type { SessionService, SignedIn } from './sessions.ts'
import type { Visitor } from './visitor.ts'

const LIFETIME_DAYS = 7

export interface FoundRequest {
  token: string
  groupName: string
  name: string
  email: string
  password: string
}

/** The address at which the first group can be made, for whoever starts the server; null once there is a group. */
export async function firstGroupLink(db: Database, links: Links): Promise<string | null> {
  if (!(await awaitsFirstGroup(db))) return null
  const { id, secretHash, token } = mintToken()
  await issueFirstGroupToken(db, { id, secretHash, lifetimeDays: LIFETIME_DAYS })
  return links('first-group', token)
}

export interface FirstGroupParts {
  db: Database
  mail: QueueMail
  links: Links
  sessions: SessionService
}

/** Makes the first group and its lead, by the token printed at the start. */
export function firstGroupService({ db, mail, links, sessions }: FirstGroupParts) {
  return {
    async found({ token, ...request }: FoundRequest, visitor: Visitor): Promise<SignedIn> {
      const { groupName, name, password } = request
      const email = request.email.toLowerCase()
      const shown = readToken(token)
      const live = shown && (await findToken(db, shown.id))
      const refusal = linkNotValid('Start the server again, and it prints a new one unless there is a group.')
      if (!shown || live?.purpose !== 'first-group' || !shown.matches(live.secretHash)) throw refusal
      requireGoodPassword(password, 'password', [email, name, groupName])
      const passwordHash = await hashPassword(password)
      const founded = await foundFirstGroup(db, { tokenId: shown.id, groupName, name, email, passwordHash })
      if (founded === null) throw refusal
      const { userId } = founded
      const member = { user: { id: userId }, group: { id: founded.groupId } }
      await withMember(db, member, async (tx) => {
        await audit(tx, { ...member, key: null, from: visitor.from }, 'group.create', founded.groupId)
        const verification = await issueToken(tx, 'verify-email', { userId, email })
        await mail(tx, verifyEmailMail({ to: email, url: links('confirm-email', verification) }))
      })
      return sessions.open({ ...founded, email }, visitor)
    },
  }
}

export type FirstGroupService = ReturnType<typeof firstGroupService>
