import { drizzle } from 'drizzle-orm/node-postgres'
import { migrate as applyMigrations } from 'drizzle-orm/node-postgres/migrator'
import pg from 'pg'
import { MIGRATIONS_FOLDER } from './migrationsFolder.ts'
import { installQueue } from './queue/install.ts'

/** Any number will do, as long as every Emberline migrator takes the same one. */
const MIGRATION_LOCK = 7_236_001

/**
 * Brings the database at `url` to the newest schema, the queue's tables with it; `url` signs in as its owner.
 * Several may be started at once: each waits for the one before, then finds nothing left to do.
 */
export async function migrate(url: string): Promise<void> {
  const client = new pg.Client({ connectionString: url })
  await client.connect()
  try {
    await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK])
    await applyMigrations(drizzle(client), { migrationsFolder: MIGRATIONS_FOLDER })
    await installQueue(url)
  } finally {
    await client.end()
  }
}

/** Whether this file, or the bundle of the same name, is the program node was asked to run. */
const startedAsProgram = /[\\/]migrate\.[jt]s$/.test(process.argv[1] ?? '')

if (startedAsProgram) {
  const url = process.env['EMBERLINE_MIGRATION_URL']
  if (url === undefined || url === '') {
    console.error(
      'EMBERLINE_MIGRATION_URL is not set: give the address of the database, signing in as its owner',
    )
    process.exit(2)
  }
  await migrate(url)
}
