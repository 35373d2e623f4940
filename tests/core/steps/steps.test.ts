import { describe, expect, it } from 'vitest'
import { QUESTIONS, complete, completeAsync, computeAttribution, computeSolve, inSlices } from '#core/index'
import type { Progress, Steps } from '#core/index'
import { atOnce, part } from '#core/steps/steps'

/** Counts to `of` and tells what it did in `log`. */
function* counting(of: number, log: number[] = []): Steps<string> {
  for (let i = 1; i <= of; i++) {
    log.push(i)
    yield { done: i, of }
  }
  return 'counted'
}

/** Gives the event loop a turn. */
const turn = () => new Promise<void>((resolve) => setTimeout(resolve))

const candidate = {
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
}
const asked = {
  solve: { history: {}, candidate, solveFor: 'candidate.annihilation.sWaveCm3PerS' },
  attribute: { baseline: { bath: { treatment: 'thresholds' } }, variant: {}, candidate },
  propagate: {
    history: {},
    candidate,
    distributions: [{ path: 'candidate.massGeV', kind: 'normal', mean: 100, standardDeviation: 5 }],
    samples: 60,
  },
  laboratory: {
    history: {},
    measured: {
      parentMassGeV: { value: 300, minus: 10, plus: 10 },
      lifetimeS: { value: 1e-9, minus: 2e-10, plus: 3e-10 },
      massGeV: { value: 1e-5, minus: 1e-6, plus: 1e-6 },
    },
    parent: { degreesOfFreedom: 1, statistics: 'boson' },
    line: { fromGeV: 1e-6, toGeV: 1, points: 10 },
    samples: 60,
  },
  convert: {
    from: { quantity: 'timeS', values: Array.from({ length: 1000 }, (_, i) => 10 ** (i / 100)) },
    to: ['redshift'],
  },
  history: { history: {}, timesS: Array.from({ length: 2500 }, (_, i) => 10 ** (i / 200)) },
}

describe('a computation in steps', () => {
  it('gives its result at once and with pauses', async () => {
    expect(complete(counting(3))).toBe('counted')
    expect(await completeAsync(counting(3))).toBe('counted')
    expect(complete(atOnce(() => 7))).toBe(7)
  })

  it('tells its progress, a part of a longer one its share', () => {
    function* whole(): Steps<void> {
      yield* part(counting(2), 0, 10, 40)
      yield* part(counting(3), 10, 30, 40)
    }
    expect([...whole()]).toEqual([5, 10, 20, 30, 40].map((done) => ({ done, of: 40 })))
  })

  it('throws the reason as soon as it is cancelled, and does no more', async () => {
    const log: number[] = []
    const controller = new AbortController()
    const reason = new Error('no longer wanted')
    const onProgress = ({ done }: Progress): void => {
      if (done === 2) controller.abort(reason)
    }
    await expect(completeAsync(counting(5, log), { signal: controller.signal, onProgress })).rejects.toBe(
      reason,
    )
    expect(log).toEqual([1, 2])
    await expect(completeAsync(counting(5, log), { signal: controller.signal })).rejects.toBe(reason)
    expect(log).toEqual([1, 2])
  })

  it('passes on what goes wrong', async () => {
    function* failing(): Steps<number> {
      yield { done: 1, of: 2 }
      throw new RangeError('beyond')
    }
    await expect(completeAsync(failing())).rejects.toThrow('beyond')
    expect(() => complete(failing())).toThrow('beyond')
  })

  it('pauses when a slice of time is over, and not before', async () => {
    let clock = 0
    let pauses = 0
    const pause = inSlices(
      10,
      () => clock,
      async () => {
        pauses++
        // A pause takes its time as well, which is not counted as work.
        clock += 100
      },
    )
    function* ticking(): Steps<void> {
      for (let i = 1; i <= 20; i++) {
        clock += 4
        yield { done: i, of: 20 }
      }
    }
    await completeAsync(ticking(), { pause })
    // Steps of 4 ms fill a slice of 10 ms three at a time.
    expect(pauses).toBe(6)
  })

  it('can be cancelled from outside during its pauses', async () => {
    const log: number[] = []
    const controller = new AbortController()
    setTimeout(() => controller.abort())
    await expect(
      completeAsync(counting(1e6, log), { signal: controller.signal, pause: turn }),
    ).rejects.toMatchObject({ name: 'AbortError' })
    expect(log.length).toBeLessThan(100)
  })
})

describe('the questions', () => {
  it.each(Object.keys(asked) as (keyof typeof asked)[])(
    'tell a progress that grows to the whole: %s',
    (question) => {
      const told = [...(QUESTIONS[question](asked[question]) as Generator<Progress>)]
      expect(told.length).toBeGreaterThan(40)
      told.forEach(({ done, of }, i) => {
        expect(of).toBe(told[0]!.of)
        expect(done).toBeGreaterThanOrEqual(told[i - 1]?.done ?? 0)
        expect(done).toBeLessThanOrEqual(of)
      })
      expect(told.at(-1)!.done / told.at(-1)!.of).toBeGreaterThan(0.9)
    },
  )

  it('do less than a tenth of a second of work in a step', () => {
    // A tenth of a second; a step is a few milliseconds, the rest is for a busy machine and the first build of a bath.
    for (const question of Object.keys(asked) as (keyof typeof asked)[]) {
      const steps = QUESTIONS[question](asked[question]) as Generator<Progress>
      const taken: number[] = []
      for (
        let before = performance.now(), next = steps.next();
        ;
        before = performance.now(), next = steps.next()
      ) {
        taken.push(performance.now() - before)
        if (next.done) break
      }
      expect(taken.sort((a, b) => a - b)[Math.floor(0.95 * taken.length)], question).toBeLessThan(100)
    }
  })

  it('have the same answer with pauses', async () => {
    expect(await completeAsync(QUESTIONS.solve(asked.solve), { pause: turn })).toEqual(
      computeSolve(asked.solve),
    )
    expect(await completeAsync(QUESTIONS.attribute(asked.attribute), { pause: turn })).toEqual(
      computeAttribution(asked.attribute),
    )
  })
})
