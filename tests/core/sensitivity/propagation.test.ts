import { readFileSync } from 'node:fs'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ConvergenceError, computeAbundance, computePropagation } from '#core/index'
import { quantile } from '#core/numerics/statistics/quantile'
import { normalQuantile } from '#core/numerics/special/normalQuantile'
import { quantileOf, twoPieceNormalQuantile } from '#core/sensitivity/distributions'
import { InputError, distributionInput } from '#core/wire/index'
import type { DistributionInput, PropagateResult } from '#core/wire/index'
import { relative } from '../fixtures.ts'

const { twoPieceNormal } = JSON.parse(
  readFileSync(new URL('../../reference/sampling.json', import.meta.url), 'utf8'),
) as {
  twoPieceNormal: { value: number; minus: number; plus: number; probability: number; quantile: number }[]
}

const decay = {
  mechanism: 'freeze-in-decay',
  massGeV: 1e-5,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-9 },
}

const wimp = {
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
}

const lifetime = {
  path: 'candidate.parent.lifetimeS',
  kind: 'log-normal',
  median: 1e-9,
  standardDeviationOfLn: 0.8,
}
const massOfParent = { path: 'candidate.parent.massGeV', kind: 'normal', mean: 300, standardDeviation: 15 }

function faultsOf(input: unknown): string[] {
  try {
    computePropagation(input)
  } catch (error) {
    if (error instanceof InputError) return error.message.split('\n')
    throw error
  }
  return []
}

