/**
 * Textbook steps: a species counts fully while T > m and not at all below. Quarks and gluons are replaced by pions at T_c.
 * A step treatment, so dg_s/d ln T is zero and p = ρ/3.
 * Source: Kolb & Turner, The Early Universe (1990), fig. 3.5; PDG, Big-bang cosmology, table of g.
 */
import type { BathPart } from '../bath.ts'
import { PIONS } from '../particles/hadrons.ts'
import { WITHOUT_COLOUR, WITH_COLOUR } from '../particles/standardModel.ts'
import type { Particle } from '../particles/species.ts'

const weight = (particle: Particle): number =>
  particle.degreesOfFreedom * (particle.statistics === 'fermion' ? 7 / 8 : 1)

function countAbove(particles: readonly Particle[], temperatureGeV: number): number {
  let sum = 0
  for (const particle of particles) if (temperatureGeV > particle.massGeV) sum += weight(particle)
  return sum
}

export function thresholds(transitionTemperatureGeV: number, others: readonly Particle[]): BathPart {
  const always = [...WITHOUT_COLOUR, ...others]
  const masses = (particles: readonly Particle[]) => particles.map((particle) => particle.massGeV)
  return {
    breaks: [
      ...masses(always),
      ...masses(WITH_COLOUR).filter((mass) => mass > transitionTemperatureGeV),
      ...masses(PIONS).filter((mass) => mass < transitionTemperatureGeV),
      transitionTemperatureGeV,
    ].filter((mass) => mass > 0),
    evaluate(temperatureGeV, out) {
      const strong = temperatureGeV > transitionTemperatureGeV ? WITH_COLOUR : PIONS
      out.gRho = out.gS = out.gP = countAbove(always, temperatureGeV) + countAbove(strong, temperatureGeV)
      out.gSSlope = 0
    },
    contributions(temperatureGeV) {
      const strong = temperatureGeV > transitionTemperatureGeV ? WITH_COLOUR : PIONS
      return [...always, ...strong]
        .filter((particle) => temperatureGeV > particle.massGeV)
        .map((particle) => {
          const g = weight(particle)
          return { name: particle.name, temperatureGeV, gRho: g, gS: g, gP: g }
        })
    },
  }
}
