import { CORE_VERSION, publishedValues } from '#core/index'
import type { Progress, Question } from '#core/index'
import type { BatchResult } from '#core/wire/index'
import type { Request, Response, Router } from 'express'
import {
  computeAbundanceEndpoint,
  computeAttributeEndpoint,
  computeBatchEndpoint,
  computeConvertEndpoint,
  computeHistoryEndpoint,
  computeLaboratoryEndpoint,
  computePropagateEndpoint,
  computeSolveEndpoint,
  publishedValuesEndpoint,
} from '../endpoints/compute.ts'
import { problemDocument, problemDocumentOf } from '../errors/sendProblem.ts'
import { problemOf } from '../errors/problemOf.ts'
import { requestIdOf } from '../middleware/requestId.ts'
import type { Computing } from '../services/computing.ts'
import { mount } from './mount.ts'

const LINES = 'application/x-ndjson'

/** Least time between two lines of progress, ms. */
const PROGRESS_EVERY_MS = 100

/** Aborted when the client goes before it is answered. */
function whileHere(res: Response): AbortSignal {
  const controller = new AbortController()
  res.on('close', () => {
    if (!res.writableFinished) controller.abort(new ClientGone())
  })
  return controller.signal
}

/** Why a computation was given up: nobody waits for it. */
class ClientGone extends Error {}

/** Writes progress as it comes, then the result or the problem; the status is told by the last line. */
async function writeLines(
  res: Response,
  ask: (onProgress: (progress: Progress) => void) => Promise<unknown>,
): Promise<void> {
  res.type(LINES)
  const line = (value: object): void => void res.write(`${JSON.stringify(value)}\n`)
  let last = 0
  try {
    const result = await ask((progress) => {
      const now = performance.now()
      if (now - last < PROGRESS_EVERY_MS) return
      last = now
      line({ progress })
    })
    line({ result })
  } catch (error) {
    if (error instanceof ClientGone) return
    const foreseen = problemOf(error)
    if (foreseen === null) throw error
    line({ problem: problemDocument(foreseen, requestIdOf(res)) })
  }
  res.end()
}

export function computeRoutes(router: Router, computing: Computing): void {
  /** One question, answered whole or by lines; nothing is answered to who has gone. */
  const ask =
    (question: Question) =>
    async ({ body, req, res }: { body: unknown; req: Request; res: Response }): Promise<never> => {
      const signal = whileHere(res)
      const answer = (onProgress?: (progress: Progress) => void): Promise<unknown> =>
        computing.answer(question, body, onProgress ? { signal, onProgress } : { signal })
      if (req.accepts(['application/json', LINES]) === LINES) {
        await writeLines(res, answer)
        return undefined as never
      }
      try {
        return (await answer()) as never
      } catch (error) {
        if (error instanceof ClientGone) return undefined as never
        throw error
      }
    }

  mount(router, computeHistoryEndpoint, ask('history'))
  mount(router, computeAbundanceEndpoint, ask('abundance'))
  mount(router, computeSolveEndpoint, ask('solve'))
  mount(router, computeAttributeEndpoint, ask('attribute'))
  mount(router, computePropagateEndpoint, ask('propagate'))
  mount(router, computeConvertEndpoint, ask('convert'))
  mount(router, computeLaboratoryEndpoint, ask('laboratory'))

  mount(router, computeBatchEndpoint, async ({ body, req, res }) => {
    const signal = whileHere(res)
    const items: BatchResult['items'] = []
    for (const { what, input } of body.items) {
      try {
        items.push({ status: 'done', result: await computing.answer(what, input, { signal }) })
      } catch (error) {
        if (error instanceof ClientGone) break
        const problem = problemDocumentOf(error, requestIdOf(res))
        if (problem.status >= 500) req.log.error({ err: error }, 'unforeseen error in a batch')
        items.push({ status: 'failed', problem })
      }
    }
    return { items }
  })

  mount(router, publishedValuesEndpoint, async () => ({
    coreVersion: CORE_VERSION,
    values: [...publishedValues()],
  }))
}
