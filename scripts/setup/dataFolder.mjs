import { createHash } from 'node:crypto'
import { accessSync, constants, existsSync, mkdirSync } from 'node:fs'
import { isAbsolute, join } from 'node:path'
import { canReach, clusterUser } from './clusterUser.mjs'
import { DATA_FOLDER, ROOT } from './project.mjs'
import { Trouble } from './trouble.mjs'

/** Where root keeps the data when the project stands in a folder closed to other users, such as /root. */
const elsewhere = () => `/var/lib/emberline-${createHash('sha256').update(ROOT).digest('hex').slice(0, 8)}`

function makeWritable(folder) {
  mkdirSync(folder, { recursive: true })
  try {
    accessSync(folder, constants.W_OK | constants.X_OK)
  } catch {
    throw new Trouble(
      `The data folder ${folder} belongs to another user, and nothing in it was touched. ` +
        'Start Emberline as that user, or name another folder in EMBERLINE_DATA_DIR.',
    )
  }
  return folder
}

const reachable = (folder) => canReach(clusterUser(clusterFolderOf(folder)), folder)

export const clusterFolderOf = (dataFolder) => join(dataFolder, 'postgres')

/**
 * The folder for everything that lasts: the database's cluster, its passwords, logs. `chosen` is the one named by
 * the environment; `withCluster` says whether PostgreSQL's user has to get through to it.
 */
export function openDataFolder({ chosen, withCluster, say }) {
  if (chosen !== undefined && !isAbsolute(chosen)) {
    throw new Trouble(`EMBERLINE_DATA_DIR is ${chosen}; allowed: a folder's full path.`)
  }
  const folder = makeWritable(chosen ?? DATA_FOLDER)
  if (!withCluster || reachable(folder)) return folder
  if (chosen !== undefined) {
    throw new Trouble(
      `The user PostgreSQL runs as cannot enter EMBERLINE_DATA_DIR, ${chosen}, or a folder above it.`,
    )
  }
  const other = elsewhere()
  say(
    `The user PostgreSQL runs as may not enter ${ROOT}; the data ${existsSync(other) ? 'is' : 'goes'} in ${other}`,
  )
  return makeWritable(other)
}
