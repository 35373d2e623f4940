import { describe, expect, it } from 'vitest'
import { computeAttribution } from '#core/index'
import { continuousPaths, elasticities } from '#core/sensitivity/elasticity'
import { abundanceRequest } from '#core/wire/index'
import { attributionFixture } from '../fixtures.ts'

interface FixtureElasticity {
  path: string
  value: number
}

/** The fixture writes `extraSpecies.0`, the product `extraSpecies[0]`. */
const written = (path: string): string => path.replace(/\.(\d+)/g, '[$1]')

describe('elasticities', () => {
  it.each(attributionFixture.cases.map((each) => [each.name, each] as const))(
    'agree with independent ones within their stated error, which is below 1e-4: %s',
    (_name, { input, outputs }) => {
      const found = computeAttribution(input).elasticities
      for (const { path, value } of (outputs as unknown as { elasticities: FixtureElasticity[] })
        .elasticities) {
        const ours = found.find((each) => each.path === written(path))
        expect(ours, path).toBeDefined()
        if (ours!.value === null) {
          // Its place at the end of the range leaves no room to move.
          expect(path).toBe('history.bath.band')
          continue
        }
        expect(Math.abs(ours!.value - value), path).toBeLessThanOrEqual(ours!.error!)
        expect(ours!.error!, path).toBeLessThan(1e-4)
      }
    },
    60_000,
  )

  it('are exactly one for the mass of a freeze-in candidate and minus one for the lifetime of its parent', () => {
    const request = abundanceRequest.parse({
      history: {},
      candidate: {
        mechanism: 'freeze-in-decay',
        massGeV: 1e-5,
        degreesOfFreedom: 2,
        statistics: 'fermion',
        parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-9 },
      },
    })
    const value = (path: string): number => elasticities(request).find((each) => each.path === path)!.value!
    expect(value('candidate.massGeV')).toBeCloseTo(1, 9)
    expect(value('candidate.parent.lifetimeS')).toBeCloseTo(-1, 9)
  })

  it('leave counts, labels and zeros out', () => {
    expect(
      continuousPaths({ a: { degreesOfFreedom: 2, massGeV: 3, band: 0 }, points: [1], b: [{ ratio: 0.5 }] }),
    ).toEqual(['a.massGeV', 'points[0]', 'b[0].ratio'])
  })

  it('are null where an input stands at the end of its range', () => {
    const request = abundanceRequest.parse({
      history: { bath: { treatment: 'fit-2018', band: 1 } },
      candidate: {
        mechanism: 'freeze-out',
        massGeV: 100,
        degreesOfFreedom: 2,
        statistics: 'fermion',
        annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2e-26 },
      },
    })
    expect(elasticities(request).find((each) => each.path === 'history.bath.band')).toEqual({
      path: 'history.bath.band',
      value: null,
      error: null,
    })
  })
})
