/** Effective numbers: the handbooks’ count by steps, today’s, and the lattice pressure. */
import { emptyPoint } from '../bath/bath.ts'
import { effectiveNeutrinos, entropyNumberToday } from '../bath/neutrinos.ts'
import { latticePressure2014 } from '../bath/treatments/lattice2014.ts'
import { neutrinosInput } from '../wire/history.ts'
import { ROUNDED, ROUNDING_ALONE } from './comparison.ts'
import type { Comparison } from './comparison.ts'
import { INSTANTANEOUS, STEPS, historyOf } from './setting.ts'

const HANDBOOKS =
  'Particle Data Group, Phys. Rev. D 110 (2024) 030001, Big-bang cosmology; Kolb & Turner, The Early Universe (1990), §3.3, fig. 3.5'

/** A temperature, GeV, between two thresholds, the number printed for it, and what is counted there. */
const COUNTED: readonly (readonly [temperatureGeV: number, g: number, counted: string])[] = [
  [200, 106.75, 'the whole Standard Model'],
  [150, 96.25, 'all but the top quark'],
  [50, 86.25, 'all but t, H, Z and W'],
  [3, 75.75, 'u, d, s, c, gluons, leptons, photons'],
  [1.5, 72.25, 'u, d, s, c, gluons, e, μ, neutrinos, photons'],
  [0.5, 61.75, 'u, d, s, gluons, e, μ, neutrinos, photons'],
  [0.15, 17.25, 'pions, e, μ, neutrinos, photons'],
  [0.12, 14.25, 'e, μ, neutrinos, photons'],
  [0.01, 10.75, 'e, neutrinos, photons'],
]

const steps: readonly Comparison[] = COUNTED.map(([temperatureGeV, published, counted]) => ({
  id: `steps-${String(published).replace('.', '-')}`,
  name: `Effective number of ${counted}`,
  quantity: `g_ρ at T = ${temperatureGeV} GeV, textbook steps`,
  unit: '',
  formula: 'g = Σ g_bosons + (7/8) Σ g_fermions over species with m < T; quarks and gluons above T_c',
  published,
  within: 1e-12,
  withinBecause: 'a count, exact',
  deviation: 'None: the same count.',
  source: HANDBOOKS,
  tag: 'published',
  ours() {
    const point = emptyPoint()
    historyOf(STEPS).radiation.bath.evaluate(temperatureGeV, point)
    return point.gRho
  },
}))

const neutrinosOf = (input: unknown) => neutrinosInput.parse(input)

/** g_ρ today of photons and relativistic neutrinos: 2[1 + (7/8)(4/11)^{4/3} N_eff]. */
const energyNumberToday = (neutrinos: unknown): number =>
  2 * (1 + (7 / 8) * (4 / 11) ** (4 / 3) * effectiveNeutrinos(neutrinosOf(neutrinos)))

const HEATED = { treatment: 'specified', nEff: 3.044 }

const today: readonly Comparison[] = [
  {
    id: 'g-rho-today',
    name: 'Effective number in energy today, three neutrinos',
    quantity: 'g_ρ(T₀), N_eff = 3',
    unit: '',
    formula: '2[1 + (7/8)(4/11)^(4/3) N_eff]',
    published: 3.363,
    within: 2e-4,
    withinBecause: ROUNDED,
    deviation: 'Rounding: the exact number is 3.36264.',
    source: HANDBOOKS,
    tag: 'published',
    ours: () => energyNumberToday(INSTANTANEOUS),
  },
  {
    id: 'g-s-today',
    name: 'Effective number in entropy today, three neutrinos',
    quantity: 'g_s(T₀), N_eff = 3',
    unit: '',
    formula: '2 + (21/11)(N_eff/3)^(3/4) = 43/11',
    published: 3.909,
    within: 2e-4,
    withinBecause: ROUNDED,
    deviation: ROUNDING_ALONE,
    source: HANDBOOKS,
    tag: 'published',
    ours: () => entropyNumberToday(neutrinosOf(INSTANTANEOUS)),
  },
  {
    id: 'g-rho-today-3-044',
    name: 'Effective number in energy today, N_eff = 3.044',
    quantity: 'g_ρ(T₀), N_eff = 3.044',
    unit: '',
    formula: '2[1 + (7/8)(4/11)^(4/3) N_eff]',
    published: 3.383,
    within: 2e-4,
    withinBecause: ROUNDED,
    deviation: 'Rounding: the exact number is 3.38263.',
    source: 'The usual formula with N_eff = 3.044 of Bennett et al., JCAP 04 (2021) 073',
    tag: 'common practice',
    ours: () => energyNumberToday(HEATED),
  },
  {
    id: 'g-s-today-3-044',
    name: 'Effective number in entropy today, N_eff = 3.044',
    quantity: 'g_s(T₀), N_eff = 3.044, heated neutrinos',
    unit: '',
    formula: '2 + (21/11)(N_eff/3)^(3/4)',
    published: 3.931,
    within: 3e-4,
    withinBecause: 'the published value comes from a solution of neutrino decoupling, ours from one number',
    deviation:
      'N_eff alone fixes the energy of the neutrinos; their entropy is taken as that of heated ones.',
    source: 'Saikawa & Shirai, JCAP 08 (2020) 011',
    tag: 'published',
    ours: () => entropyNumberToday(neutrinosOf(HEATED)),
  },
  {
    id: 'g-s-today-linear',
    name: 'Effective number in entropy today, linear in N_eff',
    quantity: 'g_s(T₀), N_eff = 3.044, linear scaling',
    unit: '',
    formula: '2 + (7/11) N_eff',
    published: 3.937,
    within: 2e-4,
    withinBecause: ROUNDED,
    deviation: ROUNDING_ALONE,
    source: 'A cruder scaling found in the literature; common practice, no source',
    tag: 'common practice',
    ours: () => entropyNumberToday(neutrinosOf({ ...HEATED, entropyScaling: 'linear' })),
  },
]

const LATTICE = 'HotQCD Collaboration, Phys. Rev. D 90 (2014) 094503, eq. 16, coefficients from memory'

const lattice: readonly Comparison[] = [
  {
    id: 'lattice-2014-at-400-mev',
    name: 'Lattice pressure of u, d, s and gluons at 400 MeV',
    quantity: 'p/T⁴ at T = 400 MeV',
    unit: '',
    formula: 'the published parametrisation, as used by the lattice-2014 bath',
    published: 3.79,
    within: 1.5e-3,
    withinBecause: ROUNDED,
    deviation: ROUNDING_ALONE,
    source: LATTICE,
    tag: 'from memory',
    ours: () => latticePressure2014(0.4).value,
  },
  {
    id: 'lattice-2014-hot',
    name: 'Lattice pressure of u, d, s and gluons in the end',
    quantity: 'p/T⁴ for T → ∞, here at 100 TeV',
    unit: '',
    formula: '95π²/180 of the ideal gas, approached by the parametrisation',
    published: 5.209,
    within: 1e-4,
    withinBecause: ROUNDED,
    deviation: 'Rounding, and (154 MeV)/T of what is still missing at 100 TeV.',
    source: LATTICE,
    tag: 'from memory',
    ours: () => latticePressure2014(1e5).value,
  },
]

export const EFFECTIVE_NUMBERS: readonly Comparison[] = [...steps, ...today, ...lattice]
