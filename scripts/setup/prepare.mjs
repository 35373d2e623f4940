import { openDataFolder } from './dataFolder.mjs'
import { withoutPostgres } from './environment.mjs'
import { ensurePackages } from './packages.mjs'
import { ensurePostgresPrograms } from './postgresPrograms.mjs'
import { startPrivateCluster } from './privateCluster.mjs'
import { ROOT } from './project.mjs'
import { mustRun } from './run.mjs'
import { becomeTheOne } from './runningRecord.mjs'
import { openSecrets } from './secrets.mjs'
import { readSettings } from './settings.mjs'

function openDatabase({ settings, dataFolder, say }) {
  const { databaseUrl, migrationUrl } = settings
  if (databaseUrl === undefined) return startPrivateCluster({ dataFolder, say })
  say('Using the database of EMBERLINE_DATABASE_URL')
  return { serverUrl: databaseUrl, ownerUrl: migrationUrl }
}

/** The server is told neither the owner's password nor anything meant for another database. */
function serverEnvironment({ settings, addresses, sessionSecret }) {
  const inherited = settings.databaseUrl === undefined ? withoutPostgres(process.env) : { ...process.env }
  delete inherited.EMBERLINE_MIGRATION_URL
  return {
    ...inherited,
    EMBERLINE_DATABASE_URL: addresses.serverUrl,
    EMBERLINE_SESSION_SECRET: sessionSecret,
    EMBERLINE_HOST: settings.host,
    EMBERLINE_DEMO: settings.demo ? '1' : '0',
  }
}

/**
 * What `npm start` and `npm run dev` have in common: the packages, a database, the secrets, and being the only one.
 * Resolves to { running } when another process has Emberline up already.
 */
export async function prepare({ command, say }) {
  const settings = readSettings(process.env)
  const withCluster = settings.databaseUrl === undefined
  if (withCluster) await ensurePostgresPrograms({ say })
  const dataFolder = openDataFolder({ chosen: settings.dataFolder, withCluster, say })
  const one = await becomeTheOne({ dataFolder, command, say })
  if (one.running !== undefined) return { running: one.running }
  await ensurePackages({ say })
  const addresses = await openDatabase({ settings, dataFolder, say })
  const sessionSecret = settings.sessionSecret ?? openSecrets(dataFolder).session
  return {
    settings,
    dataFolder,
    ownerUrl: addresses.ownerUrl,
    environment: serverEnvironment({ settings, addresses, sessionSecret }),
    announce: one.announce,
  }
}

const asOwner = (ownerUrl) => ({ cwd: ROOT, env: { ...process.env, EMBERLINE_MIGRATION_URL: ownerUrl } })

/**
 * Brings the schema up to date and, if the settings ask for it, loads the demo group into an empty database.
 * `programs` names the two programs, { migrate, seed }, as arguments of node.
 */
export async function fillDatabase({ ownerUrl, demo, programs, say }) {
  if (ownerUrl === undefined) {
    say("EMBERLINE_MIGRATION_URL is not set: the database's schema is taken as it is")
    return
  }
  await mustRun(process.execPath, programs.migrate, {
    ...asOwner(ownerUrl),
    failure: 'The database could not be brought up to date; its last complete state was kept',
  })
  say("The database's schema is up to date")
  if (!demo) return
  const { stdout } = await mustRun(process.execPath, programs.seed, {
    ...asOwner(ownerUrl),
    failure: 'The demo group could not be loaded; nothing of it was kept',
  })
  say(
    stdout.trim() === 'seeded'
      ? 'The demo group is loaded'
      : 'The database has a group already; it is left as it is',
  )
}
