/** Computes a stored evaluation again, with the core this browser has loaded. */
import { computeAbundance, CORE_VERSION } from '#core/index'
import type { CandidateInput, HistoryInput } from '#core/wire/index'

export interface RecomputeRequest {
  history: HistoryInput
  candidate: CandidateInput
}

export type RecomputeReply =
  { omegaH2: number; numericalError: number; coreVersion: string } | { error: string }

const scope = self as unknown as {
  onmessage: ((event: MessageEvent<RecomputeRequest>) => void) | null
  postMessage(message: RecomputeReply): void
}

function reply(request: RecomputeRequest): RecomputeReply {
  try {
    const { omegaH2, numericalError } = computeAbundance(request)
    return { omegaH2, numericalError, coreVersion: CORE_VERSION }
  } catch (error) {
    return { error: error instanceof Error ? error.message : String(error) }
  }
}

scope.onmessage = ({ data }) => scope.postMessage(reply(data))
