import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ConvergenceError, computeAbundance, computeHistory } from '#core/index'
import { InputError, abundanceRequest, digestOf, faultLine } from '#core/wire/index'

const between = (low: number, high: number) =>
  fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp)

const bath = fc.oneof(
  fc.record(
    { treatment: fc.constant('thresholds' as const), transitionTemperatureGeV: between(0.06, 0.9) },
    { requiredKeys: ['treatment'] },
  ),
  fc.record(
    { treatment: fc.constantFrom('ideal-switch', 'lattice-2014'), hadrons: fc.constantFrom('short', 'long') },
    { requiredKeys: ['treatment'] },
  ),
  fc.record(
    { treatment: fc.constant('crossover'), transitionWidthGeV: between(1e-3, 0.09) },
    { requiredKeys: ['treatment'] },
  ),
  fc.constant({ treatment: 'lattice-2016' }),
  fc.record(
    { treatment: fc.constant('fit-2018'), band: fc.double({ min: -1, max: 1, noNaN: true }) },
    { requiredKeys: ['treatment'] },
  ),
)

const expansion = fc.oneof(
  fc.constant({ kind: 'radiation' }),
  fc.record({
    kind: fc.constant('fluid'),
    index: between(0.1, 6),
    equalityTemperatureGeV: between(1e-3, 1e3),
  }),
  fc.record({
    kind: fc.constant('entropy-step'),
    temperatureGeV: between(1e-3, 1e3),
    factor: between(1, 1e6),
  }),
  fc.record({
    kind: fc.constant('early-matter'),
    reheatTemperatureGeV: between(5e-3, 10),
    startTemperatureGeV: between(20, 1e5),
  }),
)

const history = fc.record(
  {
    bath,
    neutrinos: fc.oneof(
      fc.record({ treatment: fc.constant('specified'), nEff: between(0.5, 10) }),
      fc.record({ treatment: fc.constant('instantaneous'), decouplingTemperatureGeV: between(1e-3, 1e-2) }),
    ),
    expansion,
    maximumTemperatureGeV: fc.option(between(50, 1e12)),
  },
  { requiredKeys: [] },
)

const particle = {
  massGeV: between(1e-3, 1e6),
  degreesOfFreedom: fc.integer({ min: 1, max: 12 }),
  statistics: fc.constantFrom('fermion', 'boson'),
}

const annihilation = fc.oneof(
  fc.record({
    kind: fc.constant('partial-waves'),
    sWaveCm3PerS: between(1e-34, 1e-20),
    pWaveCm3PerS: between(1e-34, 1e-20),
  }),
  fc.record({
    kind: fc.constant('power-law'),
    coefficientCm3PerS: between(1e-30, 1e-20),
    exponent: fc.double({ min: -0.5, max: 4, noNaN: true }),
  }),
  fc.record({
    kind: fc.constant('sommerfeld'),
    sWaveCm3PerS: between(1e-28, 1e-24),
    couplingAlpha: between(1e-4, 0.3),
  }),
)

const candidate = fc.oneof(
  fc.record({
    mechanism: fc.constant('freeze-out'),
    ...particle,
    annihilation,
    selfConjugate: fc.boolean(),
    initialAbundance: fc.constantFrom('equilibrium', 'zero'),
  }),
  fc.record({
    mechanism: fc.constant('freeze-in-decay'),
    ...particle,
    massGeV: between(1e-9, 1e-3),
    parent: fc.record({
      massGeV: between(1, 1e6),
      degreesOfFreedom: fc.integer({ min: 1, max: 4 }),
      statistics: fc.constantFrom('fermion', 'boson', 'maxwell-boltzmann'),
      lifetimeS: between(1e-14, 1e2),
    }),
    backReaction: fc.boolean(),
  }),
  fc.record({
    mechanism: fc.constant('asymmetric'),
    ...particle,
    annihilation,
    asymmetry: between(1e-14, 1e-8),
  }),
  fc.record({
    mechanism: fc.constant('hot-relic'),
    ...particle,
    massGeV: between(1e-12, 1e-6),
    decouplingTemperatureGeV: between(1e-3, 40),
  }),
)