describe('propagation', () => {
  it('has the distribution known in closed form where the abundance is a power of the input', () => {
    // Freeze-in by decay is exactly ∝ 1/τ: a log-normal lifetime makes a log-normal abundance of the same width.
    const samples = 2000
    const result = computePropagation({
      history: {},
      candidate: decay,
      distributions: [lifetime],
      samples,
      seed: 3,
    })
    const { omegaH2 } = computeAbundance({ history: {}, candidate: decay })
    expect(relative(result.central.omegaH2, omegaH2)).toBeLessThan(1e-14)
    for (const { probability, value } of result.omegaH2.quantiles) {
      const exact = omegaH2 * Math.exp(0.8 * normalQuantile(probability))
      // One sample in each stratum: the quantile lies within the strata next to it.
      const strata = normalQuantile(probability + 2 / samples) - normalQuantile(probability - 2 / samples)
      expect(Math.abs(Math.log(value / exact))).toBeLessThan(0.8 * strata)
    }
    // Strata of 1/2000 leave a bias of about 1/samples in mean and width.
    expect(Math.abs(result.omegaH2.meanOfLn - Math.log(omegaH2))).toBeLessThan(1e-3)
    expect(relative(result.omegaH2.standardDeviationOfLn, 0.8)).toBeLessThan(2e-3)
    expect(relative(result.omegaH2.mean, omegaH2 * Math.exp(0.8 ** 2 / 2))).toBeLessThan(5e-3)
    expect(result.rankCorrelations).toEqual([{ path: lifetime.path, value: -1 }])
  })

  it('of a product has the width of both factors, and rank correlations in proportion', () => {
    // ln Ω = ln m_X − ln τ + const: the variances add, and independent columns of 4000 correlate to 1.6 %.
    const result = computePropagation({
      history: {},
      candidate: decay,
      distributions: [
        lifetime,
        { path: 'candidate.massGeV', kind: 'log-normal', median: 1e-5, standardDeviationOfLn: 0.6 },
      ],
      samples: 4000,
      seed: 11,
    })
    expect(relative(result.omegaH2.standardDeviationOfLn, 1)).toBeLessThan(0.05)
    const spearman = (r: number): number => (6 / Math.PI) * Math.asin(r / 2)
    const [ofLifetime, ofMass] = result.rankCorrelations.map((each) => each.value!)
    // For normal variables ρ_S = (6/π) asin(ρ/2), Pearson 1907; five standard deviations of 1/√4000 and the chance correlation.
    expect(Math.abs(ofLifetime! - spearman(-0.8))).toBeLessThan(0.08)
    expect(Math.abs(ofMass! - spearman(0.6))).toBeLessThan(0.08)
  })

  it('is the abundance of each sample, and its statistics are theirs', () => {
    const result = computePropagation({
      history: {},
      candidate: decay,
      distributions: [lifetime, massOfParent],
      samples: 30,
      seed: 4,
      withSamples: true,
      histogramBins: 7,
    })
    const { omegaH2, inputs } = result.samples!
    const [lifetimes, masses] = inputs.map((each) => each.values)
    for (const i of [0, 7, 29]) {
      const candidate = {
        ...decay,
        parent: { ...decay.parent, lifetimeS: lifetimes![i]!, massGeV: masses![i]! },
      }
      expect(computeAbundance({ history: {}, candidate }).omegaH2).toBe(omegaH2[i])
    }
    const ascending = (omegaH2 as number[]).toSorted((a, b) => a - b)
    for (const { probability, value } of result.omegaH2.quantiles)
      expect(value).toBe(quantile(ascending, probability))
    expect(result.histogram.edges).toHaveLength(8)
    result.histogram.counts.forEach((count, i) => {
      const [low, high] = [result.histogram.edges[i]!, result.histogram.edges[i + 1]!]
      const edge = 1e-12
      expect(
        ascending.filter((value) => value > low * (1 + edge) && value < high * (1 - edge)).length,
      ).toBeLessThanOrEqual(count)
    })
    expect(result.histogram.counts.reduce((sum, count) => sum + count, 0)).toBe(30)
    expect([result.samplesComputed, result.samplesFailed, result.failures]).toEqual([30, 0, []])
  })

  it('gives the same numbers for the same seed, and others for another', () => {
    const ask = (seed: number): PropagateResult =>
      computePropagation({ history: {}, candidate: decay, distributions: [lifetime], samples: 20, seed })
    expect(ask(8)).toEqual(ask(8))
    expect(ask(9).omegaH2.quantiles).not.toEqual(ask(8).omegaH2.quantiles)
  })

  it('does not depend on the order of the distributions, nor a column on the others', () => {
    const ask = (distributions: unknown[]): PropagateResult =>
      computePropagation({ history: {}, candidate: decay, distributions, samples: 25, withSamples: true })
    const [there, back, alone] = [
      ask([lifetime, massOfParent]),
      ask([massOfParent, lifetime]),
      ask([lifetime]),
    ]
    expect(back.samples!.omegaH2).toEqual(there.samples!.omegaH2)
    expect(back.omegaH2).toEqual(there.omegaH2)
    expect(back.rankCorrelations.toReversed()).toEqual(there.rankCorrelations)
    expect(alone.samples!.inputs[0]).toEqual(there.samples!.inputs[0])
  })

  it('chooses between whole treatments, each in its share, and says what each gave', () => {
    const baths = [{ treatment: 'thresholds' }, { treatment: 'lattice-2016' }]
    const { choices, rankCorrelations, omegaH2 } = computePropagation({
      history: {},
      candidate: wimp,
      distributions: [{ path: 'history.bath', kind: 'discrete', values: baths, weights: [3, 1] }],
      samples: 40,
    })
    const each = baths.map((bath) => computeAbundance({ history: { bath }, candidate: wimp }).omegaH2)
    expect(choices[0]!.values).toEqual([
      { samples: 30, medianOmegaH2: each[0] },
      { samples: 10, medianOmegaH2: each[1] },
    ])
    expect(rankCorrelations[0]!.value).toBeNull()
    expect(relative(omegaH2.mean, (3 * each[0]! + each[1]!) / 4)).toBeLessThan(1e-14)
  })

  it('varies numbers anywhere, in lists and in a history whose value was left out', () => {
    const species = {
      name: 'dark',
      degreesOfFreedom: 2,
      statistics: 'boson',
      coupling: { kind: 'ratio', ratio: 0.5 },
    }
    const { rankCorrelations } = computePropagation({
      history: { extraSpecies: [{ ...species, massGeV: 0 }] },
      candidate: wimp,
      distributions: [
        { path: 'history.extraSpecies[0].coupling.ratio', kind: 'uniform', low: 0.5, high: 1 },
        { path: 'history.today.temperatureK', kind: 'normal', mean: 2.7255, standardDeviation: 1e-7 },
      ],
      samples: 12,
    })
    // More radiation: faster expansion, more left over; the present temperature moves the abundance by 1e-7 only.
    expect(rankCorrelations[0]!.value).toBe(1)
  })

  it('compares with a measured density: pull, share, and the part below', () => {
    const ask = (target: unknown) =>
      computePropagation({ history: {}, candidate: decay, distributions: [lifetime], samples: 400, target })
        .target!
    const { omegaH2 } = computeAbundance({ history: {}, candidate: decay })
    // A target known exactly, one standard deviation above the median, where 84 % lie below.
    const above = ask({ value: omegaH2 * Math.exp(0.8 * normalQuantile(0.84)), minus: 0, plus: 0 })
    // 400 strata: 0.25 % of probability, 1 % of a standard deviation at 84 %.
    expect(Math.abs(above.pull! + 1)).toBeLessThan(0.02)
    expect(Math.abs(above.probabilityBelow - 0.84)).toBeLessThanOrEqual(0.0025)
    expect(Math.abs(above.share.quantiles[3]!.value - 1)).toBeLessThan(0.02)
    // With an error as large as the spread, the pull is smaller by √2.
    const uncertain = ask({
      value: omegaH2 * Math.exp(-0.8),
      minus: 0,
      plus: omegaH2 * Math.exp(-0.8) * Math.expm1(0.8),
    })
    expect(relative(uncertain.pull!, 1 / Math.hypot(1, normalQuantile(0.84)))).toBeLessThan(0.02)
  })
})

