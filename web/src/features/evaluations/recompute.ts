import type { AbundanceResult } from '#core/wire/index'
import type { RecomputeReply, RecomputeRequest } from '../../workers/recompute.worker.ts'

/** The core's answer in this browser, from a worker that lives as long as the question. */
export function recompute(request: RecomputeRequest): Promise<RecomputeReply> {
  const worker = new Worker(new URL('../../workers/recompute.worker.ts', import.meta.url), { type: 'module' })
  return new Promise<RecomputeReply>((resolve) => {
    worker.onmessage = ({ data }: MessageEvent<RecomputeReply>) => resolve(data)
    worker.onerror = () => resolve({ error: 'The computation could not be started in this browser.' })
    worker.postMessage(request)
  }).finally(() => worker.terminate())
}

export interface Agreement {
  relativeDifference: number
  /** max(1e-9, the stored numerical error), as the server allows. */
  allowed: number
  agrees: boolean
}

/** How far a number computed here lies from the stored one. */
export function agreement(
  omegaH2: number,
  stored: Pick<AbundanceResult, 'omegaH2' | 'numericalError'>,
): Agreement {
  const allowed = Math.max(1e-9, stored.numericalError)
  const relativeDifference =
    omegaH2 === stored.omegaH2 ? 0 : Math.abs(omegaH2 - stored.omegaH2) / Math.abs(stored.omegaH2)
  return { relativeDifference, allowed, agrees: relativeDifference <= allowed }
}
