/** Keeps what is on the Bench: new revisions where something changed, then the evaluation. */
import { useMutation, useQueryClient } from '@tanstack/react-query'
import type {
  CandidateInput,
  CandidateRevision,
  CreateEvaluationResult,
  HistoryInput,
  HistoryRevision,
} from '#core/wire/index'
import { createEvaluation } from '../../api/evaluations.ts'
import { createCandidate, createHistory, reviseCandidate, reviseHistory } from '../../api/records.ts'
import type { RevisionChoice } from './draft.ts'
import type { Chosen } from './revisions.ts'

/** Whether a changed input becomes the next revision of its record, or a record of its own. */
export type SaveAs = { as: 'revision'; parentId: string } | { as: 'new'; name: string }

interface PartToSave<R, Input> {
  chosen: Chosen<R>
  input: Input
  changed: boolean
  save: SaveAs
}

export interface SaveRequest {
  note: string
  history: PartToSave<HistoryRevision, HistoryInput>
  candidate: PartToSave<CandidateRevision, CandidateInput>
  shownOmegaH2: number
  /** What an attempt that stopped has stored already. */
  kept: Kept
}

/** A revision of a record, new or from before. */
interface KeptRevision extends RevisionChoice {
  revisionId: string
}

/** The revisions that are stored, as far as saving has come. */
export interface Kept {
  history?: KeptRevision
  candidate?: KeptRevision
}

export type SaveStep = 'history' | 'candidate' | 'evaluation'

/** Saving ended at a step; what was stored before it stays stored. */
export class SaveStopped extends Error {
  readonly step: SaveStep
  readonly reason: Error
  readonly kept: Kept

  constructor(step: SaveStep, reason: unknown, kept: Kept) {
    super(`saving stopped at the ${step}`)
    this.name = 'SaveStopped'
    this.step = step
    this.reason = reason instanceof Error ? reason : new Error(String(reason))
    this.kept = kept
  }
}

export interface Saved extends CreateEvaluationResult {
  history: KeptRevision
  candidate: KeptRevision
}

interface Shelf<Input> {
  create(
    name: string,
    note: string,
    input: Input,
  ): Promise<{ id: string; head: { id: string; number: number } }>
  revise(
    id: string,
    parentId: string,
    note: string,
    input: Input,
  ): Promise<{ id: string; head: { id: string; number: number } }>
}

const HISTORIES: Shelf<HistoryInput> = { create: createHistory, revise: reviseHistory }
const CANDIDATES: Shelf<CandidateInput> = { create: createCandidate, revise: reviseCandidate }

async function keep<R extends { id: string; number: number }, Input>(
  shelf: Shelf<Input>,
  { chosen, input, changed, save }: PartToSave<R, Input>,
  note: string,
): Promise<KeptRevision> {
  const { recordId, revision } = chosen
  if (!changed) return { revisionId: revision.id, recordId, number: revision.number }
  const record =
    save.as === 'new'
      ? await shelf.create(save.name, note, input)
      : await shelf.revise(recordId, save.parentId, note, input)
  return { revisionId: record.head.id, recordId: record.id, number: record.head.number }
}

async function saveAll({ note, history, candidate, shownOmegaH2, ...request }: SaveRequest): Promise<Saved> {
  const kept = { ...request.kept }
  let step: SaveStep = 'history'
  try {
    const keptHistory = (kept.history ??= await keep(HISTORIES, history, note))
    step = 'candidate'
    const keptCandidate = (kept.candidate ??= await keep(CANDIDATES, candidate, note))
    step = 'evaluation'
    const result = await createEvaluation(keptHistory.revisionId, keptCandidate.revisionId, shownOmegaH2)
    return { ...result, history: keptHistory, candidate: keptCandidate }
  } catch (error) {
    throw new SaveStopped(step, error, kept)
  }
}

/** Saves; every list that could show the result is fetched anew. */
export function useSave() {
  const queries = useQueryClient()
  return useMutation<Saved, SaveStopped, SaveRequest>({
    mutationFn: saveAll,
    // Not waited for: what was saved is told at once, and the Bench fetches what it opens.
    onSettled: () => {
      for (const key of ['histories', 'candidates', 'evaluations'])
        void queries.invalidateQueries({ queryKey: [key] })
    },
  })
}
