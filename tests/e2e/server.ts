/** The built product on a fresh database with the demo group, and a browser in front of it. */
import { spawn } from 'node:child_process'
import type { ChildProcess } from 'node:child_process'
import { randomBytes } from 'node:crypto'
import { chromium } from 'playwright-core'
import type { Browser } from 'playwright-core'
import { seedDemo } from '#db/seed/seed'
import { freshDatabase } from '../support/database.ts'

export interface RunningServer {
  url: string
  stop(): Promise<void>
}

function whenListening(child: ChildProcess): Promise<string> {
  return new Promise((resolve, reject) => {
    let output = ''
    const hear = (chunk: Buffer): void => {
      output += chunk.toString()
      const match = /listening on (http:\S+)/.exec(output)
      if (match) resolve(match[1]!)
    }
    child.stdout?.on('data', hear)
    child.stderr?.on('data', hear)
    child.once('exit', (code) => reject(new Error(`the server ended with ${code}: ${output}`)))
  })
}

export async function startServer(): Promise<RunningServer> {
  const database = await freshDatabase()
  await seedDemo(database.ownerUrl)
  const child = spawn(process.execPath, ['dist/server/server.js'], {
    stdio: ['ignore', 'pipe', 'pipe'],
    env: {
      ...process.env,
      EMBERLINE_DATABASE_URL: database.serverUrl,
      EMBERLINE_SESSION_SECRET: randomBytes(32).toString('hex'),
      EMBERLINE_HOST: '127.0.0.1',
      EMBERLINE_PORT: '0',
      EMBERLINE_DEMO: '1',
    },
  })
  const url = await whenListening(child)
  return {
    url,
    async stop() {
      const ended = new Promise((resolve) => child.once('exit', resolve))
      child.kill('SIGTERM')
      await ended
      await database.drop()
    },
  }
}

const ARGUMENTS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--disable-dev-shm-usage',
]

export const startBrowser = (): Promise<Browser> =>
  chromium.launch({ executablePath: '/usr/bin/chromium', args: ARGUMENTS })
