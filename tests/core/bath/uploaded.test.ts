import { describe, expect, it } from 'vitest'
import { emptyPoint } from '#core/bath/bath'
import type { BathPoint } from '#core/bath/bath'
import { LATTICE_2016_ROWS } from '#core/bath/treatments/lattice2016Table'
import { emptyExpansion } from '#core/history/expansionPoint'
import { buildHistory } from '#core/history/thermalHistory'
import type { ThermalHistory } from '#core/history/thermalHistory'
import { abundance, computeAbundance, computeHistory } from '#core/index'
import { InputError, candidateInput, digestOf, historyInput } from '#core/wire/index'
import type { BathColumn, BathRow } from '#core/wire/index'
import { relative, uploadedFixture } from '../fixtures.ts'

const neutrinos = { treatment: 'instantaneous' }
const historyOf = (bath: object, more: object = {}): ThermalHistory =>
  buildHistory(historyInput.parse({ bath, neutrinos, ...more }))
const ofTable = (points: readonly BathRow[], more: object = {}): ThermalHistory =>
  historyOf({ treatment: 'uploaded', points }, more)

const point = emptyPoint()
function bathAt({ radiation }: ThermalHistory, temperatureGeV: number): BathPoint {
  radiation.bath.evaluate(temperatureGeV, point)
  return { ...point }
}

/** Rows of another bath, evenly in ln T. */
function sampled(
  history: ThermalHistory,
  rows: number,
  low: number,
  high: number,
  columns: readonly BathColumn[],
  digits = 17,
): BathRow[] {
  return Array.from({ length: rows }, (_, i) => {
    const temperatureGeV = i === 0 ? low : i === rows - 1 ? high : low * (high / low) ** (i / (rows - 1))
    const found = bathAt(history, temperatureGeV)
    return {
      temperatureGeV,
      ...Object.fromEntries(columns.map((column) => [column, Number(found[column].toPrecision(digits))])),
    }
  })
}

interface Distance {
  gRho: number
  gS: number
  slope: number
}

/** Largest relative distance in g_ρ and g_s, and of the slopes, over a range of T. */
function distance(a: ThermalHistory, b: ThermalHistory, low: number, high: number): Distance {
  const most = { gRho: 0, gS: 0, slope: 0 }
  for (let i = 0; i < 2000; i++) {
    const T = low * (high / low) ** ((i + 0.5) / 2000)
    const [x, y] = [bathAt(a, T), bathAt(b, T)]
    most.gRho = Math.max(most.gRho, relative(x.gRho, y.gRho))
    most.gS = Math.max(most.gS, relative(x.gS, y.gS))
    most.slope = Math.max(most.slope, Math.abs(x.gSSlope / x.gS - y.gSSlope / y.gS))
  }
  return most
}

const BOTH = ['gRho', 'gS'] as const
const COLUMNS: readonly (readonly BathColumn[])[] = [BOTH, ['gS'], ['gRho']]
const [LOW, HIGH] = [0.004, 1e3]
const crossover = { treatment: 'crossover' }

const freezeOut = (massGeV: number) =>
  candidateInput.parse({
    mechanism: 'freeze-out',
    massGeV,
    degreesOfFreedom: 2,
    statistics: 'fermion',
    annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
  })

