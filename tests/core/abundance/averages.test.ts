/** Quick averages over energies and velocities, for any input, against the same integrals done the slow and plain way. */
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { scaledCollisionIntegral } from '#core/abundance/rates/collisionIntegral'
import { heldAtEnds, piecesOfTable, singlePower } from '#core/abundance/rates/powerLawPieces'
import { resonanceAverage } from '#core/abundance/rates/resonanceAverage'
import {
  coulombAverage,
  coulombFactor,
  hulthenFactor,
  maxwellAverage,
} from '#core/abundance/rates/sommerfeld'
import { gaussLegendre, integrateWith } from '#core/numerics/quadrature/gaussLegendre'
import { scaledBesselK } from '#core/numerics/special/besselK'
import { between } from '../arbitraries.ts'
import { relative } from '../fixtures.ts'

const RULE = gaussLegendre(20)

/** ∫ over ln y by hundreds of panels, finer about some places. */
function slowly(f: (y: number) => number, low: number, high: number, places: readonly number[] = []): number {
  const edges = new Set([low, high])
  for (let y = low; y < high; y *= 1.25) edges.add(y)
  for (const place of places)
    for (let gap = 1e-13; gap < 4; gap *= 1.8) {
      edges.add(place * (1 + gap))
      edges.add(place * Math.max(0, 1 - gap))
    }
  const inside = [...edges].filter((edge) => edge >= low && edge <= high).sort((a, b) => a - b)
  let sum = 0
  for (let i = 0; i + 1 < inside.length; i++) sum += integrateWith(RULE, f, inside[i]!, inside[i + 1]!)
  return sum
}

const LEAST = 1e-17

describe('the average of a resonance', () => {
  const resonance = fc.record({
    ratio: fc.oneof(
      between(0.1, 30),
      between(1e-7, 0.3).map((gap) => 2 + gap),
      between(1e-7, 0.3).map((gap) => 2 - gap),
    ),
    widthOverMass: between(1e-8, 0.9),
    x: fc.oneof(between(0.1, 300), between(300, 1e14)),
  })

  it('is that of the Breit–Wigner form, by definition, wherever the pole lies and however narrow', () => {
    fc.assert(
      fc.property(resonance, ({ ratio, widthOverMass, x }) => {
        const pole = ratio * ratio - 4
        const width = ratio * ratio * widthOverMass
        const integrand = (y: number): number => {
          const excess = y / x
          const d = excess * (4 + excess)
          const lorentzian = 1 / (1 + ((d - pole) / width) ** 2)
          return lorentzian * (2 + excess) ** 2 * 2 * scaledBesselK(1, (2 + excess) * x) * Math.exp(-y)
        }
        // Where the pole is, in y; below threshold, how far from it.
        const place = Math.abs(ratio - 2) * x
        const expected = (2 * Math.PI * slowly(integrand, LEAST, 90, [place])) / scaledBesselK(2, x) ** 2
        const found = resonanceAverage({ candidateGeV: 1, massGeV: ratio, widthGeV: ratio * widthOverMass })(
          x,
        )
        // A peak at y, known to 1e-16 of itself, is met with y/width of that; else the rules leave 1e-10.
        const unknown = 4e-16 * ((place * (1 + ratio)) / x / width) * Math.max(1, place)
        expect(Math.abs(found / expected - 1)).toBeLessThan(2e-10 + unknown)
      }),
      { numRuns: 60 },
    )
  })
})

describe('the Maxwell average of a Sommerfeld factor', () => {
  const strong = fc.record({
    alpha: between(1e-4, 1),
    epsilon: between(1e-4, 1e3),
    x: between(0.1, 1e14),
  })
  const slow = (x: number, factor: (v: number) => number): number =>
    (4 / Math.sqrt(Math.PI)) *
    slowly((w) => w * w * Math.exp(-w * w) * factor((2 * w) / Math.sqrt(x)), 1e-12, 7)

  it('is that of the Hulthén and of the Coulomb factor, by definition', () => {
    fc.assert(
      fc.property(strong, ({ alpha, epsilon, x }) => {
        const hulthen = (v: number): number => hulthenFactor(v, alpha, epsilon)
        expect(relative(maxwellAverage(hulthen)(x), slow(x, hulthen))).toBeLessThan(1e-11)
        const coulomb = slow(x, (v) => coulombFactor(v, alpha))
        expect(relative(coulombAverage(alpha)(x), coulomb)).toBeLessThan(1e-11)
      }),
      { numRuns: 60 },
    )
  })

  it('of the Hulthén factor has no jump where its root turns imaginary', () => {
    fc.assert(
      fc.property(between(1e-4, 1), between(1e-4, 1e3), (alpha, epsilon) => {
        const turn = 2 * alpha * Math.sqrt(epsilon)
        const [below, above] = [1 - 1e-9, 1 + 1e-9].map((f) => hulthenFactor(turn * f, alpha, epsilon))
        expect(relative(below!, above!)).toBeLessThan(1e-6)
      }),
    )
  })
})

describe('the integral over collision energies', () => {
  const collision = fc
    .record({ one: between(0.01, 100), two: between(0.01, 100), product: between(0.01, 300) })
    .map(({ one, two, product }) => ({
      sum: one + two,
      difference: Math.abs(one - two),
      least: Math.max(one + two, product),
    }))
  const table = fc
    .tuple(
      between(0.1, 200),
      fc.array(fc.tuple(between(1.05, 30), between(1e-3, 1)), { minLength: 1, maxLength: 12 }),
    )
    .map(([first, steps]) => {
      let energy = first
      return piecesOfTable([
        [first, 0.1],
        ...steps.map(([ratio, sigma]) => [(energy *= ratio), sigma] as const),
      ])
    })
  const sigma = fc.oneof(
    table,
    table.map(heldAtEnds),
    fc
      .tuple(fc.integer({ min: -200, max: 40 }), between(0.1, 100))
      .map(([tenths, at]) => singlePower(tenths / 10, at)),
  )

  it('is the one it is, by definition, for tables and powers, in cold and in hot baths', () => {
    fc.assert(
      fc.property(collision, sigma, between(0.03, 1e6), ({ sum, difference, least }, pieces, hotness) => {
        const { edges, exponent, lnSigma, lnEnergy } = pieces
        const low = Math.max(least, edges[0]!)
        const T = low * hotness
        let expected = 0
        for (let i = 0; i + 1 < edges.length; i++) {
          const integrand = (y: number): number => {
            const energy = low + y * T
            const phaseSpace = (y * T + low - sum) * (energy + sum) * (energy ** 2 - difference ** 2)
            const power = Math.exp(lnSigma[i]! + exponent[i]! * (Math.log(energy) - lnEnergy[i]!))
            return 2 * T * power * phaseSpace * scaledBesselK(1, energy / T) * Math.exp(-y)
          }
          const [from, to] = [(edges[i]! - low) / T, (edges[i + 1]! - low) / T]
          const [first, last] = [Math.max(from, 1e-9 / hotness), Math.min(to, 90)]
          if (last > first) expected += slowly(integrand, first, last)
          // Below the first panel of the logarithm, where it begins at the threshold.
          if (from <= 0 && to > 0) expected += integrateWith(RULE, integrand, 0, Math.min(first, to))
        }
        const found = scaledCollisionIntegral(T, pieces, { sum, difference, least })
        if (expected === 0) expect(found).toBe(0)
        else expect(relative(found, expected)).toBeLessThan(1e-10)
      }),
      { numRuns: 150 },
    )
  })
})
