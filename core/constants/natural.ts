/**
 * The constants in natural units, ħ = c = k_B = 1, GeV; each computed from its primary constants.
 * Sources: codata2018.ts.
 */
import {
  BOLTZMANN_CONSTANT,
  ELEMENTARY_CHARGE,
  MEGAPARSEC,
  NEWTON_CONSTANT,
  PLANCK_CONSTANT,
  SOLAR_MASS_PARAMETER,
  SPEED_OF_LIGHT,
} from './codata2018.ts'

const c = SPEED_OF_LIGHT.value
const hbarSI = PLANCK_CONSTANT.value / (2 * Math.PI)
const joulePerGeV = ELEMENTARY_CHARGE.value * 1e9

/** Boltzmann constant, GeV/K. */
export const GEV_PER_KELVIN = BOLTZMANN_CONSTANT.value / joulePerGeV

/** Reduced Planck constant, GeV s. */
export const HBAR_GEV_S = hbarSI / joulePerGeV

/** ħc, GeV cm. */
export const HBARC_GEV_CM = HBAR_GEV_S * c * 100

/** Planck mass √(ħc/G), not reduced, GeV. */
export const PLANCK_MASS_GEV = (Math.sqrt((hbarSI * c) / NEWTON_CONSTANT.value) * c ** 2) / joulePerGeV

/** 100 km/s/Mpc, GeV. */
export const HUBBLE_100_GEV = (1e5 / MEGAPARSEC.value) * HBAR_GEV_S

/** Critical density over h², GeV⁴: 3 (100 km/s/Mpc)² M_Pl²/(8π). */
export const CRITICAL_DENSITY_GEV4 = (3 * HUBBLE_100_GEV ** 2 * PLANCK_MASS_GEV ** 2) / (8 * Math.PI)

/** 1 cm³/s as a thermally averaged cross-section, GeV⁻². */
export const GEV_MINUS2_PER_CM3_S = HBAR_GEV_S / HBARC_GEV_CM ** 3

/** Solar mass, GeV: the nominal GM☉ over G. */
export const SOLAR_MASS_GEV = ((SOLAR_MASS_PARAMETER.value / NEWTON_CONSTANT.value) * c ** 2) / joulePerGeV

/** ζ(3), by the OEIS sequence A002117. */
export const ZETA_3 = 1.2020569031595942
