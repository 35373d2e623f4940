import { useEffect, useRef, useState } from 'react'
import type { BenchAnswer, BenchReport, BenchRequest } from '#core/bench/types'
import type { Fault } from '#core/wire/index'
import { benchClient, startWorker } from './benchWorker.ts'
import type { BenchClient } from './benchWorker.ts'

export interface BenchView {
  /** The last good report, kept on screen while a fault stands. */
  report: BenchReport | null
  /** What was asked for that report. */
  request: BenchRequest | null
  faults: readonly Fault[]
  failure: string | null
}

const EMPTY: BenchView = { report: null, request: null, faults: [], failure: null }

function viewAfter(view: BenchView, answer: BenchAnswer, request: BenchRequest): BenchView {
  if (answer.status === 'done') return { report: answer.report, request, faults: [], failure: null }
  if (answer.status === 'refused') return { ...view, faults: answer.faults, failure: null }
  return { ...view, faults: [], failure: answer.reason }
}

/** The answer to a request, recomputed in a worker whenever the request changes. */
export function useBenchAnswer(request: BenchRequest | null): BenchView {
  const [view, setView] = useState(EMPTY)
  const client = useRef<BenchClient | null>(null)

  useEffect(() => {
    const made = benchClient(startWorker(), (answer, asked) =>
      setView((before) => viewAfter(before, answer, asked)),
    )
    client.current = made
    return () => {
      made.close()
      client.current = null
    }
  }, [])

  useEffect(() => {
    if (request) client.current?.ask(request)
  }, [request])
  return view
}
