import { afterEach, describe, expect, it } from 'vitest'
import { writeAddress } from '../../../../web/src/features/bench/draft.ts'
import { sittingOf } from '../../../../web/src/features/bench/sitting.ts'
import { aCandidate } from '../records/support.tsx'

afterEach(() => sessionStorage.clear())

const rows = (count: number) =>
  Array.from({ length: count }, (_, i): [number, number] => [10 + i * 0.1234567, 1.234567e-26])
const withTable = (count: number) => ({
  history: null,
  candidate: null,
  window: null,
  draft: {
    candidate: aCandidate({ annihilation: { kind: 'table', against: 'x', points: rows(count) } }),
  },
})

describe('what a tab remembers of the Bench', () => {
  it('is the last look, when an address says nothing', () => {
    const sitting = sittingOf('tove')
    const address = { ...withTable(2), window: { hotGeV: 100, coldGeV: 0.1 } }
    sitting.keep(writeAddress(address), address.draft)
    expect(sitting.open('')).toEqual(address)
    expect(sitting.open('?window=10,1')).toMatchObject({ draft: {}, window: { hotGeV: 10, coldGeV: 1 } })
  })

  it('is a draft of many thousand rows, which the address only names', () => {
    const sitting = sittingOf('tove')
    const address = withTable(20_000)
    const search = writeAddress(address)
    expect(search.length).toBeLessThan(100)
    sitting.keep(search, address.draft)
    expect(sitting.open(search)).toEqual(address)
  })

  it('is not taken for another long draft', () => {
    const sitting = sittingOf('tove')
    sitting.keep(writeAddress(withTable(500)), withTable(500).draft)
    expect(sitting.open(writeAddress(withTable(600)))).toMatchObject({ draft: {}, draftMissing: true })
  })

  it('belongs to the person who left it', () => {
    sittingOf('tove').keep('?window=10,1', {})
    expect(sittingOf('ines').open('').window).toBeNull()
    expect(sittingOf('tove').open('').window).toEqual({ hotGeV: 10, coldGeV: 1 })
  })

  it('may be refused by a full store without harm', () => {
    const full = { ...sessionStorage, getItem: () => null, removeItem: () => undefined } as unknown as Storage
    full.setItem = () => {
      throw new DOMException('full', 'QuotaExceededError')
    }
    expect(() => sittingOf('tove', full).keep('?window=10,1', withTable(500).draft)).not.toThrow()
  })
})
