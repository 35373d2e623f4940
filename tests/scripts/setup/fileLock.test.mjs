import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { pathToFileURL } from 'node:url'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { tryLock, withLock } from '../../../scripts/setup/fileLock.mjs'

const MODULE = pathToFileURL(resolve('scripts/setup/fileLock.mjs')).href
let folder
let path

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'lock-'))
  path = join(folder, 'deep', 'a.lock')
})

afterEach(() => rmSync(folder, { recursive: true, force: true }))

it('gives a lock to one at a time', () => {
  const first = tryLock(path)
  expect(tryLock(path)).toBeNull()
  first.release()
  const second = tryLock(path)
  expect(second).not.toBeNull()
  second.release()
})

it('waits for whoever has the lock, saying so once', async () => {
  const first = tryLock(path)
  const told = []
  const waiting = withLock(
    path,
    () => {
      told.push('waiting')
      setTimeout(first.release, 700)
    },
    () => 'done',
  )
  expect(await waiting).toBe('done')
  expect(told).toEqual(['waiting'])
})

it('is free again when its holder is killed', async () => {
  const program = `const { tryLock } = await import('${MODULE}'); tryLock('${path}'); console.log('held'); setInterval(() => {}, 1000)`
  const holder = spawn(process.execPath, ['--input-type=module', '-e', program], {
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  await once(holder.stdout, 'data')
  expect(tryLock(path)).toBeNull()
  holder.kill('SIGKILL')
  await once(holder, 'exit')
  const lock = tryLock(path)
  expect(lock).not.toBeNull()
  lock.release()
})