describe('samples that cannot be computed', () => {
  const wide = { path: 'candidate.parent.massGeV', kind: 'normal', mean: 300, standardDeviation: 150 }

  it('are counted with their reason and left out of the statistics', () => {
    const result = computePropagation({
      history: {},
      candidate: decay,
      distributions: [wide],
      samples: 200,
      withSamples: true,
    })
    // Φ(−2) of 200 is 4.55: four strata are negative masses, and a part of the fifth.
    expect([4, 5]).toContain(result.samplesFailed)
    expect(result.samplesComputed).toBe(200 - result.samplesFailed)
    expect(result.failures).toHaveLength(1)
    const failure = result.failures[0]!
    expect(failure).toMatchObject({
      error: 'InputError',
      path: 'candidate.parent.massGeV',
      count: result.samplesFailed,
    })
    expect(failure.message).toMatch(/^allowed: above 0 \(found -/)
    expect(result.samples!.omegaH2[failure.firstSample]).toBeNull()
    expect(result.samples!.inputs[0]!.values[failure.firstSample]).toBeLessThan(0)
  })

  it('are an error when they are more than the share allowed', () => {
    const asked = {
      history: {},
      candidate: decay,
      distributions: [wide],
      samples: 200,
      largestFailedShare: 0.015,
    }
    expect(() => computePropagation(asked)).toThrow(InputError)
    expect(() => computePropagation(asked)).toThrow(
      /distributions: 4 samples .* at most a share 0.015 .* candidate.parent.massGeV: allowed: above 0/,
    )
  })
})

describe('distributions', () => {
  const on = (distribution: object) => ({
    history: {},
    candidate: decay,
    distributions: [distribution],
    samples: 10,
  })

  it('must fit their place', () => {
    expect(faultsOf(on({ ...massOfParent, path: 'candidate.colour' }))[0]).toBe(
      'distributions[0].path: candidate.colour: not a name known here; remove it or correct its spelling',
    )
    expect(faultsOf(on({ ...massOfParent, mean: -3 }))[0]).toBe(
      'distributions[0].mean: candidate.parent.massGeV: allowed: above 0 (found -3)',
    )
    expect(faultsOf(on({ path: 'candidate.parent.massGeV', kind: 'uniform', low: 1, high: 1e20 }))).toEqual([
      'distributions[0].high: candidate.parent.massGeV: allowed: at most 10000000000000000000 (found 100000000000000000000)',
    ])
    expect(
      faultsOf(
        on({
          path: 'history.bath',
          kind: 'discrete',
          values: [{ treatment: 'thresholds' }, { treatment: 'fit-2018', band: 2 }],
        }),
      ),
    ).toEqual(['distributions[0].values[1].band: history.bath.band: allowed: at most 1 (found 2)'])
    expect(faultsOf(on({ ...massOfParent, path: 'candidate.mechanism' }))[0]).toMatch(
      /^distributions\[0\]\.mean: candidate\.mechanism: /,
    )
  })

  it('must be apart from each other', () => {
    const bath = {
      path: 'history.bath',
      kind: 'discrete',
      values: [{ treatment: 'fit-2018' }, { treatment: 'thresholds' }],
    }
    const band = { path: 'history.bath.band', kind: 'uniform', low: -1, high: 1 }
    expect(faultsOf({ ...on(band), distributions: [band, bath] })).toEqual([
      'distributions[1].path: allowed: a place apart from that of distributions[0], history.bath.band (found "history.bath")',
    ])
    expect(faultsOf({ ...on(band), distributions: [band, band] })).toHaveLength(1)
  })

  it('leave faults of the rest where they are', () => {
    expect(faultsOf({ ...on(massOfParent), candidate: { ...decay, statistics: 'anyon' } })).toEqual([
      'candidate.statistics: allowed: "fermion", "boson" (found "anyon")',
    ])
  })

  it.each([
    [{ kind: 'normal', mean: 1, standardDeviation: 0 }, 'standardDeviation'],
    [{ kind: 'uniform', low: 2, high: 2 }, 'high'],
    [{ kind: 'log-uniform', low: 0, high: 2 }, 'low'],
    [{ kind: 'log-normal', median: -1, standardDeviationOfLn: 1 }, 'median'],
    [{ kind: 'two-piece-normal', value: 1, minus: 0, plus: 0 }, 'plus'],
    [{ kind: 'discrete', values: [1, 2], weights: [1] }, 'weights'],
    [{ kind: 'normal', mean: NaN, standardDeviation: 1 }, 'mean'],
  ])('are refused when they are none: %j', (distribution, field) => {
    expect(faultsOf(on({ path: 'candidate.massGeV', ...distribution }))[0]).toMatch(
      new RegExp(`^distributions\\[0\\]\\.${field}:`),
    )
  })

  it('have the quantiles of SciPy’s integrals: two pieces', () => {
    for (const { probability, quantile: expected, ...distribution } of twoPieceNormal)
      expect(relative(twoPieceNormalQuantile(distribution, probability), expected)).toBeLessThan(1e-11)
  })

  it('rise with the probability and keep within their ends', () => {
    const any = fc.oneof(
      fc.record({
        kind: fc.constant('normal'),
        mean: fc.double({ min: -10, max: 10, noNaN: true }),
        standardDeviation: fc.double({ min: 0.1, max: 5, noNaN: true }),
      }),
      fc.record({
        kind: fc.constant('two-piece-normal'),
        value: fc.constant(2),
        minus: fc.double({ min: 0, max: 5, noNaN: true }),
        plus: fc.double({ min: 0.1, max: 5, noNaN: true }),
      }),
      fc.record({
        kind: fc.constant('log-normal'),
        median: fc.double({ min: 0.1, max: 5, noNaN: true }),
        standardDeviationOfLn: fc.constant(0.7),
      }),
      fc.record({
        kind: fc.constantFrom('uniform', 'log-uniform'),
        low: fc.constant(0.5),
        high: fc.double({ min: 1, max: 5, noNaN: true }),
      }),
      fc.record({
        kind: fc.constant('discrete'),
        values: fc.constant([1, 2, 3]),
        weights: fc.array(fc.double({ min: 0.1, max: 5, noNaN: true }), { minLength: 3, maxLength: 3 }),
      }),
    )
    fc.assert(
      fc.property(
        any,
        fc.double({ min: 1e-6, max: 1 - 1e-6, noNaN: true }),
        fc.double({ min: 1e-6, max: 1 - 1e-6, noNaN: true }),
        (written, p, q) => {
          const distribution: DistributionInput = distributionInput.parse({
            path: 'candidate.massGeV',
            ...written,
          })
          const [low, high] = [
            quantileOf(distribution, Math.min(p, q)),
            quantileOf(distribution, Math.max(p, q)),
          ]
          expect(low).toBeLessThanOrEqual(high)
          if (distribution.kind === 'uniform' || distribution.kind === 'log-uniform') {
            expect(low).toBeGreaterThanOrEqual(distribution.low)
            expect(high).toBeLessThanOrEqual(distribution.high * (1 + 1e-15))
          }
          if (distribution.kind === 'discrete') expect([0, 1, 2]).toContain(low)
        },
      ),
    )
  })
})

describe('a propagation that does not converge', () => {
  it('is an error with its reason', () => {
    // A field that heats a bath of steps through the crossover cannot be followed.
    const history = {
      bath: { treatment: 'ideal-switch' },
      expansion: { kind: 'early-matter', reheatTemperatureGeV: 0.1, startTemperatureGeV: 100 },
    }
    expect(() =>
      computePropagation({
        history,
        candidate: wimp,
        distributions: [{ path: 'candidate.massGeV', kind: 'uniform', low: 10, high: 20 }],
        samples: 10,
      }),
    ).toThrow(ConvergenceError)
  })
})

it('varies a number whose default stands for its part of the history', () => {
  const { rankCorrelations } = computePropagation({
    history: {},
    candidate: decay,
    distributions: [{ path: 'history.neutrinos.nEff', kind: 'normal', mean: 3.044, standardDeviation: 0.2 }],
    samples: 10,
  })
  // Made long before, at the same Y: more entropy today is more of it.
  expect(rankCorrelations[0]!.value).toBe(1)
})
