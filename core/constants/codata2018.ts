import type { Constant } from './constant.ts'

const SI_EXACT = 'CODATA 2018 (exact in the SI)'

export const PLANCK_CONSTANT: Constant = {
  symbol: 'h',
  name: 'Planck constant',
  value: 6.62607015e-34,
  unit: 'J s',
  uncertainty: 0,
  source: SI_EXACT,
  tag: 'published',
}

export const SPEED_OF_LIGHT: Constant = {
  symbol: 'c',
  name: 'speed of light in vacuum',
  value: 299792458,
  unit: 'm/s',
  uncertainty: 0,
  source: SI_EXACT,
  tag: 'published',
}

export const ELEMENTARY_CHARGE: Constant = {
  symbol: 'e',
  name: 'elementary charge',
  value: 1.602176634e-19,
  unit: 'C',
  uncertainty: 0,
  source: SI_EXACT,
  tag: 'published',
}

export const BOLTZMANN_CONSTANT: Constant = {
  symbol: 'k_B',
  name: 'Boltzmann constant',
  value: 1.380649e-23,
  unit: 'J/K',
  uncertainty: 0,
  source: SI_EXACT,
  tag: 'published',
}

export const NEWTON_CONSTANT: Constant = {
  symbol: 'G',
  name: 'Newtonian constant of gravitation',
  value: 6.6743e-11,
  unit: 'm³ kg⁻¹ s⁻²',
  uncertainty: 1.5e-15,
  source: 'CODATA 2018',
  tag: 'published',
}

export const MEGAPARSEC: Constant = {
  symbol: 'Mpc',
  name: 'megaparsec, from the parsec of IAU 2015 resolution B2',
  value: 3.085677581491367e22,
  unit: 'm',
  uncertainty: 0,
  source: 'IAU 2015 resolution B2',
  tag: 'published',
}

export const SOLAR_MASS_PARAMETER: Constant = {
  symbol: 'GM☉',
  name: 'nominal solar mass parameter',
  value: 1.3271244e20,
  unit: 'm³ s⁻²',
  uncertainty: 0,
  source: 'IAU 2015 resolution B3',
  tag: 'published',
}
