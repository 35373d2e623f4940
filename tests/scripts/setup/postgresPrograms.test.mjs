import { expect, it } from 'vitest'
import { chooseVersion } from '../../../scripts/setup/postgresPrograms.mjs'

it('chooses the newest PostgreSQL for a new cluster', () => {
  expect(chooseVersion([15, 9, 17, 16], undefined)).toBe(17)
})

it('chooses for an existing cluster the version that made it, or none', () => {
  expect(chooseVersion([15, 17], 15)).toBe(15)
  expect(chooseVersion([15, 17], 16)).toBeUndefined()
})

it('passes over versions in which everybody may create objects in the schema public', () => {
  expect(chooseVersion([13, 14], undefined)).toBeUndefined()
})
