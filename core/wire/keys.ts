import { z } from 'zod'
import { person } from './records.ts'

/** How much a key may do, each including the one before: read, compute without saving, save. */
export const keyScope = z
  .enum(['read', 'compute', 'write'])
  .describe('read: what the group has; compute: also compute without saving; write: also save')
  .meta({ id: 'KeyScope' })
export type KeyScope = z.output<typeof keyScope>

const moment = z.iso.datetime().describe('UTC, ISO 8601')

export const apiKey = z
  .object({
    id: z.uuid(),
    owner: person,
    name: z.string(),
    scope: keyScope,
    beginning: z.string().describe('The first characters of the secret, to know it again by'),
    createdAt: moment,
    expiresAt: moment,
    lastUsedAt: moment.nullable(),
    revokedAt: moment.nullable(),
  })
  .meta({ id: 'ApiKey' })
export type ApiKey = z.output<typeof apiKey>

export const LONGEST_KEY_DAYS = 366

export const createKeyRequest = z
  .strictObject({
    name: z.string().trim().min(1).max(80).describe('What the key is for'),
    scope: keyScope,
    days: z.number().int().min(1).max(LONGEST_KEY_DAYS).default(90).describe('Days until it expires'),
  })
  .meta({ id: 'CreateKeyRequest' })

/** A new key with its secret, which is told this once. */
export const createKeyResult = z
  .object({
    key: apiKey,
    secret: z.string().describe('Send it as `Authorization: Bearer SECRET`; it cannot be shown again'),
  })
  .meta({ id: 'CreateKeyResult' })
export type CreateKeyResult = z.output<typeof createKeyResult>

export const keyQuery = z.object({
  of: z.enum(['me', 'group']).default('me').describe('Own keys, or everyone’s (lead)'),
})
export const keyList = z.object({ items: z.array(apiKey) })
