/** Densities today and the Planck mass. */
import {
  CRITICAL_DENSITY_GEV4,
  GEV_PER_KELVIN,
  HBARC_GEV_CM,
  PLANCK_MASS_GEV,
  ZETA_3,
} from '../constants/natural.ts'
import { ROUNDED, ROUNDING_ALONE } from './comparison.ts'
import type { Comparison } from './comparison.ts'
import { INSTANTANEOUS, abundanceOf, historyOf } from './setting.ts'

const PDG_CONSTANTS =
  'Particle Data Group, Phys. Rev. D 110 (2024) 030001, Astrophysical constants and parameters'

/** Photon temperature today: Fixsen, Astrophys. J. 707 (2009) 916. */
const PHOTON_TEMPERATURE_GEV = 2.7255 * GEV_PER_KELVIN

export const TODAY: readonly Comparison[] = [
  {
    id: 'entropy-density-today',
    name: 'Entropy density today',
    quantity: 's₀ for g_s = 43/11, T₀ = 2.7255 K',
    unit: 'cm⁻³',
    formula: '(2π²/45) g_s T₀³',
    published: 2891.2,
    within: 3e-5,
    withinBecause: ROUNDED,
    deviation: 'Rounding, and constants of another year: 2891.28 here.',
    source: PDG_CONSTANTS,
    tag: 'published',
    ours: () => historyOf({ neutrinos: INSTANTANEOUS }).entropyToday / HBARC_GEV_CM ** 3,
  },
  {
    id: 'photon-density-today',
    name: 'Number density of photons today',
    quantity: 'n_γ for T₀ = 2.7255 K',
    unit: 'cm⁻³',
    formula: '(2ζ(3)/π²) T₀³',
    published: 410.73,
    within: 3e-5,
    withinBecause: ROUNDED,
    deviation: ROUNDING_ALONE,
    source: PDG_CONSTANTS,
    tag: 'published',
    ours: () => ((2 * ZETA_3) / Math.PI ** 2) * (PHOTON_TEMPERATURE_GEV / HBARC_GEV_CM) ** 3,
  },
  {
    id: 'critical-density',
    name: 'Critical density over h²',
    quantity: 'ρ_c/h²',
    unit: 'GeV cm⁻³',
    formula: '3 (100 km/s/Mpc)² M_Pl²/(8π)',
    published: 1.053672e-5,
    publishedError: 2.4e-10,
    within: 2.3e-5,
    withinBecause: 'the published standard error, that of Newton’s constant',
    deviation: 'Rounding: the same constants.',
    source: PDG_CONSTANTS,
    tag: 'published',
    ours: () => CRITICAL_DENSITY_GEV4 / HBARC_GEV_CM ** 3,
  },
  {
    id: 'planck-mass',
    name: 'Planck mass',
    quantity: 'M_Pl = √(ħc/G)',
    unit: 'GeV',
    formula: '√(ħc/G)',
    published: 1.22089e19,
    publishedError: 1.4e14,
    within: 1.2e-5,
    withinBecause: 'the published standard error, half that of Newton’s constant',
    deviation: ROUNDING_ALONE,
    source: PDG_CONSTANTS,
    tag: 'published',
    ours: () => PLANCK_MASS_GEV,
  },
  {
    id: 'reduced-planck-mass',
    name: 'Reduced Planck mass',
    quantity: 'M_Pl/√(8π)',
    unit: 'GeV',
    formula: '√(ħc/(8πG))',
    published: 2.435323e18,
    within: 1.2e-5,
    withinBecause: 'half the standard error of Newton’s constant',
    deviation: ROUNDING_ALONE,
    source: PDG_CONSTANTS,
    tag: 'published',
    ours: () => PLANCK_MASS_GEV / Math.sqrt(8 * Math.PI),
  },
  {
    id: 'density-per-mass-and-yield',
    name: 'Present density of a relic',
    quantity: 'Ωh²/(m Y₀) for g_s = 43/11',
    unit: 'GeV⁻¹',
    formula: 's₀/(ρ_c/h²), from a solved hot relic',
    published: 2.744e8,
    within: 2e-4,
    withinBecause: ROUNDED,
    deviation: ROUNDING_ALONE,
    source: 'Kolb & Turner, The Early Universe (1990), §5.2, with the present constants of the PDG',
    tag: 'published',
    ours() {
      const massGeV = 1e-6
      const { omegaH2, yieldToday } = abundanceOf(historyOf({ neutrinos: INSTANTANEOUS }), {
        mechanism: 'hot-relic',
        massGeV,
        degreesOfFreedom: 2,
        statistics: 'fermion',
        decouplingTemperatureGeV: 1,
      })
      return omegaH2 / (massGeV * yieldToday)
    },
  },
]
