import { sql } from 'drizzle-orm'
import { connect } from '../database.ts'
import type { GroupTransaction } from '../database.ts'
import { candidateQueries } from '../queries/candidates.ts'
import { historyQueries } from '../queries/histories.ts'
import { groups } from '../schema/groups.ts'
import { readDemoData } from './demoData.ts'
import type { DemoData } from './demoData.ts'
import { seedEvaluations } from './seedEvaluations.ts'
import { seedGroup } from './seedGroup.ts'
import { seedRecords } from './seedRecords.ts'

/** Two seeds at once: the second waits, then finds a group. */
const SEED_LOCK = 7_236_002

/**
 * Loads data-demo/ into the database at `ownerUrl` (signing in as its owner), in one transaction.
 * A database that holds any group is left as it is.
 */
export async function seedDemo(ownerUrl: string): Promise<'seeded' | 'not-empty'> {
  const data = await readDemoData()
  const { db, close } = connect(ownerUrl, () => undefined)
  try {
    return await db.transaction(async (tx) => {
      await tx.execute(sql`select pg_advisory_xact_lock(${SEED_LOCK})`)
      await tx.execute(sql`select set_config('emberline.across_groups', 'on', true)`)
      const [existing] = await tx.select({ id: groups.id }).from(groups).limit(1)
      if (existing !== undefined) return 'not-empty'
      await seedAll(tx, data)
      return 'seeded'
    })
  } finally {
    await close()
  }
}

async function seedAll(tx: GroupTransaction, data: DemoData): Promise<void> {
  const { groupId, idOfPerson } = await seedGroup(tx, data.group)
  const scope = { tx, groupId, idOfPerson }
  const histories = await seedRecords(scope, historyQueries, data.histories)
  const candidates = await seedRecords(scope, candidateQueries, data.candidates)
  const { history, revision } = data.group.baseline
  await tx.update(groups).set({ baselineRevisionId: histories.get(history, revision).id })
  await seedEvaluations(scope, histories, candidates, data.evaluations)
}

/** Whether this file, or the bundle of the same name, is the program node was asked to run. */
const startedAsProgram = /[\\/]seed\.[jt]s$/.test(process.argv[1] ?? '')

if (startedAsProgram) {
  const url = process.env['EMBERLINE_MIGRATION_URL']
  if (url === undefined || url === '') {
    console.error(
      'EMBERLINE_MIGRATION_URL is not set: give the address of the database, signing in as its owner',
    )
    process.exit(2)
  }
  console.log(await seedDemo(url))
}
