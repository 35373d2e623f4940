import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { GEV_PER_KELVIN } from '#core/constants/natural'
import { computeHistory } from '#core/index'
import { InputError, faultLine } from '#core/wire/index'
import { between } from '../arbitraries.ts'
import { historyFixture, relative } from '../fixtures.ts'

const YEAR = 365.25 * 86_400

const faultsOf = (input: unknown): string[] => {
  try {
    computeHistory(input)
  } catch (error) {
    if (error instanceof InputError) return error.faults.map(faultLine)
    throw error
  }
  return []
}

describe('rows at given ages', () => {
  const blocks = [...historyFixture.expansions, ...historyFixture.earlyMatter]
    .filter((block) => block.rows && !('startHubbleGeV' in block.history.expansion))
    .map(
      (block) =>
        [`${block.history.bath.treatment}, ${JSON.stringify(block.history.expansion)}`, block] as const,
    )

  it.each(blocks)('have the temperatures of independent rows to 1e-9: %s', (_name, block) => {
    const rows = block.rows!
    const timesS = rows.map((row) => row['timeS']!)
    const found = computeHistory({ history: block.history, timesS }).rows
    found.forEach((row, i) => {
      // t ∝ T⁻² or steeper, so an age good to 1e-9 (1e-8 in an era of matter) is a temperature at least as good.
      expect(relative(row.temperatureGeV, rows[i]!.temperatureGeV)).toBeLessThan(
        block.history.expansion.kind === 'early-matter' ? 1e-8 : 1e-9,
      )
    })
  })

  it('meet z = 1100 at 365,567 years and today at 13.793 Gyr, as an independent integration has it', () => {
    for (const { history, ageAtZ1100Years, ageTodayYears } of historyFixture.ages) {
      const { rows } = computeHistory({ history, timesS: [ageTodayYears * YEAR, ageAtZ1100Years * YEAR] })
      expect(relative(rows[0]!.temperatureGeV, 2.7255 * GEV_PER_KELVIN)).toBeLessThan(1e-9)
      expect(relative(rows[1]!.redshift, 1100)).toBeLessThan(1e-8)
    }
    const ideal = historyFixture.ages.find(({ history }) => history.bath.treatment === 'ideal-switch')!
    expect(Math.round(ideal.ageAtZ1100Years)).toBe(365_567)
    expect(ideal.ageTodayYears / 1e9).toBeCloseTo(13.793, 3)
  })

  it('have the ages asked for, in the order asked for, from 1e16 to 1e-14 GeV', () => {
    const history = fc.constantFrom(
      {},
      { bath: { treatment: 'thresholds' } },
      {
        bath: { treatment: 'crossover' },
        expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 0.01 },
      },
      { expansion: { kind: 'entropy-step', temperatureGeV: 5, factor: 100 } },
      { expansion: { kind: 'early-matter', reheatTemperatureGeV: 0.1, startTemperatureGeV: 1e4 } },
    )
    const temperatures = fc.array(between(2e-14, 9e15), { minLength: 1, maxLength: 8 })
    fc.assert(
      fc.property(history, temperatures, (h, temperaturesGeV) => {
        const asked = computeHistory({ history: h, temperaturesGeV }).rows.map((row) => row.timeS)
        const { rows } = computeHistory({ history: h, timesS: asked })
        rows.forEach((row, i) => {
          expect(relative(row.timeS, asked[i]!)).toBeLessThan(1e-11)
          expect(relative(row.temperatureGeV, temperaturesGeV[i]!)).toBeLessThan(1e-10)
        })
      }),
      { numRuns: 60 },
    )
  })

  it('refuse an age before the tables begin or after they end, with its place in the list', () => {
    expect(faultsOf({ history: {}, timesS: [1, 1e-50] })[0]).toMatch(
      /^timesS\[1\]: allowed: at least 2\.\d+e-39 s, the age at 10000000000000000 GeV \(found 1e-50\)$/,
    )
    expect(faultsOf({ history: {}, timesS: [1, 1e19] })[0]).toMatch(/^timesS\[1\]: allowed: at most \d/)
  })

  it.each<[what: string, request: object, line: string]>([
    [
      'neither ages nor temperatures',
      {},
      'temperaturesGeV: missing; allowed: exactly one of temperaturesGeV and timesS',
    ],
    [
      'both',
      { temperaturesGeV: [1], timesS: [1] },
      'timesS: allowed: exactly one of temperaturesGeV and timesS',
    ],
    ['no age', { timesS: [] }, 'timesS: allowed: at least 1 in the list'],
    ['a negative age', { timesS: [1, -1] }, 'timesS[1]: allowed: above 0 (found -1)'],
    ['an endless age', { timesS: [Infinity] }, 'timesS[0]: allowed: a finite number (found "Infinity")'],
    [
      'too many rows with contributions',
      { temperaturesGeV: Array.from({ length: 2001 }, () => 1), contributions: true },
      'temperaturesGeV: allowed: at most 2000 in the list with contributions',
    ],
    [
      'contributions that are neither wanted nor not',
      { temperaturesGeV: [1], contributions: 'yes' },
      'contributions: allowed: true or false (found "yes")',
    ],
  ])('are refused with %s', (_what, request, line) => {
    expect(faultsOf({ history: {}, ...request })).toContain(line)
  })
})
