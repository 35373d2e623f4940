import { pgTable, text } from 'drizzle-orm/pg-core'
import { createdAt } from './columns.ts'

/** Keys that sign sessions: the newest signs, the one before is still believed. Private parts are sealed. */
export const signingKeys = pgTable('signing_keys', {
  /** The key's own thumbprint (RFC 7638). */
  kid: text('kid').primaryKey(),
  sealedJwk: text('sealed_jwk').notNull(),
  createdAt: createdAt(),
})
