import { spawnSync } from 'node:child_process'
import { closeSync, mkdirSync, openSync } from 'node:fs'
import { dirname } from 'node:path'
import { setTimeout as sleep } from 'node:timers/promises'
import { Trouble } from './trouble.mjs'

const RETRY_MS = 250

/**
 * Takes the lock on `path` if it is free; null if another process holds it. The kernel keeps it for this process's
 * open file, so that it is free again however this process ends, and no stale lock is ever left.
 */
export function tryLock(path) {
  mkdirSync(dirname(path), { recursive: true })
  const file = openSync(path, 'a')
  const { status, error } = spawnSync('flock', ['-n', '3'], {
    stdio: ['ignore', 'ignore', 'ignore', file],
  })
  if (status === 0) return { release: () => closeSync(file) }
  closeSync(file)
  if (status === 1) return null
  throw new Trouble(
    `No lock could be taken on ${path}: ${error?.message ?? `flock ended with status ${status}`}`,
  )
}

/** Runs `work` holding the lock on `path`; `onWait` is told once if another process has it. */
export async function withLock(path, onWait, work) {
  let lock = tryLock(path)
  if (lock === null) onWait()
  while (lock === null) {
    await sleep(RETRY_MS)
    lock = tryLock(path)
  }
  try {
    return await work()
  } finally {
    lock.release()
  }
}
