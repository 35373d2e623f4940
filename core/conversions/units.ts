/** Numbers that say the same of a particle in different units, whatever the history. */
import { GEV_MINUS2_PER_CM3_S, HBARC_GEV_CM, HBAR_GEV_S } from '../constants/natural.ts'
import { UNITS } from '../units/units.ts'
import type { ParticleQuantity } from '../wire/convert.ts'

const CM_PER_M = 100

interface Unit {
  /** What it measures; only quantities of one kind can be converted into each other. */
  kind: 'decay' | 'annihilation'
  /** To the base of its kind: the lifetime in s, ⟨σv⟩ in cm³/s. Its own inverse up to the factor when it is inverse to the base. */
  toBase(value: number): number
  fromBase(base: number): number
}

const times = (kind: Unit['kind'], factor: number): Unit => ({
  kind,
  toBase: (value) => value * factor,
  fromBase: (base) => base / factor,
})

const inverse = (kind: Unit['kind'], factor: number): Unit => ({
  kind,
  toBase: (value) => factor / value,
  fromBase: (base) => factor / base,
})

export const PARTICLE_UNITS: Record<ParticleQuantity, Unit> = {
  lifetimeS: times('decay', 1),
  widthGeV: inverse('decay', HBAR_GEV_S),
  decayLengthM: times('decay', (HBAR_GEV_S / HBARC_GEV_CM) * CM_PER_M),
  sigmaVCm3PerS: times('annihilation', 1),
  sigmaVGeVMinus2: times('annihilation', 1 / GEV_MINUS2_PER_CM3_S),
  sigmaVPicobarnC: times('annihilation', UNITS.crossSection['pb·c']!),
}
