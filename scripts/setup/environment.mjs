/**
 * The environment without the variables the PostgreSQL programs and drivers read by themselves (PGHOST, PGSSLMODE,
 * PGSERVICE …): set for some other database, they would turn a private cluster's connections elsewhere.
 */
export const withoutPostgres = (environment) =>
  Object.fromEntries(Object.entries(environment).filter(([name]) => !/^PG[A-Z]+$/.test(name)))

/** npm's settings that say where packages come from; the rest belong to the npm that called us. */
const KEPT_NPM_SETTINGS = new Set([
  'registry',
  'cache',
  'userconfig',
  'globalconfig',
  'prefer_offline',
  'offline',
  'cafile',
  'proxy',
  'https_proxy',
  'noproxy',
])

const isForeignNpmSetting = (name) =>
  /^npm_/i.test(name) && !KEPT_NPM_SETTINGS.has(name.toLowerCase().replace(/^npm_config_/, ''))

/** The environment for an npm of our own: a production NODE_ENV or the caller's flags would leave packages out. */
export const forNpm = (environment) =>
  Object.fromEntries(
    Object.entries(environment).filter(([name]) => name !== 'NODE_ENV' && !isForeignNpmSetting(name)),
  )
