import { randomBytes } from 'node:crypto'
import { mkdtempSync, readdirSync, rmSync, statSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { SUPERUSER, createCluster, makeClusterFolder, startCluster, stopCluster } from './cluster.mjs'
import { canReach, unprivilegedUser } from './clusterUser.mjs'
import { tryLock } from './fileLock.mjs'
import { OWNER, SERVER, databaseUrl, provision } from './provision.mjs'
import { beforeEnd } from './stopping.mjs'
import { Trouble } from './trouble.mjs'

const PREFIX = 'emberline-test-'
/** The database the tests' template is made in. */
const DATABASE = 'emberline_template'
/** Nothing here is worth keeping through a power cut. */
const SETTINGS = ['fsync=off', 'synchronous_commit=off', 'full_page_writes=off']
/** A younger folder may belong to a start that has not taken its lock yet. */
const STALE_AFTER_MS = 60_000

/** A folder for temporary files that `user` gets through to: root's own is often closed to others. */
function temporaryFolder(user) {
  const folder = [tmpdir(), '/tmp', '/var/tmp'].find((candidate) => canReach(user, candidate))
  if (folder !== undefined) return folder
  throw new Trouble(`The user PostgreSQL runs as may not enter ${tmpdir()}: set TMPDIR to a folder it may.`)
}

const lockOf = (folder) => join(folder, 'lock')

function mayBeStale(folder, user) {
  const found = statSync(folder, { throwIfNoEntry: false })
  if (found === undefined) return false
  return found.uid === (user?.uid ?? process.getuid()) && Date.now() - found.mtimeMs > STALE_AFTER_MS
}

/** Stops and removes clusters whose launcher was killed before it could: nobody holds their lock any more. */
async function removeStale({ parent, programs, user }) {
  const folders = readdirSync(parent).filter((name) => name.startsWith(PREFIX))
  for (const folder of folders.map((name) => join(parent, name))) {
    const lock = mayBeStale(folder, user) ? tryLock(lockOf(folder)) : null
    if (lock === null) continue
    await stopCluster({ folder, programs, user })
    rmSync(folder, { recursive: true, force: true })
    lock.release()
  }
}

/**
 * A cluster for tests in a temporary folder, gone when this process ends or `stop` is called. The addresses are
 * those of its one database, which is empty; each role signs in with its own.
 */
export async function startThrowawayCluster(programs) {
  const user = unprivilegedUser()
  const parent = temporaryFolder(user)
  await removeStale({ parent, programs, user })
  const folder = mkdtempSync(join(parent, PREFIX))
  const lock = tryLock(lockOf(folder))
  const place = { folder, programs, user }
  const stop = async () => {
    await stopCluster(place)
    rmSync(folder, { recursive: true, force: true })
    lock.release()
  }
  const forget = beforeEnd(stop)
  makeClusterFolder(place)
  const [superuser, owner, server] = [0, 1, 2].map(() => randomBytes(18).toString('base64url'))
  await createCluster(place, superuser, ['--no-sync'])
  const { port } = await startCluster(place, SETTINGS)
  await provision({ programs, port, passwords: { superuser, owner, server }, database: DATABASE })
  const url = (role, password) => databaseUrl({ role, password, port, database: DATABASE })
  return {
    addresses: {
      superuserUrl: url(SUPERUSER, superuser),
      ownerUrl: url(OWNER, owner),
      serverUrl: url(SERVER, server),
    },
    async stop() {
      forget()
      await stop()
    },
  }
}
