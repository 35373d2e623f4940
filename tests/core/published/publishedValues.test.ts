import { describe, expect, it } from 'vitest'
import { publishedValues } from '#core/index'
import { publishedResult } from '#core/wire/index'
import type { PublishedValue } from '#core/wire/index'
import { ownValue, publishedFixture, relative } from '../fixtures.ts'

const before = process.cpuUsage()
const values = publishedValues()
const { user, system } = process.cpuUsage(before)

function valueOf(id: string): PublishedValue {
  const found = values.find((each) => each.id === id)
  if (!found) throw new Error(`no published value is called ${id}`)
  return found
}

/** Effective numbers, densities and constants are closed forms; both codes round alike. */
const ROUNDING = 1e-12
/** The product's promise for an abundance, which a solved input inherits as 1/elasticity, here 1/2 to 1. */
const SOLVED = 1e-6

/** Our value of each check of the independent code: its id, and the largest relative difference between the two. */
const COUNTERPARTS: Record<string, readonly [id: string, within: number]> = {
  'g at T = 200 GeV, steps': ['steps-106-75', ROUNDING],
  'g at T = 150 GeV, steps': ['steps-96-25', ROUNDING],
  'g at T = 50 GeV, steps': ['steps-86-25', ROUNDING],
  'g at T = 3 GeV, steps': ['steps-75-75', ROUNDING],
  'g at T = 1.5 GeV, steps': ['steps-72-25', ROUNDING],
  'g at T = 0.5 GeV, steps': ['steps-61-75', ROUNDING],
  'g at T = 0.15 GeV, steps': ['steps-17-25', ROUNDING],
  'g at T = 0.12 GeV, steps': ['steps-14-25', ROUNDING],
  'g at T = 0.01 GeV, steps': ['steps-10-75', ROUNDING],
  'g_rho today, N_eff=3': ['g-rho-today', ROUNDING],
  'g_s today, N_eff=3': ['g-s-today', ROUNDING],
  'g_rho today, N_eff=3.044': ['g-rho-today-3-044', ROUNDING],
  'g_s today, N_eff=3.044': ['g-s-today-3-044', ROUNDING],
  'g_s today, N_eff=3.044, linear': ['g-s-today-linear', ROUNDING],
  's0 in cm^-3, g_s = 43/11': ['entropy-density-today', ROUNDING],
  'n_gamma in cm^-3': ['photon-density-today', ROUNDING],
  'rho_c/h^2 in GeV cm^-3': ['critical-density', ROUNDING],
  M_Pl: ['planck-mass', ROUNDING],
  'reduced M_Pl': ['reduced-planck-mass', ROUNDING],
  'omegaH2/(m Y0) per GeV': ['density-per-mass-and-yield', ROUNDING],
  'HQ14 p/T^4 at 400 MeV': ['lattice-2014-at-400-mev', ROUNDING],
  'HQ14 p/T^4 at high T': ['lattice-2014-hot', ROUNDING],
  // The other code takes 1.66 for √(4π³/45) = 1.66015 here.
  'freeze-in decay closed form: omegaH2 prefactor 1.09e27': ['freeze-in-decay-prefactor', 1e-4],
  'lifetime prefactor 7.7e-3 s for omegaH2 = 0.11': ['freeze-in-lifetime-0-11', 1e-4],
  'lifetime prefactor 7.7e-3 s for omegaH2 = 0.12': ['freeze-in-lifetime-0-12', 1e-4],
  't = k g^-1/2 (T/MeV)^-2 s, k': ['time-temperature', 1e-9],
  'sum m_nu/(omegaH2) in eV, N_eff=3 instantaneous': ['neutrino-masses-three', 1e-9],
  'sum m_nu/(omegaH2) in eV, N_eff=3.044 scaled as (N_eff/3)^{3/4}': ['neutrino-masses-heated', ROUNDING],
  // Eras are good to 1e-8.
  'dilution prefactor 1.83 <g^{1/3}>^{3/4}, with g = g_rho(T_RH = 20 MeV)': ['dilution-prefactor', 3e-8],
  'freeze-in decay closed form Y, m_B = 1e6 GeV, g = 106.75, MB': ['freeze-in-decay-yield', 1e-9],
  'freeze-in scattering closed form Y, m = 1e6 GeV, g = 106.75': ['freeze-in-scattering-yield', 1e-9],
  'ultraviolet closed form Y, q = 1, g = 106.75': ['ultraviolet-q-1', 1e-9],
  'ultraviolet closed form Y, q = 2, g = 106.75': ['ultraviolet-q-2', 1e-9],
  'unitarity limit in GeV, omegaH2 = 0.12, self-conjugate g=2': ['unitarity-mass', SOLVED],
  'unitarity limit in GeV, omegaH2 = 1, Dirac (g=4 both, half rate)': ['unitarity-mass-1990', SOLVED],
  'SDB12 <sv> at m = 100 GeV, omegaH2 = 0.11 (fit-2018, s0 of N_eff = 3)': ['s-wave-100-gev', SOLVED],
  'SDB12 <sv> at m = 0.3 GeV, omegaH2 = 0.11 (fit-2018, s0 of N_eff = 3)': ['s-wave-0-3-gev', SOLVED],
}

