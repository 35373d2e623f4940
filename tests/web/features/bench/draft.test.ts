import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { candidateInput, historyInput } from '#core/wire/index'
import {
  decodeDraft,
  encodeDraft,
  readAddress,
  writeAddress,
} from '../../../../web/src/features/bench/draft.ts'

const history = historyInput.parse({
  extraSpecies: [
    {
      name: 'θ ≥ 1, “dark”',
      degreesOfFreedom: 3,
      statistics: 'boson',
      massGeV: 0.1,
      coupling: { kind: 'bath' },
    },
  ],
})
const candidate = candidateInput.parse({
  mechanism: 'freeze-out',
  massGeV: 321.5,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
})
const choice = { recordId: '243bed1e-f2a7-4ade-baa0-a64e1acec253', number: 4 }

describe('the address of the Bench', () => {
  it('gives back whatever was put into it', () => {
    const address = {
      history: choice,
      candidate: { ...choice, number: 1 },
      draft: { history, candidate },
      window: { hotGeV: 1000, coldGeV: 1e-4 },
    }
    expect(readAddress(writeAddress(address))).toEqual(address)
  })

  it('carries an uploaded bath, and none whose rows the forms cannot show', () => {
    const points = [0.01, 0.1, 0.5, 2].map((temperatureGeV, i) => ({ temperatureGeV, gS: 11 + 20 * i }))
    const withBath = (bath: unknown) => ({ history: { ...history, bath } as typeof history })
    const draft = withBath({ treatment: 'uploaded', points })
    expect(decodeDraft(encodeDraft(draft))).toEqual(draft)
    for (const bad of [undefined, 'many', [[0.1, 17]], [null]])
      expect(decodeDraft(encodeDraft(withBath({ treatment: 'uploaded', points: bad })))).toEqual({})
  })

  it('carries any draft, letters of any script included, in characters an address takes as they are', () => {
    fc.assert(
      fc.property(
        fc.string({ unit: 'binary' }),
        fc.double({ min: 1e-12, max: 1e12, noNaN: true }),
        (name, massGeV) => {
          const draft = {
            candidate: { ...candidate, massGeV },
            history: {
              ...history,
              extraSpecies: [{ ...history.extraSpecies[0]!, name }],
            },
          }
          const text = encodeDraft(draft)
          expect(text).toMatch(/^[\w-]*$/)
          expect(decodeDraft(text)).toEqual(draft)
        },
      ),
    )
  })

  it('opens without a draft when a link is mangled', () => {
    fc.assert(
      fc.property(fc.string(), (text) => {
        expect(decodeDraft(text)).toBeTypeOf('object')
      }),
    )
    expect(decodeDraft('%%%')).toEqual({})
    for (const draft of [
      { history: 5 },
      { history: { bath: {} } },
      { candidate: { mechanism: 'unheard-of' } },
    ])
      expect(decodeDraft(btoa(JSON.stringify(draft)))).toEqual({})
  })

  it('does not believe an impossible window or choice', () => {
    expect(readAddress('?window=1,10').window).toBeNull()
    expect(readAddress('?window=abc').window).toBeNull()
    expect(readAddress('?history=nonsense').history).toBeNull()
  })

  it('is empty when nothing is chosen', () => {
    expect(writeAddress({ history: null, candidate: null, draft: {}, window: null })).toBe('')
  })
})

describe('a draft in an address', () => {
  const withHistory = (over: object) =>
    decodeDraft(btoa(JSON.stringify({ history: { ...history, ...over } })))
  const withCandidate = (over: object) =>
    decodeDraft(btoa(JSON.stringify({ candidate: { ...candidate, ...over } })))

  it('is taken only where the forms can show it', () => {
    const plain = { extraSpecies: [] }
    expect(withHistory(plain).history).toBeDefined()
    for (const broken of [
      { neutrinos: null },
      { expansion: { kind: 'backwards' } },
      { extraSpecies: [{ name: 'x' }] },
      { today: 3 },
    ])
      expect(withHistory({ ...plain, ...broken })).toEqual({})
    expect(withCandidate({}).candidate).toBeDefined()
    for (const broken of [{ annihilation: { kind: 'unheard-of' } }, { mechanism: 'freeze-in-decay' }])
      expect(withCandidate(broken)).toEqual({})
  })
})
