import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { equal } from '../../../../web/src/features/bench/equal.ts'
import { changed, moved, opening } from '../../../../web/src/features/bench/steps.ts'
import type { Steps } from '../../../../web/src/features/bench/steps.ts'
import { extended } from '../../../../web/src/features/bench/trail.ts'
import type { TrailStep } from '../../../../web/src/features/bench/trail.ts'
import { aCandidate, aHistory } from '../records/support.tsx'

const STORED = { history: aHistory(), candidate: aCandidate() }
const ADDRESS = { history: null, candidate: null, draft: {}, window: null }
const mass = (massGeV: number) => ({ candidate: aCandidate({ massGeV }) })
const massOf = (steps: Steps): number | undefined => steps.list[steps.at]!.candidate?.massGeV

const LONG = 10_000

describe('the steps of the Bench', () => {
  it('go back and forth one change at a time, and no farther than there are any', () => {
    let steps = opening('a', ADDRESS)
    steps = changed(steps, mass(200), STORED, LONG)
    steps = changed(steps, mass(300), STORED, 2 * LONG)
    expect(massOf(moved(steps, -1))).toBe(200)
    expect(massOf(moved(steps, -5))).toBeUndefined()
    expect(massOf(moved(moved(steps, -1), 1))).toBe(300)
    expect(massOf(moved(steps, 1))).toBe(300)
  })

  it('take the keystrokes of one number together', () => {
    let steps = opening('a', ADDRESS)
    for (const [i, typed] of [3, 32, 321].entries())
      steps = changed(steps, mass(typed), STORED, LONG + 100 * i)
    expect(massOf(steps)).toBe(321)
    expect(massOf(moved(steps, -1))).toBeUndefined()
  })

  it('begin a new step after an undo, however fast', () => {
    let steps = changed(opening('a', ADDRESS), mass(200), STORED, LONG)
    steps = changed(steps, mass(300), STORED, 2 * LONG)
    steps = changed(moved(steps, -1), mass(400), STORED, 2 * LONG + 1)
    expect(massOf(moved(steps, -1))).toBe(200)
    expect(steps.at).toBe(steps.list.length - 1)
  })

  it('hold nothing that says the same as the stored revision, in whatever order its fields come', () => {
    const { treatment, ...rest } = STORED.history.neutrinos as { treatment: 'specified' } & Record<
      string,
      unknown
    >
    const reordered = {
      ...STORED.history,
      neutrinos: { ...rest, treatment } as typeof STORED.history.neutrinos,
    }
    const steps = changed(opening('a', ADDRESS), { history: reordered }, STORED, LONG)
    expect(steps.list).toHaveLength(1)
  })
})

describe('equality of inputs', () => {
  it('does not depend on the order of fields, and takes a field left out for undefined', () => {
    expect(equal({ a: 1, b: [{ c: 2 }] }, { b: [{ c: 2 }], a: 1, d: undefined })).toBe(true)
  })

  it('holds for a copy and fails where any one value differs', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const copy = JSON.parse(JSON.stringify(value)) as unknown
        expect(equal(JSON.parse(JSON.stringify(value)), copy)).toBe(true)
        expect(equal({ at: value }, { at: [copy] })).toBe(false)
      }),
    )
    expect(equal([1, 2], { 0: 1, 1: 2 })).toBe(false)
    expect(equal(null, {})).toBe(false)
  })
})

describe('the trail', () => {
  const step = (massGeV: number, history = 'fit'): TrailStep => ({
    history: STORED.history,
    candidate: aCandidate({ massGeV }),
    address: ADDRESS,
    names: { history, candidate: 'WIMP' },
    omegaH2: 0.1,
  })

  it('grows by what is new at its end, and by nothing that stands there already', () => {
    const one = extended([], step(100))
    expect(extended(one, step(100))).toBe(one)
    expect(extended(one, step(200)).map(({ candidate }) => candidate.massGeV)).toEqual([200, 100])
    expect(extended(one, step(100, 'kination'))).toHaveLength(2)
  })

  it('forgets the oldest beyond eight', () => {
    const masses = Array.from({ length: 12 }, (_, i) => 100 + i)
    const trail = masses.reduce<readonly TrailStep[]>((steps, massGeV) => extended(steps, step(massGeV)), [])
    expect(trail).toHaveLength(8)
    expect(trail[0]!.candidate.massGeV).toBe(111)
  })
})
