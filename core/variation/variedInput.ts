/**
 * A history and a candidate of which some places vary. Every variant is validated as a whole input would be; what does not vary is
 * read and built once.
 */
import { z } from 'zod'
import { buildHistory } from '../history/thermalHistory.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { candidateInput } from '../wire/candidate.ts'
import type { CandidateInput } from '../wire/candidate.ts'
import { abundanceRequest } from '../wire/compute.ts'
import { InputError, parseInput } from '../wire/fault.ts'
import { historyInput } from '../wire/history.ts'
import { readPath, substitute } from './jsonPath.ts'
import type { JsonPath } from './jsonPath.ts'

/** With its defaults filled in; as it came when it is no valid input by itself, as without the number that is to vary. */
function filledIn(schema: z.ZodType, value: unknown): unknown {
  const parsed = schema.safeParse(value)
  return parsed.success ? parsed.data : value
}

const historyPart = z.object({ history: historyInput })
const candidatePart = z.object({ candidate: candidateInput })

/** As they came, or parsed; what varies may be left out. */
export interface Inputs {
  history: unknown
  candidate: unknown
}

export interface Variant {
  history: ThermalHistory
  candidate: CandidateInput
}

export class VariedInput {
  private readonly base: Inputs
  private readonly paths: readonly JsonPath[]
  private history: ThermalHistory | null = null
  private candidate: CandidateInput | null = null

  /** @param paths places that vary, as `candidate.massGeV`; none inside another */
  constructor(base: Inputs, paths: readonly string[]) {
    // So that a number can vary whose default stands for it.
    this.base = {
      history: filledIn(historyInput, base.history),
      candidate: filledIn(candidateInput, base.candidate),
    }
    this.paths = paths.map(readPath)
  }

  /**
   * The variant with these values at the paths.
   * @throws InputError with all its faults
   */
  at(values: readonly unknown[]): Variant {
    const inputs = this.paths.reduce<unknown>(
      (whole, path, i) => substitute(whole, path, values[i]),
      this.base,
    ) as Inputs
    try {
      const history = this.history ?? buildHistory(parseInput(historyPart, inputs).history)
      const candidate = this.candidate ?? parseInput(candidatePart, inputs).candidate
      if (!this.varies('history')) this.history = history
      if (!this.varies('candidate')) this.candidate = candidate
      return { history, candidate }
    } catch (error) {
      // One half hides the faults of the other; the whole shows all.
      if (error instanceof InputError) parseInput(abundanceRequest, inputs)
      throw error
    }
  }

  private varies(half: keyof Inputs): boolean {
    return this.paths.some(([key]) => key === half)
  }
}
