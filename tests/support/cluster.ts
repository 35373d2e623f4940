import { spawn } from 'node:child_process'
import type { ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { createInterface } from 'node:readline'

/** Addresses of the template database, one for each role of the cluster. */
export interface ClusterAddresses {
  superuserUrl: string
  ownerUrl: string
  serverUrl: string
}

export interface TestCluster {
  addresses: ClusterAddresses
  stop(): Promise<void>
}

/** Set by `npm test`, and by whichever project of a lone vitest comes first: the others share its cluster. */
const SHARED = 'EMBERLINE_TEST_CLUSTER'

async function firstLine(child: ChildProcess): Promise<string> {
  if (child.stdout === null) throw new Error('the output of the test database is not a pipe')
  for await (const line of createInterface({ input: child.stdout })) return line
  throw new Error('the test database ended before it said where it is')
}

/** The cluster `npm test` has started, or one that lasts as long as this process. */
export async function openTestCluster(): Promise<TestCluster> {
  const shared = process.env[SHARED]
  if (shared !== undefined) {
    return { addresses: JSON.parse(shared) as ClusterAddresses, stop: () => Promise.resolve() }
  }
  const keeper = spawn(process.execPath, ['scripts/test-database.mjs'], {
    detached: true,
    stdio: ['pipe', 'pipe', 'inherit'],
  })
  const line = await firstLine(keeper)
  process.env[SHARED] = line
  return {
    addresses: JSON.parse(line) as ClusterAddresses,
    async stop() {
      const ended = once(keeper, 'exit')
      keeper.stdin?.end()
      await ended
    },
  }
}
