/** Asks the worker one question at a time; of those that wait only the newest is kept. */
import type { BenchAnswer, BenchRequest } from '#core/bench/types'
import type { BenchQuestion, BenchReply } from '../../workers/bench.worker.ts'

/** The part of a Worker that is needed, so that tests can stand in for it. */
export interface WorkerPort {
  onmessage: ((event: MessageEvent<BenchReply>) => void) | null
  onerror: ((event: ErrorEvent) => void) | null
  postMessage(question: BenchQuestion): void
  terminate(): void
}

export interface BenchClient {
  ask(request: BenchRequest): void
  close(): void
}

export const startWorker = (): WorkerPort =>
  new Worker(new URL('../../workers/bench.worker.ts', import.meta.url), { type: 'module' })

export function benchClient(
  port: WorkerPort,
  onAnswer: (answer: BenchAnswer, request: BenchRequest) => void,
): BenchClient {
  let lastId = 0
  let underWay: BenchQuestion | null = null
  let waiting: BenchRequest | null = null

  const send = (request: BenchRequest): void => {
    underWay = { id: ++lastId, request }
    port.postMessage(underWay)
  }
  const settle = (answer: BenchAnswer): void => {
    const asked = underWay
    underWay = null
    const next = waiting
    waiting = null
    if (next) send(next)
    else if (asked) onAnswer(answer, asked.request)
  }
  port.onmessage = ({ data }) => {
    if (data.id === underWay?.id) settle(data.answer)
  }
  port.onerror = (event) => settle({ status: 'failed', reason: event.message })
  return {
    ask(request) {
      if (underWay) waiting = request
      else send(request)
    },
    close: () => port.terminate(),
  }
}
