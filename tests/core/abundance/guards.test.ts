import { describe, expect, it } from 'vitest'
import { guardsLookedAt } from '#core/abundance/guards/guard'
import { computeAbundance, computeHistory } from '#core/index'
import { candidateInput } from '#core/wire/index'

const wimp = {
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
}
const fimp = {
  mechanism: 'freeze-in-decay',
  massGeV: 1e-4,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-7 },
}
const hotRelic = (decouplingTemperatureGeV: number) => ({
  mechanism: 'hot-relic',
  massGeV: 0.01,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  decouplingTemperatureGeV,
})

const raised = (history: unknown, candidate: unknown) => computeAbundance({ history, candidate }).guards

/** A case that must raise the guard, and its neighbour that must not. */
const pairs: readonly (readonly [code: string, raises: [unknown, unknown], quiet: [unknown, unknown]])[] = [
  [
    'fluid-too-late',
    [{ expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 3e-3 } }, wimp],
    [{ expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 5e-3 } }, wimp],
  ],
  [
    'entropy-too-late',
    [{ expansion: { kind: 'entropy-step', temperatureGeV: 3e-3, factor: 2 } }, wimp],
    [{ expansion: { kind: 'entropy-step', temperatureGeV: 5e-3, factor: 2 } }, wimp],
  ],
  [
    'reheating-too-late',
    [{ expansion: { kind: 'early-matter', reheatTemperatureGeV: 3e-3, startTemperatureGeV: 1 } }, wimp],
    [{ expansion: { kind: 'early-matter', reheatTemperatureGeV: 6e-3, startTemperatureGeV: 1 } }, wimp],
  ],
  [
    'massless-today',
    [
      {
        extraSpecies: [
          { name: 'ghost', degreesOfFreedom: 1, statistics: 'boson', massGeV: 0, coupling: { kind: 'bath' } },
        ],
      },
      wimp,
    ],
    [
      {
        extraSpecies: [
          {
            name: 'ghost',
            degreesOfFreedom: 1,
            statistics: 'boson',
            massGeV: 0,
            coupling: { kind: 'decoupled', temperatureGeV: 1 },
          },
        ],
      },
      wimp,
    ],
  ],
  ['start-near-freeze-out', [{ maximumTemperatureGeV: 6 }, wimp], [{ maximumTemperatureGeV: 60 }, wimp]],
  [
    'never-in-equilibrium',
    [{}, { ...wimp, annihilation: { kind: 'partial-waves', sWaveCm3PerS: 1e-45 } }],
    [{}, wimp],
  ],
  [
    'late-annihilation',
    [{}, { ...wimp, massGeV: 5e-3, annihilation: { kind: 'partial-waves', sWaveCm3PerS: 4e-26 } }],
    [{}, wimp],
  ],
  [
    'kinetic-equilibrium',
    [
      {},
      {
        ...wimp,
        annihilation: { kind: 'resonance', massGeV: 205, widthGeV: 1e-4, spin: 1, branchingProduct: 1e-6 },
      },
    ],
    [
      {},
      {
        ...wimp,
        annihilation: { kind: 'resonance', massGeV: 205, widthGeV: 10, spin: 1, branchingProduct: 1e-6 },
      },
    ],
  ],
  [
    'table-extrapolated',
    [
      {},
      {
        ...wimp,
        annihilation: {
          kind: 'table',
          against: 'x',
          points: [
            [1, 2e-26],
            [10, 2e-26],
          ],
        },
      },
    ],
    [
      {},
      {
        ...wimp,
        annihilation: {
          kind: 'table',
          against: 'x',
          points: [
            [1, 2e-26],
            [100, 2e-26],
          ],
        },
      },
    ],
  ],
  [
    'unitarity',
    [{}, { ...wimp, massGeV: 3e5, annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.4e-26 } }],
    [{}, { ...wimp, massGeV: 1e5, annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.4e-26 } }],
  ],
  [
    'not-cold',
    [{}, { ...wimp, startX: 0.01, annihilation: { kind: 'partial-waves', sWaveCm3PerS: 1e-37 } }],
    [{}, { ...wimp, startX: 0.01, annihilation: { kind: 'partial-waves', sWaveCm3PerS: 1e-33 } }],
  ],
  [
    'decay-near-freeze-out',
    [{}, { ...fimp, parent: { ...fimp.parent, lifetimeS: 1e-8, annihilation: wimp.annihilation } }],
    [{}, { ...fimp, parent: { ...fimp.parent, lifetimeS: 1e-5, annihilation: wimp.annihilation } }],
  ],
  ['not-hot', [{}, hotRelic(0.005)], [{}, hotRelic(0.02)]],
  ['production-cut-off', [{ maximumTemperatureGeV: 40 }, fimp], [{ maximumTemperatureGeV: 1e4 }, fimp]],
  ['late-decay', [{}, { ...fimp, parent: { ...fimp.parent, lifetimeS: 1 } }], [{}, fimp]],
  ['structure-formation', [{}, { ...fimp, massGeV: 3e-6 }], [{}, fimp]],
  ['not-freeze-in', [{}, { ...fimp, parent: { ...fimp.parent, lifetimeS: 1e-13 } }], [{}, fimp]],
  [
    'production-above-expansion',
    [{}, { ...fimp, parent: { ...fimp.parent, lifetimeS: 1e-15 } }],
    [{}, { ...fimp, parent: { ...fimp.parent, lifetimeS: 1e-11 } }],
  ],
]

