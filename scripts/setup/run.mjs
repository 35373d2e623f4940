import { spawn } from 'node:child_process'
import { beforeEnd, isStopping } from './stopping.mjs'
import { Trouble } from './trouble.mjs'

/** How much of a failed program's output is worth showing, lines. */
const TAIL_LINES = 40

function collect(stream) {
  const chunks = []
  stream?.on('data', (chunk) => chunks.push(chunk))
  return () => Buffer.concat(chunks).toString('utf8')
}

/** Sends `signal` to a program started in a process group of its own, and to whatever it started there. */
export function signalGroup(child, signal) {
  if (child.exitCode !== null || child.signalCode !== null || child.pid === undefined) return
  try {
    process.kill(-child.pid, signal)
  } catch (error) {
    if (error.code !== 'ESRCH') throw error
  }
}

/**
 * Runs a program to its end; resolves to { status, signal, stdout, stderr }, whatever the status.
 * It gets a process group of its own, so that Ctrl-C reaches this process alone, which decides the order of things.
 *
 * options.output  'capture' (the default) or 'show' (seen as it comes, and empty in the result)
 * options.whenStopping  'end' (the default: a terminating signal), 'finish' (waited for: half-done work would need
 *                       repair) or 'allowed' (part of stopping itself)
 * options.user  { uid, gid } to run as, when root starts it
 */
export async function run(program, args, options = {}) {
  const { output = 'capture', whenStopping = 'end', user, ...rest } = options
  if (isStopping() && whenStopping !== 'allowed') throw new Trouble(`stopping: ${program} was not started`)
  const stream = output === 'show' ? 'inherit' : 'pipe'
  const child = spawn(program, args, { ...rest, ...user, detached: true, stdio: ['ignore', stream, stream] })
  const read = { out: collect(child.stdout), err: collect(child.stderr) }
  const ended = new Promise((resolve, reject) => {
    child.once('error', reject)
    child.once('close', (status, signal) => resolve({ status, signal }))
  })
  const forget = beforeEnd(async () => {
    if (whenStopping === 'end') signalGroup(child, 'SIGTERM')
    await ended
  })
  try {
    const { status, signal } = await ended
    // Whoever waited for it is to go no further: it was ended before its time, or its use is gone.
    if (isStopping() && whenStopping !== 'allowed') throw new Trouble(`stopping: ${program} was ended`)
    return { status, signal, stdout: read.out(), stderr: read.err() }
  } finally {
    forget()
  }
}

const lastLines = (text) => text.trimEnd().split('\n').slice(-TAIL_LINES).join('\n')

/** As `run`, but a status other than 0 is Trouble: `failure` says what it means, and the output follows. */
export async function mustRun(program, args, { failure, ...options }) {
  const ended = await run(program, args, options)
  if (ended.status === 0) return ended
  const how = ended.signal === null ? `status ${ended.status}` : `signal ${ended.signal}`
  throw new Trouble(`${failure} (${how})\n${lastLines(ended.stdout + ended.stderr)}`.trimEnd())
}
