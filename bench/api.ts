/** The round trip of an evaluation: the server of this repository on a throw-away database, asked over loopback. */
import { spawn } from 'node:child_process'
import type { ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { createInterface } from 'node:readline'
import type { AddressInfo } from 'node:net'
import type { Bench } from 'tinybench'
import { createApp } from '#api/app'
import { createLogger } from '#api/logger'
import { DEFAULT_ATTEMPT_LIMITS } from '#api/services/attempts'
import { connect } from '#db/database'
import { jobQueue } from '#db/queue/jobQueue'
import { migrate } from '#db/migrate'
import { readDemoData } from '#db/seed/demoData'
import { seedDemo } from '#db/seed/seed'
import type { HistorySummary, CandidateSummary } from '#core/wire/index'

interface Cluster {
  ownerUrl: string
  serverUrl: string
}

async function startCluster(): Promise<{ cluster: Cluster; child: ChildProcess }> {
  const child = spawn(process.execPath, ['scripts/test-database.mjs'], { stdio: ['pipe', 'pipe', 'inherit'] })
  const [line] = (await once(createInterface({ input: child.stdout! }), 'line')) as [string]
  return { cluster: JSON.parse(line) as Cluster, child }
}

/** A signed-in client of the running server. */
async function signedIn(
  url: string,
): Promise<(method: string, path: string, body?: unknown) => Promise<unknown>> {
  const { group } = await readDemoData()
  const author = group.people.find((person) => person.role === 'author')!
  const headers = { 'content-type': 'application/json' }
  const answer = await fetch(`${url}/api/v1/session`, {
    method: 'POST',
    headers,
    body: JSON.stringify({ email: author.email, password: author.password }),
  })
  const cookie = answer.headers
    .getSetCookie()
    .map((each) => each.split(';')[0])
    .join('; ')
  return async (method, path, body) => {
    const response = await fetch(`${url}/api/v1${path}`, {
      method,
      headers: { ...headers, cookie },
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    })
    if (!response.ok) throw new Error(`${method} ${path}: ${response.status} ${await response.text()}`)
    return response.json()
  }
}

/** Adds the round trips to the bench; the returned function ends server and database. */
export async function addApiBenchmarks(bench: Bench): Promise<() => Promise<void>> {
  const { cluster, child } = await startCluster()
  await migrate(cluster.ownerUrl)
  await seedDemo(cluster.ownerUrl)
  const { db, close } = connect(cluster.serverUrl, () => undefined)
  const app = createApp({
    db,
    queue: jobQueue(cluster.serverUrl, () => undefined),
    logger: createLogger('silent'),
    sessionSecret: 'a secret of this measurement, used once'.padEnd(48, '.'),
    publicUrl: null,
    mailSink: null,
    webRoot: 'dist/web',
    demoSignIns: null,
    requestsPerMinute: 1e9,
    computeLimits: { running: 4, waiting: 1000 },
    attemptLimits: DEFAULT_ATTEMPT_LIMITS,
    origin: () => 'http://127.0.0.1',
  })
  const server = app.listen(0, '127.0.0.1')
  await once(server, 'listening')
  const ask = await signedIn(`http://127.0.0.1:${(server.address() as AddressInfo).port}`)
  const { items: histories } = (await ask('GET', '/histories')) as { items: HistorySummary[] }
  const { items: candidates } = (await ask('GET', '/candidates')) as { items: CandidateSummary[] }
  const history = histories.find(
    (each) => each.head.input.bath.treatment === 'fit-2018' && each.head.input.expansion.kind === 'radiation',
  )!
  const candidate = candidates.find((each) => each.head.input.mechanism === 'freeze-out')!
  const stored = { historyRevisionId: history.head.id, candidateRevisionId: candidate.head.id }
  const computed = { history: history.head.input, candidate: candidate.head.input }
  bench.add('API: compute an abundance', async () => void (await ask('POST', '/compute/abundance', computed)))
  bench.add('API: store an evaluation', async () => void (await ask('POST', '/evaluations', stored)))
  return async () => {
    server.close()
    server.closeAllConnections()
    await close()
    child.stdin?.end()
    await once(child, 'exit')
  }
}
