/** A field that decays into the candidate as well as into the bath. */
import { describe, expect, it } from 'vitest'
import { abundance, buildHistory } from '#core/index'
import { emptyExpansion } from '#core/history/expansionPoint'
import { isMatterEra } from '#core/history/expansions/earlyMatter'
import { mechanismOf } from '#core/abundance/mechanisms/mechanisms'
import { candidateInput, historyInput } from '#core/wire/index'
import { relative } from '../fixtures.ts'

const particle = { degreesOfFreedom: 2, statistics: 'fermion' }
const FIELD_GEV = 1e8

const historyWith = (branching: number, era: object = {}, more: object = {}) =>
  buildHistory(
    historyInput.parse({
      expansion: {
        kind: 'early-matter',
        reheatTemperatureGeV: 0.5,
        startTemperatureGeV: 100,
        ...(branching > 0 ? { branching, fieldMassGeV: FIELD_GEV } : {}),
        ...era,
      },
      ...more,
    }),
  )

const yieldOf = (history: ReturnType<typeof historyWith>, candidate: unknown): number =>
  abundance(history, candidateInput.parse(candidate)).yieldToday

/** b ρ_φ a³/(m_φ s a³) of a field that has not decayed yet, per today's s a³: what all of its decays make. */
function allDecays(branching: number): number {
  const history = historyWith(branching)
  if (!isMatterEra(history.expansion)) throw new Error('not an era of matter')
  const { startTemperatureGeV } = history.expansion
  // At the start both are equal, and 1e-8 of the field has decayed. ρ_R/s = (3/4) T g_ρ/g_s.
  const lnStart = Math.log(startTemperatureGeV)
  const point = emptyExpansion()
  history.at(lnStart, point)
  return ((branching / FIELD_GEV) * point.otherEnergy) / (point.entropy * Math.exp(point.lnDilution))
}
const decay = {
  mechanism: 'freeze-in-decay',
  massGeV: 1e-5,
  ...particle,
  parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-12 },
}
const followed = {
  ...decay,
  parent: {
    ...decay.parent,
    lifetimeS: 1e-10,
    annihilation: { kind: 'partial-waves', sWaveCm3PerS: 1e-27 },
  },
}
const hot = { mechanism: 'hot-relic', massGeV: 1e-9, ...particle, decouplingTemperatureGeV: 1000 }
const collision = {
  mechanism: 'freeze-in-scattering',
  massGeV: 30,
  ...particle,
  scattering: { kind: 'constant-matrix-element', matrixElementSquared: 1e-20 },
}

describe('candidates from a decaying field', () => {
  const branching = 1e-3

  it.each([
    ['decays of a parent in equilibrium', decay],
    ['a parent that annihilates', followed],
    ['collisions', collision],
    ['a hot relic', hot],
  ])('come beside %s: all of ρ_φ/m_φ times the branching', (_what, candidate) => {
    const more = yieldOf(historyWith(branching), candidate) - yieldOf(historyWith(0), candidate)
    // Of the field, Γ/H at 100 GeV, 1e-5 of it, decayed before the start: b and the era itself are good to 1e-8.
    expect(relative(more, allDecays(branching))).toBeLessThan(1e-4)
  })

  it('come beside a light parent as well, though the field decays before its time', () => {
    const light = { ...decay, parent: { ...decay.parent, massGeV: 1e-6, lifetimeS: 1e21 }, massGeV: 1e-9 }
    const more = yieldOf(historyWith(branching), light) - yieldOf(historyWith(0), light)
    expect(relative(more, allDecays(branching))).toBeLessThan(1e-4)
  })

  it('are not touched by inverse decays once the parents have gone', () => {
    const heavy = { ...decay, parent: { ...decay.parent, massGeV: 1e5 }, massGeV: 1e-3, backReaction: true }
    const more = yieldOf(historyWith(branching), heavy) - yieldOf(historyWith(0), heavy)
    expect(relative(more, allDecays(branching))).toBeLessThan(1e-4)
  })

  it('are halved between particles and antiparticles: the total is what it was', () => {
    const weak = { kind: 'partial-waves', sWaveCm3PerS: 1e-32 }
    const symmetric = {
      mechanism: 'freeze-out',
      massGeV: 10,
      ...particle,
      degreesOfFreedom: 4,
      selfConjugate: false,
      annihilation: weak,
    }
    const asymmetric = { ...symmetric, mechanism: 'asymmetric', asymmetry: 1e-25 }
    expect(
      relative(yieldOf(historyWith(branching), asymmetric), yieldOf(historyWith(branching), symmetric)),
    ).toBeLessThan(3e-7)
  })

  it.each([
    ['freeze-in by decay', decay],
    ['a parent that annihilates', followed],
    ['a hot relic', hot],
  ])('are on the curve of %s, which ends at the yield today', (_what, candidate) => {
    const history = historyWith(branching)
    const parsed = candidateInput.parse(candidate)
    const mechanism = mechanismOf(parsed)
    const lnToday = Math.log(mechanism.scaleGeV(history, parsed) / history.temperatureToday)
    const { lnYield } = mechanism.yields(history, parsed, Float64Array.of(lnToday - 1e-9))
    // A curve is solved with less effort.
    expect(relative(Math.exp(lnYield[0]!), yieldOf(history, candidate))).toBeLessThan(1e-5)
  })
})
