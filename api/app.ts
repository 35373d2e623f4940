import compression from 'compression'
import express from 'express'
import type { Express } from 'express'
import type { AppDependencies } from './dependencies.ts'
import { problemHandler } from './errors/sendProblem.ts'
import { requestId } from './middleware/requestId.ts'
import { requestLog } from './middleware/requestLog.ts'
import { securityHeaders } from './middleware/securityHeaders.ts'
import { apiRoutes } from './routes/api.ts'
import { mailSinkRoutes } from './routes/mailSink.ts'
import { operationRoutes } from './routes/operations.ts'
import { pageRoutes } from './routes/pages.ts'

/** Builds the server from what it depends on; listening is left to the caller. */
export function createApp(dependencies: AppDependencies): Express {
  const app = express()
  app.disable('x-powered-by')
  // A proxy on this machine is believed about the client's address and scheme; nobody else is.
  app.set('trust proxy', 'loopback')
  app.use(requestId, requestLog(dependencies.logger))
  app.use(securityHeaders(dependencies.publicUrl?.protocol === 'https:'))
  // What a group keeps here is nobody's to index, a guest's page least of all.
  app.use((_req, res, next) => {
    res.setHeader('x-robots-tag', 'noindex, nofollow')
    next()
  })
  app.use(compression())
  app.use('/api', apiRoutes(dependencies))
  app.use(operationRoutes(dependencies.db, dependencies.queue.isRunning))
  if (dependencies.mailSink !== null) app.use('/mail', mailSinkRoutes(dependencies.mailSink))
  app.use(pageRoutes(dependencies.webRoot))
  app.use(problemHandler)
  return app
}
