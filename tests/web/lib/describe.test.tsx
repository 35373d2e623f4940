import { cleanup, render } from '@testing-library/react'
import { afterEach, describe, expect, it } from 'vitest'
import { candidateInput, historyInput } from '#core/wire/index'
import type { AssumptionGroup } from '#core/wire/index'
import { describeAssumption, describeCandidate } from '../../../web/src/lib/describe.tsx'

afterEach(cleanup)

const textOf = (node: React.ReactNode): string | null => render(<p>{node}</p>).container.textContent

describe('describeAssumption', () => {
  it.each<[AssumptionGroup, object, string]>([
    ['bath', {}, '2018 fit, middle of its band'],
    ['bath', { bath: { treatment: 'fit-2018', band: -0.5 } }, '2018 fit, −50 % of its band'],
    [
      'bath',
      { bath: { treatment: 'thresholds', transitionTemperatureGeV: 0.15 } },
      'textbook steps, QCD at 150 MeV',
    ],
    [
      'bath',
      { bath: { treatment: 'crossover', hadrons: 'long' } },
      'smooth crossover at 156.5 MeV, 20 MeV wide',
    ],
    [
      'bath',
      {
        bath: {
          treatment: 'uploaded',
          points: [0.01, 0.1, 0.5, 2].map((temperatureGeV, i) => ({ temperatureGeV, gS: 11 + 20 * i })),
        },
      },
      'uploaded table, 4 rows of g_s, 10 MeV to 2 GeV',
    ],
    ['neutrinos', {}, 'decouple at 2 MeV, Neff 3.044'],
    ['neutrinos', { neutrinos: { treatment: 'instantaneous' } }, 'decouple at 2 MeV, instantly'],
    ['extraSpecies', {}, 'none'],
    [
      'extraSpecies',
      {
        extraSpecies: [
          {
            name: 'dark photon',
            degreesOfFreedom: 3,
            statistics: 'boson',
            massGeV: 0.01,
            coupling: { kind: 'bath' },
          },
        ],
      },
      'dark photon (g = 3)',
    ],
    ['expansion', {}, 'radiation'],
    [
      'expansion',
      { expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 1.15 } },
      'kination, equal to radiation at 1.15 GeV',
    ],
    [
      'expansion',
      { expansion: { kind: 'entropy-step', temperatureGeV: 0.01, factor: 20 } },
      'entropy × 20 at 10 MeV',
    ],
    [
      'expansion',
      { expansion: { kind: 'early-matter', reheatTemperatureGeV: 0.005, dilution: 300 } },
      'matter era dilution 300, reheating at 5 MeV',
    ],
    ['maximumTemperatureGeV', {}, 'not bounded'],
    ['maximumTemperatureGeV', { maximumTemperatureGeV: 1e10 }, '1.00e10 GeV'],
    ['today', {}, 'T0 2.7255 K, h 0.674'],
  ])('tells the %s of %j', (group, input, words) => {
    expect(textOf(describeAssumption(group, historyInput.parse(input)))).toBe(words)
  })
})

const PARTICLE = { massGeV: 100, degreesOfFreedom: 2, statistics: 'fermion' }
const S_WAVE = { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 }

describe('describeCandidate', () => {
  it.each<[object, string]>([
    [
      { ...PARTICLE, mechanism: 'freeze-out', annihilation: S_WAVE },
      '100 GeV self-conjugate fermion, s-wave ⟨σv⟩ 2.2 × 10−26 cm³/s',
    ],
    [
      {
        ...PARTICLE,
        mechanism: 'freeze-out',
        selfConjugate: false,
        annihilation: { kind: 'partial-waves', sWaveCm3PerS: 0, pWaveCm3PerS: 1e-24 },
      },
      '100 GeV fermion, p-wave ⟨σv⟩ 1 × 10−24 cm³/s',
    ],
    [
      {
        ...PARTICLE,
        mechanism: 'asymmetric',
        asymmetry: 1e-11,
        annihilation: { kind: 'resonance', massGeV: 210, widthGeV: 1, spin: 0, branchingProduct: 0.1 },
      },
      '100 GeV fermion, resonance at 210 GeV',
    ],
    [
      {
        ...PARTICLE,
        massGeV: 1e-5,
        mechanism: 'freeze-in-decay',
        parent: { massGeV: 500, degreesOfFreedom: 1, statistics: 'boson', widthGeV: 1e-15 },
      },
      '10 keV fermion from a 500 GeV parent',
    ],
    [
      { ...PARTICLE, massGeV: 1e-8, mechanism: 'hot-relic', decouplingTemperatureGeV: 0.002 },
      '10 eV fermion, hot relic',
    ],
  ])('tells %j in a line', (input, words) => {
    expect(textOf(describeCandidate(candidateInput.parse(input)))).toBe(words)
  })
})
