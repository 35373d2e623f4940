import { describe, expect, it } from 'vitest'
import { abundance, buildHistory, computeAbundance, computeAttribution } from '#core/index'
import { attribute, splitSteps } from '#core/sensitivity/attribution'
import { complete } from '#core/steps/steps'
import { InputError, candidateInput, historyInput } from '#core/wire/index'
import type { AttributeResult } from '#core/wire/index'
import { attributionFixture, relative } from '../fixtures.ts'

describe('attribution between two histories', () => {
  it('the other way round has the same parts with the other sign', () => {
    const { input } = attributionFixture.cases[0]!
    const there = computeAttribution(input)
    const back = computeAttribution({ ...input, baseline: input.variant, variant: input.baseline })
    there.parts.forEach((part, i) => {
      expect(back.parts[i]!.group).toBe(part.group)
      expect(Math.abs(back.parts[i]!.lnFactor + part.lnFactor)).toBeLessThan(1e-12)
    })
    expect(Math.abs(back.ratio * there.ratio - 1)).toBeLessThan(1e-12)
  })

  it('of a history with itself has factors of one', () => {
    const { input } = attributionFixture.cases[0]!
    const { ratio, parts, oneAtATime } = computeAttribution({ ...input, variant: input.baseline })
    expect(ratio).toBe(1)
    for (const part of [...parts, ...oneAtATime]) expect([part.lnFactor, part.factor]).toEqual([0, 1])
  })

  it('has the two abundances, their ratio, and factors whose product is the ratio, from the wire', () => {
    for (const { input, outputs } of attributionFixture.cases) {
      const { baselineOmegaH2, variantOmegaH2, ratio, parts } = computeAttribution(input)
      // Two abundances good to 1e-8 or so each; 1e-7 is what is promised of the factors.
      expect(Math.abs(ratio / outputs.ratio - 1)).toBeLessThan(1e-7)
      expect(Math.abs(variantOmegaH2 / baselineOmegaH2 / ratio - 1)).toBeLessThan(1e-12)
      const product = parts.reduce((total, part) => total * part.factor, 1)
      expect(Math.abs(product / ratio - 1)).toBeLessThan(1e-12)
      const { omegaH2 } = computeAbundance({ history: input.variant, candidate: input.candidate })
      expect(Math.abs(variantOmegaH2 / omegaH2 - 1)).toBeLessThan(1e-12)
    }
  })

  const cases = attributionFixture.cases.map((each) => [each.name, each] as const)

  it.each(cases)('agrees with independent factors to 1e-7: %s', (_name, { input, outputs }) => {
    const candidate = candidateInput.parse(input.candidate)
    const { lnRatio, lnFactors, oneAtATime } = attribute(
      historyInput.parse(input.baseline),
      historyInput.parse(input.variant),
      (history) => abundance(buildHistory(history), candidate).omegaH2,
    )
    const find = (parts: Record<string, number>, group: string): number =>
      parts[group === 'maximumTemperature' ? 'maximumTemperatureGeV' : group]!
    expect(Math.abs(lnRatio - Math.log(outputs.ratio))).toBeLessThan(1e-7)
    for (const { group, lnFactor } of outputs.parts)
      expect(Math.abs(find(lnFactors, group) - lnFactor), group).toBeLessThan(1e-7)
    for (const { group, lnFactor } of outputs.oneAtATime)
      expect(Math.abs(find(oneAtATime, group) - lnFactor), group).toBeLessThan(1e-7)
    const sum = Object.values(lnFactors).reduce((total, part) => total + part, 0)
    expect(Math.abs(sum - lnRatio)).toBeLessThan(1e-12)
  })
})

describe('attribution of a real change', () => {
  const candidate = {
    mechanism: 'freeze-out',
    massGeV: 100,
    degreesOfFreedom: 2,
    statistics: 'fermion',
    annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
  }

  it('does not depend on the order in which the groups are read', () => {
    const { input } = attributionFixture.cases[0]!
    const [baseline, variant] = [historyInput.parse(input.baseline), historyInput.parse(input.variant)]
    const parsed = candidateInput.parse(input.candidate)
    const groups = ['bath', 'expansion', 'neutrinos'] as const
    const split = (order: readonly number[]): number[] => {
      const { lnFactors } = complete(
        splitSteps(order.length, (taken) => {
          const mixed = Object.fromEntries(
            taken.map((i) => [groups[order[i]!]!, variant[groups[order[i]!]!]]),
          )
          return abundance(buildHistory({ ...baseline, ...mixed }), parsed).omegaH2
        }),
      )
      return order.map((_, group) => lnFactors[order.indexOf(group)]!)
    }
    const first = split([0, 1, 2])
    for (const order of [
      [1, 0, 2],
      [2, 1, 0],
      [1, 2, 0],
    ])
      split(order).forEach((part, i) => expect(Math.abs(part - first[i]!)).toBeLessThan(1e-13))
  })

  it('gives a group nothing that differs without a difference (dummy)', () => {
    // The abundance leaves matter and Λ out of H, so h has no part in it.
    const { parts, ratio } = computeAttribution({
      baseline: { bath: { treatment: 'thresholds' } },
      variant: { bath: { treatment: 'lattice-2016' }, today: { hubbleParameter: 0.73 } },
      candidate,
    })
    const find = (group: string): number => parts.find((part) => part.group === group)!.lnFactor
    expect(Math.abs(find('today'))).toBeLessThan(1e-15)
    expect(Math.abs(find('bath') - Math.log(ratio))).toBeLessThan(1e-15)
    expect(Math.abs(Math.log(ratio))).toBeGreaterThan(0.01)
  })
})

