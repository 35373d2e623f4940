import { describe, expect, it } from 'vitest'
import { benchAnswer, computeHistory } from '#core/index'
import type { BenchReport, BenchRequest, Curve } from '#core/index'
import { ASSUMPTION_GROUPS, candidateInput, historyInput } from '#core/wire/index'
import type { CandidateInput } from '#core/wire/index'

const baseline = historyInput.parse({ bath: { treatment: 'thresholds' } })
const history = historyInput.parse({ expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 1.15 } })
const window = { hotGeV: 1000, coldGeV: 1e-4 }
const common = { massGeV: 100, degreesOfFreedom: 2, statistics: 'fermion' }
const annihilation = { kind: 'partial-waves', sWaveCm3PerS: 4.1e-26 }
const wimp = candidateInput.parse({ mechanism: 'freeze-out', ...common, annihilation })

function report(request: Partial<BenchRequest> = {}): BenchReport {
  const answer = benchAnswer({ history, baseline, candidate: wimp, window, ...request })
  if (answer.status !== 'done') throw new Error(JSON.stringify(answer))
  return answer.report
}

/** One candidate of every mechanism. */
const candidates: CandidateInput[] = [
  wimp,
  candidateInput.parse({ mechanism: 'freeze-out', ...common, annihilation, initialAbundance: 'zero' }),
  candidateInput.parse({
    mechanism: 'freeze-in-decay',
    ...common,
    massGeV: 1e-4,
    parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-7 },
  }),
  candidateInput.parse({
    mechanism: 'freeze-in-decay',
    ...common,
    massGeV: 1e-4,
    parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-7 },
    backReaction: true,
  }),
  candidateInput.parse({
    mechanism: 'freeze-in-decay',
    ...common,
    massGeV: 1e-4,
    parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-7, annihilation },
  }),
  candidateInput.parse({
    mechanism: 'freeze-in-scattering',
    ...common,
    scattering: { kind: 'constant-matrix-element', matrixElementSquared: 1e-21 },
  }),
  candidateInput.parse({
    mechanism: 'asymmetric',
    ...common,
    degreesOfFreedom: 4,
    asymmetry: 1e-11,
    annihilation,
  }),
  candidateInput.parse({ mechanism: 'hot-relic', ...common, massGeV: 1e-8, decouplingTemperatureGeV: 0.1 }),
]

