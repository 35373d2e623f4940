import { describe, expect, it } from 'vitest'
import { LATTICE_2016_ROWS } from '#core/bath/treatments/lattice2016Table'
import { computeHistory } from '#core/index'
import type { EffectiveNeutrinos } from '#core/wire/index'
import { bathFixture, relative } from '../fixtures.ts'

const numbersOf = (history: object): EffectiveNeutrinos =>
  computeHistory({ history, temperaturesGeV: [1] }).effectiveNeutrinos

const species = (over: object): object => ({
  name: 'x',
  degreesOfFreedom: 1,
  statistics: 'boson',
  massGeV: 0,
  coupling: { kind: 'bath' },
  ...over,
})

describe('radiation beside the photons', () => {
  const blocks = bathFixture.extraSpeciesBlocks.filter((block) => block.deltaNEffAt1KeV !== undefined)

  it('is that of independent numbers to 1e-8, for decoupled species and for those of a fixed ratio', () => {
    expect(blocks.length).toBeGreaterThanOrEqual(2)
    for (const { bath, neutrinos, extraSpecies, deltaNEffAt1KeV } of blocks) {
      const found = numbersOf({ bath, neutrinos, extraSpecies })
      expect(found.temperatureGeV).toBe(1e-6)
      expect(relative(found.deltaNEff, deltaNEffAt1KeV!)).toBeLessThan(1e-8)
      expect(relative(found.extraSpecies[0]!.deltaNEff!, deltaNEffAt1KeV!)).toBeLessThan(1e-8)
    }
  })

  it('follows from the temperatures of independent numbers where a species beside it is not relativistic', () => {
    const block = bathFixture.extraSpeciesBlocks.at(-1)!
    const { bath, neutrinos, extraSpecies } = block
    const found = numbersOf({ bath, neutrinos, extraSpecies })
    // Colder than the electrons' annihilation T_X/T stays: taken from the reference at 10 keV. g = 1 boson: ρ_X/ρ_γ = ½(T_X/T)⁴.
    const cold = block.rows[0]!
    const ratio = cold.temperaturesOfSpeciesApartGeV![0]! / cold.temperatureGeV
    const expected = ratio ** 4 / 2 / ((7 / 8) * (4 / 11) ** (4 / 3))
    expect(found.extraSpecies.map(({ deltaNEff }) => deltaNEff === null)).toEqual([true, false, true])
    expect(relative(found.extraSpecies[1]!.deltaNEff!, expected)).toBeLessThan(1e-8)
    expect(found.deltaNEff).toBe(found.extraSpecies[1]!.deltaNEff)
    expect(found.extraSpecies[0]!.because).toMatch(/^not relativistic then: its mass is 3\.00e\+6 times/)
  })

  it.each([
    ['a real scalar', 1, 'boson', 0.027],
    ['a Weyl fermion', 2, 'fermion', 0.047],
    ['a massless vector', 2, 'boson', 0.054],
  ] as const)(
    'of %s that let go above all thresholds is the least there can be (Brust, Kaplan, Walters, JHEP 12 (2013) 058, from memory)',
    (_what, degreesOfFreedom, statistics, published) => {
      const coupling = { kind: 'decoupled', temperatureGeV: 1e4 }
      const found = numbersOf({
        bath: { treatment: 'thresholds' },
        neutrinos: { treatment: 'instantaneous', decouplingTemperatureGeV: 0.01 },
        extraSpecies: [species({ degreesOfFreedom, statistics, coupling })],
      })
      // By the textbook's counts: g_s falls from 106.75 to 43/4 before neutrinos go, who keep the ratio from there on.
      const weight = degreesOfFreedom * (statistics === 'fermion' ? 7 / 8 : 1)
      const closed = (weight / (7 / 4)) * (43 / 4 / 106.75) ** (4 / 3)
      expect(relative(found.deltaNEff, closed)).toBeLessThan(1e-12)
      expect(Math.abs(found.deltaNEff - published)).toBeLessThan(0.0006)
    },
  )

  it('of a massless species that never let go has the photons’ temperature, and counts for itself', () => {
    const found = numbersOf({
      bath: { treatment: 'thresholds' },
      neutrinos: { treatment: 'instantaneous', decouplingTemperatureGeV: 0.01 },
      extraSpecies: [species({ degreesOfFreedom: 2 })],
    })
    expect(relative(found.deltaNEff, (8 / 7) * (11 / 4) ** (4 / 3))).toBeLessThan(1e-12)
    // Neutrinos leave 2 + 7/2 + 2 behind, of which 2 + 2 inherit the entropy.
    expect(relative(found.neutrinos, 3 * ((4 / 7.5) * (11 / 4)) ** (4 / 3))).toBeLessThan(1e-12)
  })

  it('counts a species as long as its mass is at most its temperature', () => {
    const at = (massGeV: number): number | null =>
      numbersOf({ extraSpecies: [species({ massGeV, coupling: { kind: 'ratio', ratio: 0.5 } })] })
        .extraSpecies[0]!.deltaNEff
    expect(at(0.49e-6)).toBeLessThan(at(0)!)
    expect(at(0.51e-6)).toBeNull()
  })

  it.each([3.044, 2, 7])('of specified neutrinos is what was specified: %f', (nEff) => {
    for (const treatment of ['thresholds', 'ideal-switch', 'crossover', 'lattice-2014'])
      expect(
        relative(
          numbersOf({ bath: { treatment }, neutrinos: { treatment: 'specified', nEff } }).neutrinos,
          nEff,
        ),
      ).toBeLessThan(1e-10)
  })

  it('of neutrinos that let go at once at 2 MeV is 3.018, for electrons have begun to go', () => {
    for (const treatment of ['ideal-switch', 'crossover', 'lattice-2014'])
      expect(
        numbersOf({ bath: { treatment }, neutrinos: { treatment: 'instantaneous' } }).neutrinos,
      ).toBeCloseTo(3.018, 3)
    // The whole bath of 2016 goes over into such neutrinos below its table, and so does an uploaded one.
    expect(numbersOf({ bath: { treatment: 'lattice-2016' } }).neutrinos).toBeCloseTo(3.018, 3)
    const uploaded = { bath: { treatment: 'uploaded', points: LATTICE_2016_ROWS } }
    expect(numbersOf(uploaded).neutrinos).toBeCloseTo(3.018, 3)
  })

  it('of the 2018 fit is its own: g_ρ = 3.383 (Saikawa & Shirai 2018) is N_eff = 3.045', () => {
    const { neutrinos } = numbersOf({ bath: { treatment: 'fit-2018' } })
    expect(relative(neutrinos, (3.383 / 2 - 1) / ((7 / 8) * (4 / 11) ** (4 / 3)))).toBeLessThan(1e-10)
  })
})
