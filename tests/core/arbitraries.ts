/** Inputs as a user could write them, drawn from the whole of what the wire takes. */
import fc from 'fast-check'
import { LATTICE_2016_ROWS } from '#core/bath/treatments/lattice2016Table'

/** Evenly in the logarithm. (A double drawn at random has its exponents about zero: nearly every number would be 1.) */
export const between = (low: number, high: number) =>
  fc.integer({ min: 0, max: 1e6 }).map((i) => low * (high / low) ** (i / 1e6))

/** Evenly between two numbers, to a thousandth of their distance. */
const evenly = (low: number, high: number) =>
  fc.integer({ min: 0, max: 1000 }).map((i) => low + ((high - low) * i) / 1000)

const hadrons = fc.constantFrom('short', 'long')
const statistics = fc.constantFrom('fermion', 'boson')
const degreesOfFreedom = fc.integer({ min: 1, max: 12 })

export const bath = fc.oneof(
  fc.record(
    { treatment: fc.constant('thresholds'), transitionTemperatureGeV: between(0.06, 0.9) },
    { requiredKeys: ['treatment'] },
  ),
  fc.record(
    { treatment: fc.constantFrom('ideal-switch', 'lattice-2014'), hadrons },
    { requiredKeys: ['treatment'] },
  ),
  fc.record(
    { treatment: fc.constant('crossover'), transitionWidthGeV: between(0.015, 0.09), hadrons },
    { requiredKeys: ['treatment'] },
  ),
  fc.constant({ treatment: 'lattice-2016' }),
  // From 10^0.5 MeV on one of the columns will do.
  fc.constantFrom(['gRho', 'gS'] as const, ['gRho'] as const, ['gS'] as const).map((columns) => ({
    treatment: 'uploaded',
    points: LATTICE_2016_ROWS.slice(1).map((row) => ({
      temperatureGeV: row.temperatureGeV,
      ...Object.fromEntries(columns.map((column) => [column, row[column]])),
    })),
  })),
  fc.record({ treatment: fc.constant('fit-2018'), band: evenly(-1, 1) }, { requiredKeys: ['treatment'] }),
)

const decouplingTemperatureGeV = between(6e-4, 0.04)

const neutrinos = fc.oneof(
  fc.record({ treatment: fc.constant('instantaneous'), decouplingTemperatureGeV }),
  fc.record(
    {
      treatment: fc.constant('specified'),
      nEff: between(0.5, 10),
      decouplingTemperatureGeV,
      entropyScaling: fc.constantFrom('heated', 'linear'),
    },
    { requiredKeys: ['treatment'] },
  ),
)

const extraSpecies = fc.array(
  fc.oneof(
    fc.record({
      name: fc.constantFrom('dark photon', 'partner'),
      degreesOfFreedom,
      statistics,
      massGeV: fc.oneof(fc.constant(0), between(1e-3, 1e4)),
      coupling: fc.oneof(
        fc.constant({ kind: 'bath' }),
        fc.record({ kind: fc.constant('ratio'), ratio: between(0.05, 2) }),
      ),
    }),
    fc.record({
      name: fc.constant('hidden'),
      degreesOfFreedom,
      statistics,
      massGeV: fc.oneof(fc.constant(0), between(1e-6, 1e-2)),
      coupling: fc.record({ kind: fc.constant('decoupled'), temperatureGeV: between(0.01, 1e3) }),
    }),
  ),
  { maxLength: 2 },
)

export const expansion = fc.oneof(
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
    startTemperatureGeV: between(100, 1e5),
  }),
  fc.record({
    kind: fc.constant('early-matter'),
    reheatTemperatureGeV: between(5e-3, 10),
    startTemperatureGeV: between(100, 1e5),
    branching: between(1e-9, 1),
    fieldMassGeV: between(1e3, 1e10),
  }),
)

export const history = fc.record(
  { bath, neutrinos, extraSpecies, expansion, maximumTemperatureGeV: fc.option(between(50, 1e12)) },
  { requiredKeys: [] },
)

const sWaveCm3PerS = between(1e-30, 1e-22)
const quickAnnihilations = [
  fc.record({ kind: fc.constant('partial-waves'), sWaveCm3PerS, pWaveCm3PerS: between(1e-30, 1e-22) }),
  fc.record({ kind: fc.constant('power-law'), coefficientCm3PerS: sWaveCm3PerS, exponent: evenly(-0.5, 4) }),
  fc.record({
    kind: fc.constant('coannihilation'),
    others: fc.constant([{ massGeV: 2e6, degreesOfFreedom: 2, statistics: 'boson' }]),
    pairs: fc.constant([
      { first: 0, second: 0, sWaveCm3PerS: 1e-26 },
      { first: 0, second: 1, sWaveCm3PerS: 1e-25 },
    ]),
    weights: fc.constantFrom('exact', 'nonrelativistic'),
  }),
  fc.record({
    kind: fc.constant('table'),
    against: fc.constantFrom('x', 'temperatureGeV'),
    points: fc.constant([
      [1e-3, 1e-27],
      [1, 3e-26],
      [30, 1e-26],
    ]),
  }),
]
const sommerfeld = fc.record(
  {
    kind: fc.constant('sommerfeld'),
    sWaveCm3PerS,
    couplingAlpha: between(1e-4, 0.3),
    mediatorMassGeV: between(1e-3, 1e3),
  },
  { requiredKeys: ['kind', 'sWaveCm3PerS', 'couplingAlpha'] },
)
const annihilation = fc.oneof(...quickAnnihilations, sommerfeld)

