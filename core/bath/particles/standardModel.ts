/**
 * Species of the Standard Model above the strong-interaction crossover.
 * Masses: Particle Data Group, Review of Particle Physics 2024, written down from memory.
 */
import { boson, fermion } from './species.ts'
import type { Particle } from './species.ts'

export const PHOTON: Particle = boson('γ', 0, 2)

export const ELECTRON: Particle = fermion('e', 0.51099895e-3, 4)

export const CHARGED_LEPTONS: readonly Particle[] = [
  ELECTRON,
  fermion('μ', 0.1056583755, 4),
  fermion('τ', 1.77693, 4),
]

export const LIGHT_QUARKS: readonly Particle[] = [
  fermion('u', 2.16e-3, 12),
  fermion('d', 4.7e-3, 12),
  fermion('s', 0.0935, 12),
]

export const HEAVY_QUARKS: readonly Particle[] = [
  fermion('c', 1.273, 12),
  fermion('b', 4.183, 12),
  fermion('t', 172.57, 12),
]

export const GLUONS: Particle = boson('g', 0, 16)

export const WEAK_BOSONS: readonly Particle[] = [
  boson('W', 80.3692, 6),
  boson('Z', 91.188, 3),
  boson('H', 125.2, 1),
]

/** Everything without strong interaction that shares the photons' temperature. */
export const WITHOUT_COLOUR: readonly Particle[] = [PHOTON, ...CHARGED_LEPTONS, ...WEAK_BOSONS]

/** Quarks and gluons. */
export const WITH_COLOUR: readonly Particle[] = [...LIGHT_QUARKS, ...HEAVY_QUARKS, GLUONS]

/** g_ρ, and g_s, of three massless neutrino species at the photons' temperature: 7/8 · 3 · 2. */
export const NEUTRINO_G = 5.25

/** What quarks, gluons and hadrons are called where they cannot be told apart. */
export const STRONG_PART = 'strongly interacting'
