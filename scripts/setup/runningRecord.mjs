import { existsSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { setTimeout as sleep } from 'node:timers/promises'
import { tryLock } from './fileLock.mjs'
import { beforeEnd } from './stopping.mjs'

const POLL_MS = 500

const recordOf = (dataFolder) => join(dataFolder, 'running.json')

function read(dataFolder) {
  const file = recordOf(dataFolder)
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : {}
}

function write(dataFolder, record) {
  const unfinished = `${recordOf(dataFolder)}.${process.pid}`
  writeFileSync(unfinished, JSON.stringify(record))
  renameSync(unfinished, recordOf(dataFolder))
}

/**
 * Makes this process the one that runs Emberline on a data folder. Resolves to { announce }, to be told the address,
 * or, when another process does, to { running: { command, pid, address } } as soon as that one has its address.
 */
export async function becomeTheOne({ dataFolder, command, say }) {
  let waited = false
  for (;;) {
    const lock = tryLock(join(dataFolder, 'running.lock'))
    if (lock !== null) {
      const record = { command, pid: process.pid }
      write(dataFolder, record)
      beforeEnd(() => {
        rmSync(recordOf(dataFolder), { force: true })
        lock.release()
      })
      return { announce: (address) => write(dataFolder, { ...record, address }) }
    }
    const running = read(dataFolder)
    if (running.address !== undefined) return { running }
    if (!waited) say(`Another ${running.command ?? 'start'} is under way; waiting for it`)
    waited = true
    await sleep(POLL_MS)
  }
}
