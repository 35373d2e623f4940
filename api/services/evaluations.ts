import { CORE_VERSION, LEAST_ALLOWED_DIFFERENCE, computeAbundance, evidenceOf } from '#core/index'
import { digestOf } from '#core/wire/index'
import type { AbundanceResult, CreateEvaluationResult, Evaluation, EvidenceBundle } from '#core/wire/index'
import { withGroup } from '#db/database'
import type { Database, GroupTransaction } from '#db/database'
import { candidateQueries } from '#db/queries/candidates'
import { findEvaluation, insertEvaluation, listEvaluations } from '#db/queries/evaluations'
import type { EvaluationFilter, StoredEvaluation } from '#db/queries/evaluations'
import { historyQueries } from '#db/queries/histories'
import { notFound } from '../errors/problemError.ts'
import type { Caller } from '../middleware/caller.ts'
import { audit } from './audit.ts'
import { pageAnswer, pageRequest } from './cursor.ts'

const writeEvaluation = (stored: StoredEvaluation): Evaluation => ({
  ...stored,
  createdAt: stored.createdAt.toISOString(),
})

/** How far what the browser showed lies from what the server computed; null when it showed nothing. */
export function compareShown(
  shownOmegaH2: number | undefined,
  { omegaH2, numericalError }: AbundanceResult,
): CreateEvaluationResult['shown'] {
  if (shownOmegaH2 === undefined) return null
  const relativeDifference = Math.abs(shownOmegaH2 - omegaH2) / omegaH2
  const allowed = Math.max(LEAST_ALLOWED_DIFFERENCE, numericalError)
  return { relativeDifference, allowed, agrees: relativeDifference <= allowed }
}

/** An evaluation with both its inputs; revisions outlive everything, so they are there. */
export async function readWithInputs(
  tx: GroupTransaction,
  id: string,
): Promise<{ evaluation: Evaluation; input: EvidenceBundle['input'] }> {
  const stored = await findEvaluation(tx, id)
  if (stored === null) throw notFound('evaluation')
  const history = await historyQueries.findRevision(tx, stored.history.id)
  const candidate = await candidateQueries.findRevision(tx, stored.candidate.id)
  if (history === null || candidate === null) throw new Error(`evaluation ${id} has lost a revision`)
  return {
    evaluation: writeEvaluation(stored),
    input: { history: history.input, candidate: candidate.input },
  }
}

interface EvaluationRequest {
  historyRevisionId: string
  candidateRevisionId: string
  shownOmegaH2?: number | undefined
}

type ListRequest = EvaluationFilter & { limit: number; cursor?: string | undefined }

export function evaluationService(db: Database) {
  const revisionsOf = (caller: Caller, request: EvaluationRequest) =>
    withGroup(db, caller.group.id, async (tx) => {
      const history = await historyQueries.findRevision(tx, request.historyRevisionId)
      if (history === null) throw notFound('history revision')
      const candidate = await candidateQueries.findRevision(tx, request.candidateRevisionId)
      if (candidate === null) throw notFound('candidate revision')
      return { history, candidate }
    })

  const read = (caller: Caller, id: string): Promise<Evaluation> =>
    withGroup(db, caller.group.id, async (tx) => {
      const stored = await findEvaluation(tx, id)
      if (stored === null) throw notFound('evaluation')
      return writeEvaluation(stored)
    })

  return {
    read,

    evidence: (caller: Caller, id: string): Promise<EvidenceBundle> =>
      withGroup(db, caller.group.id, async (tx) => {
        const { evaluation, input } = await readWithInputs(tx, id)
        return evidenceOf(evaluation, input, caller.group.name)
      }),

    async list(caller: Caller, query: ListRequest) {
      const request = pageRequest(query)
      const page = await withGroup(db, caller.group.id, (tx) => listEvaluations(tx, query, request))
      return pageAnswer(page, writeEvaluation)
    },

    /** Computes between two transactions: revisions never change, and no connection waits for the solver. */
    async create(caller: Caller, request: EvaluationRequest): Promise<CreateEvaluationResult> {
      const { history, candidate } = await revisionsOf(caller, request)
      const input = { history: history.input, candidate: candidate.input }
      const result = computeAbundance(input)
      const id = await withGroup(db, caller.group.id, async (tx) => {
        const stored = await insertEvaluation(tx, {
          groupId: caller.group.id,
          authorId: caller.user.id,
          history,
          candidate,
          coreVersion: CORE_VERSION,
          inputDigest: digestOf(input),
          result,
        })
        await audit(tx, caller, 'evaluation.create', stored, { omegaH2: result.omegaH2 })
        return stored
      })
      return { evaluation: await read(caller, id), shown: compareShown(request.shownOmegaH2, result) }
    },
  }
}