const particle = { massGeV: between(1e-3, 1e6), degreesOfFreedom, statistics }
const lightParticle = { ...particle, massGeV: between(1e-9, 1e-3) }

/** One arbitrary candidate of every mechanism, by its name. */
export const candidates = {
  'freeze-out': fc.record(
    {
      mechanism: fc.constant('freeze-out'),
      ...particle,
      annihilation,
      selfConjugate: fc.boolean(),
      initialAbundance: fc.constant('equilibrium'),
      equilibriumStatistics: fc.constantFrom('exact', 'maxwell-boltzmann'),
      startX: between(0.1, 20),
    },
    { requiredKeys: ['mechanism', 'massGeV', 'degreesOfFreedom', 'statistics', 'annihilation'] },
  ),
  'freeze-out from nothing': fc.record({
    mechanism: fc.constant('freeze-out'),
    ...particle,
    massGeV: between(1e-3, 1e3),
    annihilation: fc.record({ kind: fc.constant('partial-waves'), sWaveCm3PerS: between(1e-45, 1e-25) }),
    initialAbundance: fc.constant('zero'),
  }),
  'freeze-in-decay': fc.record(
    {
      mechanism: fc.constant('freeze-in-decay'),
      ...lightParticle,
      parent: fc.record(
        {
          massGeV: between(1, 1e6),
          degreesOfFreedom: fc.integer({ min: 1, max: 4 }),
          statistics: fc.constantFrom('fermion', 'boson', 'maxwell-boltzmann'),
          lifetimeS: between(1e-12, 1e2),
        },
        { requiredKeys: ['massGeV', 'degreesOfFreedom', 'statistics', 'lifetimeS'] },
      ),
      backReaction: fc.boolean(),
      perDecay: fc.constantFrom(1, 2),
    },
    { requiredKeys: ['mechanism', 'massGeV', 'degreesOfFreedom', 'statistics', 'parent'] },
  ),
  'freeze-in-decay of a parent that annihilates': fc.record({
    mechanism: fc.constant('freeze-in-decay'),
    ...lightParticle,
    parent: fc.record({
      massGeV: between(10, 1e4),
      degreesOfFreedom: fc.integer({ min: 1, max: 4 }),
      statistics,
      widthGeV: between(1e-24, 1e-12),
      annihilation: fc.oneof(...quickAnnihilations.slice(0, 2)),
    }),
  }),
  'freeze-in-scattering': fc.record({
    mechanism: fc.constant('freeze-in-scattering'),
    ...particle,
    massGeV: between(1e-3, 1e3),
    scattering: fc.oneof(
      fc.record({
        kind: fc.constant('constant-matrix-element'),
        matrixElementSquared: between(1e-26, 1e-18),
      }),
      fc.record({
        kind: fc.constant('power-law'),
        crossSectionGeVMinus2: between(1e-32, 1e-25),
        referenceEnergyGeV: between(1, 1e3),
        exponent: fc.integer({ min: -6, max: -1 }),
        incoming: fc.tuple(
          fc.record({ massGeV: between(1e-3, 100), degreesOfFreedom }),
          fc.record({ massGeV: between(1e-3, 100), degreesOfFreedom }),
        ),
      }),
    ),
  }),
  'freeze-in-ultraviolet': fc.record({
    mechanism: fc.constant('freeze-in-ultraviolet'),
    ...lightParticle,
    ultraviolet: fc.record({
      coefficient: between(1e-4, 10),
      scaleGeV: between(1e13, 1e18),
      index: fc.integer({ min: 1, max: 4 }),
    }),
  }),
  asymmetric: fc.record({
    mechanism: fc.constant('asymmetric'),
    ...particle,
    massGeV: between(0.1, 1e3),
    annihilation: fc.oneof(...quickAnnihilations.slice(0, 2)),
    asymmetry: between(1e-14, 1e-11),
  }),
  'hot-relic': fc.record({
    mechanism: fc.constant('hot-relic'),
    ...particle,
    massGeV: between(1e-12, 1e-6),
    decouplingTemperatureGeV: between(1e-3, 40),
  }),
}

export const candidate = fc.oneof(...Object.values(candidates))
