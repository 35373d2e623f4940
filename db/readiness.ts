import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { sql } from 'drizzle-orm'
import { z } from 'zod'
import type { Database } from './database.ts'
import { MIGRATIONS_FOLDER } from './migrationsFolder.ts'

const journal = z.object({ entries: z.array(z.object({ when: z.number() })) })

/** When the newest migration this server knows was made, milliseconds: the migrator notes the same number. */
async function newestKnown(): Promise<number> {
  const text = await readFile(join(MIGRATIONS_FOLDER, 'meta', '_journal.json'), 'utf8')
  return Math.max(...journal.parse(JSON.parse(text)).entries.map(({ when }) => when))
}

/** Whether the database has every migration this server was written for. */
export async function isMigrated(db: Database): Promise<boolean> {
  const { rows } = await db.execute<{ newest: string | null }>(sql`select newest_migration() as newest`)
  return Number(rows[0]?.newest ?? 0) >= (await newestKnown())
}
