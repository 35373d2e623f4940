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

/** What came of a question: an answer, or a worker that broke down over it. */
export type BenchOutcome = BenchAnswer | { status: 'broken'; reason: string }

export interface BenchClient {
  ask(request: BenchRequest): void
  close(): void
}

export const startWorker = (): WorkerPort =>
  new Worker(new URL('../../workers/bench.worker.ts', import.meta.url), { type: 'module' })

/** A worker that could not be loaded gives no message. */
const reasonOf = ({ message }: ErrorEvent): string =>
  message ? message : 'it could not be loaded; the connection may be lost, or Emberline was updated'

export function benchClient(
  start: () => WorkerPort,
  onOutcome: (outcome: BenchOutcome, request: BenchRequest) => void,
): BenchClient {
  let port: WorkerPort | null = null
  let lastId = 0
  let underWay: BenchQuestion | null = null
  let waiting: BenchRequest | null = null

  const open = (): WorkerPort => {
    const opened = start()
    opened.onmessage = ({ data }) => {
      if (data.id === underWay?.id) settle(data.answer)
    }
    opened.onerror = (event) => {
      // It will answer nothing any more, not even what waits: the next question starts another.
      close()
      const asked = waiting ?? underWay?.request
      underWay = null
      waiting = null
      if (asked) onOutcome({ status: 'broken', reason: reasonOf(event) }, asked)
    }
    return opened
  }
  const close = (): void => {
    port?.terminate()
    port = null
  }
  const send = (request: BenchRequest): void => {
    underWay = { id: ++lastId, request }
    port ??= open()
    port.postMessage(underWay)
  }
  const settle = (answer: BenchAnswer): void => {
    const asked = underWay
    underWay = null
    const next = waiting
    waiting = null
    if (next) send(next)
    else if (asked) onOutcome(answer, asked.request)
  }
  return {
    ask(request) {
      if (underWay) waiting = request
      else send(request)
    },
    close,
  }
}