/** A smooth table of 40 rows between two temperatures, GeV. */
function uploadedBath(low: number, high: number): unknown {
  const temperaturesGeV = Array.from({ length: 40 }, (_, i) => low * (high / low) ** (i / 39))
  const { rows } = computeHistory({ history: { bath: { treatment: 'crossover' } }, temperaturesGeV })
  return {
    bath: {
      treatment: 'uploaded',
      points: rows.map(({ temperatureGeV, gRho, gS }) => ({ temperatureGeV, gRho, gS })),
    },
  }
}
const cold = uploadedBath(0.01, 2)
const wide = uploadedBath(0.01, 1e3)

const sigmaTable = (from: number, to: number) => ({
  kind: 'cross-section',
  points: Array.from({ length: 30 }, (_, i) => {
    const rootS = from * (to / from) ** (i / 29)
    return [rootS, 2e-9 / Math.sqrt(1 - (200 / rootS) ** 2 + 1e-6)]
  }),
})
const averaged = (to: number) => ({
  kind: 'table',
  against: 'x',
  points: [
    [1, 2e-26],
    [to, 2e-26],
  ],
})
const collision = (from: number, to: number) => ({
  mechanism: 'freeze-in-scattering',
  massGeV: 1e-3,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  scattering: {
    kind: 'table',
    points: [
      [from, 1e-30],
      [to, 1e-30 * (from / to) ** 6],
    ],
    incoming: [
      { massGeV: 100, degreesOfFreedom: 2 },
      { massGeV: 100, degreesOfFreedom: 2 },
    ],
  },
})
const asymmetric = { ...wimp, mechanism: 'asymmetric', degreesOfFreedom: 4, asymmetry: 1e-12 }
const withParent = (annihilation: object) => ({
  ...fimp,
  parent: { ...fimp.parent, lifetimeS: 1e-5, annihilation },
})

