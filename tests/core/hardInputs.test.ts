import { describe, expect, it } from 'vitest'
import {
  abundance,
  benchAnswer,
  buildHistory,
  computeAbundance,
  computeHistory,
  computeSolve,
} from '#core/index'
import { InputError, abundanceResult, candidateInput, historyInput } from '#core/wire/index'

const wimp = {
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
}
const withRate = (sWaveCm3PerS: number) => ({
  ...wimp,
  annihilation: { kind: 'partial-waves', sWaveCm3PerS },
})
const window = { hotGeV: 1000, coldGeV: 1e-4 }

describe('baths', () => {
  it.each([5e-4, 1e-3, 2e-3, 5e-3])(
    'resolve a crossover %f GeV wide: the table is good to 1e-8',
    (transitionWidthGeV) => {
      const history = buildHistory(
        historyInput.parse({ bath: { treatment: 'crossover', transitionWidthGeV } }),
      )
      expect(history.tableError).toBeLessThan(1e-8)
    },
  )

  it('never give a result that states an error of per cents', () => {
    const history = { bath: { treatment: 'crossover', transitionWidthGeV: 1e-3 } }
    const { numericalError } = computeAbundance({ history, candidate: { ...wimp, massGeV: 3 } })
    expect(numericalError).toBeLessThan(1e-6)
  })

  it.each(['instantaneous', 'specified'])(
    'of steps take %s neutrinos that let go after the electrons are gone',
    (treatment) => {
      const history = {
        bath: { treatment: 'thresholds' },
        neutrinos: { treatment, decouplingTemperatureGeV: 4e-4 },
      }
      const [row] = computeHistory({ history, temperaturesGeV: [1e-4] }).rows
      expect(Number.isFinite(row!.gRho) && Number.isFinite(row!.hubbleGeV)).toBe(true)
    },
  )

  it('refuse a species that let go when none of it was left, with its path', () => {
    const extraSpecies = [
      {
        name: 'x',
        degreesOfFreedom: 1,
        statistics: 'boson',
        massGeV: 1,
        coupling: { kind: 'decoupled', temperatureGeV: 1e-3 },
      },
    ]
    const history = (): unknown => computeHistory({ history: { extraSpecies }, temperaturesGeV: [1e-4] })
    expect(history).toThrow(InputError)
    expect(history).toThrow('history.extraSpecies[0].coupling.temperatureGeV')
  })
})

describe('an era of matter', () => {
  const diluted = (dilution: number): number => {
    const expansion = { kind: 'early-matter', reheatTemperatureGeV: 0.1, dilution }
    return computeAbundance({ history: { expansion }, candidate: wimp }).dilution!
  }

  it.each([5, 20])('with a dilution of %f is found', (dilution) => {
    expect(diluted(dilution) / dilution).toBeCloseTo(1, 8)
  })

  it('whose field never equals the radiation has a dilution that is refused with its path', () => {
    expect(() => diluted(1.1)).toThrow(InputError)
    expect(() => diluted(1.1)).toThrow('history.expansion.dilution')
  })

  it('whose dilution would begin above the tables is an InputError, not a RangeError', () => {
    const expansion = { kind: 'early-matter', reheatTemperatureGeV: 1e6, dilution: 1e12 }
    expect(() => computeAbundance({ history: { expansion }, candidate: wimp })).toThrow(InputError)
  })

  it('that would begin after it ends is an InputError', () => {
    const expansion = { kind: 'early-matter', reheatTemperatureGeV: 10, startTemperatureGeV: 0.5 }
    expect(() => computeAbundance({ history: { expansion }, candidate: wimp })).toThrow(InputError)
  })

  it('is solved for a dilution of about nine', () => {
    const expansion = { kind: 'early-matter', reheatTemperatureGeV: 0.1 }
    const solved = computeSolve({
      history: { expansion },
      candidate: withRate(2.2e-27),
      solveFor: 'history.expansion.dilution',
    })
    expect(solved.solutions).toHaveLength(1)
  })
})

describe('solving', () => {
  it('does not take a jump of the abundance for a solution', () => {
    const history = { bath: { treatment: 'thresholds' } }
    const candidate = {
      mechanism: 'hot-relic',
      massGeV: 1e-8,
      degreesOfFreedom: 2,
      statistics: 'fermion',
      decouplingTemperatureGeV: 0.1,
    }
    const request = {
      history,
      candidate,
      solveFor: 'candidate.decouplingTemperatureGeV',
      targetOmegaH2: 0.0937,
      between: [0.05, 0.13],
    }
    for (const decouplingTemperatureGeV of computeSolve(request).solutions)
      expect(
        computeAbundance({ history, candidate: { ...candidate, decouplingTemperatureGeV } }).omegaH2 / 0.0937,
      ).toBeCloseTo(1, 5)
  })
})

describe('abundances', () => {
  it.each([1e-22, 1e-21])(
    'of an asymmetric candidate that annihilates strongly are its asymmetry: %f cm³/s',
    (rate) => {
      const candidate = {
        ...withRate(rate),
        mechanism: 'asymmetric',
        massGeV: 5,
        degreesOfFreedom: 4,
        asymmetry: 1e-9,
      }
      expect(computeAbundance({ history: {}, candidate }).yieldToday / 1e-9).toBeCloseTo(1, 8)
    },
  )

  it.each([1e-22, 1e-20])(
    'from nothing with strong annihilation end as from equilibrium: %f cm³/s',
    (rate) => {
      const fromNothing = computeAbundance({
        history: {},
        candidate: { ...withRate(rate), initialAbundance: 'zero' },
      })
      expect(
        fromNothing.omegaH2 / computeAbundance({ history: {}, candidate: withRate(rate) }).omegaH2,
      ).toBeCloseTo(1, 6)
    },
  )

  it('have guards with finite numbers, so that they survive JSON', () => {
    const result = abundance(
      buildHistory(historyInput.parse({ maximumTemperatureGeV: 1 })),
      candidateInput.parse({
        mechanism: 'freeze-in-ultraviolet',
        massGeV: 1e6,
        degreesOfFreedom: 2,
        statistics: 'fermion',
        ultraviolet: { coefficient: 1, scaleGeV: 1, index: 1 },
      }),
    )
    expect(() => abundanceResult.parse(JSON.parse(JSON.stringify(result)))).not.toThrow()
  })
})

describe('the Bench', () => {
  it.each([
    ['nothing', null],
    ['no window', { history: {}, baseline: {}, candidate: wimp }],
    [
      'a window that is no number',
      { history: {}, baseline: {}, candidate: wimp, window: { hotGeV: NaN, coldGeV: 1 } },
    ],
    [
      'a window the wrong way round',
      { history: {}, baseline: {}, candidate: wimp, window: { hotGeV: 1, coldGeV: 2 } },
    ],
  ])('refuses %s with a fault', (_what, request) => {
    expect(benchAnswer(request as never).status).toBe('refused')
  })

  it('names the baseline when it is the baseline that does not fit the candidate', () => {
    const ultraviolet = { coefficient: 1, scaleGeV: 1e15, index: 1 }
    const particle = { massGeV: 100, degreesOfFreedom: 2, statistics: 'fermion' }
    const answer = benchAnswer({
      history: historyInput.parse({ maximumTemperatureGeV: 1e6 }),
      baseline: historyInput.parse({}),
      candidate: candidateInput.parse({ ...particle, mechanism: 'freeze-in-ultraviolet', ultraviolet }),
      window,
    })
    expect(answer.status === 'refused' && answer.faults[0]!.path).toBe('baseline.maximumTemperatureGeV')
  })
})
