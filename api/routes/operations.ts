import { ping } from '#db/database'
import type { Database } from '#db/database'
import { isMigrated } from '#db/readiness'
import express from 'express'
import type { Response, Router } from 'express'

type Check = () => Promise<boolean>

const holds = (check: Check): Promise<'ok' | 'failing'> =>
  check().then(
    (yes) => (yes ? 'ok' : 'failing'),
    () => 'failing',
  )

/** An answer that holds now and must not be kept. */
const fresh = (res: Response): Response => res.setHeader('cache-control', 'no-store')

/**
 * For whatever keeps the server running. /healthz: the process answers; restart it if not. /readyz: it can work, with
 * each part named; send it no requests while it says 503.
 */
export function operationRoutes(db: Database, isQueueRunning: () => boolean): Router {
  const router = express.Router()
  const checks: Record<string, Check> = {
    database: () => ping(db).then(() => true),
    migrations: () => isMigrated(db),
    queue: async () => isQueueRunning(),
  }
  router.get('/healthz', (_req, res) => void fresh(res).json({ status: 'ok' }))
  router.get('/readyz', async (_req, res) => {
    const parts = await Promise.all(
      Object.entries(checks).map(async ([name, check]) => [name, await holds(check)] as const),
    )
    const ready = parts.every(([, state]) => state === 'ok')
    fresh(res)
      .status(ready ? 200 : 503)
      .json({ status: ready ? 'ok' : 'failing', ...Object.fromEntries(parts) })
  })
  return router
}
