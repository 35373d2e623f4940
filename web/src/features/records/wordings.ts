/** Revisions in words, part by part, for holding two of them side by side. */
import type { ReactNode } from 'react'
import type { CandidateInput, HistoryInput } from '#core/wire/index'
import {
  ASSUMPTION_ORDER,
  ASSUMPTION_TITLES,
  describeAssumption,
  describeCandidate,
} from '../../lib/describe.tsx'

export interface Wording {
  /** The fields it speaks of: this one and all below it; '' for every field. */
  path: string
  title: string
  words: ReactNode
}

export const historyWordings = (input: HistoryInput): Wording[] =>
  ASSUMPTION_ORDER.map((group) => ({
    path: group,
    title: ASSUMPTION_TITLES[group],
    words: describeAssumption(group, input),
  }))

export const candidateWordings = (input: CandidateInput): Wording[] => [
  { path: '', title: 'Particle', words: describeCandidate(input) },
]

/** Whether a field is among those a wording speaks of. */
export const speaksOf = ({ path }: Pick<Wording, 'path'>, field: string): boolean =>
  path === '' || field === path || field.startsWith(`${path}.`) || field.startsWith(`${path}[`)
