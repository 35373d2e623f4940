import { useEffect, useRef, useState } from 'react'
import type { BenchReport, BenchRequest } from '#core/bench/types'
import type { Fault } from '#core/wire/index'
import { benchClient, startWorker } from './benchWorker.ts'
import type { BenchClient, BenchOutcome } from './benchWorker.ts'

export interface BenchView {
  /** The last good report, kept on screen while a fault stands. */
  report: BenchReport | null
  /** What was asked for that report. */
  request: BenchRequest | null
  faults: readonly Fault[]
  /** Why there is no number for the present input, though nothing is wrong with it. */
  failure: { of: 'convergence' | 'worker'; reason: string } | null
}

const EMPTY: BenchView = { report: null, request: null, faults: [], failure: null }

function viewAfter(view: BenchView, outcome: BenchOutcome, request: BenchRequest): BenchView {
  switch (outcome.status) {
    case 'done':
      return { report: outcome.report, request, faults: [], failure: null }
    case 'refused':
      return { ...view, faults: outcome.faults, failure: null }
    case 'failed':
      return { ...view, faults: [], failure: { of: 'convergence', reason: outcome.reason } }
    case 'broken':
      return { ...view, faults: [], failure: { of: 'worker', reason: outcome.reason } }
  }
}

/** The answer to a request, recomputed in a worker whenever the request changes. */
export function useBenchAnswer(request: BenchRequest): BenchView {
  const [view, setView] = useState(EMPTY)
  const client = useRef<BenchClient | null>(null)

  useEffect(() => {
    const made = benchClient(startWorker, (outcome, asked) =>
      setView((before) => viewAfter(before, outcome, asked)),
    )
    client.current = made
    return () => {
      made.close()
      client.current = null
    }
  }, [])

  useEffect(() => client.current?.ask(request), [request])
  return view
}
