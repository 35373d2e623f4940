import { describe, expect, it } from 'vitest'
import { UNITS } from '#core/units/units'
import { relative } from '../fixtures.ts'

describe('units', () => {
  it('convert as published: 1 eV = 11604.518 K, 1 pb·c = 2.99792458e-26 cm³/s, 1 GeV⁻² = 1.16733e-17 cm³/s (CODATA 2018)', () => {
    const { energy, crossSection } = UNITS
    expect(relative(energy['eV']! / energy['K']!, 11604.518)).toBeLessThan(1e-7)
    expect(relative(crossSection['pb·c']!, 2.99792458e-26)).toBeLessThan(1e-14)
    expect(relative(crossSection['GeV^-2']!, 1.16733e-17)).toBeLessThan(1e-5)
  })

  it('have a base unit of factor one in every dimension that has units', () => {
    for (const [dimension, units] of Object.entries(UNITS)) {
      const factors = Object.values(units)
      expect(factors.every((factor) => factor > 0)).toBe(true)
      if (dimension !== 'pure') expect(factors).toContain(1)
    }
  })

  it('count a Julian year of 365.25 days', () => {
    expect(UNITS.time['yr']! / UNITS.time['d']!).toBe(365.25)
  })
})
