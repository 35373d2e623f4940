/** Thermal relics: the cross-section that gives the measured density, neutrinos, and where unitarity ends them. */
import { effectiveNeutrinos } from '../bath/neutrinos.ts'
import { CRITICAL_DENSITY_GEV4, GEV_MINUS2_PER_CM3_S, GEV_PER_KELVIN, ZETA_3 } from '../constants/natural.ts'
import { brent } from '../numerics/roots/brent.ts'
import { neutrinosInput } from '../wire/history.ts'
import type { Comparison } from './comparison.ts'
import { FERMION, INSTANTANEOUS, STEPS, abundanceOf, historyOf } from './setting.ts'

/** Accuracy of ln of a solved input; the abundance itself is good to 1e-6 or better. */
const SOLVED = 1e-9

/** s-wave ⟨σv⟩, cm³/s, that leaves a self-conjugate fermion of the given mass, GeV, with Ωh². */
function sWaveFor(massGeV: number, omegaH2: number): number {
  const history = historyOf({ neutrinos: INSTANTANEOUS })
  const excess = (lnSigmaV: number): number => {
    const annihilation = { kind: 'partial-waves', sWaveCm3PerS: Math.exp(lnSigmaV) }
    const candidate = { mechanism: 'freeze-out', massGeV, ...FERMION, annihilation }
    return Math.log(abundanceOf(history, candidate).omegaH2 / omegaH2)
  }
  return Math.exp(brent(excess, Math.log(1e-26), Math.log(1e-25), SOLVED))
}

const SDB12 = 'Steigman, Dasgupta, Beacom, Phys. Rev. D 86 (2012) 023506, abstract and §IV'
const BATH_CHANGED =
  'their bath predates the lattice determinations of the transition; the 2018 bath moves √g by 4 to 5 %'

const PLATEAU = 2.2e-26

/** Mass, GeV; what is printed for it, cm³/s; why ours differs. */
const CROSS_SECTIONS: readonly (readonly [massGeV: number, published: number | null, deviation: string])[] = [
  [0.3, 5.2e-26, 'The 2018 bath has other effective numbers below the transition than theirs.'],
  [1, null, 'No number is printed here: their curve falls from 5.2e-26 at 0.3 GeV to 2.2e-26 above 10 GeV.'],
  [5, null, 'No number is printed here: their curve falls steeply around this mass, as ours does.'],
  [100, PLATEAU, 'The 2018 bath has a larger √g at freeze-out, near 4 GeV, than theirs.'],
  [
    1000,
    PLATEAU,
    'Their 2.2e-26 stands for all masses far above 10 GeV, over which it rises with x_f as ln m: 8 % at 1 TeV with the bath’s share.',
  ],
]

const crossSections: readonly Comparison[] = CROSS_SECTIONS.map(([massGeV, published, deviation]) => ({
  id: `s-wave-${String(massGeV).replace('.', '-')}-gev`,
  name: `Annihilation that leaves Ωh² = 0.11 of a ${massGeV} GeV particle`,
  quantity: '⟨σv⟩, s-wave, self-conjugate, Ωh² = 0.11',
  unit: 'cm³/s',
  formula: 'solved for with the fit-2018 bath and three neutrinos',
  published,
  within: 0.05,
  withinBecause: BATH_CHANGED,
  deviation,
  source: SDB12,
  tag: 'published',
  ours: () => sWaveFor(massGeV, 0.11),
}))

