/** Answers the Bench from the same core as the server. */
import { benchAnswer } from '#core/index'
import type { BenchAnswer, BenchRequest } from '#core/index'

export interface BenchQuestion {
  id: number
  request: BenchRequest
}

export interface BenchReply {
  id: number
  answer: BenchAnswer
}

const scope = self as unknown as {
  onmessage: ((event: MessageEvent<BenchQuestion>) => void) | null
  postMessage(message: BenchReply, transfer: Transferable[]): void
}

/** The buffers of all curves, each once: they are handed over, not copied. */
function buffersOf(answer: BenchAnswer): ArrayBuffer[] {
  if (answer.status !== 'done') return []
  const arrays = Object.values(answer.report as unknown as Record<string, unknown>).flatMap((value) =>
    value !== null &&
    typeof value === 'object' &&
    'temperatureGeV' in value &&
    value.temperatureGeV instanceof Float64Array &&
    'value' in value &&
    value.value instanceof Float64Array
      ? [value.temperatureGeV, value.value]
      : [],
  )
  return [...new Set(arrays.map((array) => array.buffer as ArrayBuffer))]
}

function answerTo(request: BenchRequest): BenchAnswer {
  try {
    return benchAnswer(request)
  } catch (error) {
    return { status: 'failed', reason: error instanceof Error ? error.message : String(error) }
  }
}

scope.onmessage = ({ data }) => {
  const answer = answerTo(data.request)
  scope.postMessage({ id: data.id, answer }, buffersOf(answer))
}
