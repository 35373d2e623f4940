/** Ideal gases of several species, and how a pressure becomes the numbers of a bath. */
import { emptyPoint } from './bath.ts'
import type { BathPoint, Contribution } from './bath.ts'
import type { Particle } from './particles/species.ts'
import { addSpecies } from './speciesTable.ts'
import type { PressureJet } from './speciesTable.ts'

const PI2 = Math.PI ** 2

export const zeroJet = (): PressureJet => ({ value: 0, first: 0, second: 0 })

/** Adds the pressure jets of all species at temperature T, GeV. */
export function addGas(jet: PressureJet, particles: readonly Particle[], temperatureGeV: number): void {
  for (const { massGeV, degreesOfFreedom, statistics } of particles)
    addSpecies(jet, massGeV / temperatureGeV, degreesOfFreedom, statistics)
}

/** The pressure jet of an ideal gas at temperature T, GeV. */
export function gasJet(particles: readonly Particle[], temperatureGeV: number): PressureJet {
  const jet = zeroJet()
  addGas(jet, particles, temperatureGeV)
  return jet
}

/** s/T³ of a pressure jet: 4f + f′. */
export const entropyOf = (jet: PressureJet): number => 4 * jet.value + jet.first

/** d(s)/d ln T over T³ of a pressure jet: 12f + 7f′ + f″. */
export const entropySlopeOf = (jet: PressureJet): number => 12 * jet.value + 7 * jet.first + jet.second

/** Turns p/T⁴ = f(ln T) into effective numbers by s = dp/dT and ρ = Ts − p, which it therefore obeys exactly. */
export function pointOfJet(jet: PressureJet, out: BathPoint): void {
  const entropy = entropyOf(jet)
  out.gRho = (30 / PI2) * (3 * jet.value + jet.first)
  out.gS = (45 / (2 * PI2)) * entropy
  out.gSSlope = (45 / (2 * PI2)) * (entropySlopeOf(jet) - 3 * entropy)
  out.gP = (90 / PI2) * jet.value
}

/** A part with the effective numbers of a pressure jet at temperature T, GeV. */
export function contributionOf(name: string, jet: PressureJet, temperatureGeV: number): Contribution {
  const { gRho, gS, gP } = pointOf(jet)
  return { name, temperatureGeV, gRho, gS, gP }
}

const pointOf = (jet: PressureJet): BathPoint => {
  const point = emptyPoint()
  pointOfJet(jet, point)
  return point
}

/** What each species of an ideal gas gives at temperature T, GeV; those of which nothing is left are left out. */
export const gasContributions = (particles: readonly Particle[], temperatureGeV: number): Contribution[] =>
  particles
    .map((particle) => contributionOf(particle.name, gasJet([particle], temperatureGeV), temperatureGeV))
    .filter(({ gRho }) => gRho > 0)
