/** `npm run dev`: the database and demo group of `npm start`, with the api and the web app reloading as they change. */
import { demoSignInLines, mailPageLines } from './setup/demoSignIns.mjs'
import { freePortFrom } from './setup/freePort.mjs'
import { fillDatabase, prepare } from './setup/prepare.mjs'
import { runProgram } from './setup/program.mjs'
import { LISTENING, firstGroupLines, startServer } from './setup/serverProcess.mjs'
import { isStopping } from './setup/stopping.mjs'
import { Trouble } from './setup/trouble.mjs'

const say = console.log

const FIRST_API_PORT = 4500
const LOOPBACK = '127.0.0.1'
const PROGRAMS = {
  migrate: ['--import', 'tsx', 'db/migrate.ts'],
  seed: ['--import', 'tsx', 'db/seed/seed.ts'],
}
const VITE = ['node_modules/vite/bin/vite.js', '--clearScreen', 'false']
const VITE_READY = /Local:\s+(http\S+)/

async function startApi({ environment, publicUrl, port }) {
  return startServer({
    args: ['--watch', '--import', 'tsx', 'api/server.ts'],
    environment: { ...environment, EMBERLINE_PORT: String(port), EMBERLINE_PUBLIC_URL: publicUrl },
    ready: LISTENING,
  })
}

async function startVite({ webPort, apiPort }) {
  return startServer({
    args: [...VITE, '--port', String(webPort)],
    environment: { ...process.env, NO_COLOR: '1', EMBERLINE_API_PORT: String(apiPort) },
    ready: VITE_READY,
  })
}

async function main() {
  const prepared = await prepare({ command: 'npm run dev', say })
  if (prepared.running !== undefined) {
    const { address, command, pid } = prepared.running
    throw new Trouble(
      `Emberline is already running at ${address} (${command}, process ${pid}); both use one database. Stop that one first.`,
    )
  }
  const { settings, ownerUrl, environment, announce } = prepared
  await fillDatabase({ ownerUrl, demo: settings.demo, programs: PROGRAMS, say })
  const webPort = await freePortFrom(settings.port, LOOPBACK)
  const apiPort = await freePortFrom(FIRST_API_PORT, LOOPBACK)
  const publicUrl = `http://${LOOPBACK}:${webPort}`
  const api = await startApi({ environment, publicUrl, port: apiPort })
  const vite = await startVite({ webPort, apiPort })
  announce(vite.address)
  say(`\nEmberline, reloading as you edit, is at ${vite.address}`)
  for (const line of firstGroupLines(api.said)) say(line)
  for (const line of mailPageLines({
    address: vite.address,
    demo: settings.demo,
    environment: process.env,
  }))
    say(line)
  say([...(await demoSignInLines(api.address)), '\nCtrl-C stops everything.'].join('\n'))
  await Promise.race([api.exited, vite.exited])
  if (!isStopping()) throw new Trouble('One of the two servers ended by itself; stopping the rest.')
  return 0
}

await runProgram(main, { statusAfterSignal: 0, onSignal: () => say('\nStopping') })
