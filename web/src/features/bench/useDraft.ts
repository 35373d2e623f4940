/** The inputs on the Bench: the chosen revisions and what was changed in them, with undo, kept in the address. */
import { useCallback, useEffect, useMemo, useState } from 'react'
import type { CandidateInput, CandidateRevision, HistoryInput, HistoryRevision } from '#core/wire/index'
import { writeAddress } from './draft.ts'
import type { BenchAddress, Draft, TemperatureWindow } from './draft.ts'
import type { Chosen } from './revisions.ts'

/** Where the last look at the Bench is kept, so that leaving the page loses nothing. */
export const LAST_ADDRESS = 'emberline.bench'

const WRITE_AFTER_MS = 200
const MOST_STEPS = 200

export interface BenchInputs {
  history: HistoryInput
  candidate: CandidateInput
}

export interface DraftState extends BenchInputs {
  historyChanged: boolean
  candidateChanged: boolean
  window: TemperatureWindow
  setWindow(window: TemperatureWindow | null): void
  change(next: Partial<BenchInputs>): void
  undo(): void
  redo(): void
  canUndo: boolean
  canRedo: boolean
  /** Drops every change. */
  reset(): void
}

const same = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b)

/** A window that shows where this candidate is decided. */
export function usualWindow(candidate: CandidateInput): TemperatureWindow {
  const scale = candidate.mechanism === 'freeze-in-decay' ? candidate.parent.massGeV : candidate.massGeV
  const decisive = Math.min(Math.max(scale, 1e-2), 1e6)
  return { hotGeV: 10 ** Math.ceil(Math.log10(decisive) + 0.6), coldGeV: 1e-4 }
}

export function useDraft(
  address: BenchAddress,
  history: Chosen<HistoryRevision>,
  candidate: Chosen<CandidateRevision>,
): DraftState {
  const [steps, setSteps] = useState<{ list: Draft[]; at: number }>({ list: [address.draft], at: 0 })
  const [window, setWindow] = useState<TemperatureWindow | null>(address.window)
  const draft = steps.list[steps.at]!
  const historyInput = draft.history ?? history.revision.input
  const candidateInput = draft.candidate ?? candidate.revision.input

  const change = useCallback(
    (next: Partial<BenchInputs>) => {
      setSteps(({ list, at }) => {
        const changed: Draft = { ...list[at], ...next }
        if (changed.history && same(changed.history, history.revision.input)) delete changed.history
        if (changed.candidate && same(changed.candidate, candidate.revision.input)) delete changed.candidate
        const kept = [...list.slice(0, at + 1), changed].slice(-MOST_STEPS)
        return { list: kept, at: kept.length - 1 }
      })
    },
    [history, candidate],
  )
  const move = useCallback(
    (by: number) =>
      setSteps(({ list, at }) => ({ list, at: Math.max(0, Math.min(list.length - 1, at + by)) })),
    [],
  )

  const search = useMemo(
    () =>
      writeAddress({
        history: { recordId: history.recordId, number: history.revision.number },
        candidate: { recordId: candidate.recordId, number: candidate.revision.number },
        draft,
        window,
      }),
    [history, candidate, draft, window],
  )
  useEffect(() => {
    // Written past the router: a keystroke is no navigation, and the pages beneath need not hear of it.
    const timer = setTimeout(() => {
      globalThis.history.replaceState(globalThis.history.state, '', `/bench${search}`)
      sessionStorage.setItem(LAST_ADDRESS, search)
    }, WRITE_AFTER_MS)
    return () => clearTimeout(timer)
  }, [search])

  const usual = useMemo(() => usualWindow(candidate.revision.input), [candidate])
  return {
    history: historyInput,
    candidate: candidateInput,
    historyChanged: draft.history !== undefined,
    candidateChanged: draft.candidate !== undefined,
    window: window ?? usual,
    setWindow,
    change,
    undo: useCallback(() => move(-1), [move]),
    redo: useCallback(() => move(1), [move]),
    canUndo: steps.at > 0,
    canRedo: steps.at < steps.list.length - 1,
    reset: useCallback(() => setSteps({ list: [{}], at: 0 }), []),
  }
}
