/**
 * `npm start`: from a fresh clone to a server with its address printed. Needs nothing but Node.js until the packages
 * are installed, and stops the server and its database on Ctrl-C and SIGTERM.
 */
import { join } from 'node:path'
import { buildServer, buildWeb } from './setup/build.mjs'
import { demoSignInLines, mailPageLines } from './setup/demoSignIns.mjs'
import { freePortFrom } from './setup/freePort.mjs'
import { fillDatabase, prepare } from './setup/prepare.mjs'
import { runProgram } from './setup/program.mjs'
import { inProject } from './setup/project.mjs'
import { LISTENING, firstGroupLines, startServer } from './setup/serverProcess.mjs'
import { isStopping } from './setup/stopping.mjs'
import { Trouble } from './setup/trouble.mjs'

const say = console.log

const PROGRAMS = { migrate: ['dist/server/migrate.js'], seed: ['dist/server/seed.js'] }
const SERVER = [
  '--enable-source-maps',
  '--import',
  './scripts/setup/endWithLauncher.mjs',
  'dist/server/server.js',
]

async function choosePort({ port, host }) {
  const free = await freePortFrom(port, host)
  if (port !== 0 && free !== port) say(`Port ${port} is taken by another program; using ${free}`)
  return free
}

async function sayWhere({ address, said, publicUrl, logFile, demo }) {
  say(`\nEmberline is ready at ${address}`)
  if (publicUrl) say(`and, for everybody else, at ${publicUrl}`)
  for (const line of firstGroupLines(said)) say(line)
  for (const line of mailPageLines({ address, demo, environment: process.env })) say(line)
  const signIns = await demoSignInLines(address)
  if (signIns.length > 0) say(['\nDemo sign-ins (made-up people):', ...signIns].join('\n'))
  say(`\n${logFile === undefined ? '' : `The server's log is ${logFile}. `}Ctrl-C stops Emberline.`)
}

async function main() {
  const prepared = await prepare({ command: 'npm start', say })
  if (prepared.running !== undefined) {
    const { address, command, pid } = prepared.running
    say(`Emberline is already running at ${address} (${command}, process ${pid}); nothing to do`)
    return 0
  }
  const { settings, dataFolder, ownerUrl, environment, announce } = prepared
  await buildWeb({ say })
  await buildServer({ say })
  await fillDatabase({ ownerUrl, demo: settings.demo, programs: PROGRAMS, say })
  const port = await choosePort(settings)
  // A server run for real has its log collected from standard output; here the lines above are for reading.
  const logFile = settings.databaseUrl === undefined ? join(dataFolder, 'server.log') : undefined
  const { address, said, exited } = await startServer({
    args: SERVER,
    environment: {
      ...environment,
      NODE_ENV: 'production',
      EMBERLINE_PORT: String(port),
      EMBERLINE_WEB_ROOT: process.env.EMBERLINE_WEB_ROOT ?? inProject('dist', 'web'),
    },
    ready: LISTENING,
    logFile,
  })
  announce(address)
  await sayWhere({ address, said, publicUrl: process.env.EMBERLINE_PUBLIC_URL, logFile, demo: settings.demo })
  await exited
  if (!isStopping())
    throw new Trouble('The server ended by itself; the database is being stopped. See its log above.')
  return 0
}

await runProgram(main, {
  statusAfterSignal: 0,
  onSignal: () => say('\nStopping Emberline'),
})
