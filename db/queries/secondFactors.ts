import { and, eq, isNull, lt, or, sql } from 'drizzle-orm'
import type { GroupTransaction } from '../database.ts'
import { recoveryCodes } from '../schema/recoveryCodes.ts'
import { secondFactors } from '../schema/secondFactors.ts'

export interface StoredFactor {
  sealedSecret: string
  isConfirmed: boolean
}

/** The factor of the person the transaction names, confirmed or begun; null when there is none. */
export async function findFactor(tx: GroupTransaction, userId: string): Promise<StoredFactor | null> {
  const [row] = await tx
    .select({ sealedSecret: secondFactors.sealedSecret, confirmedAt: secondFactors.confirmedAt })
    .from(secondFactors)
    .where(eq(secondFactors.userId, userId))
  return row === undefined ? null : { sealedSecret: row.sealedSecret, isConfirmed: row.confirmedAt !== null }
}

/** Keeps a new secret, in place of one that was begun or given up. */
export async function beginFactor(tx: GroupTransaction, userId: string, sealedSecret: string): Promise<void> {
  const fresh = { sealedSecret, confirmedAt: null, lastStep: null }
  await tx
    .insert(secondFactors)
    .values({ userId, ...fresh })
    .onConflictDoUpdate({ target: secondFactors.userId, set: fresh })
}

/** Takes the code of a time step; false when it, or a later one, was taken already. */
export async function takeStep(tx: GroupTransaction, userId: string, step: number): Promise<boolean> {
  const taken = await tx
    .update(secondFactors)
    .set({ lastStep: step })
    .where(
      and(
        eq(secondFactors.userId, userId),
        or(isNull(secondFactors.lastStep), lt(secondFactors.lastStep, step)),
      ),
    )
    .returning({ userId: secondFactors.userId })
  return taken.length > 0
}

/** Puts the factor in force, or gives it up. */
export async function setFactorInForce(
  tx: GroupTransaction,
  userId: string,
  inForce: boolean,
): Promise<void> {
  await tx
    .update(secondFactors)
    .set({ confirmedAt: inForce ? new Date() : null })
    .where(eq(secondFactors.userId, userId))
}

const unused = (userId: string) => and(eq(recoveryCodes.userId, userId), isNull(recoveryCodes.usedAt))

/** Makes these the only codes that are good. */
export async function replaceRecoveryCodes(
  tx: GroupTransaction,
  userId: string,
  hashes: readonly string[],
): Promise<void> {
  await tx.update(recoveryCodes).set({ usedAt: new Date() }).where(unused(userId))
  if (hashes.length === 0) return
  await tx.insert(recoveryCodes).values(hashes.map((codeHash) => ({ userId, codeHash })))
}

/** Uses a code up; false when there is none of this hash. The code has 80 random bits: nothing to learn by timing. */
export async function takeRecoveryCode(
  tx: GroupTransaction,
  userId: string,
  codeHash: string,
): Promise<boolean> {
  const taken = await tx
    .update(recoveryCodes)
    .set({ usedAt: new Date() })
    .where(and(unused(userId), eq(recoveryCodes.codeHash, codeHash)))
    .returning({ id: recoveryCodes.id })
  return taken.length > 0
}

export async function countRecoveryCodes(tx: GroupTransaction, userId: string): Promise<number> {
  const [row] = await tx
    .select({ count: sql<number>`count(*)::integer` })
    .from(recoveryCodes)
    .where(unused(userId))
  return row?.count ?? 0
}
