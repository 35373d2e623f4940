import { execFileSync } from 'node:child_process'
import { chmodSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { sessionInfo } from '#core/wire/index'
import type { SessionInfo } from '#core/wire/index'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { processesIn, startEmberline } from './emberline.ts'
import type { RunningStart } from './emberline.ts'

const AUTHOR = /author\s+(\S+@\S+)\s+(.+)/
const READY = /Ctrl-C stops Emberline/
const ADDRESS = /Emberline is ready at (http:\S+)/

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const server = createServer()
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo
      server.close(() => resolve(port))
    })
  })
}

async function signIn(start: RunningStart): Promise<SessionInfo> {
  const [, address] = await start.waitFor(ADDRESS)
  const [, email, password] = await start.waitFor(AUTHOR)
  const answer = await fetch(`${address}/api/v1/session`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ email, password }),
  })
  expect(answer.status).toBe(201)
  return sessionInfo.parse(await answer.json())
}

describe('npm start, from a fresh clone', () => {
  let folder: string
  let port: number
  let start: RunningStart
  let groupId: string

  beforeAll(async () => {
    const parent = mkdtempSync(join(tmpdir(), 'emberline-clone-'))
    // Root's temporary folders are closed to others, and the database runs as another user.
    chmodSync(parent, 0o755)
    folder = join(parent, 'emberline')
    execFileSync('git', ['clone', '--quiet', process.cwd(), folder])
    port = await freePort()
    start = startEmberline(folder, port)
    await start.waitFor(READY)
  })

  afterAll(async () => {
    await start.end('SIGTERM')
    rmSync(join(folder, '..'), { recursive: true, force: true })
  })

  it('prints an address that serves the page and answers for the database', async () => {
    const address = `http://127.0.0.1:${port}`
    expect(start.output()).toContain(`Emberline is ready at ${address}\n`)
    const health = await fetch(`${address}/api/v1/health`)
    expect(await health.json()).toEqual({ status: 'ok' })
    const page = await fetch(address)
    expect(page.headers.get('content-type')).toMatch(/^text\/html/)
    const [, script] = /<script[^>]* src="([^"]+)"/.exec(await page.text()) ?? []
    expect((await fetch(new URL(script ?? 'no script', address))).status).toBe(200)
  })

  it('prints a demo author who can sign in', async () => {
    const session = await signIn(start)
    expect(session.role).toBe('author')
    groupId = session.group.id
  })

  it('started once more, says where it is running already and changes nothing', async () => {
    const second = startEmberline(folder, port)
    expect(await second.status).toBe(0)
    expect(second.output()).toContain(`Emberline is already running at http://127.0.0.1:${port}`)
    expect((await fetch(`http://127.0.0.1:${port}/api/v1/health`)).status).toBe(200)
  })

  it('on SIGTERM stops the server and the database, and ends with status 0', async () => {
    expect(await start.end('SIGTERM')).toBe(0)
    expect(processesIn(folder)).toEqual([])
  })

  it('started again, finds the data of before and installs and builds nothing', async () => {
    start = startEmberline(folder, port)
    await start.waitFor(READY)
    expect(start.output()).not.toMatch(/Installing|Building|Making/)
    expect((await signIn(start)).group.id).toBe(groupId)
  })

  it('killed without a chance to stop, is put right by the next start', async () => {
    const { pid } = JSON.parse(readFileSync(join(folder, '.data', 'running.json'), 'utf8')) as { pid: number }
    process.kill(pid, 'SIGKILL')
    await start.status
    start = startEmberline(folder, port)
    await start.waitFor(READY)
    expect(start.output()).toContain('The database was still running')
    expect((await signIn(start)).group.id).toBe(groupId)
    expect(await start.end('SIGINT')).toBe(0)
    expect(processesIn(folder)).toEqual([])
  })
})
