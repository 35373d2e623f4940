import { Trouble } from './trouble.mjs'

const DEFAULT_PORT = 4400

function portOf(text) {
  if (text === undefined || text === '') return DEFAULT_PORT
  const port = Number(text)
  if (Number.isInteger(port) && port >= 0 && port <= 65535) return port
  throw new Trouble(`EMBERLINE_PORT is ${text}; allowed: a whole number from 0 (any free port) to 65535.`)
}

function demoOf(text, otherwise) {
  if (text === undefined || text === '') return otherwise
  if (text === '1' || text === '0') return text === '1'
  throw new Trouble(`EMBERLINE_DEMO is ${text}; allowed: 1 or 0.`)
}

const nonEmpty = (text) => (text === undefined || text === '' ? undefined : text)

/**
 * What the environment asks for. With EMBERLINE_DATABASE_URL the database is somebody else's and no cluster is made;
 * the demo group, whose passwords everybody knows, is then loaded only when asked for.
 */
export function readSettings(environment) {
  const databaseUrl = nonEmpty(environment.EMBERLINE_DATABASE_URL)
  const migrationUrl = nonEmpty(environment.EMBERLINE_MIGRATION_URL)
  if (databaseUrl === undefined && migrationUrl !== undefined) {
    throw new Trouble(
      "EMBERLINE_MIGRATION_URL is set but EMBERLINE_DATABASE_URL, the address for the server's own role, is not.",
    )
  }
  return {
    port: portOf(environment.EMBERLINE_PORT),
    host: nonEmpty(environment.EMBERLINE_HOST) ?? '127.0.0.1',
    demo: demoOf(environment.EMBERLINE_DEMO, databaseUrl === undefined),
    dataFolder: nonEmpty(environment.EMBERLINE_DATA_DIR),
    sessionSecret: nonEmpty(environment.EMBERLINE_SESSION_SECRET),
    databaseUrl,
    migrationUrl,
  }
}
