/** Every physical impossibility has a name: the JSON path, what was found there, and what would be allowed. */
import { describe, expect, it } from 'vitest'
import { QUESTIONS, complete } from '#core/index'
import type { Question, Steps } from '#core/index'
import { InputError } from '#core/wire/index'
import type { Fault } from '#core/wire/index'

type Json = Record<string, unknown>

const wimp: Json = {
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
}
const fimp: Json = {
  mechanism: 'freeze-in-decay',
  massGeV: 1e-4,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-7 },
}
const particle: Json = { massGeV: 1, degreesOfFreedom: 2, statistics: 'fermion' }
const incoming = [
  { massGeV: 80, degreesOfFreedom: 2 },
  { massGeV: 60, degreesOfFreedom: 1 },
]
const tableOf = (points: unknown): Json => ({
  ...particle,
  mechanism: 'freeze-in-scattering',
  scattering: { kind: 'table', points, incoming },
})
const collision = (differing: Json): Json => ({
  ...particle,
  mechanism: 'freeze-in-scattering',
  scattering: {
    kind: 'power-law',
    crossSectionGeVMinus2: 1e-28,
    referenceEnergyGeV: 200,
    exponent: -4,
    incoming,
    ...differing,
  },
})
const ultraviolet = (differing: Json): Json => ({
  ...particle,
  mechanism: 'freeze-in-ultraviolet',
  ultraviolet: { coefficient: 1, scaleGeV: 1e13, index: 1, ...differing },
})
const asymmetric = (differing: Json): Json => ({
  ...wimp,
  mechanism: 'asymmetric',
  degreesOfFreedom: 4,
  asymmetry: 1e-11,
  ...differing,
})
const hot = (differing: Json): Json => ({
  ...particle,
  massGeV: 1e-8,
  mechanism: 'hot-relic',
  decouplingTemperatureGeV: 0.1,
  ...differing,
})
const annihilating = (annihilation: Json): Json => ({ ...wimp, annihilation })
const pole = (differing: Json): Json =>
  annihilating({
    kind: 'resonance',
    massGeV: 205,
    widthGeV: 1,
    spin: 1,
    branchingProduct: 1e-3,
    ...differing,
  })
const yukawa = (differing: Json): Json =>
  annihilating({ kind: 'sommerfeld', sWaveCm3PerS: 1e-26, couplingAlpha: 0.03, ...differing })
const pairs = [{ first: 0, second: 0, sWaveCm3PerS: 1e-26 }]
const partner = { massGeV: 110, degreesOfFreedom: 2, statistics: 'fermion' }
const together = (differing: Json): Json =>
  annihilating({ kind: 'coannihilation', others: [partner], pairs, ...differing })
const withParent = (differing: Json): Json => ({
  ...fimp,
  parent: { ...(fimp['parent'] as Json), ...differing },
})

const matter: Json = { kind: 'early-matter', reheatTemperatureGeV: 0.02, startTemperatureGeV: 10 }
const expanding = (expansion: Json, differing: Json = {}): Json => ({ expansion, ...differing })
const species = (differing: Json): Json => ({
  extraSpecies: [
    {
      name: 'x',
      degreesOfFreedom: 2,
      statistics: 'boson',
      massGeV: 0.1,
      coupling: { kind: 'bath' },
      ...differing,
    },
  ],
})
const letGo = (massGeV: number, temperatureGeV: number): Json =>
  species({ massGeV, coupling: { kind: 'decoupled', temperatureGeV } })

/** Path and found value of the fault, then words of what is allowed. */
type Expected = readonly [path: string, value: unknown, allowed: RegExp]
type Row = readonly [what: string, input: unknown, ...Expected]

const of = (candidate: unknown, history: unknown = {}): Json => ({ history, candidate })