/** The other code has it for 3.044 neutrinos: f ∝ g_s(today)^{1/3}. */
const FREQUENCY = 'frequency prefactor 2.654e-8 Hz at g = 106.75 (g_s today 3.930)'

/** Values that are known not to agree, for the reason each states. */
const APART = ['s-wave-1000-gev', 'freeze-in-lifetime-0-11', 'freeze-in-lifetime-0-12']

describe('the published values', () => {
  it('take in every check of the independent code', () => {
    const names = publishedFixture.checks.map((each) => each.name)
    expect(names.filter((name) => name !== FREQUENCY && !(name in COUNTERPARTS))).toEqual([])
  })

  it.each(Object.entries(COUNTERPARTS))(
    'are met by ours as by independent code: %s',
    (name, [id, within]) => {
      expect(relative(valueOf(id).ours, ownValue(name))).toBeLessThan(within)
    },
  )

  it('have the frequency of independent code, for its entropy today', () => {
    const heated = valueOf('g-s-today-3-044').ours / valueOf('g-s-today').ours
    expect(relative(valueOf('wave-frequency').ours * Math.cbrt(heated), ownValue(FREQUENCY))).toBeLessThan(
      1e-9,
    )
  })

  it('have the cross-sections of independent code at every mass of Steigman, Dasgupta, Beacom', () => {
    const { sigmaVCm3PerS } = publishedFixture.sdb12.find(
      (each) => each.bath === 'fit-2018' && each.neutrinos === 'instantaneous',
    )!
    for (const mass of ['0.3', '1', '5', '100', '1000'])
      expect(
        relative(valueOf(`s-wave-${mass.replace('.', '-')}-gev`).ours, sigmaVCm3PerS[mass]!),
        `${mass} GeV`,
      ).toBeLessThan(SOLVED)
  })

  it('agree with the print within what each allows, but for those that say why not', () => {
    const compared = values.filter((each) => each.published !== null)
    expect(compared.filter((each) => !each.agrees).map((each) => each.id)).toEqual(APART)
    for (const { id, ours, published, relativeDifference, within, agrees } of compared) {
      expect(relativeDifference, id).toBeCloseTo(ours / published! - 1, 15)
      expect(agrees, id).toBe(Math.abs(relativeDifference!) <= within)
    }
  })

  it('claim no agreement where nothing is printed', () => {
    const alone = values.filter((each) => each.published === null)
    expect(alone.map((each) => each.id)).toEqual(['s-wave-1-gev', 's-wave-5-gev'])
    for (const each of alone) expect([each.relativeDifference, each.agrees]).toEqual([null, null])
  })

  it('lie within the printed standard error where there is one', () => {
    const measured = values.filter((each) => each.publishedError !== undefined)
    expect(measured.length).toBeGreaterThan(2)
    for (const { id, ours, published, publishedError } of measured)
      expect(Math.abs(ours - published!), id).toBeLessThan(publishedError!)
  })

  it('each state a reason, a source, a formula and a tag, under a name of their own', () => {
    for (const each of values)
      for (const words of [each.name, each.quantity, each.formula, each.withinBecause, each.deviation])
        expect(words.length, each.id).toBeGreaterThan(4)
    expect(new Set(values.map((each) => each.id)).size).toBe(values.length)
    // A journal or a book with a year, unless it is common practice.
    for (const each of values.filter(({ tag }) => tag !== 'common practice'))
      expect(each.source, each.id).toMatch(/\((19|20)\d\d\)/)
  })

  it('survive the wire', () => {
    const result = { coreVersion: '1', values }
    expect(publishedResult.parse(JSON.parse(JSON.stringify(result)))).toEqual(result)
  })

  it('are the same list on every call, made in less than a second of work', () => {
    expect(publishedValues()).toBe(values)
    expect((user + system) / 1000).toBeLessThan(1000)
  })
})
