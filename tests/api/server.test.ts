import { spawn } from 'node:child_process'
import type { ChildProcessWithoutNullStreams } from 'node:child_process'
import { once } from 'node:events'
import { createInterface } from 'node:readline'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { freshDatabase } from '../support/database.ts'
import { SESSION_SECRET } from './support/harness.ts'

let database: Awaited<ReturnType<typeof freshDatabase>>
beforeAll(async () => {
  database = await freshDatabase()
})
afterAll(() => database.drop())

function startServer(environment: Record<string, string>): ChildProcessWithoutNullStreams {
  return spawn(process.execPath, ['--import', 'tsx', 'api/server.ts'], {
    env: { PATH: process.env['PATH'], EMBERLINE_LOG_LEVEL: 'silent', ...environment },
  })
}

async function addressOf(server: ChildProcessWithoutNullStreams): Promise<string> {
  for await (const line of createInterface({ input: server.stdout })) {
    const [, address] = /^listening on (http:\/\/127\.0\.0\.1:\d+)$/.exec(line) ?? []
    if (address !== undefined) return address
  }
  throw new Error('the server ended without listening')
}

describe('the server as a program', () => {
  it.each(['SIGTERM', 'SIGINT'] as const)(
    'says where it listens, answers, and ends with 0 on %s',
    async (signal) => {
      const server = startServer({
        EMBERLINE_DATABASE_URL: database.serverUrl,
        EMBERLINE_SESSION_SECRET: SESSION_SECRET,
        EMBERLINE_PORT: '0',
        EMBERLINE_DEMO: '1',
      })
      const ended = once(server, 'exit')
      const address = await addressOf(server)
      expect((await fetch(`${address}/api/v1/health`)).status).toBe(200)
      const info = (await (await fetch(`${address}/api/v1/info`)).json()) as {
        demoSignIns: { role: string }[]
      }
      expect(info.demoSignIns.map(({ role }) => role)).toEqual(['lead', 'author', 'reader'])
      server.kill(signal)
      expect(await ended).toEqual([0, null])
    },
  )

  it('ends with 2 and the names at fault when the environment does not fit', async () => {
    const server = startServer({ EMBERLINE_PORT: 'many' })
    const ended = once(server, 'exit')
    let complaint = ''
    for await (const chunk of server.stderr) complaint += String(chunk)
    expect(await ended).toEqual([2, null])
    expect(complaint).toMatch(
      /EMBERLINE_DATABASE_URL: missing[^]+EMBERLINE_SESSION_SECRET: missing[^]+EMBERLINE_PORT/,
    )
  })
})