describe('what the Bench shows', () => {
  it('has factors whose product is the ratio to the baseline', () => {
    const { factors, result, baselineOmegaH2 } = report()
    const product = factors.reduce((total, factor) => total * factor.attributed!, 1)
    expect(product).toBeCloseTo(result.omegaH2 / baselineOmegaH2, 12)
    expect(factors.filter((factor) => factor.differs).map((factor) => factor.group)).toEqual([
      'bath',
      'expansion',
    ])
    for (const factor of factors.filter((each) => !each.differs))
      expect([factor.oneAtATime, factor.attributed]).toEqual([1, 1])
  })

  it('has factors whose product is the ratio when every group differs, in the order of the cards', () => {
    const other = historyInput.parse({
      bath: { treatment: 'lattice-2016' },
      neutrinos: { treatment: 'instantaneous' },
      extraSpecies: [
        { name: 'x', degreesOfFreedom: 4, statistics: 'fermion', massGeV: 1, coupling: { kind: 'bath' } },
      ],
      expansion: { kind: 'entropy-step', temperatureGeV: 0.1, factor: 3 },
      maximumTemperatureGeV: 8,
      today: { temperatureK: 2.73 },
    })
    const { factors, result, baselineOmegaH2 } = report({ history: other })
    expect(factors.map((factor) => factor.group)).toEqual([...ASSUMPTION_GROUPS])
    expect(factors.every((factor) => factor.differs)).toBe(true)
    const product = factors.reduce((total, factor) => total * factor.attributed!, 1)
    expect(product).toBeCloseTo(result.omegaH2 / baselineOmegaH2, 12)
    // Today's entropy goes as T₀³ whatever else is assumed, so alone and attributed are one number.
    const today = factors.find((factor) => factor.group === 'today')!
    expect(today.oneAtATime).toBeCloseTo((2.73 / 2.7255) ** 3, 10)
    expect(today.attributed).toBeCloseTo(today.oneAtATime!, 10)
  })

  it('has factors of one throughout when the history is the baseline', () => {
    const { factors, result, baselineOmegaH2 } = report({ history: baseline })
    expect(result.omegaH2).toBe(baselineOmegaH2)
    for (const factor of factors)
      expect([factor.differs, factor.oneAtATime, factor.attributed]).toEqual([false, 1, 1])
  })

  it('leaves a factor open that cannot be computed, and answers all the same', () => {
    // The maximum temperature alone would lie below the matter era of the baseline.
    const era = { kind: 'early-matter', reheatTemperatureGeV: 1, startTemperatureGeV: 100 }
    const { factors } = report({
      baseline: historyInput.parse({ expansion: era }),
      history: historyInput.parse({ maximumTemperatureGeV: 0.5 }),
      candidate: candidateInput.parse({ ...wimp, massGeV: 1 }),
    })
    const maximum = factors.find((factor) => factor.group === 'maximumTemperatureGeV')!
    expect([maximum.oneAtATime, maximum.attributed]).toEqual([null, null])
    expect(factors.find((factor) => factor.group === 'expansion')!.oneAtATime).toBeGreaterThan(0)
  })

  it('draws every curve over the same temperatures, hot to cold, within the window', () => {
    const { yieldCurve, ...rest } = report()
    const temperatures = [...yieldCurve.temperatureGeV]
    expect(temperatures[0]).toBeCloseTo(window.hotGeV, 9)
    expect(temperatures.at(-1)).toBeCloseTo(window.coldGeV, 12)
    for (let i = 1; i < temperatures.length; i++) expect(temperatures[i]).toBeLessThan(temperatures[i - 1]!)
    const curves = Object.entries(rest).filter(([name]) => name.endsWith('Curve'))
    expect(curves.length).toBeGreaterThanOrEqual(7)
    for (const [name, curve] of curves) {
      expect([...(curve as Curve).temperatureGeV], name).toEqual(temperatures)
      expect((curve as Curve).value.length, name).toBe(temperatures.length)
    }
  })

  it('draws g_ρ as the rows of the history have it, and its ratio to the baseline', () => {
    const { gRhoCurve, gRhoRatioCurve, baselineGRhoCurve } = report()
    const { rows } = computeHistory({ history, temperaturesGeV: [...gRhoCurve.temperatureGeV] })
    rows.forEach((row, i) => {
      expect(gRhoCurve.value[i]! / row.gRho).toBeCloseTo(1, 8)
      expect(gRhoRatioCurve.value[i]! * baselineGRhoCurve.value[i]!).toBeCloseTo(gRhoCurve.value[i]!, 10)
    })
  })

  it('shows how the number comes about: Ωh² = m Y₀ s₀/(ρ_c/h²) holds among its workings', () => {
    const { workings, result } = report()
    const value = (symbol: string): number => workings.find((each) => each.symbol === symbol)!.value
    const product = (value('m') * value('Y₀') * value('s₀')) / value('ρ_c/h²')
    expect(product / result.omegaH2).toBeCloseTo(1, 12)
    for (const working of workings) expect(working.formula && working.source).toBeTruthy()
  })

  it('looks at every guard that it raises', () => {
    for (const candidate of candidates) {
      const { guardsLookedAt, result } = report({ candidate })
      const codes = guardsLookedAt.map((each) => each.code)
      for (const guard of result.guards) expect(codes).toContain(guard.code)
    }
  })

  it.each(candidates.map((candidate) => [candidate.mechanism, candidate] as const))(
    'draws a yield that ends at the yield today: %s',
    (_mechanism, candidate) => {
      const { yieldCurve, result } = report({ candidate, history: baseline })
      const shown = [...yieldCurve.value].filter(Number.isFinite)
      expect(shown.length).toBeGreaterThan(50)
      // The curve ends at 100 keV, after which no more than 1e-4 is annihilated; the fine solve and the drawn one differ by less.
      expect(Math.abs(shown.at(-1)! / result.yieldToday - 1)).toBeLessThan(1e-3)
    },
  )

  it('draws a yield without a leap anywhere but at an entropy release', () => {
    for (const candidate of candidates) {
      const { yieldCurve } = report({ candidate })
      const logs = [...yieldCurve.value].filter((value) => value > 0).map(Math.log)
      // Neighbours are 6 % apart in T; Y_eq falls by at most e^{−0.06 x}, that is e^{−2} at freeze-out, and freeze-in rises as T⁻³.
      for (let i = 5; i < logs.length; i++)
        expect(Math.abs(logs[i]! - logs[i - 1]!), `${candidate.mechanism} at ${i}`).toBeLessThan(2.5)
    }
  })

  it('follows equilibrium before freeze-out to the lag that is expected', () => {
    const { yieldCurve, equilibriumCurve, mark } = report()
    yieldCurve.temperatureGeV.forEach((temperature, i) => {
      if (temperature > 2.5 * mark!.temperatureGeV)
        expect(Math.abs(yieldCurve.value[i]! / equilibriumCurve.value[i]! - 1)).toBeLessThan(0.01)
    })
  })

  it('shows both sides of every step', () => {
    const { baselineGRhoCurve } = report()
    const jumps = [...baselineGRhoCurve.value].filter(
      (value, i, all) => i > 0 && Math.abs(value - all[i - 1]!) > 1,
    )
    const ratios = [...baselineGRhoCurve.temperatureGeV].filter(
      (temperature, i, all) => i > 0 && all[i - 1]! / temperature < 1 + 1e-8,
    )
    expect(jumps.length).toBeGreaterThan(6)
    expect(ratios.length).toBeGreaterThan(10)
  })

  it('gives the age at the powers of ten of the window, growing as it cools', () => {
    const { times } = report()
    expect(times.map((time) => time.temperatureGeV)).toEqual([1000, 100, 10, 1, 0.1, 0.01, 0.001, 0.0001])
    for (let i = 1; i < times.length; i++) expect(times[i]!.timeS).toBeGreaterThan(times[i - 1]!.timeS)
  })

  it('names epochs from hot to cold, the fluid among them', () => {
    const { epochs } = report()
    expect(epochs.map((epoch) => epoch.code)).toContain('fluid-equality')
    for (let i = 1; i < epochs.length; i++)
      expect(epochs[i]!.temperatureGeV).toBeLessThanOrEqual(epochs[i - 1]!.temperatureGeV)
  })

  it('has a band where the bath has one, around the answer', () => {
    const { band, result } = report()
    expect(band!.low).toBeLessThan(result.omegaH2)
    expect(band!.high).toBeGreaterThan(result.omegaH2)
    expect(report({ history: baseline }).band).toBeNull()
  })

  it('answers a bad input with faults that name the field', () => {
    const bad = { ...wimp, massGeV: -5 } as CandidateInput
    const answer = benchAnswer({ history, baseline, candidate: bad, window })
    expect(answer).toEqual({
      status: 'refused',
      faults: [{ path: 'candidate.massGeV', value: -5, message: 'allowed: above 0' }],
    })
  })

  it('answers a history and a candidate that do not go together with a fault, too', () => {
    const ultraviolet = candidateInput.parse({
      mechanism: 'freeze-in-ultraviolet',
      ...common,
      ultraviolet: { coefficient: 1, scaleGeV: 1e15, index: 1 },
    })
    const answer = benchAnswer({ history, baseline, candidate: ultraviolet, window })
    expect(answer.status === 'refused' && answer.faults[0]!.path).toBe('history.maximumTemperatureGeV')
  })
})
