import { describe, expect, it } from 'vitest'
import { guardsLookedAt } from '#core/abundance/guards/guard'
import { computeAbundance } from '#core/index'
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
]

describe('guards', () => {
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