const PARTICLES: readonly Row[] = [
  ['a negative mass', of({ ...wimp, massGeV: -100 }), 'candidate.massGeV', -100, /above 0/],
  ['a mass of zero', of({ ...wimp, massGeV: 0 }), 'candidate.massGeV', 0, /above 0/],
  ['a mass that is no number', of({ ...wimp, massGeV: NaN }), 'candidate.massGeV', 'NaN', /a finite number/],
  [
    'an infinite mass',
    of({ ...wimp, massGeV: Infinity }),
    'candidate.massGeV',
    'Infinity',
    /a finite number/,
  ],
  ['a mass above the Planck scale', of({ ...wimp, massGeV: 1e20 }), 'candidate.massGeV', 1e20, /at most/],
  ['a mass in words', of({ ...wimp, massGeV: '100' }), 'candidate.massGeV', '100', /a finite number/],
  ['no states', of({ ...wimp, degreesOfFreedom: 0 }), 'candidate.degreesOfFreedom', 0, /above 0/],
  [
    'unknown statistics',
    of({ ...wimp, statistics: 'anyon' }),
    'candidate.statistics',
    'anyon',
    /"fermion", "boson"/,
  ],
  [
    'an unknown mechanism',
    of({ ...wimp, mechanism: 'magic' }),
    'candidate.mechanism',
    'magic',
    /"freeze-out"/,
  ],
  [
    'a mass too light to begin with',
    of({ ...wimp, massGeV: 1e-13 }),
    'candidate.massGeV',
    1e-13,
    /above today/,
  ],
  ['a start before the tables', of({ ...wimp, massGeV: 1e18 }), 'candidate.massGeV', 1e18, /at most/],
  ['a start at x = 0', of({ ...wimp, startX: 0 }), 'candidate.startX', 0, /allowed/],
  ['a start at x = 1000', of({ ...wimp, startX: 1000 }), 'candidate.startX', 1000, /at most 500/],
  [
    'no annihilation at all',
    of(annihilating({ kind: 'partial-waves', sWaveCm3PerS: 0 })),
    'candidate.annihilation.sWaveCm3PerS',
    0,
    /positive/,
  ],
  [
    'a negative cross-section',
    of(annihilating({ kind: 'partial-waves', sWaveCm3PerS: -1e-26 })),
    'candidate.annihilation.sWaveCm3PerS',
    -1e-26,
    /at least 0/,
  ],
  [
    'a cross-section beyond anything',
    of(annihilating({ kind: 'partial-waves', sWaveCm3PerS: 1 })),
    'candidate.annihilation.sWaveCm3PerS',
    1,
    /at most 0.001/,
  ],
  [
    'a power beyond its range',
    of(annihilating({ kind: 'power-law', coefficientCm3PerS: 1e-26, exponent: -3 })),
    'candidate.annihilation.exponent',
    -3,
    /at least -0.75/,
  ],
  [
    'a width above the mass',
    of(pole({ widthGeV: 206 })),
    'candidate.annihilation.widthGeV',
    206,
    /below the mass/,
  ],
  ['a width of zero', of(pole({ widthGeV: 0 })), 'candidate.annihilation.widthGeV', 0, /above 0/],
  [
    'a width too narrow to resolve',
    of(pole({ widthGeV: 1e-8 })),
    'candidate.annihilation.widthGeV',
    1e-8,
    /1e-9 of the mass/,
  ],
  [
    'branchings that add to more than one',
    of(pole({ branchingProduct: 0.3 })),
    'candidate.annihilation.branchingProduct',
    0.3,
    /at most 0.25/,
  ],
  ['a third of a spin', of(pole({ spin: 1 / 3 })), 'candidate.annihilation.spin', 1 / 3, /multiple|0\.5/],
  [
    'a coupling above one',
    of(yukawa({ couplingAlpha: 1.5 })),
    'candidate.annihilation.couplingAlpha',
    1.5,
    /at most 1/,
  ],
  [
    'a mediator of negative mass',
    of(yukawa({ mediatorMassGeV: -1 })),
    'candidate.annihilation.mediatorMassGeV',
    -1,
    /above 0/,
  ],
  [
    'nobody to coannihilate with',
    of(together({ others: [] })),
    'candidate.annihilation.others',
    undefined,
    /at least 1/,
  ],
  [
    'a partner lighter than the candidate',
    of(together({ others: [{ ...partner, massGeV: 90 }] })),
    'candidate.annihilation.others',
    undefined,
    /lightest/,
  ],
  [
    'a pair that is not there',
    of(together({ pairs: [{ first: 0, second: 2, sWaveCm3PerS: 1e-26 }] })),
    'candidate.annihilation.pairs[0].second',
    2,
    /0 to 1/,
  ],
  [
    'a pair given twice',
    of(together({ pairs: [...pairs, ...pairs] })),
    'candidate.annihilation.pairs[1]',
    undefined,
    /twice/,
  ],
  [
    'pairs that do nothing',
    of(together({ pairs: [{ first: 0, second: 1 }] })),
    'candidate.annihilation.pairs',
    undefined,
    /annihilates/,
  ],
  [
    'a table of ⟨σv⟩ that turns back',
    of(
      annihilating({
        kind: 'table',
        against: 'x',
        points: [
          [1, 1e-26],
          [3, 1e-26],
          [2, 1e-26],
        ],
      }),
    ),
    'candidate.annihilation.points[2][0]',
    2,
    /above 3/,
  ],
  [
    'a table with a row twice',
    of(
      annihilating({
        kind: 'cross-section',
        points: [
          [200, 1e-9],
          [200, 2e-9],
        ],
      }),
    ),
    'candidate.annihilation.points[1][0]',
    200,
    /above 200/,
  ],
  [
    'a table with a gap',
    of(annihilating({ kind: 'cross-section', points: [[200, 1e-9], [300], [400, 1e-9]] })),
    'candidate.annihilation.points[1]',
    undefined,
    /at least 2/,
  ],
  [
    'a table with a hole of null',
    of(
      annihilating({
        kind: 'cross-section',
        points: [
          [200, 1e-9],
          [300, null],
        ],
      }),
    ),
    'candidate.annihilation.points[1][1]',
    null,
    /a finite number/,
  ],
  [
    'a table with a negative value',
    of(
      annihilating({
        kind: 'cross-section',
        points: [
          [200, 1e-9],
          [300, -1e-9],
        ],
      }),
    ),
    'candidate.annihilation.points[1][1]',
    -1e-9,
    /above 0/,
  ],
  [
    'a table of nothing',
    of(annihilating({ kind: 'table', against: 'x', points: [] })),
    'candidate.annihilation.points',
    undefined,
    /at least 2/,
  ],
  ['a parent of zero mass', of(withParent({ massGeV: 0 })), 'candidate.parent.massGeV', 0, /above 0/],
  [
    'a candidate heavier than its parent',
    of({ ...fimp, massGeV: 400 }),
    'candidate.massGeV',
    400,
    /mass of the parent/,
  ],
  [
    'two candidates heavier than their parent',
    of({ ...fimp, massGeV: 200, perDecay: 2 }),
    'candidate.massGeV',
    200,
    /perDecay/,
  ],
  ['a lifetime of zero', of(withParent({ lifetimeS: 0 })), 'candidate.parent.lifetimeS', 0, /above 0/],
  [
    'neither lifetime nor width',
    of(withParent({ lifetimeS: undefined })),
    'candidate.parent.lifetimeS',
    undefined,
    /exactly one/,
  ],
  [
    'a parent that is wider than heavy',
    of(withParent({ lifetimeS: undefined, widthGeV: 400 })),
    'candidate.parent.widthGeV',
    400,
    /below the mass/,
  ],
  ['decays that make nothing', of({ ...fimp, perDecay: 0 }), 'candidate.perDecay', 0, /above 0/],
  [
    'inverse decays of a parent that is followed',
    of({ ...withParent({ annihilation: wimp['annihilation'] }), backReaction: true }),
    'candidate.backReaction',
    true,
    /false while/,
  ],
  [
    'parents that are left today',
    of(withParent({ lifetimeS: 1e20, annihilation: wimp['annihilation'] })),
    'candidate.parent.lifetimeS',
    1e20,
    /decayed by today/,
  ],
  [
    'a negative |M|²',
    of(
      collision({
        kind: 'constant-matrix-element',
        matrixElementSquared: -1,
        crossSectionGeVMinus2: undefined,
        referenceEnergyGeV: undefined,
        exponent: undefined,
        incoming: undefined,
      }),
    ),
    'candidate.scattering.matrixElementSquared',
    -1,
    /above 0/,
  ],
  [
    'a cross-section that grows too fast',
    of(collision({ exponent: 6 })),
    'candidate.scattering.exponent',
    6,
    /at most 4/,
  ],
  [
    'one incoming particle',
    of(collision({ incoming: [incoming[0]] })),
    'candidate.scattering.incoming',
    undefined,
    /allowed|2/,
  ],
  [
    'a table of collisions that turns back',
    of(
      tableOf([
        [200, 1e-28],
        [150, 1e-28],
      ]),
    ),
    'candidate.scattering.points[1][0]',
    150,
    /above 200/,
  ],
  [
    'a dimension below five',
    of(ultraviolet({ index: 0.5 }), { maximumTemperatureGeV: 1e6 }),
    'candidate.ultraviolet.index',
    0.5,
    /at least 1/,
  ],
  [
    'ultraviolet freeze-in without end',
    of(ultraviolet({})),
    'history.maximumTemperatureGeV',
    null,
    /without end/,
  ],
  [
    'ultraviolet freeze-in today',
    of(ultraviolet({}), { maximumTemperatureGeV: 1e-13 }),
    'history.maximumTemperatureGeV',
    1e-13,
    /above today/,
  ],
  ['an asymmetry of zero', of(asymmetric({ asymmetry: 0 })), 'candidate.asymmetry', 0, /above 0/],
  [
    'an asymmetric particle that is its own antiparticle',
    of(asymmetric({ selfConjugate: true })),
    'candidate.selfConjugate',
    true,
    /false/,
  ],
  [
    'an asymmetry of coannihilating species',
    of(asymmetric({ annihilation: { kind: 'coannihilation', others: [partner], pairs } })),
    'candidate.annihilation.kind',
    'coannihilation',
    /any but/,
  ],
  [
    'a hot relic that never lets go',
    of(hot({ decouplingTemperatureGeV: 0 })),
    'candidate.decouplingTemperatureGeV',
    0,
    /allowed/,
  ],
  [
    'a hot relic that lets go above the maximum',
    of(hot({}), { maximumTemperatureGeV: 0.01 }),
    'candidate.decouplingTemperatureGeV',
    0.1,
    /maximum temperature/,
  ],
  [
    'freeze-out when nothing is left',
    of(wimp, { maximumTemperatureGeV: 0.1 }),
    'history.maximumTemperatureGeV',
    0.1,
    /500th of the mass/,
  ],
  [
    'decays when no parents are left',
    of(fimp, { maximumTemperatureGeV: 0.1 }),
    'history.maximumTemperatureGeV',
    0.1,
    /fortieth/,
  ],
]

