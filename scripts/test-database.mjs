/**
 * Starts a throw-away cluster, prints its addresses as one line of JSON, and stops it when standard input ends, so
 * that it never outlives whoever asked for it.
 */
import { once } from 'node:events'
import { ensurePostgresPrograms } from './setup/postgresPrograms.mjs'
import { runProgram } from './setup/program.mjs'
import { startThrowawayCluster } from './setup/throwawayCluster.mjs'

async function main() {
  const programs = await ensurePostgresPrograms({ say: console.error })
  const { addresses } = await startThrowawayCluster(programs)
  console.log(JSON.stringify(addresses))
  process.stdin.resume()
  await once(process.stdin, 'end')
  return 0
}

await runProgram(main, { statusAfterSignal: 0 })
