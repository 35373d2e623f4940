import { CORE_VERSION, computeAbundance } from '#core/index'
import { digestOf } from '#core/wire/index'
import type { CandidateInput, HistoryInput } from '#core/wire/index'
import { insertEvaluation } from '../queries/evaluations.ts'
import type { DemoData } from './demoData.ts'
import type { SeedScope } from './seedGroup.ts'
import type { SeededRevisions } from './seedRecords.ts'

/** Computes each listed pair with the core as it stands and stores the result: no number comes from a file. */
export async function seedEvaluations(
  { tx, groupId, idOfPerson }: SeedScope,
  histories: SeededRevisions<HistoryInput>,
  candidates: SeededRevisions<CandidateInput>,
  pairs: DemoData['evaluations'],
): Promise<void> {
  for (const pair of pairs) {
    const history = histories.get(pair.history.name, pair.history.revision)
    const candidate = candidates.get(pair.candidate.name, pair.candidate.revision)
    const input = { history: history.input, candidate: candidate.input }
    await insertEvaluation(tx, {
      groupId,
      authorId: idOfPerson(pair.author),
      history,
      candidate,
      coreVersion: CORE_VERSION,
      inputDigest: digestOf(input),
      result: computeAbundance(input),
    })
  }
}
