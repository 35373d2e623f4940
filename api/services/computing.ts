import { setImmediate } from 'node:timers/promises'
import { QUESTIONS, completeAsync, inSlices } from '#core/index'
import type { Progress, Question } from '#core/index'
import { ProblemError } from '../errors/problemError.ts'

/** Work between two turns of the event loop, ms: short enough that nobody else's request is seen to wait. */
const SLICE_MS = 8

/** How many computations take turns, and how many may wait for one of these places. */
export interface ComputeLimits {
  running: number
  waiting: number
}

export const DEFAULT_COMPUTE_LIMITS: ComputeLimits = { running: 4, waiting: 64 }

export interface Asked {
  /** Ends the computation between two of its steps: whoever asked has gone. */
  signal?: AbortSignal
  onProgress?: (progress: Progress) => void
}

export interface Computing {
  /**
   * Answers a question of the core in slices, so that the server goes on answering others.
   * @throws what the core throws, the signal's reason, or a ProblemError when too many are waiting
   */
  answer(question: Question, input: unknown, asked?: Asked): Promise<unknown>
}

/** A few places for computations, and a line of those that wait for one. */
export function computing({ running, waiting }: ComputeLimits): Computing {
  let free = running
  const line: (() => void)[] = []
  const enter = async (): Promise<void> => {
    if (free > 0) {
      free--
      return
    }
    if (line.length >= waiting)
      throw new ProblemError(
        'busy',
        'As many computations are waiting as there is room for. Nothing was computed; try again in a few seconds.',
      )
    await new Promise<void>((resolve) => line.push(resolve))
  }
  const leave = (): void => {
    const next = line.shift()
    if (next === undefined) free++
    else next()
  }
  return {
    async answer(question, input, { signal, onProgress } = {}) {
      await enter()
      try {
        return await completeAsync<unknown>(QUESTIONS[question](input), {
          signal,
          onProgress,
          pause: inSlices(SLICE_MS, () => performance.now(), setImmediate),
        })
      } finally {
        leave()
      }
    },
  }
}
