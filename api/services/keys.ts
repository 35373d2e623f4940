import { createHash, randomBytes } from 'node:crypto'
import type { ApiKey, CreateKeyResult, KeyScope } from '#core/wire/index'
import { withGroup } from '#db/database'
import type { Database, GroupTransaction } from '#db/database'
import { findKey, insertKey, listKeys, revokeKey, useKey } from '#db/queries/apiKeys'
import type { KeyHolder, StoredKey } from '#db/queries/apiKeys'
import { ProblemError, notFound } from '../errors/problemError.ts'
import type { Caller } from '../middleware/caller.ts'
import { may } from '../permissions.ts'
import { audit } from './audit.ts'

/** What every secret begins with, so that a scanner of repositories can tell one that leaked. */
const MARK = 'ember_'
const SHOWN = MARK.length + 4
const DAY_MS = 86_400_000

const hashOf = (secret: string): string => createHash('sha256').update(secret).digest('hex')

const writeKey = (stored: StoredKey): ApiKey => ({
  ...stored,
  createdAt: stored.createdAt.toISOString(),
  expiresAt: stored.expiresAt.toISOString(),
  lastUsedAt: stored.lastUsedAt?.toISOString() ?? null,
  revokedAt: stored.revokedAt?.toISOString() ?? null,
})

async function readIn(tx: GroupTransaction, id: string): Promise<StoredKey> {
  const stored = await findKey(tx, id)
  if (stored === null) throw notFound('API key')
  return stored
}

export function keyService(db: Database) {
  return {
    /** Who comes with this secret; null when no key in force has it. */
    find: (secret: string): Promise<KeyHolder | null> =>
      secret.startsWith(MARK) ? useKey(db, hashOf(secret)) : Promise.resolve(null),

    async list(caller: Caller, of: 'me' | 'group'): Promise<{ items: ApiKey[] }> {
      if (of === 'group' && !may(caller.role, 'all-keys')) throw leadsOnly(caller)
      const keys = await withGroup(db, caller.group.id, (tx) =>
        listKeys(tx, of === 'group' ? null : caller.user.id),
      )
      return { items: keys.map(writeKey) }
    },

    /** Makes a key for the caller; the secret is told here and kept nowhere. */
    async create(
      caller: Caller,
      request: { name: string; scope: KeyScope; days: number },
    ): Promise<CreateKeyResult> {
      if (request.scope === 'write' && !may(caller.role, 'save-revision'))
        throw new ProblemError(
          'not-allowed',
          `A key that saves needs the role lead or author; you are a ${caller.role}. Nothing was changed.`,
        )
      const secret = MARK + randomBytes(32).toString('base64url')
      const key = await withGroup(db, caller.group.id, async (tx) => {
        const id = await insertKey(tx, {
          groupId: caller.group.id,
          userId: caller.user.id,
          name: request.name,
          scope: request.scope,
          secretHash: hashOf(secret),
          beginning: secret.slice(0, SHOWN),
          expiresAt: new Date(Date.now() + request.days * DAY_MS),
        })
        await audit(tx, caller, 'key.create', id, { name: request.name, scope: request.scope })
        return readIn(tx, id)
      })
      return { key: writeKey(key), secret }
    },

    /** Ends a key: one's own, or as a lead anyone's. */
    revoke: (caller: Caller, id: string): Promise<ApiKey> =>
      withGroup(db, caller.group.id, async (tx) => {
        const stored = await readIn(tx, id)
        if (stored.owner.id !== caller.user.id && !may(caller.role, 'all-keys')) throw notFound('API key')
        if (stored.revokedAt === null) {
          await revokeKey(tx, id)
          await audit(tx, caller, 'key.revoke', id, { name: stored.name, owner: stored.owner.id })
        }
        return writeKey(await readIn(tx, id))
      }),
  }
}

const leadsOnly = (caller: Caller): ProblemError =>
  new ProblemError(
    'not-allowed',
    `Everyone’s keys are shown to a lead; you are a ${caller.role}. Nothing was changed.`,
  )

export type KeyService = ReturnType<typeof keyService>