const neutrinoMasses: readonly Comparison[] = [
  {
    id: 'neutrino-masses-three',
    name: 'Sum of neutrino masses per density, instantaneous decoupling',
    quantity: 'Σm_ν/(Ω_ν h²), N_eff = 3',
    unit: 'eV',
    formula: 'a hot relic of two states that lets go at 10 MeV in a bath of steps',
    published: 94.1,
    within: 6e-4,
    withinBecause: 'the published value is rounded to three digits',
    deviation: 'Rounding: 94.06 eV with present constants.',
    source: 'Particle Data Group, Phys. Rev. D 110 (2024) 030001, Neutrinos in cosmology',
    tag: 'published',
    ours() {
      const massGeV = 1e-9
      const candidate = { mechanism: 'hot-relic', massGeV, ...FERMION, decouplingTemperatureGeV: 0.01 }
      return (massGeV * 1e9) / abundanceOf(historyOf(STEPS), candidate).omegaH2
    },
  },
  {
    id: 'neutrino-masses-heated',
    name: 'Sum of neutrino masses per density, N_eff = 3.044',
    quantity: 'Σm_ν/(Ω_ν h²), heated neutrinos',
    unit: 'eV',
    formula: '(ρ_c/h²)/n_ν with n_ν = (3ζ(3)/(2π²)) (4/11) (N_eff/3)^(3/4) T₀³ for each kind',
    published: 93.12,
    within: 1e-3,
    withinBecause: 'one temperature stands for spectra that are distorted at the 1e-3 level',
    deviation: 'The published value rests on the spectra of detailed decoupling, ours on N_eff alone.',
    source:
      'Particle Data Group, Phys. Rev. D 110 (2024) 030001, Neutrinos in cosmology; Mangano et al., Nucl. Phys. B 729 (2005) 221',
    tag: 'published',
    ours() {
      const nEff = effectiveNeutrinos(neutrinosInput.parse({ treatment: 'specified' }))
      const temperature = 2.7255 * GEV_PER_KELVIN
      const heating = (4 / 11) * (nEff / 3) ** 0.75
      const density = ((3 * ZETA_3) / (2 * Math.PI ** 2)) * heating * temperature ** 3
      return (CRITICAL_DENSITY_GEV4 / density) * 1e9
    },
  },
]

/** Mass, GeV, above which ⟨σv⟩ at the s-wave bound (4π/m²)⟨1/v⟩, with ⟨1/v⟩ = √(x/π), leaves more than Ωh². */
function unitarityMass(omegaH2: number, particle: object): number {
  const history = historyOf({ bath: STEPS.bath })
  const excess = (lnMass: number): number => {
    const massGeV = Math.exp(lnMass)
    const coefficientCm3PerS = (4 * Math.PI) / massGeV ** 2 / Math.sqrt(Math.PI) / GEV_MINUS2_PER_CM3_S
    const annihilation = { kind: 'power-law', coefficientCm3PerS, exponent: -0.5 }
    const candidate = { mechanism: 'freeze-out', massGeV, statistics: 'fermion', annihilation, ...particle }
    return Math.log(abundanceOf(history, candidate).omegaH2 / omegaH2)
  }
  return Math.exp(brent(excess, Math.log(2e4), Math.log(2e6), SOLVED))
}

const GK90 = 'Griest & Kamionkowski, Phys. Rev. Lett. 64 (1990) 615'

const unitarity: readonly Comparison[] = [
  {
    id: 'unitarity-mass',
    name: 'Heaviest s-wave thermal relic with the measured density',
    quantity: 'm for Ωh² = 0.12 at the unitarity bound, self-conjugate, g = 2',
    unit: 'GeV',
    formula: '⟨σv⟩ = (4π/m²)√(x/π), solved for the mass',
    published: 1e5,
    within: 1,
    withinBecause: 'the published statement is one of order, not a number',
    deviation: '“Of order 100 TeV”: the solver gives twice that for one partial wave.',
    source: `${GK90}, brought to Ωh² = 0.12`,
    tag: 'common practice',
    ours: () => unitarityMass(0.12, { degreesOfFreedom: 2 }),
  },
  {
    id: 'unitarity-mass-1990',
    name: 'Heaviest s-wave thermal relic that does not overclose',
    quantity: 'm for Ωh² = 1 at the unitarity bound, Dirac',
    unit: 'GeV',
    formula: '⟨σv⟩ = (4π/m²)√(x/π), half of it for a particle with its antiparticle, solved for the mass',
    published: 3.4e5,
    within: 0.2,
    withinBecause: 'x_f from a formula and a round g_* move the square of the mass by a third',
    deviation: 'They estimate x_f and g_* where ours solves the equation.',
    source: GK90,
    tag: 'published',
    ours: () => unitarityMass(1, { degreesOfFreedom: 4, selfConjugate: false }),
  },
]

export const RELICS: readonly Comparison[] = [...crossSections, ...neutrinoMasses, ...unitarity]
