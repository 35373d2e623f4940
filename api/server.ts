import type { Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { connect } from '#db/database'
import type { Database } from '#db/database'
import { jobQueue } from '#db/queue/jobQueue'
import { readDemoGroup } from '#db/seed/demoData'
import type { Logger } from 'pino'
import { createApp } from './app.ts'
import { EnvironmentError, readEnvironment } from './env.ts'
import type { Environment } from './env.ts'
import { runJobs } from './jobs/jobs.ts'
import { createLogger } from './logger.ts'
import { smtpSender } from './mail/sender.ts'
import type { MailSender } from './mail/sender.ts'
import type { MailSink } from './mail/sink.ts'
import { USUAL_REQUESTS_PER_MINUTE } from './middleware/requestLimit.ts'
import { DEFAULT_COMPUTE_LIMITS } from './services/computing.ts'
import { sealer } from './secrets/sealer.ts'
import { DEFAULT_ATTEMPT_LIMITS, attemptCounter } from './services/attempts.ts'
import { firstGroupLink } from './services/firstGroup.ts'
import { linksFrom } from './services/links.ts'
import type { Links } from './services/links.ts'

/** How long requests under way may take to finish after a signal, milliseconds. */
const PATIENCE_MS = 10_000
/** How long jobs under way may take after that, before they are given back to the queue. */
const JOB_PATIENCE_MS = 3_000

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

/** Where mails go: the mail server set, or in demo mode a sink of our own; nowhere yet when neither. */
async function openMail(env: Environment): Promise<{ sender: MailSender | null; sink: MailSink | null }> {
  if (env.mail !== null) return { sender: smtpSender(env.mail.url, env.mail.from), sink: null }
  if (!env.demo) return { sender: null, sink: null }
  const { startMailSink } = await import('./mail/sink.ts')
  const sink = await startMailSink()
  return { sender: smtpSender(sink.url, 'Emberline <emberline@demo.example>'), sink }
}

/** Stops accepting, lets requests and jobs under way finish, closes the database, and leaves with status 0. */
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

function addressOf(server: Server, host: string): string {
  const { port } = server.address() as AddressInfo
  return `http://${host.includes(':') ? `[${host}]` : host}:${port}`
}

/** On an empty database, says where the first group is made: to whoever reads this output, and nobody else. */
async function offerFirstGroup(db: Database, links: Links, logger: Logger): Promise<void> {
  try {
    const link = await firstGroupLink(db, links)
    if (link !== null) console.log(`there is no group yet; make the first at ${link}`)
  } catch (error) {
    logger.error({ err: error }, 'whether there is a group could not be seen; start again to be offered one')
  }
}

async function main(): Promise<void> {
  const env = environmentOrExit()
  const logger = createLogger(env.logLevel)
  const { db, close } = connect(env.databaseUrl, (error) =>
    logger.warn({ err: error }, 'lost an idle connection'),
  )
  const queue = jobQueue(env.databaseUrl, (error) => logger.warn({ err: error }, 'trouble with the queue'))
  const { sender, sink } = await openMail(env)
  const people = env.demo ? (await readDemoGroup()).people : null
  let address = ''
  const origin = (): string => env.publicUrl?.origin ?? address
  const app = createApp({
    ...env,
    db,
    queue,
    logger,
    mailSink: sink,
    demoSignIns: people,
    requestsPerMinute: USUAL_REQUESTS_PER_MINUTE,
    computeLimits: DEFAULT_COMPUTE_LIMITS,
    attemptLimits: DEFAULT_ATTEMPT_LIMITS,
    origin,
  })
  const server = await listen(app, env.host, env.port)
  address = addressOf(server, env.host)
  const ended = new AbortController()
  const links = linksFrom(origin)
  const attempts = attemptCounter(db)
  const jobs = runJobs(
    { db, queue, sealer: sealer(env.sessionSecret), links, attempts, sender, logger },
    ended.signal,
  )
  const closeAll = async (): Promise<void> => {
    ended.abort()
    await jobs
    await queue.stop(JOB_PATIENCE_MS)
    await sink?.stop()
    await close()
  }
  stopOnSignal(server, closeAll, logger)
  await offerFirstGroup(db, links, logger)
  console.log(`listening on ${address}`)
}

await main()
