import { describe, expect, it } from 'vitest'
import { buildHistory } from '#core/index'
import { annihilationRate } from '#core/abundance/rates/annihilationRate'
import { heldOutside, logLogTable } from '#core/abundance/rates/logLogTable'
import { scatteringSource } from '#core/abundance/freezeInSources'
import { GEV_MINUS2_PER_CM3_S } from '#core/constants/natural'
import { candidateInput, historyInput } from '#core/wire/index'
import type { CandidateInput } from '#core/wire/index'
import { ratesFixture, relative } from '../fixtures.ts'

type Of<M extends CandidateInput['mechanism']> = Extract<CandidateInput, { mechanism: M }>

const averageOf = (candidate: unknown): ((x: number) => number) => {
  const rate = annihilationRate(candidateInput.parse(candidate) as Of<'freeze-out'>)
  return (x) => rate.at(x) / GEV_MINUS2_PER_CM3_S
}

const wimp = (annihilation: object) => ({
  mechanism: 'freeze-out',
  massGeV: 50,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation,
})

describe('thermal averages', () => {
  it.each(ratesFixture.annihilation.map((each) => [each.name, each] as const))(
    'agree with independent quadrature to 1e-9: %s',
    (_name, { candidate, rows }) => {
      const average = averageOf(candidate)
      // The reference is good to 1e-10; averages are tabulated to 1e-9 in the logarithm.
      for (const { x, sigmaVCm3PerS } of rows)
        expect(relative(average(x), sigmaVCm3PerS), `x = ${x}`).toBeLessThan(1e-9)
    },
  )

  it('of partial waves are a + 6b/x (Gondolo & Gelmini 1991)', () => {
    const average = averageOf(wimp({ kind: 'partial-waves', sWaveCm3PerS: 2e-26, pWaveCm3PerS: 3e-26 }))
    expect(relative(average(20), 2e-26 + (6 * 3e-26) / 20)).toBeLessThan(1e-14)
  })

  it('of a Coulomb potential go over into the bare rate as α vanishes, and into 2πα√(x/π) times it when it is strong', () => {
    const factor = (couplingAlpha: number, x: number): number =>
      averageOf(wimp({ kind: 'sommerfeld', sWaveCm3PerS: 1e-26, couplingAlpha }))(x) / 1e-26
    // S = 1 + πα/v + …, and ⟨1/v⟩ = √(x/π).
    expect(relative(factor(1e-6, 20), 1 + Math.PI * 1e-6 * Math.sqrt(20 / Math.PI))).toBeLessThan(1e-9)
    // S = 2πα/v up to e^{−2πα/v}.
    expect(relative(factor(1, 400), 2 * Math.PI * Math.sqrt(400 / Math.PI))).toBeLessThan(1e-9)
  })

  it('of a Hulthén potential go over into Coulomb as the mediator becomes light', () => {
    const strength = { kind: 'sommerfeld', sWaveCm3PerS: 1e-26, couplingAlpha: 0.02 }
    const hulthen = averageOf(wimp({ ...strength, mediatorMassGeV: 1e-6 }))
    // The screening length is 2e4 wave lengths.
    expect(relative(hulthen(25), averageOf(wimp(strength))(25))).toBeLessThan(1e-5)
  })

  it('of a narrow resonance above threshold are those of the narrow-width integral (Griest & Seckel 1991)', () => {
    const [m, M, width] = [50, 120, 1.2e-5]
    const average = averageOf(
      wimp({ kind: 'resonance', massGeV: M, widthGeV: width, spin: 1, branchingProduct: 1e-3 }),
    )
    // Heavier in ⟨σv⟩ by one factor e^{−x(M/m − 2)}: a ratio at two x needs no normalisation.
    const kernel = (x: number): number => {
      const scaledK1 = Math.sqrt(Math.PI / (2 * x * (M / m))) * series(x * (M / m), 1)
      const scaledK2 = Math.sqrt(Math.PI / (2 * x)) * series(x, 2)
      return (x * scaledK1 * Math.exp(-x * (M / m - 2))) / scaledK2 ** 2
    }
    // Off the peak the tail adds Γ/M = 1e-7 times the ratio of phase spaces, e^{0.4 · 30} at most.
    expect(relative(average(30) / average(25), kernel(30) / kernel(25))).toBeLessThan(2e-3)
  })

  it('of one table in x, and the same in temperature, are the same', () => {
    const points = [1, 10, 100].map((x) => [x, 1e-26 * x] as const)
    const inX = averageOf(wimp({ kind: 'table', against: 'x', points }))
    const inT = averageOf(
      wimp({
        kind: 'table',
        against: 'temperatureGeV',
        points: points.map(([x, y]) => [50 / x, y]).reverse(),
      }),
    )
    for (const x of [0.1, 1, 3, 10, 77, 1e4]) expect(relative(inX(x), inT(x))).toBeLessThan(1e-13)
    expect(inX(0.1)).toBeCloseTo(inX(1), 40)
  })

  it('of two equal species that coannihilate are those of one with twice the states', () => {
    const pair = { sWaveCm3PerS: 3e-26 }
    const both = averageOf(
      wimp({
        kind: 'coannihilation',
        others: [{ massGeV: 50, degreesOfFreedom: 2, statistics: 'fermion' }],
        pairs: [
          { first: 0, second: 0, ...pair },
          { first: 0, second: 1, ...pair },
          { first: 1, second: 1, ...pair },
        ],
      }),
    )
    expect(relative(both(20), 3e-26)).toBeLessThan(1e-14)
  })
})

describe('a table of positive numbers', () => {
  const table = logLogTable([
    [1, 2],
    [10, 200],
    [100, 20],
  ])

  it('is joined by straight lines in the logarithms, through its rows', () => {
    expect(heldOutside(table, 10)).toBeCloseTo(200, 11)
    expect(heldOutside(table, Math.sqrt(10))).toBeCloseTo(20, 11)
    expect(heldOutside(table, Math.sqrt(1000))).toBeCloseTo(Math.sqrt(4000), 11)
  })

  it('holds its end value outside', () => {
    expect(heldOutside(table, 1e-3)).toBeCloseTo(2, 13)
    expect(heldOutside(table, 1e3)).toBeCloseTo(20, 12)
  })
})

/** The asymptotic series of e^z K_n(z)/√(π/2z): DLMF 10.40.2. */
function series(z: number, n: number): number {
  let term = 1
  let sum = 1
  for (let k = 1; k < 12; k++) sum += term *= (4 * n * n - (2 * k - 1) ** 2) / (8 * z * k)
  return sum
}

describe('reaction densities', () => {
  const history = buildHistory(historyInput.parse({}))

  it.each(ratesFixture.scattering.map((each) => [each.name, each] as const))(
    'agree with independent quadrature to 1e-9: %s',
    (_name, { massGeV, scattering, rows }) => {
      const candidate = candidateInput.parse({
        mechanism: 'freeze-in-scattering',
        massGeV,
        degreesOfFreedom: 2,
        statistics: 'fermion',
        scattering,
      }) as Of<'freeze-in-scattering'>
      const source = scatteringSource(history, candidate)
      for (const { temperatureGeV, productionGeV4 } of rows)
        expect(relative(source.reactionDensity(temperatureGeV), productionGeV4), `T = ${temperatureGeV}`)
          // The reference is good to 1e-10; the density is tabulated to 1e-10 in the logarithm.
          .toBeLessThan(1e-9)
    },
  )
})
