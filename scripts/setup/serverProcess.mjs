import { spawn } from 'node:child_process'
import { createWriteStream, existsSync, renameSync } from 'node:fs'
import { setTimeout as sleep } from 'node:timers/promises'
import { ROOT } from './project.mjs'
import { signalGroup } from './run.mjs'
import { beforeEnd } from './stopping.mjs'
import { Trouble } from './trouble.mjs'

/** A little more than the server gives to requests under way. */
const STOP_PATIENCE_MS = 15_000
const KEPT_CHARACTERS = 4_000

/** A fresh log file; the one of the start before is kept beside it. */
function openLog(file) {
  if (existsSync(file)) renameSync(file, `${file}.1`)
  return createWriteStream(file, { mode: 0o600 })
}

async function endGently(child, exited) {
  signalGroup(child, 'SIGTERM')
  const patience = sleep(STOP_PATIENCE_MS, 'late', { ref: false })
  if ((await Promise.race([exited, patience])) !== 'late') return
  signalGroup(child, 'SIGKILL')
  await exited
}

/** What Emberline's own server says before, on a database without a group: where the first is made. */
const FIRST_GROUP = /^there is no group yet; make the first at (http\S+)$/m

/** The line that tells whoever started the server how to make the first group; none when there is one. */
export function firstGroupLines(said) {
  const [, link] = FIRST_GROUP.exec(said) ?? []
  return link === undefined ? [] : [`\nThere is no group yet. Make the first, once, at\n  ${link}`]
}

/** What Emberline's own server says once it listens. */
export const LISTENING = /^listening on (http\S+)$/m

/**
 * Starts a server: `args` are those of node. Its output goes to `logFile`, or to standard output if there is none.
 * Resolves, once the output matches `ready`, to { address, said, exited }: the pattern's first group, the output so
 * far, and a promise that resolves when the server is no more.
 * It stops when this process ends; should this process be killed, the channel between them closes and it stops too.
 */
export async function startServer({ args, environment, ready, logFile }) {
  const child = spawn(process.execPath, args, {
    cwd: ROOT,
    env: environment,
    detached: true,
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  })
  const log = logFile === undefined ? process.stdout : openLog(logFile)
  const exited = new Promise((resolve) => child.once('exit', resolve))
  beforeEnd(() => endGently(child, exited))
  let last = ''
  const address = new Promise((resolve) => {
    const hear = (chunk) => {
      log.write(chunk)
      last = (last + chunk.toString('utf8')).slice(-KEPT_CHARACTERS)
      const match = ready.exec(last)
      if (match !== null) resolve(match[1])
    }
    child.stdout.on('data', hear)
    child.stderr.on('data', hear)
  })
  const first = await Promise.race([address, exited.then(() => null)])
  if (first === null) throw new Trouble(`The server ended before it was ready. It said:\n${last.trim()}`)
  return { address: first, said: last, exited }
}
