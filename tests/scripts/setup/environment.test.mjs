import { expect, it } from 'vitest'
import { forNpm, withoutPostgres } from '../../../scripts/setup/environment.mjs'

it('lets npm know where packages come from, and nothing else of the npm that called', () => {
  const ofCaller = {
    NODE_ENV: 'production',
    npm_config_omit: 'dev',
    npm_config_ignore_scripts: 'true',
    npm_command: 'run',
  }
  const ofPlace = {
    PATH: '/bin',
    npm_config_registry: 'https://registry.example',
    npm_config_cache: '/cache',
  }
  expect(forNpm({ ...ofCaller, ...ofPlace })).toEqual(ofPlace)
})

it('keeps the address of another database from the programs that would follow it', () => {
  expect(withoutPostgres({ PATH: '/bin', PGHOST: 'db.example', PGSSLMODE: 'require', PGP_KEY: 'x' })).toEqual(
    {
      PATH: '/bin',
      PGP_KEY: 'x',
    },
  )
})
