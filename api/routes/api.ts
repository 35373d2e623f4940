import cookieParser from 'cookie-parser'
import express from 'express'
import type { Router } from 'express'
import type { AppDependencies } from '../dependencies.ts'
import { notFound } from '../errors/problemError.ts'
import { mailQueue } from '../mail/mailQueue.ts'
import { sameOrigin } from '../middleware/sameOrigin.ts'
import { findCaller } from '../middleware/caller.ts'
import { GUEST_OPENINGS_PER_MINUTE, addressLimit, requestLimit } from '../middleware/requestLimit.ts'
import { sessionCookie } from '../middleware/sessionCookie.ts'
import { visitors } from '../middleware/visitor.ts'
import { apiDocument } from '../openapi/document.ts'
import { keyRing } from '../secrets/keyRing.ts'
import { sealer } from '../secrets/sealer.ts'
import { accountService } from '../services/accounts.ts'
import { attemptCounter } from '../services/attempts.ts'
import { auditService } from '../services/audit.ts'
import { computing } from '../services/computing.ts'
import { evaluationService } from '../services/evaluations.ts'
import { guestLinkService } from '../services/guestLinks.ts'
import { firstGroupService } from '../services/firstGroup.ts'
import { invitationService } from '../services/invitations.ts'
import { keyService } from '../services/keys.ts'
import { knownDevices } from '../services/knownDevices.ts'
import { linksFrom } from '../services/links.ts'
import { candidateService, historyService } from '../services/records.ts'
import { secondFactorService } from '../services/secondFactor.ts'
import { sessionService } from '../services/sessions.ts'
import { sessionTokens } from '../services/token.ts'
import { accountRoutes } from './account.ts'
import { auditRoutes } from './audit.ts'
import { candidateRoutes } from './candidates.ts'
import { computeRoutes } from './compute.ts'
import { evaluationRoutes } from './evaluations.ts'
import { guestLinkRoutes } from './guestLinks.ts'
import { historyRoutes } from './histories.ts'
import { infoRoutes } from './info.ts'
import { keyRoutes } from './keys.ts'
import { invitationRoutes } from './invitations.ts'
import { sessionRoutes } from './session.ts'

/** Everything below /api. */
export function apiRoutes(dependencies: AppDependencies): Router {
  const {
    db,
    queue,
    publicUrl,
    sessionSecret,
    demoSignIns,
    attemptLimits,
    computeLimits,
    requestsPerMinute,
    origin,
  } = dependencies
  const https = publicUrl?.protocol === 'https:'
  const cookie = sessionCookie(https)
  const entrance = visitors(cookie, https)
  const seals = sealer(sessionSecret)
  const mail = mailQueue(queue, seals)
  const links = linksFrom(origin)
  const attempts = attemptCounter(db)
  const factors = secondFactorService({ db, sealer: seals, mail, attempts })
  const sessions = sessionService({
    db,
    tokens: sessionTokens(keyRing(db, seals)),
    attempts,
    limits: attemptLimits,
    devices: knownDevices(sessionSecret),
    factors,
  })
  const accounts = accountService({ db, queue, sealer: seals, mail, links, attempts, factors })
  const invitations = invitationService({ db, mail, links, attempts, sessions, factors })
  const firstGroup = firstGroupService({ db, mail, links, sessions })

  const v1 = express.Router()
  const keys = keyService(db)
  v1.use(cookieParser(), findCaller(cookie, { session: sessions.find, key: keys.find }))
  v1.use(requestLimit(requestsPerMinute))
  infoRoutes(v1, db, demoSignIns)
  sessionRoutes(v1, sessions, cookie, entrance)
  accountRoutes(v1, accounts, factors, sessions, entrance)
  invitationRoutes(v1, invitations, firstGroup, entrance)
  historyRoutes(v1, historyService(db))
  candidateRoutes(v1, candidateService(db))
  evaluationRoutes(v1, evaluationService(db))
  computeRoutes(v1, computing(computeLimits))
  keyRoutes(v1, keys)
  guestLinkRoutes(v1, guestLinkService(db), addressLimit(GUEST_OPENINGS_PER_MINUTE))
  auditRoutes(v1, auditService(db))

  const api = express.Router()
  api.use((_req, res, next) => {
    res.setHeader('cache-control', 'no-store')
    next()
  })
  api.use(sameOrigin(publicUrl?.origin ?? null))
  api.get('/openapi.json', (_req, res) => void res.json(apiDocument()))
  api.use('/v1', v1)
  api.use((_req, _res, next) => next(notFound('endpoint')))
  return api
}