/** Tables of every kind: a case that leaves its rows where the abundance is decided, and its neighbour that does not. */
const tables: readonly (readonly [
  what: string,
  raises: [unknown, unknown],
  quiet: [unknown, unknown],
  value: number,
  limit: number,
])[] = [
  ['an uploaded bath at freeze-out', [cold, wimp], [wide, wimp], 4.2, 2],
  ['an uploaded bath where a parent decays', [cold, fimp], [wide, fimp], 80, 2],
  [
    'an uploaded bath where a hot relic decouples',
    [wide, { ...hotRelic(0.005), massGeV: 1e-9 }],
    [wide, hotRelic(0.02)],
    0.005,
    0.01,
  ],
  [
    'an uploaded bath where annihilation into an asymmetry ends',
    [cold, asymmetric],
    [wide, asymmetric],
    4,
    2,
  ],
  [
    'an uploaded bath where something is made from nothing',
    [
      cold,
      { ...wimp, initialAbundance: 'zero', annihilation: { kind: 'partial-waves', sWaveCm3PerS: 1e-40 } },
    ],
    [
      wide,
      { ...wimp, initialAbundance: 'zero', annihilation: { kind: 'partial-waves', sWaveCm3PerS: 1e-40 } },
    ],
    33,
    2,
  ],
  [
    '⟨σv⟩ of a candidate',
    [{}, { ...wimp, annihilation: averaged(10) }],
    [{}, { ...wimp, annihilation: averaged(100) }],
    24,
    10,
  ],
  [
    '⟨σv⟩ of an asymmetric candidate',
    [{}, { ...asymmetric, annihilation: averaged(10) }],
    [{}, { ...asymmetric, annihilation: averaged(1e3) }],
    25,
    10,
  ],
  ['⟨σv⟩ of a parent', [{}, withParent(averaged(10))], [{}, withParent(averaged(100))], 24, 10],
  [
    'σ(√s) of a candidate',
    [{}, { ...wimp, annihilation: sigmaTable(200, 215) }],
    [{}, { ...wimp, annihilation: sigmaTable(200, 400) }],
    // What a constant σv has beyond: the tail of √y e^{−y} above y = (215 − 200)/4.1, over the rest.
    0.07,
    0.01,
  ],
  ['σ(√s) of a collision', [{}, collision(200, 300)], [{}, collision(200, 6000)], 1, 0.01],
]

describe('guards', () => {
  it.each(tables)('a table used outside its rows raises one: %s', (_what, raises, quiet, value, limit) => {
    const found = raised(...raises).find((guard) => guard.code === 'table-extrapolated')
    expect(found).toBeDefined()
    expect(found!.limit / limit).toBeCloseTo(1, 2)
    // The number it rests on is of the size that the case was made for.
    expect(found!.value / value).toBeGreaterThan(0.5)
    expect(found!.value / value).toBeLessThan(2)
    expect(raised(...quiet).map((guard) => guard.code)).not.toContain('table-extrapolated')
  })

  it('unitarity is held against an enhancement that outgrows it long after freeze-out', () => {
    const sommerfeld = (mediatorMassGeV: number) => ({
      ...wimp,
      massGeV: 1e4,
      annihilation: { kind: 'sommerfeld', sWaveCm3PerS: 1e-26, couplingAlpha: 0.05, mediatorMassGeV },
    })
    // 6αm/(π²m_φ) = 1: on the first bound state; and half way to the second.
    const level = (6 * 0.05 * 1e4) / Math.PI ** 2
    const codes = (mediator: number) =>
      raised({}, sommerfeld(mediator)).filter((guard) => guard.code === 'unitarity')
    expect(codes(level * (1 - 1e-7))[0]?.message).toContain('After freeze-out')
    expect(codes(level / 2.25)).toEqual([])
  })

  it.each(pairs)('%s is raised where it should be and not next to it', (code, raises, quiet) => {
    const guards = raised(...raises)
    const found = guards.find((guard) => guard.code === code)
    expect(found, guards.map((guard) => guard.code).join()).toBeDefined()
    expect(raised(...quiet).map((guard) => guard.code)).not.toContain(code)
  })

  it('are each tried here, whatever mechanism they belong to', () => {
    const mechanisms = candidateInput.options.map((option) => option.shape.mechanism.value)
    const known = new Set(
      mechanisms.flatMap((mechanism) => guardsLookedAt(mechanism).map(({ code }) => code)),
    )
    expect([...known].sort()).toEqual(pairs.map(([code]) => code).sort())
  })

  it('carry message, value, limit and source', () => {
    for (const [, raises] of pairs) {
      for (const guard of raised(...raises)) {
        expect(guard.message.length).toBeGreaterThan(20)
        expect(Number.isFinite(guard.value) && Number.isFinite(guard.limit)).toBe(true)
        expect(guard.source.length).toBeGreaterThan(5)
      }
    }
  })
})
