import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { computeAbundance, computeHistory } from '#core/index'
import { InputError, abundanceRequest, faultLine } from '#core/wire/index'
import type { Fault } from '#core/wire/index'
import { candidate, history } from '../arbitraries.ts'

const wimp = {
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
}

function faultsOf(compute: (input: unknown) => unknown, input: unknown): readonly Fault[] {
  try {
    compute(input)
  } catch (error) {
    if (error instanceof InputError) return error.faults
    throw error
  }
  return []
}

type Json = null | boolean | number | string | Json[] | { [name: string]: Json }
type Path = (string | number)[]

const text = (path: Path): string =>
  path.map((step, i) => (typeof step === 'number' ? `[${step}]` : i === 0 ? step : `.${step}`)).join('')

/** Every place in a JSON value with what stands there. */
function places(value: Json, path: Path = []): [Path, Json][] {
  const inside =
    value === null || typeof value !== 'object'
      ? []
      : Object.entries(value).flatMap(([name, each]) =>
          places(each, [...path, Array.isArray(value) ? Number(name) : name]),
        )
  return [[path, value], ...inside]
}

/** A copy with another value at one place. */
function replaced(value: Json, [step, ...rest]: Path, by: Json): Json {
  if (step === undefined) return by
  const copy = structuredClone(value) as Record<string | number, Json>
  copy[step] = replaced(copy[step]!, rest, by)
  return copy as Json
}

/** A valid request with its defaults written out, and a choice among its places. */
const spoilable = fc.tuple(history, candidate, fc.nat()).map(([h, c, choice]) => ({
  request: structuredClone(abundanceRequest.parse({ history: h, candidate: c })) as unknown as Json,
  choice,
}))

/** Numbers that may be negative: a place in a band, a power. */
const MAY_BE_NEGATIVE = /\.(band|exponent)$/