const HISTORIES: readonly Row[] = [
  [
    'an unknown treatment',
    { bath: { treatment: 'perfect' } },
    'history.bath.treatment',
    'perfect',
    /"thresholds"/,
  ],
  [
    'a transition at zero',
    { bath: { treatment: 'thresholds', transitionTemperatureGeV: 0 } },
    'history.bath.transitionTemperatureGeV',
    0,
    /at least 0.05/,
  ],
  [
    'a transition without width',
    { bath: { treatment: 'crossover', transitionWidthGeV: 0 } },
    'history.bath.transitionWidthGeV',
    0,
    /at least/,
  ],
  ['a band beyond one', { bath: { treatment: 'fit-2018', band: 2 } }, 'history.bath.band', 2, /at most 1/],
  [
    'a negative N_eff',
    { neutrinos: { treatment: 'specified', nEff: -3 } },
    'history.neutrinos.nEff',
    -3,
    /above 0/,
  ],
  [
    'N_eff for neutrinos that let go at once',
    { neutrinos: { treatment: 'instantaneous', nEff: 3 } },
    'history.neutrinos.nEff',
    undefined,
    /not a name/,
  ],
  [
    'neutrinos that let go today',
    { neutrinos: { treatment: 'instantaneous', decouplingTemperatureGeV: 1e-12 } },
    'history.neutrinos.decouplingTemperatureGeV',
    1e-12,
    /at least/,
  ],
  [
    'a species of negative mass',
    species({ massGeV: -1 }),
    'history.extraSpecies[0].massGeV',
    -1,
    /at least 0/,
  ],
  [
    'a species without states',
    species({ degreesOfFreedom: 0 }),
    'history.extraSpecies[0].degreesOfFreedom',
    0,
    /above 0/,
  ],
  ['a species without a name', species({ name: ' ' }), 'history.extraSpecies[0].name', ' ', /at least 1/],
  [
    'a species without coupling',
    species({ coupling: undefined }),
    'history.extraSpecies[0].coupling',
    undefined,
    /missing/,
  ],
  [
    'a species at no temperature',
    species({ coupling: { kind: 'ratio', ratio: 0 } }),
    'history.extraSpecies[0].coupling.ratio',
    0,
    /above 0/,
  ],
  [
    'a species that lets go when it is gone',
    letGo(100, 0.1),
    'history.extraSpecies[0].coupling.temperatureGeV',
    0.1,
    /500th/,
  ],
  [
    'a species that lets go at no temperature',
    letGo(0, -1),
    'history.extraSpecies[0].coupling.temperatureGeV',
    -1,
    /allowed/,
  ],
  ['an unknown expansion', expanding({ kind: 'bounce' }), 'history.expansion.kind', 'bounce', /"radiation"/],
  [
    'a fluid that is radiation',
    expanding({ kind: 'fluid', index: 0, equalityTemperatureGeV: 1 }),
    'history.expansion.index',
    0,
    /above 0/,
  ],
  [
    'a fluid that equals radiation at zero',
    expanding({ kind: 'fluid', index: 2, equalityTemperatureGeV: 0 }),
    'history.expansion.equalityTemperatureGeV',
    0,
    /allowed/,
  ],
  [
    'an entropy step down',
    expanding({ kind: 'entropy-step', temperatureGeV: 1, factor: 0.5 }),
    'history.expansion.factor',
    0.5,
    /at least 1/,
  ],
  [
    'a field that heats nothing',
    expanding({ ...matter, reheatTemperatureGeV: 0 }),
    'history.expansion.reheatTemperatureGeV',
    0,
    /allowed/,
  ],
  [
    'a field that decays before it dominates',
    expanding({ ...matter, startTemperatureGeV: 0.01 }),
    'history.expansion.startTemperatureGeV',
    0.01,
    /at least the reheating/,
  ],
  [
    'a field without a beginning',
    expanding({ ...matter, startTemperatureGeV: undefined }),
    'history.expansion.startTemperatureGeV',
    undefined,
    /exactly one/,
  ],
  [
    'a field with two beginnings',
    expanding({ ...matter, dilution: 10 }),
    'history.expansion.startTemperatureGeV',
    10,
    /exactly one/,
  ],
  [
    'a dilution of less than one',
    expanding({ ...matter, startTemperatureGeV: undefined, dilution: 0.5 }),
    'history.expansion.dilution',
    0.5,
    /above 1/,
  ],
  [
    'a branching without a mass',
    expanding({ ...matter, branching: 0.1 }),
    'history.expansion.fieldMassGeV',
    undefined,
    /needed/,
  ],
  [
    'a negative branching',
    expanding({ ...matter, branching: -0.1, fieldMassGeV: 1e6 }),
    'history.expansion.branching',
    -0.1,
    /at least 0/,
  ],
  [
    'reheating above the maximum temperature',
    expanding(matter, { maximumTemperatureGeV: 0.01 }),
    'history.maximumTemperatureGeV',
    0.01,
    /at least the reheating temperature/,
  ],
  [
    'a maximum temperature of zero',
    { maximumTemperatureGeV: 0 },
    'history.maximumTemperatureGeV',
    0,
    /allowed/,
  ],
  ['photons at absolute zero', { today: { temperatureK: 0 } }, 'history.today.temperatureK', 0, /at least 1/],
  [
    'more matter than there is room for',
    { today: { omegaMatterH2: 0.6 } },
    'history.today.omegaMatterH2',
    0.6,
    /below h²/,
  ],
  ['h of zero', { today: { hubbleParameter: 0 } }, 'history.today.hubbleParameter', 0, /at least/],
]