describe('attribution between two candidates', () => {
  const decay = {
    mechanism: 'freeze-in-decay',
    massGeV: 1e-5,
    degreesOfFreedom: 2,
    statistics: 'fermion',
    parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-9 },
  }
  const ask = (change: object, more: object = {}): AttributeResult =>
    computeAttribution({
      baseline: {},
      variant: {},
      candidate: decay,
      variantCandidate: { ...decay, ...change },
      ...more,
    })
  const factors = ({ parts }: AttributeResult): Record<string, number> =>
    Object.fromEntries(
      parts.filter(({ lnFactor }) => lnFactor !== 0).map(({ group, factor }) => [group, factor]),
    )

  it('has the factors known in closed form: Ωh² ∝ m_X n_X/τ', () => {
    const found = ask({ massGeV: 3e-5, perDecay: 2, parent: { ...decay.parent, lifetimeS: 4e-9 } })
    expect(Object.keys(factors(found)).sort()).toEqual([
      'candidate.massGeV',
      'candidate.parent.lifetimeS',
      'candidate.perDecay',
    ])
    const {
      'candidate.massGeV': mass,
      'candidate.parent.lifetimeS': lifetime,
      'candidate.perDecay': perDecay,
    } = factors(found)
    expect(relative(mass!, 3)).toBeLessThan(1e-12)
    expect(relative(lifetime!, 1 / 4)).toBeLessThan(1e-12)
    expect(relative(perDecay!, 2)).toBeLessThan(1e-12)
    expect(relative(found.ratio, 1.5)).toBeLessThan(1e-12)
  })

  it('treats fields alike that do alike (symmetry)', () => {
    const found = factors(
      ask({ massGeV: 2e-5, perDecay: 2 }, { variant: { bath: { treatment: 'lattice-2016' } } }),
    )
    expect(Object.keys(found)).toEqual(['bath', 'candidate.massGeV', 'candidate.perDecay'])
    expect(relative(found['candidate.massGeV']!, found['candidate.perDecay']!)).toBeLessThan(1e-13)
  })

  it('adds history and candidate up to the whole, and is the elasticities of the variant', () => {
    const found = ask(
      { parent: { ...decay.parent, massGeV: 500 } },
      { variant: { bath: { treatment: 'thresholds' } } },
    )
    expect(
      relative(
        found.parts.reduce((product, { factor }) => product * factor, 1),
        found.ratio,
      ),
    ).toBeLessThan(1e-12)
    expect(found.parts.map(({ group }) => group)).toEqual([
      'bath',
      'neutrinos',
      'extraSpecies',
      'expansion',
      'maximumTemperatureGeV',
      'today',
      'candidate.parent.massGeV',
    ])
    expect(found.elasticities.find(({ path }) => path === 'candidate.parent.lifetimeS')!.value).toBeCloseTo(
      -1,
      8,
    )
    const { omegaH2 } = computeAbundance({
      history: { bath: { treatment: 'thresholds' } },
      candidate: { ...decay, parent: { ...decay.parent, massGeV: 500 } },
    })
    expect(relative(found.variantOmegaH2, omegaH2)).toBeLessThan(1e-12)
  })

  it('takes what is of another kind as a whole', () => {
    const byWidth = { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', widthGeV: 1e-15 }
    expect(Object.keys(factors(ask({ parent: byWidth })))).toEqual(['candidate.parent'])
    const scattering = { kind: 'constant-matrix-element', matrixElementSquared: 1e-20 }
    const variantCandidate = {
      mechanism: 'freeze-in-scattering',
      massGeV: 1e-5,
      degreesOfFreedom: 2,
      statistics: 'fermion',
      scattering,
    }
    expect(
      Object.keys(
        factors(computeAttribution({ baseline: {}, variant: {}, candidate: decay, variantCandidate })),
      ),
    ).toEqual(['candidate'])
  })

  it('says what is wrong when a mixture is no candidate, or there are too many groups', () => {
    const message = (input: () => unknown): string => {
      try {
        input()
      } catch (error) {
        if (error instanceof InputError) return error.message
        throw error
      }
      return ''
    }
    expect(message(() => ask({ massGeV: 400, parent: { ...decay.parent, massGeV: 1000 } }))).toMatch(
      /^variantCandidate: the baseline with candidate\.massGeV of the variant is no candidate.*candidate\.massGeV: allowed: at most the mass of the parent/,
    )
    const partner = { massGeV: 110, degreesOfFreedom: 2, statistics: 'fermion' }
    const everything = {
      massGeV: 2e-5,
      degreesOfFreedom: 4,
      statistics: 'boson',
      perDecay: 2,
      backReaction: true,
      parent: { ...decay.parent, massGeV: 400, degreesOfFreedom: 2, statistics: 'fermion', lifetimeS: 2e-9 },
    }
    const otherHistory = {
      bath: { treatment: 'thresholds' },
      extraSpecies: [{ name: 'dark', ...partner, coupling: { kind: 'bath' } }],
    }
    expect(message(() => ask(everything, { variant: otherHistory }))).toMatch(
      /^variantCandidate: allowed: at most 10 groups that differ; these are 11: bath, extraSpecies, candidate\.massGeV/,
    )
  })
})
