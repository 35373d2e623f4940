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
import type { Chosen } from './revisions.ts'

/** Whether a changed input becomes the next revision of its record, or a record of its own. */
export type SaveAs = { as: 'revision' } | { as: 'new'; name: string }

export interface SaveRequest {
  note: string
  history: { chosen: Chosen<HistoryRevision>; input: HistoryInput; changed: boolean; save: SaveAs }
  candidate: { chosen: Chosen<CandidateRevision>; input: CandidateInput; changed: boolean; save: SaveAs }
  shownOmegaH2: number
}

export interface Saved extends CreateEvaluationResult {
  history: { recordId: string; number: number }
  candidate: { recordId: string; number: number }
}

interface KeptRevision {
  revisionId: string
  recordId: string
  number: number
}

async function keepHistory(
  { chosen, input, changed, save }: SaveRequest['history'],
  note: string,
): Promise<KeptRevision> {
  if (!changed)
    return { revisionId: chosen.revision.id, recordId: chosen.recordId, number: chosen.revision.number }
  const record =
    save.as === 'new'
      ? await createHistory(save.name, note, input)
      : await reviseHistory(chosen.recordId, chosen.revision.id, note, input)
  return { revisionId: record.head.id, recordId: record.id, number: record.head.number }
}

async function keepCandidate(
  { chosen, input, changed, save }: SaveRequest['candidate'],
  note: string,
): Promise<KeptRevision> {
  if (!changed)
    return { revisionId: chosen.revision.id, recordId: chosen.recordId, number: chosen.revision.number }
  const record =
    save.as === 'new'
      ? await createCandidate(save.name, note, input)
      : await reviseCandidate(chosen.recordId, chosen.revision.id, note, input)
  return { revisionId: record.head.id, recordId: record.id, number: record.head.number }
}

async function saveAll(request: SaveRequest): Promise<Saved> {
  const history = await keepHistory(request.history, request.note)
  const candidate = await keepCandidate(request.candidate, request.note)
  const result = await createEvaluation(history.revisionId, candidate.revisionId, request.shownOmegaH2)
  return { ...result, history, candidate }
}

/** Saves; every list that could show the result is fetched anew. */
export function useSave() {
  const queries = useQueryClient()
  return useMutation({
    mutationFn: saveAll,
    onSettled: () =>
      Promise.all(
        ['histories', 'candidates', 'evaluations'].map((key) =>
          queries.invalidateQueries({ queryKey: [key] }),
        ),
      ),
  })
}
