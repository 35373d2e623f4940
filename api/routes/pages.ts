import { resolve } from 'node:path'
import express from 'express'
import type { Router } from 'express'
import { notFound } from '../errors/problemError.ts'

/** The built web app: hashed assets for ever, index.html never cached, every other address is a page of the app. */
export function pageRoutes(webRoot: string): Router {
  const root = resolve(webRoot)
  const router = express.Router()
  router.use(
    '/assets',
    express.static(resolve(root, 'assets'), { immutable: true, maxAge: '1y', index: false }),
  )
  router.use('/assets', (_req, _res, next) => next(notFound('file')))
  router.use(express.static(root, { index: false, maxAge: 0 }))
  router.get('/{*page}', (_req, res, next) => {
    res.setHeader('cache-control', 'no-cache')
    res.sendFile('index.html', { root, cacheControl: false }, (error) => {
      if (error !== undefined && error !== null && !res.headersSent) next(notFound('page'))
    })
  })
  return router
}
