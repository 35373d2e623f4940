/** The inputs on the Bench: the chosen revisions and what was changed in them, with undo, kept in the address. */
import { useCallback, useEffect, useMemo, useState } from 'react'
import type { CandidateInput, CandidateRevision, HistoryInput, HistoryRevision } from '#core/wire/index'
import type { TemperatureWindow } from '../../components/charts/window.ts'
import { writeAddress } from './draft.ts'
import type { BenchAddress, Draft } from './draft.ts'
import type { Chosen } from './revisions.ts'
import type { Sitting } from './sitting.ts'
import { apart, changed, moved, opening } from './steps.ts'

const WRITE_AFTER_MS = 200

export interface BenchInputs {
  history: HistoryInput
  candidate: CandidateInput
}

/** What the Bench was opened with. */
export interface Opened {
  /** Another key is another opening: the steps begin anew. */
  key: string
  address: BenchAddress
  history: Chosen<HistoryRevision>
  candidate: Chosen<CandidateRevision>
  /** Whether the address in the browser is still that of this opening, so that it may be written. */
  settled: boolean
}

export interface DraftState extends BenchInputs {
  draft: Draft
  historyChanged: boolean
  candidateChanged: boolean
  window: TemperatureWindow
  /** All of it, as its address holds it. */
  address: BenchAddress
  search: string
  setWindow(window: TemperatureWindow | null): void
  change(next: Partial<BenchInputs>): void
  /** A change that is a step of its own, however soon after the last. */
  jump(next: BenchInputs): void
  undo(): void
  redo(): void
  canUndo: boolean
  canRedo: boolean
  /** Drops every change, as a step that can be undone. */
  reset(): void
}

/** A window that shows where this candidate is decided. */
export function usualWindow(candidate: CandidateInput): TemperatureWindow {
  const scale = candidate.mechanism === 'freeze-in-decay' ? candidate.parent.massGeV : candidate.massGeV
  const decisive = Math.min(Math.max(scale, 1e-2), 1e6)
  return { hotGeV: 10 ** Math.ceil(Math.log10(decisive) + 0.6), coldGeV: 1e-4 }
}

/** Writes the address and keeps it for this tab, shortly after the last change. */
function useWrittenAddress(search: string, draft: Draft, settled: boolean, sitting: Sitting): void {
  useEffect(() => {
    if (!settled) return
    sitting.keep(search, draft)
    // Written past the router: a keystroke is no navigation, and the pages beneath need not hear of it.
    const timer = setTimeout(
      () => globalThis.history.replaceState(globalThis.history.state, '', `/bench${search}`),
      WRITE_AFTER_MS,
    )
    return () => clearTimeout(timer)
  }, [search, draft, settled, sitting])
}

export function useDraft(
  { key, address, history, candidate, settled }: Opened,
  sitting: Sitting,
): DraftState {
  const [kept, setKept] = useState(() => opening(key, address))
  const state = kept.key === key ? kept : opening(key, address)
  if (state !== kept) setKept(state)
  const draft = state.list[state.at]!

  const stored = useMemo<BenchInputs>(
    () => ({ history: history.revision.input, candidate: candidate.revision.input }),
    [history, candidate],
  )
  const change = useCallback(
    (next: Partial<BenchInputs>) => {
      const at = Date.now()
      setKept((before) => changed(before, next, stored, at))
    },
    [stored],
  )
  const jump = useCallback(
    (next: BenchInputs) => setKept((before) => apart(changed(apart(before), next, stored, 0))),
    [stored],
  )
  const here = useMemo<BenchAddress>(
    () => ({
      history: { recordId: history.recordId, number: history.revision.number },
      candidate: { recordId: candidate.recordId, number: candidate.revision.number },
      draft,
      window: state.window,
    }),
    [history, candidate, draft, state.window],
  )
  const search = useMemo(() => writeAddress(here), [here])
  useWrittenAddress(search, draft, settled, sitting)

  const usual = useMemo(() => usualWindow(candidate.revision.input), [candidate])
  return {
    history: draft.history ?? history.revision.input,
    candidate: draft.candidate ?? candidate.revision.input,
    draft,
    historyChanged: draft.history !== undefined,
    candidateChanged: draft.candidate !== undefined,
    window: state.window ?? usual,
    address: here,
    search,
    setWindow: useCallback((window) => setKept((before) => ({ ...before, window })), []),
    change,
    jump,
    undo: useCallback(() => setKept((before) => moved(before, -1)), []),
    redo: useCallback(() => setKept((before) => moved(before, 1)), []),
    canUndo: state.at > 0,
    canRedo: state.at < state.list.length - 1,
    reset: useCallback(() => jump(stored), [jump, stored]),
  }
}
