import { z } from 'zod'

/** A finite number above zero. JSON has no infinities, but JavaScript callers do: they are refused here. */
export const positive = z.number().positive()

export const nonNegative = z.number().nonnegative()

/** A mass, GeV. The ceiling is the Planck scale: above it the expansion used here means nothing. */
export const massGeV = positive.max(1e19).describe('Mass, GeV')

/** A temperature of the bath, GeV. */
export const temperatureGeV = positive.min(1e-14).max(1e16).describe('Temperature of the bath, GeV')

/** Internal states g; half-integers do not occur, but effective numbers need not be whole. */
export const degreesOfFreedom = positive.max(1e4).describe('Internal states g')

export const quantumStatistics = z.enum(['fermion', 'boson']).describe('Quantum statistics')
