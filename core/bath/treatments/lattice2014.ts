/**
 * Lattice pressure of u, d, s quarks and gluons, joined to a gas of hadrons between 130 and 145 MeV:
 *
 *   p = (1 − w) p_hadrons + w (p_lattice + p_c + p_b + p_t),   w = 10z³ − 15z⁴ + 6z⁵,   z = (T − 130 MeV)/15 MeV in [0, 1].
 *
 * Source: HotQCD, Phys. Rev. D 90 (2014) 094503, parametrisation written down from memory; the join is this project's own.
 */
import type { BathPart, Contribution } from '../bath.ts'
import { addGas, contributionOf, gasContributions, gasJet, pointOfJet, zeroJet } from '../gas.ts'
import type { PressureJet } from '../speciesTable.ts'
import { HEAVY_QUARKS, STRONG_PART, WITHOUT_COLOUR } from '../particles/standardModel.ts'
import type { Particle } from '../particles/species.ts'

const JOIN_LOW_GEV = 0.13
const JOIN_HIGH_GEV = 0.145

/** Product of two functions of ln T with their derivatives. */
function product(a: PressureJet, b: PressureJet): PressureJet {
  return {
    value: a.value * b.value,
    first: a.first * b.value + a.value * b.first,
    second: a.second * b.value + 2 * a.first * b.first + a.value * b.second,
  }
}

/** 1/a with its derivatives. */
function reciprocal(a: PressureJet): PressureJet {
  const value = 1 / a.value
  const first = -a.first * value * value
  return { value, first, second: -a.second * value * value - 2 * a.first * first * value }
}

/** Σ cₖ t^k over the given powers, with derivatives in ln t. */
function powers(t: number, terms: readonly (readonly [coefficient: number, power: number])[]): PressureJet {
  const jet = zeroJet()
  for (const [coefficient, power] of terms) {
    const term = coefficient * t ** power
    jet.value += term
    jet.first += power * term
    jet.second += power * power * term
  }
  return jet
}

const IDEAL_LIMIT = (95 * Math.PI ** 2) / 180
const STEEPNESS = 3.8706
const CENTRE = 0.9761

/** p/T⁴ of u, d, s and gluons, with derivatives in ln T. */
export function latticePressure2014(temperatureGeV: number): PressureJet {
  const t = temperatureGeV / 0.154
  const numerator = powers(t, [
    [IDEAL_LIMIT, 0],
    [-8.7704, -1],
    [3.92, -2],
    [0.3419, -4],
  ])
  const denominator = powers(t, [
    [1, 0],
    [-1.26, -1],
    [0.8425, -2],
    [-0.0475, -4],
  ])
  const tanh = Math.tanh(STEEPNESS * (t - CENTRE))
  const slope = ((1 - tanh * tanh) / 2) * STEEPNESS * t
  const rise = { value: (1 + tanh) / 2, first: slope, second: slope * (1 - 2 * tanh * STEEPNESS * t) }
  return product(rise, product(numerator, reciprocal(denominator)))
}

/** The weight of the lattice pressure, with derivatives in ln T. */
function joinWeight(temperatureGeV: number): PressureJet {
  const width = JOIN_HIGH_GEV - JOIN_LOW_GEV
  const z = Math.min(1, Math.max(0, (temperatureGeV - JOIN_LOW_GEV) / width))
  const perZ = 30 * z * z * (1 - z) ** 2
  const perZ2 = 60 * z * (1 - z) * (1 - 2 * z)
  const dz = temperatureGeV / width
  return { value: z ** 3 * (10 - 15 * z + 6 * z * z), first: perZ * dz, second: perZ2 * dz * dz + perZ * dz }
}

function add(jet: PressureJet, part: PressureJet): void {
  jet.value += part.value
  jet.first += part.first
  jet.second += part.second
}

/**
 * The strong part by its species: hadrons below the join; above it c, b, t, and what the lattice has, which is one. Within the join
 * the entropy of what appears and what goes cannot be told apart.
 */
function strongContributions(
  hadrons: readonly Particle[],
  temperatureGeV: number,
  addStrong: (jet: PressureJet, temperatureGeV: number) => void,
): Contribution[] {
  if (temperatureGeV <= JOIN_LOW_GEV) return gasContributions(hadrons, temperatureGeV)
  if (temperatureGeV >= JOIN_HIGH_GEV)
    return [
      contributionOf('u, d, s, g', latticePressure2014(temperatureGeV), temperatureGeV),
      ...gasContributions(HEAVY_QUARKS, temperatureGeV),
    ]
  const strong = zeroJet()
  addStrong(strong, temperatureGeV)
  return [contributionOf(STRONG_PART, strong, temperatureGeV)]
}

export function lattice2014(hadrons: readonly Particle[], others: readonly Particle[]): BathPart {
  const always = [...WITHOUT_COLOUR, ...others]
  const addStrong = (jet: PressureJet, temperatureGeV: number): void => {
    const weight = joinWeight(temperatureGeV)
    if (weight.value < 1) {
      const rest = { value: 1 - weight.value, first: -weight.first, second: -weight.second }
      add(jet, product(rest, gasJet(hadrons, temperatureGeV)))
    }
    if (weight.value > 0) {
      const strong = latticePressure2014(temperatureGeV)
      addGas(strong, HEAVY_QUARKS, temperatureGeV)
      add(jet, product(weight, strong))
    }
  }
  return {
    breaks: [JOIN_LOW_GEV, JOIN_HIGH_GEV],
    evaluate(temperatureGeV, out) {
      const jet = gasJet(always, temperatureGeV)
      addStrong(jet, temperatureGeV)
      pointOfJet(jet, out)
    },
    contributions: (temperatureGeV) => [
      ...gasContributions(always, temperatureGeV),
      ...strongContributions(hadrons, temperatureGeV, addStrong),
    ],
  }
}
