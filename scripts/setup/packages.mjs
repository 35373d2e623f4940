import { createHash } from 'node:crypto'
import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { basename, join } from 'node:path'
import { forNpm } from './environment.mjs'
import { withLock } from './fileLock.mjs'
import { DATA_FOLDER, ROOT, inProject } from './project.mjs'
import { mustRun } from './run.mjs'

const LOCK_FILE = inProject('package-lock.json')
const STAMP = inProject('node_modules', '.emberline-stamp.json')
/** What npm itself notes of an installation it has finished; `npm ci` removes it first and writes it last. */
const INSTALLED = inProject('node_modules', '.package-lock.json')

const readJson = (path) => (existsSync(path) ? JSON.parse(readFileSync(path, 'utf8')) : undefined)

/** Binaries among the packages are chosen by these. */
const machine = () => ({ node: process.versions.node, platform: `${process.platform}-${process.arch}` })

/**
 * Whether an installation, as npm notes it, is the one the lock file asks for: every package there that is not
 * optional, in its version, and none in another version.
 */
export function isInstalled(locked, installed) {
  const wanted = Object.entries(locked.packages).filter(([path]) => path !== '')
  const complete = wanted.every(([path, entry]) => {
    const found = installed.packages[path]
    return found === undefined ? entry.optional === true : found.version === entry.version
  })
  return complete && Object.keys(installed.packages).every((path) => locked.packages[path] !== undefined)
}

function arePackagesInPlace() {
  const text = readFileSync(LOCK_FILE, 'utf8')
  const current = { ...machine(), lock: createHash('sha256').update(text).digest('hex') }
  const stamp = existsSync(INSTALLED) ? readJson(STAMP) : undefined
  if (stamp !== undefined && (stamp.node !== current.node || stamp.platform !== current.platform))
    return false
  if (stamp?.lock === current.lock) return true
  const installed = readJson(INSTALLED)
  if (installed === undefined || !isInstalled(JSON.parse(text), installed)) return false
  writeFileSync(STAMP, JSON.stringify(current))
  return true
}

/** The npm that runs this script, else the one on the path. */
function npmCommand() {
  const path = process.env.npm_execpath
  return path !== undefined && basename(path) === 'npm-cli.js' ? [process.execPath, path] : ['npm']
}

async function install(say) {
  say(`Installing the npm packages (half a minute or so) into ${join(ROOT, 'node_modules')}`)
  const [program, ...first] = npmCommand()
  await mustRun(program, [...first, 'ci', '--include=dev', '--no-audit', '--no-fund'], {
    cwd: ROOT,
    env: forNpm(process.env),
    failure:
      'The npm packages could not be installed; your data was not touched. With the network back, or the registry ' +
      'set in your .npmrc, give the same command again. npm said',
  })
}

/** Installs the packages of the lock file, unless they are in place. */
export async function ensurePackages({ say }) {
  if (arePackagesInPlace()) return
  const waiting = () => say('Waiting for another command that is installing the npm packages')
  await withLock(join(DATA_FOLDER, 'packages.lock'), waiting, async () => {
    if (!arePackagesInPlace()) await install(say)
    if (!arePackagesInPlace())
      throw new Error('npm ci ended well, yet node_modules is not what package-lock.json says')
  })
}