describe('the wire', () => {
  it('fills defaults in once: a parsed input parses to itself', () => {
    fc.assert(
      fc.property(history, candidate, (h, c) => {
        const once = abundanceRequest.parse({ history: h, candidate: c })
        expect(abundanceRequest.parse(once)).toEqual(once)
      }),
    )
  })

  it('has digests that know neither the order of names nor whether a default was written', () => {
    const written = { bath: { treatment: 'fit-2018', band: 0 }, maximumTemperatureGeV: null }
    const short = { bath: { treatment: 'fit-2018' } }
    const wimp = {
      mechanism: 'freeze-out',
      massGeV: 100,
      degreesOfFreedom: 2,
      statistics: 'fermion',
      annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
    }
    const digest = (h: unknown): string => digestOf(abundanceRequest.parse({ candidate: wimp, history: h }))
    expect(digest(written)).toBe(digest(short))
    expect(digest({ maximumTemperatureGeV: 1e3 })).not.toBe(digest(short))
    expect(digestOf({ b: 1, a: [1, 2] })).toBe(digestOf({ a: [1, 2], b: 1 }))
  })

  it('digests the example of RFC 8785 appendix… by its canonical bytes', () => {
    // SHA-256 of the seven bytes {"a":1}, by a general-purpose tool.
    expect(digestOf({ a: 1 })).toBe('015abd7f5cc57a2dd94b7590f04ad8084273905ee33ec5cebeae62276a97f862')
  })

  const wimp = {
    mechanism: 'freeze-out',
    massGeV: 100,
    degreesOfFreedom: 2,
    statistics: 'fermion',
    annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
  }
  const faultsOf = (input: unknown) => {
    try {
      computeAbundance(input)
    } catch (error) {
      if (error instanceof InputError) return error.faults.map(faultLine)
      throw error
    }
    return []
  }

  it.each([
    [{ history: {}, candidate: { ...wimp, massGeV: 0 } }, 'candidate.massGeV: allowed: above 0 (found 0)'],
    [
      { history: {}, candidate: { ...wimp, massGeV: NaN } },
      'candidate.massGeV: allowed: a finite number (found "NaN")',
    ],
    [
      { history: {}, candidate: { ...wimp, massGeV: Infinity } },
      'candidate.massGeV: allowed: a finite number (found "Infinity")',
    ],
    [
      { history: { colour: 1 }, candidate: wimp },
      'history.colour: not a name known here; remove it or correct its spelling',
    ],
    [
      { history: { bath: { treatment: 'thresholds', band: 0 } }, candidate: wimp },
      'history.bath.band: not a name known here; remove it or correct its spelling',
    ],
    [{ candidate: wimp }, 'history: missing; allowed: an object'],
    [
      { history: {}, candidate: { ...wimp, annihilation: { kind: 'partial-waves', sWaveCm3PerS: 0 } } },
      'candidate.annihilation.sWaveCm3PerS: allowed: a positive s-wave or p-wave part; with both zero nothing annihilates (found 0)',
    ],
    [
      {
        history: {
          extraSpecies: [
            { name: 'x', degreesOfFreedom: -1, statistics: 'boson', massGeV: 1, coupling: { kind: 'bath' } },
          ],
        },
        candidate: wimp,
      },
      'history.extraSpecies[0].degreesOfFreedom: allowed: above 0 (found -1)',
    ],
    [
      {
        history: {
          maximumTemperatureGeV: 0.01,
          expansion: { kind: 'early-matter', reheatTemperatureGeV: 0.02, startTemperatureGeV: 10 },
        },
        candidate: wimp,
      },
      'history.maximumTemperatureGeV: allowed: at least the reheating temperature of the matter era, 0.02 GeV (found 0.01)',
    ],
  ])('names the path, what was found and what is allowed: %#', (input, line) => {
    expect(faultsOf(input)).toContain(line)
  })

  it('answers any JSON with a result or an InputError', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (input) => {
        for (const compute of [computeAbundance, computeHistory]) {
          try {
            compute(input)
          } catch (error) {
            expect(error).toBeInstanceOf(InputError)
          }
        }
      }),
      { numRuns: 300 },
    )
  })

  it('answers any valid input with a finite positive abundance or a named error, never a bare number or a hang', () => {
    fc.assert(
      fc.property(history, candidate, (h, c) => {
        try {
          const result = computeAbundance({ history: h, candidate: c })
          expect(Number.isFinite(result.omegaH2)).toBe(true)
          expect(result.omegaH2).toBeGreaterThan(0)
          expect(result.numericalError).toBeGreaterThan(0)
        } catch (error) {
          expect(error instanceof InputError || error instanceof ConvergenceError, String(error)).toBe(true)
        }
      }),
      { numRuns: 120, seed: 20261201 },
    )
  })
})
