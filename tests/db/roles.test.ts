import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { freshDatabase } from '../support/database.ts'

let database: Awaited<ReturnType<typeof freshDatabase>>
let server: pg.Client
beforeAll(async () => {
  database = await freshDatabase()
  server = new pg.Client({ connectionString: database.serverUrl })
  await server.connect()
})
afterAll(async () => {
  await server.end()
  await database.drop()
})

const TABLES = [
  'api_keys',
  'attempts',
  'audit_entries',
  'candidate_revisions',
  'candidates',
  'evaluations',
  'groups',
  'guest_links',
  'histories',
  'history_revisions',
  'invitations',
  'memberships',
  'one_time_tokens',
  'recovery_codes',
  'second_factors',
  'sessions',
  'signing_keys',
  'users',
]

describe('the server’s role', () => {
  it('is no superuser, bypasses no row-level security, makes no roles and no databases', async () => {
    const { rows } = await server.query(
      'select rolsuper, rolbypassrls, rolcreaterole, rolcreatedb from pg_roles where rolname = current_user',
    )
    expect(rows).toEqual([{ rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false }])
  })

  it('belongs to no other role', async () => {
    const { rows } = await server.query(
      'select 1 from pg_auth_members where member = (select oid from pg_roles where rolname = current_user)',
    )
    expect(rows).toEqual([])
  })

  it('owns nothing', async () => {
    const { rows } = await server.query(
      `select relname from pg_class where relowner = (select oid from pg_roles where rolname = current_user)
       union all
       select proname from pg_proc where proowner = (select oid from pg_roles where rolname = current_user)
       union all
       select nspname from pg_namespace where nspowner = (select oid from pg_roles where rolname = current_user)
       union all
       select datname from pg_database where datdba = (select oid from pg_roles where rolname = current_user)`,
    )
    expect(rows).toEqual([])
  })

  it('may delete from no table and empty none', async () => {
    const { rows } = await server.query(
      `select relname from pg_class where relkind = 'r' and relnamespace = 'public'::regnamespace
         and has_table_privilege(current_user, oid, 'delete, truncate')`,
    )
    expect(rows).toEqual([])
  })

  it('may change only the columns named here', async () => {
    const { rows } = await server.query<{ at: string }>(
      `select c.relname || '.' || a.attname as at from pg_class c join pg_attribute a on a.attrelid = c.oid
       where c.relkind = 'r' and c.relnamespace = 'public'::regnamespace and a.attnum > 0
         and has_column_privilege(current_user, c.oid, a.attnum, 'update') order by 1`,
    )
    expect(rows.map(({ at }) => at)).toEqual([
      'api_keys.revoked_at',
      'candidates.latest_number',
      'candidates.updated_at',
      'guest_links.revoked_at',
      'histories.latest_number',
      'histories.updated_at',
      'invitations.withdrawn_at',
      'one_time_tokens.used_at',
      'recovery_codes.used_at',
      'second_factors.confirmed_at',
      'second_factors.last_step',
      'second_factors.sealed_secret',
      'sessions.group_id',
      'sessions.revoked_at',
      'users.email',
      'users.email_verified_at',
      'users.name',
      'users.password_hash',
    ])
  })

  it('cannot read the hash of a password from the table', async () => {
    await expect(server.query('select password_hash from users')).rejects.toThrow('permission denied')
  })

  it('cannot read the hash of any secret, nor give a key a rate of its own', async () => {
    await expect(server.query('select secret_hash from api_keys')).rejects.toThrow('permission denied')
    await expect(server.query('select secret_hash from invitations')).rejects.toThrow('permission denied')
    await expect(server.query('select secret_hash from one_time_tokens')).rejects.toThrow('permission denied')
    await expect(server.query('select token_hash from guest_links')).rejects.toThrow('permission denied')
    await expect(server.query('update api_keys set requests_per_minute = 1')).rejects.toThrow(
      'permission denied',
    )
  })

  it('cannot create tables', async () => {
    await expect(server.query('create table mine (id int)')).rejects.toThrow('permission denied')
  })
})

describe('row-level security', () => {
  it('is on and forced on every table', async () => {
    const { rows } = await server.query<{ relname: string }>(
      `select relname from pg_class where relkind = 'r' and relnamespace = 'public'::regnamespace
         and relrowsecurity and relforcerowsecurity order by relname`,
    )
    expect(rows.map(({ relname }) => relname)).toEqual(TABLES)
    const all = await server.query(
      "select 1 from pg_class where relkind = 'r' and relnamespace = 'public'::regnamespace",
    )
    expect(all.rowCount).toBe(TABLES.length)
  })

  it('every function that runs as the owner has a fixed search path and is closed to the public', async () => {
    const { rows } = await server.query<{ proname: string; proconfig: string[]; open: boolean }>(
      `select proname, proconfig, has_function_privilege('public', oid, 'execute') as open
       from pg_proc where prosecdef and pronamespace = 'public'::regnamespace order by proname`,
    )
    expect(rows.map(({ proname }) => proname)).toEqual([
      'accept_invitation',
      'account_for_sign_in',
      'add_signing_key',
      'all_signing_keys',
      'awaits_first_group',
      'forgive_attempt',
      'found_first_group',
      'issue_first_group_token',
      'live_invitation',
      'live_token',
      'newest_migration',
      'own_password_hash',
      'remove_expired',
      'take_attempt',
      'use_api_key',
      'use_guest_link',
      'use_session',
    ])
    for (const { proconfig, open } of rows) {
      expect(proconfig).toContainEqual(expect.stringMatching(/^search_path=pg_catalog, public, pg_temp$/))
      expect(open).toBe(false)
    }
  })
})
