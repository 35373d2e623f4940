import { sql } from 'drizzle-orm'
import type { Database } from '../database.ts'

export interface StoredSigningKey {
  kid: string
  sealedJwk: string
  createdAt: Date
}

/** Every key there is, newest first. */
export async function listSigningKeys(db: Database): Promise<StoredSigningKey[]> {
  const { rows } = await db.execute<{ kid: string; sealed_jwk: string; created_at: string }>(
    sql`select kid, sealed_jwk, created_at from all_signing_keys()`,
  )
  return rows.map((row) => ({
    kid: row.kid,
    sealedJwk: row.sealed_jwk,
    createdAt: new Date(row.created_at),
  }))
}

/** Keeps a new key as long as the newest is still `newestSeen`; does nothing when another was added meanwhile. */
export async function addSigningKey(
  db: Database,
  { kid, sealedJwk }: { kid: string; sealedJwk: string },
  newestSeen: string | null,
): Promise<void> {
  await db.execute(sql`select add_signing_key(${kid}, ${sealedJwk}, ${newestSeen})`)
}
