import { describe, expect, it } from 'vitest'
import { readPath, substitute, valueAt } from '#core/variation/jsonPath'
import { VariedInput } from '#core/variation/variedInput'
import { InputError } from '#core/wire/index'

describe('a place in a value', () => {
  const value = { a: [{ b: 1 }, { b: 2, c: 3 }] }

  it('takes anything, and nothing else changes', () => {
    expect(substitute(value, readPath('a[1].b'), 7)).toEqual({ a: [{ b: 1 }, { b: 7, c: 3 }] })
    expect(substitute(value, readPath('a'), 'all')).toEqual({ a: 'all' })
    expect(value).toEqual({ a: [{ b: 1 }, { b: 2, c: 3 }] })
    expect(substitute({}, readPath('x.y'), 1)).toEqual({ x: { y: 1 } })
    expect(substitute(value, readPath('a[2].b'), 9)).toEqual({ a: [{ b: 1 }, { b: 2, c: 3 }, { b: 9 }] })
  })

  it('is read, and undefined where nothing stands', () => {
    expect(valueAt(value, readPath('a[1].c'))).toBe(3)
    expect(valueAt(value, readPath('a[4].c.d'))).toBeUndefined()
  })

  it('is refused where it would leave a gap in a list', () => {
    expect(() => substitute(value, readPath('a[3].b'), 7)).toThrow('a[3]: allowed: an index below 2')
    expect(() => substitute(value, readPath('x[4294967294]'), 7)).toThrow(InputError)
  })
})

describe('an input of which places vary', () => {
  const candidate = {
    mechanism: 'hot-relic',
    degreesOfFreedom: 2,
    statistics: 'fermion',
    decouplingTemperatureGeV: 1,
  }

  it('is read anew only where it varies', () => {
    const varied = new VariedInput({ history: {}, candidate }, ['candidate.massGeV'])
    const [first, second] = [varied.at([1e-9]), varied.at([2e-9])]
    expect(second.history).toBe(first.history)
    expect([first, second].map((each) => each.candidate.massGeV)).toEqual([1e-9, 2e-9])
    const histories = new VariedInput({ history: {}, candidate: { ...candidate, massGeV: 1e-9 } }, [
      'history.today.temperatureK',
    ])
    const [cold, warm] = [histories.at([2.7]), histories.at([2.8])]
    expect(warm.candidate).toBe(cold.candidate)
    expect([cold, warm].map((each) => each.history.input.today.temperatureK)).toEqual([2.7, 2.8])
  })

  it('is refused with the faults of both halves', () => {
    const varied = new VariedInput({ history: { bath: 1 }, candidate }, ['candidate.massGeV'])
    expect(() => varied.at([-1])).toThrow(/history\.bath[^]*candidate\.massGeV/)
  })
})
