import type { Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { connect } from '#db/database'
import { readDemoGroup } from '#db/seed/demoData'
import type { Logger } from 'pino'
import { createApp } from './app.ts'
import { EnvironmentError, readEnvironment } from './env.ts'
import type { Environment } from './env.ts'
import { createLogger } from './logger.ts'
import { USUAL_REQUESTS_PER_MINUTE } from './middleware/requestLimit.ts'
import { DEFAULT_SIGN_IN_LIMITS } from './middleware/signInLimit.ts'

/** How long requests under way may take to finish after a signal, milliseconds. */
const PATIENCE_MS = 10_000

function environmentOrExit(): Environment {
  try {
    return readEnvironment(process.env)
  } catch (error) {
    if (!(error instanceof EnvironmentError)) throw error
    console.error(error.message)
    process.exit(2)
  }
}

function listen(app: ReturnType<typeof createApp>, host: string, port: number): Promise<Server> {
  return new Promise((resolve, reject) => {
    const server = app.listen(port, host, (error?: Error) => (error ? reject(error) : resolve(server)))
  })
}

/** Stops accepting, lets requests under way finish, closes the database, and leaves with status 0. */
function stopOnSignal(server: Server, close: () => Promise<void>, logger: Logger): void {
  const stop = (signal: string): void => {
    logger.info({ signal }, 'stopping')
    setTimeout(() => server.closeAllConnections(), PATIENCE_MS).unref()
    server.close(() => void close().then(() => process.exit(0)))
    server.closeIdleConnections()
  }
  process.once('SIGTERM', stop)
  process.once('SIGINT', stop)
}

async function main(): Promise<void> {
  const env = environmentOrExit()
  const logger = createLogger(env.logLevel)
  const { db, close } = connect(env.databaseUrl, (error) =>
    logger.warn({ err: error }, 'lost an idle connection'),
  )
  const people = env.demo ? (await readDemoGroup()).people : null
  const app = createApp({
    ...env,
    db,
    logger,
    demoSignIns: people,
    signInLimits: DEFAULT_SIGN_IN_LIMITS,
    requestsPerMinute: USUAL_REQUESTS_PER_MINUTE,
  })
  const server = await listen(app, env.host, env.port)
  stopOnSignal(server, close, logger)
  const { port } = server.address() as AddressInfo
  const host = env.host.includes(':') ? `[${env.host}]` : env.host
  console.log(`listening on http://${host}:${port}`)
}

await main()
