import { randomBytes } from 'node:crypto'
import { readdir } from 'node:fs/promises'
import { migrate } from '#db/migrate'
import pg from 'pg'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { freshDatabase } from '../support/database.ts'

let database: Awaited<ReturnType<typeof freshDatabase>>
let superuser: pg.Client
const name = `empty_${randomBytes(6).toString('hex')}`
let emptyUrl: string
beforeAll(async () => {
  database = await freshDatabase()
  superuser = new pg.Client({ connectionString: database.superuserUrl })
  await superuser.connect()
  await superuser.query(`create database ${name} owner emberline_owner template template0`)
  const url = new URL(database.ownerUrl)
  url.pathname = `/${name}`
  emptyUrl = url.href
})
afterAll(async () => {
  await superuser.query(`drop database ${name} with (force)`)
  await superuser.end()
  await database.drop()
})

it('four migrators started at once on an empty database all succeed, and each migration is applied once', async () => {
  await Promise.all([migrate(emptyUrl), migrate(emptyUrl), migrate(emptyUrl), migrate(emptyUrl)])
  const client = new pg.Client({ connectionString: emptyUrl })
  await client.connect()
  const { rows } = await client.query('select hash from drizzle.__drizzle_migrations')
  const lock = await client.query(
    "select 1 from pg_locks where locktype = 'advisory' and database = (select oid from pg_database where datname = current_database())",
  )
  await client.end()
  const files = (await readdir('db/migrations')).filter((file) => file.endsWith('.sql'))
  expect(rows).toHaveLength(files.length)
  expect(lock.rows).toEqual([])
})

it('a database already at the newest schema is left as it is', async () => {
  await migrate(database.ownerUrl)
  await expect(migrate(database.ownerUrl)).resolves.toBeUndefined()
})
