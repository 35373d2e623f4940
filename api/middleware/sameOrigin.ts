import type { Request, RequestHandler } from 'express'
import { ProblemError } from '../errors/problemError.ts'

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS'])

function cameFromHere(req: Request, publicOrigin: string | null): boolean {
  const fetchSite = req.get('sec-fetch-site')
  if (fetchSite !== undefined) return fetchSite === 'same-origin'
  const origin = req.get('origin')
  if (origin === undefined) return true
  return origin === (publicOrigin ?? `${req.protocol}://${req.get('host') ?? ''}`)
}

/**
 * Refuses a change asked for by a page of another site. Browsers say where a request comes from; one that says
 * nothing at all is a script, which holds no one else's cookie.
 */
export const sameOrigin =
  (publicOrigin: string | null): RequestHandler =>
  (req, _res, next) => {
    if (SAFE_METHODS.has(req.method) || cameFromHere(req, publicOrigin)) {
      next()
      return
    }
    next(
      new ProblemError(
        'other-site',
        'Changes are taken from Emberline’s own pages only. Nothing was changed.',
      ),
    )
  }
