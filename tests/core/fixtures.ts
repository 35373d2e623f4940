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
  deltaNEffAt1KeV?: number
  rows: ({ temperatureGeV: number; temperaturesOfSpeciesApartGeV?: number[] } & Numbers)[]
}

export interface HistoryBlock {
  history: { expansion: { kind: string }; bath: { treatment: string } }
  outputs: Numbers
  s0PerCm3?: number
  rows?: ({ temperatureGeV: number } & Numbers)[]
}

export interface AbundanceCase {
  name: string
  input: { history: { expansion: { kind: string } }; candidate: { mechanism: string } }
  /** Numbers, and in some cases a group of them under one name. */
  outputs: Record<string, number | Numbers>
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

export interface Age {
  history: { bath: { treatment: string } }
  temperatureAtZ1100GeV: number
  ageAtZ1100Years: number
  ageTodayYears: number
  hubbleTodayOverH100: number
}

/** Change of ρa³ between two temperatures over ρa³ at the lower one, and what the pressure did. */
export interface ContinuityBlock {
  bath: { treatment: string }
  neutrinos: { treatment: string }
  intervals: { fromGeV: number; toGeV: number; changeOfRhoA3: number; residual: number }[]
}

export interface PublishedCheck {
  name: string
  published: number
  own: number
  source: string
}

export interface CrossSectionsForDensity {
  bath: string
  neutrinos: string
  omegaH2: number
  sigmaVCm3PerS: Numbers
}

export const speciesFixture = read('species') as SpeciesFixture
export const bathFixture = read('bath') as { blocks: BathBlock[]; extraSpeciesBlocks: BathBlock[] }
export const uploadedFixture = read('uploaded') as { blocks: (BathBlock & { name: string })[] }
export const historyFixture = read('history') as {
  expansions: HistoryBlock[]
  earlyMatter: HistoryBlock[]
  ages: Age[]
  continuity: { blocks: ContinuityBlock[] }
}
export const ratesFixture = read('rates') as {
  annihilation: { name: string; candidate: unknown; rows: { x: number; sigmaVCm3PerS: number }[] }[]
  scattering: {
    name: string
    massGeV: number
    scattering: unknown
    rows: { temperatureGeV: number; productionGeV4: number }[]
  }[]
}
export const abundanceFixture = read('abundance') as { cases: AbundanceCase[] }
export const attributionFixture = read('attribution') as { cases: AttributionCase[] }
export const publishedFixture = read('published') as {
  checks: PublishedCheck[]
  sdb12: CrossSectionsForDensity[]
}

/** What a published check gave in independent code. */
export function ownValue(name: string): number {
  const found = publishedFixture.checks.find((each) => each.name === name)
  if (!found) throw new Error(`no published check is named ${name}`)
  return found.own
}

/** |found/expected − 1|. */
export const relative = (found: number, expected: number): number =>
  found === expected ? 0 : Math.abs(found / expected - 1)
