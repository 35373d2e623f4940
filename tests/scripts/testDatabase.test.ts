import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { createInterface } from 'node:readline'
import pg from 'pg'
import { expect, it } from 'vitest'
import { processesIn } from './emberline.ts'

interface Role {
  rolname: string
  rolsuper: boolean
  rolbypassrls: boolean
  owns: string
}

async function query<T extends pg.QueryResultRow>(url: string, sql: string): Promise<T[]> {
  const client = new pg.Client({ connectionString: url })
  await client.connect()
  try {
    return (await client.query<T>(sql)).rows
  } finally {
    await client.end()
  }
}

const ROLES = `
  select rolname, rolsuper, rolbypassrls,
    (select count(*) from pg_database where datdba = pg_roles.oid) as owns
  from pg_roles where rolname !~ '^pg_' order by rolname`

it('gives a cluster with an owner and a powerless server role, and takes it away when no longer wanted', async () => {
  const keeper = spawn(process.execPath, ['scripts/test-database.mjs'], {
    stdio: ['pipe', 'pipe', 'inherit'],
  })
  const [line] = (await once(createInterface({ input: keeper.stdout }), 'line')) as [string]
  const urls = JSON.parse(line) as { superuserUrl: string; serverUrl: string }

  expect(await query<Role>(urls.superuserUrl, ROLES)).toEqual([
    { rolname: 'emberline_owner', rolsuper: false, rolbypassrls: false, owns: '1' },
    { rolname: 'emberline_server', rolsuper: false, rolbypassrls: false, owns: '0' },
    { rolname: 'provisioner', rolsuper: true, rolbypassrls: true, owns: '3' },
  ])
  await expect(query(urls.serverUrl, 'create table mine (id int)')).rejects.toThrow(/permission denied/)
  await expect(query(urls.serverUrl, 'create temporary table mine (id int)')).rejects.toThrow(
    /permission denied/,
  )

  const [{ folder } = { folder: '' }] = await query<{ folder: string }>(
    urls.superuserUrl,
    "select current_setting('data_directory') as folder",
  )
  expect(processesIn(folder)).not.toEqual([])
  keeper.stdin.end()
  expect(await once(keeper, 'exit')).toEqual([0, null])
  expect(processesIn(folder)).toEqual([])
})
