import {
  chmodSync,
  chownSync,
  existsSync,
  mkdirSync,
  readFileSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs'
import { join } from 'node:path'
import { anyFreePort } from './freePort.mjs'
import { mustRun, run } from './run.mjs'
import { Trouble } from './trouble.mjs'

/**
 * A PostgreSQL cluster of our own, on loopback only and without a socket. A place is { folder, programs, user }:
 * folder/data holds the cluster, folder/log what it has to say; `user` as clusterUser gives it.
 */
export const SUPERUSER = 'provisioner'

const dataOf = (place) => join(place.folder, 'data')
const logOf = (place) => join(place.folder, 'log')

/** Another program may take the port between asking for a free one and using it. */
const START_ATTEMPTS = 3
const START_SECONDS = 60
const STOP_SECONDS = 60

const pathOf = (place, program) => join(place.programs.folder, program)
const runAs = (place) => ({ user: place.user, cwd: '/' })

/** The major version that made the cluster in `folder`; undefined when there is none. */
export function clusterVersion(folder) {
  const file = join(folder, 'data', 'PG_VERSION')
  return existsSync(file) ? Number(readFileSync(file, 'utf8')) : undefined
}

function giveTo(user, path) {
  if (user !== undefined) chownSync(path, user.uid, user.gid)
}

/** Makes the folder of a cluster, private to its user. */
export function makeClusterFolder({ folder, user }) {
  mkdirSync(folder, { recursive: true })
  chmodSync(folder, 0o700)
  giveTo(user, folder)
}

/** Makes the cluster. An attempt that was cut short leaves nothing that looks like one: it gets its name last. */
export async function createCluster(place, superuserPassword, options = []) {
  makeClusterFolder(place)
  const unfinished = join(place.folder, 'unfinished')
  const passwordFile = join(place.folder, 'password')
  rmSync(unfinished, { recursive: true, force: true })
  rmSync(passwordFile, { force: true })
  writeFileSync(passwordFile, `${superuserPassword}\n`, { mode: 0o600, flag: 'wx' })
  giveTo(place.user, passwordFile)
  const identity = [
    '-U',
    SUPERUSER,
    `--pwfile=${passwordFile}`,
    '--auth-local=reject',
    '--auth-host=scram-sha-256',
  ]
  const text = ['-E', 'UTF8', '--locale=C.UTF-8']
  try {
    await mustRun(pathOf(place, 'initdb'), ['-D', unfinished, ...identity, ...text, ...options], {
      ...runAs(place),
      failure: `No database cluster could be made in ${place.folder}. Nothing was kept.`,
    })
  } finally {
    rmSync(passwordFile, { force: true })
  }
  renameSync(unfinished, dataOf(place))
}

const pgCtl = (place, command, options = [], more = {}) =>
  run(pathOf(place, 'pg_ctl'), [command, '-D', dataOf(place), ...options], {
    ...runAs(place),
    whenStopping: 'finish',
    ...more,
  })

async function answers(place, port) {
  const { status } = await run(pathOf(place, 'pg_isready'), ['-q', '-h', '127.0.0.1', '-p', String(port)], {
    cwd: '/',
  })
  return status === 0
}

/** The port of the cluster when it is up already, left by a launcher that was killed; else null. */
async function runningPort(place) {
  if ((await pgCtl(place, 'status')).status !== 0) return null
  const port = Number(readFileSync(join(dataOf(place), 'postmaster.pid'), 'utf8').split('\n')[3])
  return (await answers(place, port)) ? port : null
}

async function startOn(place, port, settings) {
  const all = [
    'listen_addresses=127.0.0.1',
    "unix_socket_directories=''",
    'timezone=UTC',
    'log_timezone=UTC',
    ...settings,
  ]
  const server = [`-p ${port}`, ...all.map((setting) => `-c ${setting}`)].join(' ')
  const options = ['-w', '-s', '-t', String(START_SECONDS), '-l', logOf(place), '-o', server]
  return (await pgCtl(place, 'start', options)).status === 0
}

function lastOfLog(place) {
  return existsSync(logOf(place))
    ? readFileSync(logOf(place), 'utf8').trimEnd().split('\n').slice(-12).join('\n')
    : ''
}

/** Starts the cluster, or takes over the one left running; resolves to { port, takenOver }. */
export async function startCluster(place, settings = []) {
  const running = await runningPort(place)
  if (running !== null) return { port: running, takenOver: true }
  for (let attempt = 1; attempt <= START_ATTEMPTS; attempt += 1) {
    const port = await anyFreePort()
    if (await startOn(place, port, settings)) return { port, takenOver: false }
  }
  throw new Trouble(
    `The database did not start. Its files in ${place.folder} were left as they are; the end of its log:\n${lastOfLog(place)}`,
  )
}

/** Stops the cluster; connections still open are closed. No error if it is not running. */
export async function stopCluster(place) {
  const allowed = { whenStopping: 'allowed' }
  if ((await pgCtl(place, 'status', [], allowed)).status !== 0) return
  const wait = ['-w', '-s', '-t', String(STOP_SECONDS)]
  const { status } = await pgCtl(place, 'stop', ['-m', 'fast', ...wait], allowed)
  if (status !== 0) await pgCtl(place, 'stop', ['-m', 'immediate', ...wait], allowed)
}
