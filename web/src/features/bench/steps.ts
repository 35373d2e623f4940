/** The drafts of one opening of the Bench, in the order they were made, for undo and redo. */
import type { TemperatureWindow } from '../../components/charts/window.ts'
import type { BenchAddress, Draft } from './draft.ts'
import { equal } from './equal.ts'

export interface Steps {
  /** The opening they belong to. */
  key: string
  list: readonly Draft[]
  at: number
  window: TemperatureWindow | null
  /** When the last change was made, ms. */
  changedAt: number
}

type Inputs = Required<Draft>

/** Changes that follow each other faster than this are one step: typing a number is. */
const TOGETHER_MS = 700
const MOST_STEPS = 200

export const opening = (key: string, address: BenchAddress): Steps => ({
  key,
  list: [address.draft],
  at: 0,
  window: address.window,
  changedAt: -Infinity,
})

/** After a change at a moment, ms; a draft holds only what differs from the revisions it stands on. */
export function changed(steps: Steps, next: Partial<Inputs>, stored: Inputs, at: number): Steps {
  const before = steps.list[steps.at]!
  const draft: Draft = { ...before, ...next }
  if (draft.history && equal(draft.history, stored.history)) delete draft.history
  if (draft.candidate && equal(draft.candidate, stored.candidate)) delete draft.candidate
  if (equal(draft, before)) return steps
  const together = at - steps.changedAt < TOGETHER_MS && steps.at > 0
  const list = [...steps.list.slice(0, together ? steps.at : steps.at + 1), draft].slice(-MOST_STEPS)
  return { ...steps, list, at: list.length - 1, changedAt: at }
}

/** The same steps, of which the next change does not become part. */
export const apart = (steps: Steps): Steps => ({ ...steps, changedAt: -Infinity })

/** So many steps forth or back, as far as there are any; what comes next is a step of its own. */
export const moved = (steps: Steps, by: number): Steps =>
  apart({ ...steps, at: Math.max(0, Math.min(steps.list.length - 1, steps.at + by)) })
