import { existsSync } from 'node:fs'
import { clusterVersion, createCluster, startCluster, stopCluster } from './cluster.mjs'
import { clusterUser } from './clusterUser.mjs'
import { clusterFolderOf } from './dataFolder.mjs'
import { ensurePostgresPrograms } from './postgresPrograms.mjs'
import { OWNER, SERVER, databaseUrl, provision } from './provision.mjs'
import { openSecrets, secretsFileOf } from './secrets.mjs'
import { beforeEnd } from './stopping.mjs'
import { Trouble } from './trouble.mjs'

const DATABASE = 'emberline'

function checkSecrets(dataFolder) {
  const file = secretsFileOf(dataFolder)
  if (existsSync(file)) return
  throw new Trouble(
    `The database in ${clusterFolderOf(dataFolder)} is there but its passwords, in ${file}, are not. Nothing was ` +
      'changed. Put the file back from a backup, or move the whole folder away to begin with an empty database.',
  )
}

/**
 * Starts the cluster in the data folder, made at the first start, and resolves to the addresses of the database for
 * the owner's and the server's role. It stops when this process ends.
 */
export async function startPrivateCluster({ dataFolder, say }) {
  const folder = clusterFolderOf(dataFolder)
  const version = clusterVersion(folder)
  const programs = await ensurePostgresPrograms({ wanted: version, say })
  const place = { folder, programs, user: clusterUser(folder) }
  if (version !== undefined) checkSecrets(dataFolder)
  const secrets = openSecrets(dataFolder)
  if (version === undefined) {
    say(`Making a database cluster (PostgreSQL ${programs.version}) in ${folder}`)
    await createCluster(place, secrets.superuser, ['--data-checksums'])
  }
  beforeEnd(() => stopCluster(place))
  const { port, takenOver } = await startCluster(place)
  say(
    takenOver
      ? `The database was still running, on 127.0.0.1:${port}; taking it over`
      : `The database is running on 127.0.0.1:${port}`,
  )
  await provision({ programs, port, passwords: secrets, database: DATABASE })
  const url = (role, password) => databaseUrl({ role, password, port, database: DATABASE })
  return { ownerUrl: url(OWNER, secrets.owner), serverUrl: url(SERVER, secrets.server) }
}
