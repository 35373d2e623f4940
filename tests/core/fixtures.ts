/** Reads the reference numbers; tests/reference/README.md says how they were made. */
import { readFileSync } from 'node:fs'

const read = (name: string): unknown =>
  JSON.parse(readFileSync(new URL(`../reference/${name}.json`, import.meta.url), 'utf8'))

type Numbers = Record<string, number>

export interface SpeciesFixture {
  species: ({ statistics: 'fermion' | 'boson'; x: number } & Numbers)[]
  bessel: ({ z: number } & Numbers)[]
}

export interface BathBlock {
  bath: unknown
  neutrinos: unknown
  extraSpecies?: unknown
  rows: ({ temperatureGeV: number; temperaturesOfSpeciesApartGeV?: number[] } & Numbers)[]
}

export interface HistoryBlock {
  history: { expansion: { kind: string }; bath: { treatment: string } }
  outputs: Numbers
  rows?: ({ temperatureGeV: number } & Numbers)[]
}

export interface AbundanceCase {
  name: string
  input: { history: { expansion: { kind: string } }; candidate: { mechanism: string } }
  outputs: Numbers
  accuracy: number
}

export interface AttributionCase {
  name: string
  input: { baseline: unknown; variant: unknown; candidate: unknown }
  outputs: {
    ratio: number
    parts: { group: string; lnFactor: number }[]
    oneAtATime: { group: string; lnFactor: number }[]
  }
}

export interface AgeFixture {
  history: unknown
  redshift?: number
  [name: string]: unknown
}

export const speciesFixture = read('species') as SpeciesFixture
export const bathFixture = read('bath') as { blocks: BathBlock[]; extraSpeciesBlocks: BathBlock[] }
export const historyFixture = read('history') as { expansions: HistoryBlock[]; earlyMatter: HistoryBlock[] }
export const abundanceFixture = read('abundance') as { cases: AbundanceCase[] }
export const attributionFixture = read('attribution') as { cases: AttributionCase[] }
export const publishedFixture = read('published') as {
  sdb12: { bath: string; neutrinos: string; omegaH2: number; sigmaVCm3PerS: Numbers }[]
}

/** |found/expected − 1|. */
export const relative = (found: number, expected: number): number =>
  found === expected ? 0 : Math.abs(found / expected - 1)
