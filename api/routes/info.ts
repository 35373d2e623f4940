import { CORE_VERSION } from '#core/index'
import type { PublicInfo } from '#core/wire/index'
import { ping } from '#db/database'
import { awaitsFirstGroup } from '#db/queries/firstGroup'
import type { Database } from '#db/database'
import type { Router } from 'express'
import { healthEndpoint, infoEndpoint } from '../endpoints/info.ts'
import { ProblemError } from '../errors/problemError.ts'
import { mount } from './mount.ts'

export function infoRoutes(
  router: Router,
  db: Database,
  demoSignIns: PublicInfo['demoSignIns'] | null,
): void {
  mount(router, healthEndpoint, async ({ req }) => {
    await ping(db).catch((error: unknown) => {
      req.log.error({ err: error }, 'the database does not answer')
      throw new ProblemError('database-away', 'The server is up, its database is not. Try again in a moment.')
    })
    return { status: 'ok' as const }
  })

  mount(router, infoEndpoint, async () => ({
    coreVersion: CORE_VERSION,
    awaitsFirstGroup: await awaitsFirstGroup(db),
    demo: demoSignIns !== null,
    demoSignIns: demoSignIns ?? [],
  }))
}
