import { describe, expect, it } from 'vitest'
import {
  CRITICAL_DENSITY_GEV4,
  GEV_MINUS2_PER_CM3_S,
  GEV_PER_KELVIN,
  HBARC_GEV_CM,
  HBAR_GEV_S,
  HUBBLE_100_GEV,
  PLANCK_MASS_GEV,
  SOLAR_MASS_GEV,
  ZETA_3,
} from '#core/constants/natural'
import * as codata from '#core/constants/codata2018'
import { MEASURED_DENSITY } from '#core/constants/measured'
import { relative } from '../fixtures.ts'

/** As tabulated; the tolerance is the number of digits given there. */
const tabulated = [
  ['k_B', GEV_PER_KELVIN, 8.617333262145e-14, 1e-12, 'CODATA 2018'],
  ['ħ', HBAR_GEV_S, 6.582119569e-25, 1e-10, 'CODATA 2018'],
  ['ħc', HBARC_GEV_CM, 1.973269804e-14, 1e-9, 'CODATA 2018'],
  ['M_Pl', PLANCK_MASS_GEV, 1.22089e19, 1e-6, 'CODATA 2018'],
  ['the reduced M_Pl', PLANCK_MASS_GEV / Math.sqrt(8 * Math.PI), 2.435323e18, 3e-7, 'PDG 2024'],
  ['the Hubble time for h = 1, s', HBAR_GEV_S / HUBBLE_100_GEV, 3.085677581491367e17, 1e-14, 'IAU 2015'],
  ['ρ_c/h²', CRITICAL_DENSITY_GEV4 / HBARC_GEV_CM ** 3, 1.053672e-5, 1e-6, 'PDG 2024'],
  ['1 cm³/s in GeV⁻²', GEV_MINUS2_PER_CM3_S, 1 / 1.1673e-17, 1e-4, 'ħ²c³ from CODATA 2018'],
  ['the solar mass', SOLAR_MASS_GEV, 1.9884e30 / 1.78266192e-27, 5e-5, 'PDG 2024'],
  ['ζ(3)', ZETA_3, 1.2020569031595942, 1e-16, 'OEIS A002117'],
] as const

describe('constants', () => {
  it.each(tabulated)('give %s as tabulated', (_name, found, published, digits, _source) => {
    expect(relative(found, published)).toBeLessThanOrEqual(digits)
  })

  it('each carry symbol, unit, uncertainty and source', () => {
    for (const constant of Object.values(codata)) {
      expect(constant.symbol && constant.name && constant.unit && constant.source).toBeTruthy()
      expect(constant.uncertainty).toBeGreaterThanOrEqual(0)
    }
  })

  it('hold the density of Planck 2018 VI, 0.1200 ± 0.0012', () => {
    expect([MEASURED_DENSITY.omegaH2, MEASURED_DENSITY.standardError]).toEqual([0.12, 0.0012])
  })
})
