import { createHash, randomBytes } from 'node:crypto'
import { evidenceOf } from '#core/index'
import type { CreateGuestLinkResult, GuestLink, GuestLinkKind, GuestView } from '#core/wire/index'
import { withGroup } from '#db/database'
import type { Database, GroupTransaction } from '#db/database'
import { findEvaluation } from '#db/queries/evaluations'
import {
  findGuestLink,
  insertGuestLink,
  listGuestLinks,
  revokeGuestLink,
  useGuestLink,
} from '#db/queries/guestLinks'
import type { OpenedLink, StoredGuestLink } from '#db/queries/guestLinks'
import { historyQueries } from '#db/queries/histories'
import { ProblemError, notFound } from '../errors/problemError.ts'
import type { Caller } from '../middleware/caller.ts'
import { may } from '../permissions.ts'
import { audit } from './audit.ts'
import { readWithInputs } from './evaluations.ts'

const DAY_MS = 86_400_000

const hashOf = (token: string): string => createHash('sha256').update(token).digest('hex')

const writeLink = (stored: StoredGuestLink): GuestLink => ({
  ...stored,
  createdAt: stored.createdAt.toISOString(),
  expiresAt: stored.expiresAt?.toISOString() ?? null,
  lastUsedAt: stored.lastUsedAt?.toISOString() ?? null,
  revokedAt: stored.revokedAt?.toISOString() ?? null,
})

async function readIn(tx: GroupTransaction, id: string): Promise<StoredGuestLink> {
  const stored = await findGuestLink(tx, id)
  if (stored === null) throw notFound('guest link')
  return stored
}

async function requireSubject(tx: GroupTransaction, kind: GuestLinkKind, id: string): Promise<void> {
  const found =
    kind === 'evaluation' ? await findEvaluation(tx, id) : await historyQueries.findRevision(tx, id)
  if (found === null) throw notFound(kind === 'evaluation' ? 'evaluation' : 'history revision')
}

async function viewOf(
  tx: GroupTransaction,
  { kind, subjectId, group, expiresAt }: OpenedLink,
): Promise<GuestView> {
  const frame = { groupName: group.name, expiresAt: expiresAt?.toISOString() ?? null }
  if (kind === 'evaluation') {
    const { evaluation, input } = await readWithInputs(tx, subjectId)
    return { kind, ...frame, evaluation, ...input, evidence: evidenceOf(evaluation, input, group.name) }
  }
  const found = await historyQueries.findRevision(tx, subjectId)
  const record = found === null ? null : await historyQueries.find(tx, found.recordId)
  const revision = record?.revisions.find(({ id }) => id === subjectId)
  if (record === null || revision === undefined) throw notFound('history revision')
  return {
    kind,
    ...frame,
    name: record.name,
    revision: { ...revision, createdAt: revision.createdAt.toISOString() },
  }
}

interface LinkRequest {
  kind: GuestLinkKind
  subjectId: string
  note: string
  days: number | null
}

export function guestLinkService(db: Database) {
  return {
    async list(caller: Caller, subjectId: string | undefined): Promise<{ items: GuestLink[] }> {
      const links = await withGroup(db, caller.group.id, (tx) => listGuestLinks(tx, subjectId ?? null))
      return { items: links.map(writeLink) }
    },

    /** Makes a link; its token is told here and kept nowhere. */
    async create(
      caller: Caller,
      { kind, subjectId, note, days }: LinkRequest,
    ): Promise<CreateGuestLinkResult> {
      const token = randomBytes(32).toString('base64url')
      const link = await withGroup(db, caller.group.id, async (tx) => {
        await requireSubject(tx, kind, subjectId)
        const id = await insertGuestLink(tx, {
          groupId: caller.group.id,
          kind,
          subjectId,
          note,
          tokenHash: hashOf(token),
          createdBy: caller.user.id,
          expiresAt: days === null ? null : new Date(Date.now() + days * DAY_MS),
        })
        await audit(tx, caller, 'guest-link.create', id, { kind, subject: subjectId, note })
        return readIn(tx, id)
      })
      return { link: writeLink(link), token }
    },

    /** Ends a link: one's own, or as a lead anyone's. */
    revoke: (caller: Caller, id: string): Promise<GuestLink> =>
      withGroup(db, caller.group.id, async (tx) => {
        const stored = await readIn(tx, id)
        if (stored.createdBy.id !== caller.user.id && !may(caller.role, 'all-guest-links'))
          throw new ProblemError(
            'not-allowed',
            `This link is ${stored.createdBy.name}’s: they or a lead may end it. Nothing was changed.`,
          )
        if (stored.revokedAt === null) {
          await revokeGuestLink(tx, id)
          await audit(tx, caller, 'guest-link.revoke', id, { kind: stored.kind, subject: stored.subjectId })
        }
        return writeLink(await readIn(tx, id))
      }),

    /** What the token opens. One that is wrong, has expired or was revoked is told apart by nothing. */
    async open(token: string): Promise<GuestView> {
      const opened = await useGuestLink(db, hashOf(token))
      if (opened === null)
        throw new ProblemError(
          'guest-link-closed',
          'This link opens nothing: it may have expired or been withdrawn, or a part of it is missing. Ask whoever sent it for a new one.',
        )
      return withGroup(db, opened.group.id, (tx) => viewOf(tx, opened))
    },
  }
}

export type GuestLinkService = ReturnType<typeof guestLinkService>