const grid = (temperaturesGeV: unknown): Json => ({ history: {}, temperaturesGeV })
const GRIDS: readonly Row[] = [
  ['no grid', { history: {} }, 'temperaturesGeV', undefined, /missing/],
  ['an empty grid', grid([]), 'temperaturesGeV', undefined, /at least 1/],
  ['a temperature of zero', grid([1, 0]), 'temperaturesGeV[1]', 0, /above 0/],
  ['a negative temperature', grid([1, -2]), 'temperaturesGeV[1]', -2, /above 0/],
  ['a temperature that is no number', grid([NaN]), 'temperaturesGeV[0]', 'NaN', /a finite number/],
  ['an infinite temperature', grid([1, Infinity]), 'temperaturesGeV[1]', 'Infinity', /a finite number/],
  ['a hole in the grid', grid([1, null, 2]), 'temperaturesGeV[1]', null, /a finite number/],
  ['a temperature above the tables', grid([1e17]), 'temperaturesGeV[0]', 1e17, /at most/],
  ['one number for a grid', grid(1), 'temperaturesGeV', 1, /a list/],
]

const solving = (differing: Json): Json => ({
  history: {},
  candidate: wimp,
  solveFor: 'candidate.annihilation.sWaveCm3PerS',
  ...differing,
})
const SOLVES: readonly Row[] = [
  ['no unknown', solving({ solveFor: undefined }), 'solveFor', undefined, /missing/],
  ['an unknown that is no path', solving({ solveFor: 'mass' }), 'solveFor', 'mass', /a path/],
  ['a target of zero', solving({ targetOmegaH2: 0 }), 'targetOmegaH2', 0, /above 0/],
  [
    'an infinite target',
    solving({ targetOmegaH2: Infinity }),
    'targetOmegaH2',
    'Infinity',
    /a finite number/,
  ],
  ['a bracket the wrong way round', solving({ between: [2, 1] }), 'between', undefined, /low below high/],
  ['a bracket of one number', solving({ between: [1, 1] }), 'between', undefined, /low below high/],
  [
    'a bracket that begins nowhere',
    solving({ between: [-Infinity, 1] }),
    'between[0]',
    '-Infinity',
    /a finite number/,
  ],
  [
    'a bracket where every value is negative',
    solving({ between: [-2, -1] }),
    'candidate.annihilation.sWaveCm3PerS',
    -2,
    /at least 0/,
  ],
  [
    'a candidate with another fault',
    solving({ candidate: { ...wimp, statistics: 'anyon' } }),
    'candidate.statistics',
    'anyon',
    /"fermion"/,
  ],
  [
    'a history with another fault',
    solving({ history: { bath: { treatment: 'none' } } }),
    'history.bath.treatment',
    'none',
    /"thresholds"/,
  ],
  [
    'an unknown that has no place',
    solving({ solveFor: 'candidate.colour' }),
    'candidate.colour',
    undefined,
    /not a name/,
  ],
]

