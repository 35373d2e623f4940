import type { TestProject } from 'vitest/node'
import { migrate } from '../../db/migrate.ts'
import { openTestCluster } from './cluster.ts'
import type { ClusterAddresses } from './cluster.ts'

declare module 'vitest' {
  interface ProvidedContext {
    cluster: ClusterAddresses
  }
}

/** Gives the tests a cluster and in it a migrated database, which each test file copies. */
export default async function setUp(project: TestProject): Promise<() => Promise<void>> {
  const cluster = await openTestCluster()
  await migrate(cluster.addresses.ownerUrl)
  project.provide('cluster', cluster.addresses)
  return () => cluster.stop()
}