describe('an uploaded bath', () => {
  it.each(uploadedFixture.blocks.map((block) => [block.name, block] as const))(
    'agrees with independent splines and integrals to 1e-10: %s',
    (_name, block) => {
      const history = historyOf(block.bath as object)
      const read = emptyExpansion()
      for (const row of block.rows) {
        const T = row.temperatureGeV
        const at = `T = ${T} GeV`
        const found = bathAt(history, T)
        expect(relative(found.gRho, row['gRho']!), at).toBeLessThan(1e-10)
        expect(relative(found.gS, row['gS']!), at).toBeLessThan(1e-10)
        expect(Math.abs(found.gSSlope / found.gS - row['dLnGsDLnT']!), at).toBeLessThan(1e-10)
        // What the solvers read: the rows themselves, and outside of them a table good to 5e-10.
        history.at(Math.log(T), read)
        expect(relative(read.gRho, row['gRho']!), at).toBeLessThan(1e-9)
        expect(relative(read.gS, row['gS']!), at).toBeLessThan(1e-9)
        expect(Math.abs(3 * (read.stretch - 1) - row['dLnGsDLnT']!), at).toBeLessThan(1e-8)
      }
    },
  )

  it('meets its rows', () => {
    const rows = sampled(historyOf(crossover), 40, LOW, HIGH, BOTH)
    const history = ofTable(rows)
    for (const { temperatureGeV, gRho, gS } of rows) {
      expect(relative(bathAt(history, temperatureGeV).gRho, gRho!)).toBeLessThan(1e-13)
      expect(relative(bathAt(history, temperatureGeV).gS, gS!)).toBeLessThan(1e-13)
    }
  })

  it.each(COLUMNS.map((columns) => [columns.join(' and '), columns] as const))(
    'comes to the bath it samples with the fourth power of the distance of its rows: %s',
    (_name, columns) => {
      const direct = historyOf(crossover)
      const found = [400, 800, 1600].map((rows) =>
        distance(ofTable(sampled(direct, rows, LOW, HIGH, columns)), direct, LOW, HIGH),
      )
      // Halved distances: 16 in the limit for g, 8 for its slope.
      for (let i = 1; i < found.length; i++) {
        expect(found[i - 1]!.gRho / found[i]!.gRho).toBeGreaterThan(13)
        expect(found[i - 1]!.gS / found[i]!.gS).toBeGreaterThan(13)
        expect(found[i - 1]!.slope / found[i]!.slope).toBeGreaterThan(6.5)
      }
    },
  )

  it.each(COLUMNS.map((columns) => [columns.join(' and '), columns] as const))(
    'gives abundances that come to those of the bath it samples as fast: %s',
    (_name, columns) => {
      const direct = historyOf(crossover)
      // T_f ≈ 200 MeV, in the crossover, where the rows matter most.
      const candidate = freezeOut(5)
      const expected = abundance(direct, candidate)
      const missed = [100, 200, 400].map((rows) => {
        const found = abundance(ofTable(sampled(direct, rows, LOW, HIGH, columns)), candidate)
        return relative(found.omegaH2, expected.omegaH2)
      })
      for (let i = 1; i < missed.length; i++)
        expect(missed[i]!, missed.join()).toBeLessThan(missed[i - 1]! / 6 + 2 * expected.numericalError)
      expect(missed.at(-1)!).toBeLessThan(1e-6)
    },
  )

  it('has g_ρ from g_s alone, and g_s from g_ρ alone, where a bath is exactly consistent', () => {
    // Below its switch at 1 GeV the ideal gas of hadrons is one thermodynamic system; at 4 MeV its p/s is that of the start.
    const ideal = historyOf({ treatment: 'ideal-switch', transitionTemperatureGeV: 1 })
    for (const column of BOTH) {
      const found = distance(ofTable(sampled(ideal, 400, LOW, 1, [column])), ideal, LOW, 1)
      expect(found.gRho, column).toBeLessThan(1e-7)
      expect(found.gS, column).toBeLessThan(1e-7)
    }
  })

  it.each(['fit-2018', 'lattice-2016', 'lattice-2014'])('with 400 rows stands for %s', (treatment) => {
    const direct = historyOf({ treatment })
    const table = ofTable(sampled(direct, 400, LOW, 200, BOTH))
    const found = distance(table, direct, LOW, 200)
    // The 2018 fit steps by 4e-4 at 120 MeV; the others have kinks in higher derivatives only.
    expect(found.gRho).toBeLessThan(treatment === 'lattice-2014' ? 6e-3 : 5e-4)
    const candidate = freezeOut(100)
    const [a, b] = [abundance(table, candidate).omegaH2, abundance(direct, candidate).omegaH2]
    expect(relative(a, b)).toBeLessThan(3e-6)
  })

  it('made of the rows of Borsanyi et al. (2016) differs from their natural spline by what two splines of 16 rows differ', () => {
    const table = ofTable(LATTICE_2016_ROWS)
    const spline = historyOf({ treatment: 'lattice-2016' })
    for (const { temperatureGeV, gRho, gS } of LATTICE_2016_ROWS) {
      const found = bathAt(table, temperatureGeV)
      expect(relative(found.gRho, gRho)).toBeLessThan(1e-13)
      expect(relative(found.gS, gS)).toBeLessThan(1e-13)
    }
    // Where rows are a fifth of a decade apart or less, and over the whole.
    expect(distance(table, spline, 0.02, 0.3).gRho).toBeLessThan(0.02)
    expect(distance(table, spline, 10 ** -2.5, 280).gRho).toBeLessThan(0.05)
    const [a, b] = [table, spline].map((history) => abundance(history, freezeOut(100)).omegaH2)
    expect(relative(a!, b!)).toBeLessThan(0.01)
  })

  it('obeys dρ = T ds exactly with one column, and says what it misses with two', () => {
    const temperaturesGeV = [0.02, 0.15, 3]
    const residuals = (columns: readonly BathColumn[]): (number | null)[] => {
      const points = sampled(historyOf({ treatment: 'fit-2018' }), 100, LOW, HIGH, columns)
      const { rows } = computeHistory({
        history: { bath: { treatment: 'uploaded', points } },
        temperaturesGeV,
      })
      return rows.map((row) => row.identityResidual)
    }
    expect(residuals(['gS'])).toEqual([0, 0, 0])
    const [, near, far] = residuals(BOTH)
    // The fit's own: per cents near 150 MeV.
    expect(Math.abs(near!)).toBeGreaterThan(5e-3)
    expect(Math.abs(near!)).toBeLessThan(0.05)
    expect(Math.abs(far!)).toBeLessThan(5e-3)
    const table = ofTable(sampled(historyOf({ treatment: 'fit-2018' }), 100, LOW, HIGH, ['gS']))
    for (const T of temperaturesGeV) {
      const h = 1e-4
      const [hot, cold] = [bathAt(table, T * Math.exp(h)), bathAt(table, T * Math.exp(-h))]
      const { gRho, gS, gSSlope } = bathAt(table, T)
      const slope = (hot.gRho - cold.gRho) / (2 * h)
      expect(relative(3 * (4 * gRho + slope), 4 * (3 * gS + gSSlope))).toBeLessThan(1e-7)
    }
  })

  it('goes on as ideal gases outside its rows, continuous above the last and consistent there', () => {
    const table = ofTable(sampled(historyOf({ treatment: 'fit-2018' }), 60, LOW, 50, BOTH))
    const ideal = historyOf({ treatment: 'ideal-switch' })
    expect(relative(bathAt(table, 1e-3).gRho, bathAt(ideal, 1e-3).gRho)).toBeLessThan(1e-14)
    const [below, above] = [bathAt(table, 50 * (1 - 1e-12)), bathAt(table, 50 * (1 + 1e-12))]
    expect(relative(above.gRho, below.gRho)).toBeLessThan(1e-10)
    expect(relative(above.gS, below.gS)).toBeLessThan(1e-10)
    const [T, h] = [80, 1e-4]
    const slope = (bathAt(table, T * Math.exp(h)).gRho - bathAt(table, T * Math.exp(-h)).gRho) / (2 * h)
    const { gRho, gS, gSSlope } = bathAt(table, T)
    expect(relative(3 * (4 * gRho + slope), 4 * (3 * gS + gSSlope))).toBeLessThan(1e-7)
    expect(relative(bathAt(table, 1e8).gRho, bathAt(table, 1e8).gS)).toBeLessThan(1e-6)
  })

  it('takes extra species beside its own content', () => {
    const species = {
      name: 'x',
      degreesOfFreedom: 3,
      statistics: 'boson',
      massGeV: 0,
      coupling: { kind: 'bath' },
    }
    const points = sampled(historyOf(crossover), 60, LOW, HIGH, ['gS'])
    const [plain, more] = [ofTable(points), ofTable(points, { extraSpecies: [species] })]
    for (const T of [0.001, 0.02, 5, 1e4])
      expect(bathAt(more, T).gRho - bathAt(plain, T).gRho).toBeCloseTo(
        T < 0.002 ? 3.2 : 3,
        T < 0.002 ? 0 : 10,
      )
  })

  it('of 16 to 5000 rows, even of four digits, is read without a further error, and solved', () => {
    for (const [rows, digits] of [
      [16, 17],
      [300, 4],
      [5000, 17],
      [5000, 6],
      [5000, 4],
    ] as const) {
      const points = sampled(historyOf(crossover), rows, LOW, HIGH, ['gS'], digits)
      const history = ofTable(points)
      expect(history.tableError).toBeLessThan(1e-9)
      const read = emptyExpansion()
      for (let T = 0.0041; T < HIGH; T *= 1.0937) {
        history.at(Math.log(T), read)
        expect(relative(read.gRho, bathAt(history, T).gRho)).toBeLessThan(1e-12)
      }
      const { omegaH2, numericalError } = abundance(history, freezeOut(100))
      expect(numericalError).toBeLessThan(1e-6)
      expect(relative(omegaH2, abundance(historyOf(crossover), freezeOut(100)).omegaH2)).toBeLessThan(
        rows === 16 ? 5e-3 : 1e-5,
      )
    }
  })

  it('restarts integrators at the rows that need it, and at no other', () => {
    const smooth = ofTable(sampled(historyOf(crossover), 5000, LOW, HIGH, ['gS']))
    const rounded = ofTable(sampled(historyOf(crossover), 5000, LOW, HIGH, ['gS'], 4))
    expect(smooth.kinks.length).toBeLessThan(50)
    expect(rounded.kinks.length).toBeGreaterThan(2000)
  })

  it('has a digest of its own, that does not depend on the order of the names', () => {
    const points = sampled(historyOf(crossover), 20, LOW, HIGH, BOTH)
    const turned = points.map(({ temperatureGeV, gRho, gS }) => ({ gS, temperatureGeV, gRho }))
    const digest = (rows: readonly BathRow[]): string =>
      digestOf(historyInput.parse({ bath: { treatment: 'uploaded', points: rows } }))
    expect(digest(turned)).toBe(digest(points))
    expect(digest(points.slice(0, -1))).not.toBe(digest(points))
  })
})