const attributing = (differing: Json): Json => ({ baseline: {}, variant: {}, candidate: wimp, ...differing })
const ATTRIBUTIONS: readonly Row[] = [
  ['no baseline', attributing({ baseline: undefined }), 'baseline', undefined, /missing/],
  [
    'a fault in the baseline',
    attributing({ baseline: { today: { temperatureK: -1 } } }),
    'baseline.today.temperatureK',
    -1,
    /at least 1/,
  ],
  [
    'a fault in the variant',
    attributing({ variant: { bath: { treatment: 'fit-2018', band: 5 } } }),
    'variant.bath.band',
    5,
    /at most 1/,
  ],
  [
    'a fault in the candidate',
    attributing({ candidate: { ...wimp, massGeV: -1 } }),
    'candidate.massGeV',
    -1,
    /above 0/,
  ],
]

/** The faults an input is refused with. */
function faultsOf(question: Question, input: unknown): readonly Fault[] {
  try {
    complete(QUESTIONS[question](input) as Steps<unknown>)
  } catch (error) {
    if (error instanceof InputError) return error.faults
    throw error
  }
  return []
}

function expectFault(question: Question, input: unknown, [path, value, allowed]: Expected): void {
  const faults = faultsOf(question, input)
  const fault = faults.find((each) => each.path === path)
  expect(fault, `found only ${JSON.stringify(faults)}`).toBeDefined()
  expect(fault!.message).toMatch(allowed)
  expect(fault!.value).toEqual(value)
}

