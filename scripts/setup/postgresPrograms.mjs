import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { installDebianPackage } from './debianPackages.mjs'
import { Trouble } from './trouble.mjs'

const DEBIAN_FOLDER = '/usr/lib/postgresql'
/** Older ones let everybody create objects in the schema `public`. */
const OLDEST_VERSION = 15
const NEEDED = ['initdb', 'pg_ctl', 'psql', 'pg_isready']

/** Keeps Debian from making and starting a cluster of its own for the whole machine. */
const CONFIGURATION_FOLDER = '/etc/postgresql-common/createcluster.d'
const CONFIGURATION_FILE = `${CONFIGURATION_FOLDER}/emberline.conf`
const CONFIGURATION = 'create_main_cluster = false'

/** The newest of the installed major versions, or the wanted one; undefined when it is not there. */
export function chooseVersion(installed, wanted) {
  const fit = installed.filter((version) => version >= OLDEST_VERSION)
  if (wanted !== undefined) return fit.find((version) => version === wanted)
  return fit.length === 0 ? undefined : Math.max(...fit)
}

function installedVersions() {
  if (!existsSync(DEBIAN_FOLDER)) return []
  return readdirSync(DEBIAN_FOLDER)
    .filter((name) => /^\d+$/.test(name))
    .filter((name) => NEEDED.every((program) => existsSync(join(DEBIAN_FOLDER, name, 'bin', program))))
    .map(Number)
}

function findPrograms(wanted) {
  const version = chooseVersion(installedVersions(), wanted)
  return version === undefined ? null : { version, folder: join(DEBIAN_FOLDER, String(version), 'bin') }
}

function leaveOutMainCluster() {
  mkdirSync(CONFIGURATION_FOLDER, { recursive: true })
  writeFileSync(CONFIGURATION_FILE, `${CONFIGURATION}\n`)
}

/**
 * PostgreSQL's programs, { version, folder }, installed if need be. `wanted` is the major version that made an
 * existing cluster: another one cannot open it.
 */
export async function ensurePostgresPrograms({ wanted, say }) {
  const found = findPrograms(wanted)
  if (found !== null) return found
  const name = wanted === undefined ? 'postgresql' : `postgresql-${wanted}`
  const commands = [
    `mkdir -p ${CONFIGURATION_FOLDER}`,
    `echo "${CONFIGURATION}" > ${CONFIGURATION_FILE}`,
    `apt-get install -y --no-install-recommends ${name}`,
  ]
  await installDebianPackage({
    name,
    what: wanted === undefined ? 'PostgreSQL' : `PostgreSQL ${wanted}`,
    command: `sh -c '${commands.join(' && ')}'`,
    seconds: 15,
    before: leaveOutMainCluster,
    say,
  })
  const installed = findPrograms(wanted)
  if (installed !== null) return installed
  throw new Trouble(
    `The package ${name} brought no PostgreSQL ${wanted ?? OLDEST_VERSION} or newer to ${DEBIAN_FOLDER}.`,
  )
}
