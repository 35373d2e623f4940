/** d(ρa³) = −p d(a³), by sums over the rows of a history alone: nothing of how it was computed is used. */
import { describe, expect, it } from 'vitest'
import { computeHistory } from '#core/index'
import type { HistoryRow } from '#core/wire/index'

/** ∫ f dV over rows, by the trapezoidal rule with a half, a quarter … of the intervals, extrapolated (Romberg). */
function stieltjes(rows: readonly HistoryRow[], f: (row: HistoryRow) => number): number {
  const volume = (row: HistoryRow): number => row.scaleFactor ** 3
  const coarse = (stride: number): number => {
    let sum = 0
    for (let i = stride; i < rows.length; i += stride)
      sum += ((f(rows[i]!) + f(rows[i - stride]!)) / 2) * (volume(rows[i]!) - volume(rows[i - stride]!))
    return sum
  }
  let level = [16, 8, 4, 2, 1].map(coarse)
  for (let order = 4; level.length > 1; order *= 4)
    level = level.slice(1).map((fine, i) => (order * fine - level[i]!) / (order - 1))
  return level[0]!
}

const INTERVALS = 128

/** Rows over stretches of a factor of two in T at most, one after another. */
function stretches(history: object, hot: number, cold: number): HistoryRow[][] {
  const count = Math.ceil(Math.log2(hot / cold))
  const temperaturesGeV = Array.from(
    { length: INTERVALS * count + 1 },
    (_, i) => hot * (cold / hot) ** (i / (INTERVALS * count)),
  )
  const { rows } = computeHistory({ history, temperaturesGeV })
  return Array.from({ length: count }, (_, i) => rows.slice(i * INTERVALS, (i + 1) * INTERVALS + 1))
}

/** Change of ρa³ over a stretch, and the work done. */
function balance(rows: readonly HistoryRow[]): { change: number; work: number; energy: number } {
  const energy = (row: HistoryRow): number => row.energyDensityGeV4 * row.scaleFactor ** 3
  const [first, last] = [energy(rows[0]!), energy(rows.at(-1)!)]
  return {
    change: last - first,
    work: stieltjes(rows, (row) => row.pressureGeV4!),
    energy: Math.max(first, last),
  }
}

/** Largest imbalance of any stretch over its energy. */
function imbalance(history: object, hot: number, cold: number): number {
  return Math.max(
    ...stretches(history, hot, cold).map((rows) => {
      const { change, work, energy } = balance(rows)
      return Math.abs(change + work) / energy
    }),
  )
}

const instantaneous = { treatment: 'instantaneous' }

/** Stretches without a step of the bath: below pions, through muons, through the transition, above, far above. */
const SMOOTH: Record<string, readonly (readonly [hot: number, cold: number])[]> = {
  thresholds: [
    [0.1, 0.003],
    [1e4, 200],
  ],
  'ideal-switch': [
    [0.0019, 1e-5],
    [0.1564, 0.0021],
    [1e4, 0.1566],
  ],
  crossover: [
    [0.0019, 1e-5],
    [1e4, 0.0021],
  ],
  'lattice-2014': [
    [0.0019, 1e-5],
    [0.1299, 0.0021],
    [0.1449, 0.1301],
    [1e3, 0.1451],
  ],
}

const expansions = [
  { kind: 'radiation' },
  { kind: 'fluid', index: 1, equalityTemperatureGeV: 0.05 },
  { kind: 'fluid', index: 4, equalityTemperatureGeV: 0.3 },
]

describe('energy', () => {
  const cases = Object.keys(SMOOTH).flatMap((treatment) =>
    expansions.map((expansion) => [treatment, JSON.stringify(expansion), expansion] as const),
  )

  it.each(cases)('is conserved where the treatment is a pressure: %s, %s', (treatment, _name, expansion) => {
    const history = { bath: { treatment }, neutrinos: instantaneous, expansion }
    for (const [hot, cold] of SMOOTH[treatment]!)
      // 2e-12 while g is smooth on the scale of an e-fold; the transition, 13 % wide, leaves 1e-10 to the sums.
      expect(imbalance(history, hot, cold), `${hot} to ${cold}`).toBeLessThan(1e-9)
  })

  it('is conserved with a species that has let go, massive or not, each at its own temperature', () => {
    for (const massGeV of [0, 0.4]) {
      const coupling = { kind: 'decoupled', temperatureGeV: 5 }
      const extraSpecies = [{ name: 'x', degreesOfFreedom: 3, statistics: 'boson', massGeV, coupling }]
      const history = { bath: { treatment: 'crossover' }, neutrinos: instantaneous, extraSpecies }
      expect(imbalance(history, 4.9, 0.0021), `${massGeV} GeV`).toBeLessThan(1e-9)
    }
  })

  it('is conserved through an era of matter: what the field loses the bath gains', () => {
    const expansion = { kind: 'early-matter', reheatTemperatureGeV: 0.5, startTemperatureGeV: 50 }
    const history = { bath: { treatment: 'crossover' }, neutrinos: instantaneous, expansion }
    // The era is solved to 1e-8, and where it heats the energy of the bath is all made of the field's.
    expect(imbalance(history, 1000, 0.01)).toBeLessThan(3e-8)
    const [row] = computeHistory({ history, temperaturesGeV: [5] }).rows
    expect(row!.equationOfState).toBeLessThan(0.1)
  })

  it('of a fitted or tabulated bath is missed by exactly the residual it reports', () => {
    for (const [treatment, hot, cold] of [
      ['fit-2018', 100, 0.1201],
      ['lattice-2016', 9.99, 1.001],
    ] as const) {
      const history = { bath: { treatment }, neutrinos: instantaneous }
      let most = 0
      for (const rows of stretches(history, hot, cold)) {
        const { change, work, energy } = balance(rows)
        // d(ρa³) + p d(a³) = a³T ds · residual, and ds = −s d(a³)/a³.
        const missed = stieltjes(
          rows,
          (row) => -row.temperatureGeV * row.entropyDensityGeV3 * row.identityResidual!,
        )
        // The residual is a difference quotient, good to 1e-8 of what g changes.
        expect(Math.abs(change + work - missed) / energy, treatment).toBeLessThan(1e-7)
        most = Math.max(most, Math.abs(missed) / energy)
      }
      expect(most, treatment).toBeGreaterThan(1e-5)
    }
  })
})