describe('a table of the bath that cannot be', () => {
  const good = sampled(historyOf(crossover), 30, LOW, HIGH, BOTH)
  const changed = (row: number, change: Partial<Record<keyof BathRow, unknown>>): unknown[] =>
    good.map((each, i) => (i === row ? { ...each, ...change } : each))
  const at = (row: number) => good[row]!

  it.each<[what: string, points: unknown, path: string, message: RegExp]>([
    ['no rows', [], '', /at least 4 in the list/],
    ['a number that is none', changed(17, { gS: NaN }), '[17].gS', /a finite number/],
    [
      'an infinite temperature',
      changed(3, { temperatureGeV: Infinity }),
      '[3].temperatureGeV',
      /a finite number/,
    ],
    ['fewer states than photons', changed(4, { gRho: 1 }), '[4].gRho', /at least 2/],
    ['more states than any model', changed(29, { gS: 1e5 }), '[29].gS', /at most 10000/],
    [
      'a row twice',
      changed(8, { temperatureGeV: at(7).temperatureGeV }),
      '[8].temperatureGeV',
      /above .* rows ascend/,
    ],
    ['a gap', good.filter((_, i) => i < 10 || i > 17), '[10].temperatureGeV', /ten times the row before/],
    [
      'a column missing in one row',
      changed(17, { gS: undefined }),
      '[17].gS',
      /missing; allowed: a number in every row/,
    ],
    [
      'no column',
      good.map(({ temperatureGeV }) => ({ temperatureGeV })),
      '[0].gS',
      /at least one of gRho and gS/,
    ],
    ['an entropy that falls', changed(17, { gS: 15 }), '[17].gS', /entropy density falls/],
    [
      'sound faster than light',
      changed(17, { gS: at(16).gS! * 0.35, gRho: at(16).gRho! * 0.35 }),
      '[17].gS',
      /speed of sound/,
    ],
    ['an energy that falls', changed(17, { gRho: 8 }), '[17].gRho', /energy density falls/],
    [
      'a negative pressure',
      changed(16, { gRho: at(16).gS! * 1.4 }),
      '[16].gRho',
      /pressure Ts − ρ is negative/,
    ],
    [
      'a start above the crossover',
      good.filter(({ temperatureGeV }) => temperatureGeV > 0.12),
      '[0].temperatureGeV',
      /at most 0.1/,
    ],
    [
      'an end below the crossover',
      good.filter(({ temperatureGeV }) => temperatureGeV < 0.9),
      '[12].temperatureGeV',
      /at least 1/,
    ],
    [
      'one column where neutrinos are apart',
      good.map(({ temperatureGeV, gS }, i) => ({ temperatureGeV: i === 0 ? 1e-3 : temperatureGeV, gS })),
      '[0].temperatureGeV',
      /leave colder rows out, or give both/,
    ],
    ['a name that is none', changed(2, { heff: 10 } as object), '[2].heff', /not a name known here/],
  ])('is refused with its path: %s', (_what, points, path, message) => {
    const error = ((): unknown => {
      try {
        return computeAbundance({
          history: { bath: { treatment: 'uploaded', points } },
          candidate: freezeOut(100),
        })
      } catch (thrown) {
        return thrown
      }
    })()
    expect(error).toBeInstanceOf(InputError)
    const { faults } = error as InputError
    const fault = faults.find((each) => each.path === `history.bath.points${path}`)
    expect(fault, faults.map((each) => `${each.path}: ${each.message}`).join('\n')).toBeDefined()
    expect(fault!.message).toMatch(message)
  })

  it('is refused when its start does not continue the ideal gases below it', () => {
    const points = good.map((row) => ({ ...row, gRho: row.gRho! + 2, gS: row.gS! + 2 }))
    const build = (): unknown => ofTable(points)
    expect(build).toThrow(InputError)
    expect(build).toThrow(/points\[0\]\.gRho: allowed: within 5 % of 10\.7.*extraSpecies/)
  })

  it('is refused when it fails between its rows', () => {
    // Rows that obey every rule, and so steep a fall between two of them that the curve through them bends below.
    const points = good.map(({ temperatureGeV, gS }, i) => ({ temperatureGeV, gS: i > 20 ? gS! * 0.5 : gS! }))
    const build = (): unknown => ofTable(points)
    expect(build).toThrow(/points\[2[12]\]\.gS: allowed: a speed of sound/)
  })

  it('does not list every one of thousands of faults', () => {
    const points = Array.from({ length: 1000 }, (_, i) => ({ temperatureGeV: 1000 - i / 2, gS: 10 }))
    const parsed = historyInput.safeParse({ bath: { treatment: 'uploaded', points } })
    expect(parsed.error!.issues.length).toBeLessThan(50)
    expect(parsed.error!.issues[0]!.path).toEqual(['bath', 'points', 1, 'temperatureGeV'])
  })
})