/** The history part of a row's path, for questions that name their history otherwise. */
const within = (name: string, path: string): string => path.replace(/^history/, name)

describe('a candidate that cannot be', () => {
  it.each(PARTICLES)('is refused with its path, value and range: %s', (_what, input, ...expected) => {
    expectFault('abundance', input, expected)
  })
})

describe('a history that cannot be', () => {
  it.each(HISTORIES)(
    'is refused with its path, value and range, whatever is asked of it: %s',
    (_what, history, ...expected) => {
      const [path, value, allowed] = expected
      expectFault('abundance', of(wimp, history), expected)
      expectFault('history', { history, temperaturesGeV: [1] }, expected)
      expectFault('solve', solving({ history }), expected)
      expectFault('attribute', attributing({ variant: history }), [within('variant', path), value, allowed])
    },
  )
})

describe('a question that cannot be', () => {
  it.each(GRIDS)('is refused with its path, value and range: history, %s', (_what, input, ...expected) => {
    expectFault('history', input, expected)
  })

  it.each(SOLVES)('is refused with its path, value and range: solve, %s', (_what, input, ...expected) => {
    expectFault('solve', input, expected)
  })

  it.each(ATTRIBUTIONS)(
    'is refused with its path, value and range: attribute, %s',
    (_what, input, ...expected) => {
      expectFault('attribute', input, expected)
    },
  )
})
