import { randomBytes } from 'node:crypto'
import pg from 'pg'
import { inject } from 'vitest'

/** A migrated, empty database of a test file's own. */
export interface TestDatabase {
  /** The role that owns the tables and runs migrations. */
  ownerUrl: string
  /** The role the server signs in with. */
  serverUrl: string
  superuserUrl: string
  drop(): Promise<void>
}

function withDatabase(url: string, name: string): string {
  const changed = new URL(url)
  changed.pathname = `/${name}`
  return changed.href
}

async function asSuperuser(statements: string[]): Promise<void> {
  const client = new pg.Client({ connectionString: withDatabase(inject('cluster').superuserUrl, 'postgres') })
  await client.connect()
  try {
    for (const statement of statements) await client.query(statement)
  } finally {
    await client.end()
  }
}

/** Copies the migrated template. Who may connect is not part of a copy, so that is set as at the start of a server. */
export async function freshDatabase(): Promise<TestDatabase> {
  const cluster = inject('cluster')
  const template = new URL(cluster.ownerUrl).pathname.slice(1)
  const name = `emberline_${randomBytes(8).toString('hex')}`
  await asSuperuser([
    `create database ${name} template ${template} owner emberline_owner`,
    `revoke all on database ${name} from public`,
    `grant connect on database ${name} to emberline_server`,
  ])
  return {
    ownerUrl: withDatabase(cluster.ownerUrl, name),
    serverUrl: withDatabase(cluster.serverUrl, name),
    superuserUrl: withDatabase(cluster.superuserUrl, name),
    drop: () => asSuperuser([`drop database ${name} with (force)`]),
  }
}