describe('a bad input', () => {
  it('with a number that is not finite, or negative where none may be, is refused with its path and value, anywhere', () => {
    fc.assert(
      fc.property(
        spoilable,
        fc.constantFrom(NaN, Infinity, -Infinity, -1e-3, -5),
        ({ request, choice }, bad) => {
          const numbers = places(request).filter(([, value]) => typeof value === 'number')
          const [path] = numbers[choice % numbers.length]!
          const at = text(path)
          if (Number.isFinite(bad) && MAY_BE_NEGATIVE.test(at)) return
          const faults = faultsOf(computeAbundance, replaced(request, path, bad))
          const fault = faults.find((each) => each.path === at)
          expect(fault, `${at}: ${faults.map(faultLine).join('; ')}`).toBeDefined()
          expect(fault!.value).toBe(Number.isFinite(bad) ? bad : String(bad))
          expect(fault!.message).toMatch(/^allowed: /)
        },
      ),
      { numRuns: 300 },
    )
  })

  it('with a name that is not known is refused with its path, anywhere', () => {
    fc.assert(
      fc.property(spoilable, ({ request, choice }) => {
        const objects = places(request).filter(
          ([, value]) => value !== null && typeof value === 'object' && !Array.isArray(value),
        )
        const [path] = objects[choice % objects.length]!
        const spoilt = replaced(request, [...path, 'colour'], 1)
        expect(faultsOf(computeAbundance, spoilt)).toContainEqual({
          path: text([...path, 'colour']),
          message: 'not a name known here; remove it or correct its spelling',
        })
      }),
    )
  })

  it('with a mass of zero is refused, wherever a particle must have one', () => {
    fc.assert(
      fc.property(spoilable, ({ request }) => {
        const faults = faultsOf(computeAbundance, replaced(request, ['candidate', 'massGeV'], 0))
        expect(faults.map(faultLine)).toContain('candidate.massGeV: allowed: above 0 (found 0)')
      }),
      { numRuns: 30 },
    )
  })

  const { annihilation, ...without } = wimp
  const withPole = (pole: object) => ({
    ...without,
    annihilation: { kind: 'resonance', massGeV: 205, widthGeV: 1, spin: 1, branchingProduct: 1e-3, ...pole },
  })
  const withTable = (points: number[][]) => ({
    ...without,
    annihilation: { kind: 'cross-section', points },
  })
  const parent = { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson' }
  const fimp = {
    mechanism: 'freeze-in-decay',
    massGeV: 1e-4,
    degreesOfFreedom: 2,
    statistics: 'fermion',
    parent: { ...parent, lifetimeS: 1e-7 },
  }
  const species = {
    name: 'x',
    degreesOfFreedom: 1,
    statistics: 'boson',
    massGeV: 1,
    coupling: { kind: 'bath' },
  }

  it.each([
    ['no history', undefined, wimp, 'history: missing; allowed: an object'],
    ['no annihilation', {}, without, 'candidate.annihilation: missing; allowed: an object'],
    [
      'a parameter of another treatment',
      { bath: { treatment: 'thresholds', band: 0 } },
      wimp,
      'history.bath.band: not a name known here; remove it or correct its spelling',
    ],
    [
      'a candidate that nothing annihilates',
      {},
      { ...wimp, annihilation: { ...annihilation, sWaveCm3PerS: 0 } },
      'candidate.annihilation.sWaveCm3PerS: allowed: a positive s-wave or p-wave part; with both zero nothing annihilates (found 0)',
    ],
    [
      'an extra species of negative weight',
      { extraSpecies: [{ ...species, degreesOfFreedom: -1 }] },
      wimp,
      'history.extraSpecies[0].degreesOfFreedom: allowed: above 0 (found -1)',
    ],
    [
      'a matter era that outlasts the maximum temperature',
      {
        maximumTemperatureGeV: 0.01,
        expansion: { kind: 'early-matter', reheatTemperatureGeV: 0.02, startTemperatureGeV: 10 },
      },
      wimp,
      'history.maximumTemperatureGeV: allowed: at least the reheating temperature of the matter era, 0.02 GeV (found 0.01)',
    ],
    [
      'a width above the mass',
      {},
      withPole({ widthGeV: 300 }),
      'candidate.annihilation.widthGeV: allowed: below the mass of the resonance (found 300)',
    ],
    [
      'a parent wider than its mass',
      {},
      { ...fimp, parent: { ...parent, widthGeV: 301 } },
      'candidate.parent.widthGeV: allowed: below the mass of the parent, or it is no particle (found 301)',
    ],
    [
      'both lifetime and width',
      {},
      { ...fimp, parent: { ...parent, widthGeV: 1e-9, lifetimeS: 1e-7 } },
      'candidate.parent.lifetimeS: allowed: exactly one of lifetimeS and widthGeV (found 1e-7)',
    ],
    [
      'a candidate heavier than its parent',
      {},
      { ...fimp, massGeV: 301 },
      'candidate.massGeV: allowed: at most the mass of the parent divided by perDecay (found 301)',
    ],
    [
      'a table that does not ascend',
      {},
      withTable([
        [200, 1e-9],
        [400, 1e-9],
        [300, 1e-9],
      ]),
      'candidate.annihilation.points[2][0]: allowed: above 400, the row before; rows ascend (found 300)',
    ],
    [
      'a table of one row',
      {},
      withTable([[200, 1e-9]]),
      'candidate.annihilation.points: allowed: at least 2 in the list',
    ],
    [
      'ultraviolet freeze-in without an end',
      {},
      {
        ...without,
        mechanism: 'freeze-in-ultraviolet',
        ultraviolet: { coefficient: 1, scaleGeV: 1e15, index: 1 },
      },
      'history.maximumTemperatureGeV: needed: ultraviolet freeze-in grows with the highest temperature without end (found null)',
    ],
  ])('names the path, what was found and what is allowed: %s', (_what, h, c, line) => {
    const input = h === undefined ? { candidate: c } : { history: h, candidate: c }
    expect(faultsOf(computeAbundance, input).map(faultLine)).toContain(line)
  })

  it('is told all its faults at once', () => {
    const faults = faultsOf(computeAbundance, {
      history: { bath: { treatment: 'fit-2018', band: 3 } },
      candidate: { ...wimp, massGeV: 0, degreesOfFreedom: -2 },
    })
    expect(faults.map((fault) => fault.path)).toEqual([
      'history.bath.band',
      'candidate.massGeV',
      'candidate.degreesOfFreedom',
    ])
  })

  it.each([
    [[], 'temperaturesGeV: allowed: at least 1 in the list'],
    [[1, -1], 'temperaturesGeV[1]: allowed: above 0 (found -1)'],
    [[1, NaN], 'temperaturesGeV[1]: allowed: a finite number (found "NaN")'],
    [[1e17], 'temperaturesGeV[0]: allowed: at most 10000000000000000 (found 100000000000000000)'],
  ])('of a history is refused by the place in the list: %j', (temperaturesGeV, line) => {
    expect(faultsOf(computeHistory, { history: {}, temperaturesGeV }).map(faultLine)).toContain(line)
  })
})
