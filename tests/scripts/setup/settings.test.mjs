import { expect, it } from 'vitest'
import { readSettings } from '../../../scripts/setup/settings.mjs'
import { Trouble } from '../../../scripts/setup/trouble.mjs'

const DATABASE = { EMBERLINE_DATABASE_URL: 'postgres://emberline_server:x@db.example/emberline' }

it('asks, with nothing set, for a cluster of its own with the demo group on port 4400', () => {
  const settings = readSettings({})
  expect(settings).toMatchObject({ port: 4400, host: '127.0.0.1', demo: true })
  expect(settings.databaseUrl).toBeUndefined()
})

it('loads no demo group, whose passwords everybody knows, into a database it was given, unless told to', () => {
  expect(readSettings(DATABASE).demo).toBe(false)
  expect(readSettings({ ...DATABASE, EMBERLINE_DEMO: '1' }).demo).toBe(true)
})

it('leaves the demo group out on EMBERLINE_DEMO=0', () => {
  expect(readSettings({ EMBERLINE_DEMO: '0' }).demo).toBe(false)
})

it.each([
  [{ EMBERLINE_PORT: 'http' }, /EMBERLINE_PORT is http; allowed/],
  [{ EMBERLINE_PORT: '70000' }, /EMBERLINE_PORT is 70000; allowed/],
  [{ EMBERLINE_DEMO: 'yes' }, /EMBERLINE_DEMO is yes; allowed: 1 or 0/],
  [{ EMBERLINE_MIGRATION_URL: 'postgres://x' }, /EMBERLINE_DATABASE_URL/],
])('refuses %j, saying what is allowed', (environment, message) => {
  expect(() => readSettings(environment)).toThrow(Trouble)
  expect(() => readSettings(environment)).toThrow(message)
})
