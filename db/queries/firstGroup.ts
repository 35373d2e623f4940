import { sql } from 'drizzle-orm'
import type { Database } from '../database.ts'

export interface Founded {
  userId: string
  groupId: string
}

export async function awaitsFirstGroup(db: Database): Promise<boolean> {
  const { rows } = await db.execute<{ awaits: boolean }>(sql`select awaits_first_group() as awaits`)
  return rows[0]?.awaits === true
}

export async function issueFirstGroupToken(
  db: Database,
  { id, secretHash, lifetimeDays }: { id: string; secretHash: string; lifetimeDays: number },
): Promise<void> {
  await db.execute(
    sql`select issue_first_group_token(${id}, ${secretHash}, make_interval(days => ${lifetimeDays}))`,
  )
}

/** Makes the first group and its lead; null when there is a group already, or the token has been used. */
export async function foundFirstGroup(
  db: Database,
  founding: { tokenId: string; groupName: string; name: string; email: string; passwordHash: string },
): Promise<Founded | null> {
  const { tokenId, groupName, name, email, passwordHash } = founding
  const { rows } = await db.execute<{ user_id: string; group_id: string }>(
    sql`select user_id, group_id from found_first_group(${tokenId}, ${groupName}, ${name}, ${email}, ${passwordHash})`,
  )
  const [row] = rows
  return row === undefined ? null : { userId: row.user_id, groupId: row.group_id }
}
