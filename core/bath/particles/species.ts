import type { Statistics } from '../speciesIntegrals.ts'

/** A species of the bath: mass in GeV, internal states g with antiparticles and charge states counted in. */
export interface Particle {
  readonly name: string
  readonly massGeV: number
  readonly degreesOfFreedom: number
  readonly statistics: Statistics
}

const particle =
  (statistics: Statistics) =>
  (name: string, massGeV: number, degreesOfFreedom: number): Particle => ({
    name,
    massGeV,
    degreesOfFreedom,
    statistics,
  })

export const fermion = particle('fermion')
export const boson = particle('boson')
