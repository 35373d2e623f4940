/**
 * Hadrons of the gas below the strong-interaction crossover, charge states and antiparticles counted in g.
 * Masses and spins: Particle Data Group, Review of Particle Physics 2024, listings, written down from memory.
 */
import { boson, fermion } from './species.ts'
import type { Particle } from './species.ts'

export const PIONS: readonly Particle[] = [boson('π±', 0.13957039, 2), boson('π⁰', 0.1349768, 1)]

/** The short list: states to 1.02 GeV that matter for the entropy below the crossover. */
export const SHORT_HADRON_LIST: readonly Particle[] = [
  ...PIONS,
  boson('K±', 0.493677, 2),
  boson('K⁰', 0.497611, 2),
  boson('η', 0.547862, 1),
  boson('ρ', 0.77526, 9),
  boson('ω', 0.78266, 3),
  boson('K*', 0.89167, 12),
  fermion('p', 0.93827209, 4),
  fermion('n', 0.93956542, 4),
  boson('η′', 0.95778, 1),
  boson('φ', 1.019461, 3),
]

/** Heavier mesons to 2.05 GeV. */
const HEAVIER_MESONS: readonly Particle[] = [
  boson('a0(980)', 0.98, 3),
  boson('f0(980)', 0.99, 1),
  boson('h1(1170)', 1.166, 3),
  boson('b1(1235)', 1.2295, 9),
  boson('a1(1260)', 1.23, 9),
  boson('K1(1270)', 1.253, 12),
  boson('f2(1270)', 1.2754, 5),
  boson('f1(1285)', 1.2818, 3),
  boson('η(1295)', 1.294, 1),
  boson('π(1300)', 1.3, 3),
  boson('a2(1320)', 1.3182, 15),
  boson('f0(1370)', 1.35, 1),
  boson('K1(1400)', 1.403, 12),
  boson('K*(1410)', 1.414, 12),
  boson('η(1405)', 1.409, 1),
  boson('ω(1420)', 1.41, 3),
  boson('f1(1420)', 1.4263, 3),
  boson('K0*(1430)', 1.425, 4),
  boson('K2*(1430)', 1.4273, 20),
  boson('ρ(1450)', 1.465, 9),
  boson('a0(1450)', 1.474, 3),
  boson('η(1475)', 1.475, 1),
  boson('f0(1500)', 1.506, 1),
  boson("f2'(1525)", 1.5174, 5),
  boson('η2(1645)', 1.617, 5),
  boson('π1(1600)', 1.661, 9),
  boson('ω3(1670)', 1.667, 7),
  boson('ω(1650)', 1.67, 3),
  boson('π2(1670)', 1.6706, 15),
  boson('φ(1680)', 1.68, 3),
  boson('ρ3(1690)', 1.6888, 21),
  boson('K*(1680)', 1.718, 12),
  boson('ρ(1700)', 1.72, 9),
  boson('f0(1710)', 1.733, 1),
  boson('K2(1770)', 1.773, 20),
  boson('K3*(1780)', 1.779, 28),
  boson('π(1800)', 1.81, 3),
  boson('K2(1820)', 1.819, 20),
  boson('φ3(1850)', 1.854, 7),
  boson('f2(1950)', 1.936, 5),
  boson('a4(1970)', 1.967, 27),
  boson('f2(2010)', 2.011, 5),
  boson('f4(2050)', 2.018, 9),
  boson('K4*(2045)', 2.048, 36),
]

/** Heavier baryons to 1.82 GeV. */
const HEAVIER_BARYONS: readonly Particle[] = [
  fermion('Λ', 1.115683, 4),
  fermion('Σ+', 1.18937, 4),
  fermion('Σ0', 1.192642, 4),
  fermion('Σ-', 1.197449, 4),
  fermion('Δ(1232)', 1.232, 32),
  fermion('Ξ0', 1.31486, 4),
  fermion('Ξ-', 1.32171, 4),
  fermion('Σ(1385)', 1.3846, 24),
  fermion('Λ(1405)', 1.4051, 4),
  fermion('N(1440)', 1.44, 8),
  fermion('N(1520)', 1.515, 16),
  fermion('Λ(1520)', 1.519, 8),
  fermion('N(1535)', 1.53, 8),
  fermion('Ξ(1530)', 1.5334, 16),
  fermion('Δ(1600)', 1.57, 32),
  fermion('Λ(1600)', 1.6, 4),
  fermion('Δ(1620)', 1.61, 16),
  fermion('N(1650)', 1.65, 8),
  fermion('Σ(1660)', 1.66, 12),
  fermion('Ω', 1.67245, 8),
  fermion('Λ(1670)', 1.674, 4),
  fermion('N(1675)', 1.675, 24),
  fermion('Σ(1670)', 1.675, 24),
  fermion('N(1680)', 1.685, 24),
  fermion('Λ(1690)', 1.69, 8),
  fermion('Ξ(1690)', 1.69, 8),
  fermion('N(1710)', 1.71, 8),
  fermion('Δ(1700)', 1.71, 32),
  fermion('N(1700)', 1.72, 16),
  fermion('N(1720)', 1.72, 16),
  fermion('Σ(1750)', 1.75, 12),
  fermion('Σ(1775)', 1.775, 36),
  fermion('Ξ(1820)', 1.823, 16),
]

/** The long list: the short one and the heavier states. */
export const LONG_HADRON_LIST: readonly Particle[] = [
  ...SHORT_HADRON_LIST,
  ...HEAVIER_MESONS,
  ...HEAVIER_BARYONS,
]

export const HADRON_LISTS = { short: SHORT_HADRON_LIST, long: LONG_HADRON_LIST } as const
