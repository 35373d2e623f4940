/** The expansion: ages, waves entering the horizon, and what a decaying field or a fluid does to it. */
import { GEV_PER_KELVIN, PLANCK_MASS_GEV } from '../constants/natural.ts'
import { emptyExpansion } from '../history/expansionPoint.ts'
import { isMatterEra } from '../history/expansions/earlyMatter.ts'
import { historyRows } from '../history/rows.ts'
import { ages } from '../history/time.ts'
import { brent } from '../numerics/roots/brent.ts'
import type { Comparison } from './comparison.ts'
import { G_ALL, STEPS, historyOf } from './setting.ts'

const SECONDS_PER_GIGAYEAR = 365.25e9 * 86_400

/** Prefactor of D ≈ k g^{1/4} m Y τ^{1/2}/M_Pl^{1/2} in a solved era, with g = g_ρ(T_RH). */
function dilutionPrefactor(): number {
  const [reheatTemperatureGeV, startTemperatureGeV] = [0.02, 1000]
  const history = historyOf({
    expansion: { kind: 'early-matter', reheatTemperatureGeV, startTemperatureGeV },
  })
  const era = history.expansion
  if (!isMatterEra(era)) throw new TypeError('an early-matter input has no era of matter')
  const point = emptyExpansion()
  history.at(Math.log(reheatTemperatureGeV), point)
  const gAtReheating = point.gRho
  history.at(Math.log(startTemperatureGeV), point)
  // ρ_φ/s of the field before it has heated anything: at the start the entropy has grown by D e^{−lnDilution}.
  const massTimesYield = (point.otherEnergy / point.entropy) * era.dilution * Math.exp(-point.lnDilution)
  const rootLifetime = Math.sqrt(1 / era.widthGeV / PLANCK_MASS_GEV)
  return era.dilution / (gAtReheating ** 0.25 * massTimesYield * rootLifetime)
}

/** Energy of one kind of neutrino that shares the bath's temperature, in effective numbers. */
const ONE_NEUTRINO = 7 / 4

/** Share of one kind of neutrino that the fluid may have at 1 MeV: the bound behind the published 15.4 (from memory). */
const FLUID_SHARE = 0.4

/** The equality temperature, MeV, at which a fluid of index n is 0.4 of a kind of neutrino at 1 MeV. */
function coldestEquality(index: number): number {
  const point = emptyExpansion()
  const excess = (lnMeV: number): number => {
    const history = historyOf({
      ...STEPS,
      expansion: { kind: 'fluid', index, equalityTemperatureGeV: 1e-3 * Math.exp(lnMeV) },
    })
    history.at(Math.log(1e-3), point)
    const neutrino = (ONE_NEUTRINO / point.gRho) * (point.energy - point.otherEnergy)
    return Math.log(point.otherEnergy / neutrino / FLUID_SHARE)
  }
  return Math.exp(brent(excess, 0.1, Math.log(100), 1e-10))
}

const fluidLimit = (index: number): Comparison => ({
  id: `fluid-limit-n-${index}`,
  name: `Latest end of a fluid ρ ∝ a^(−${4 + index}) that leaves the light elements alone`,
  quantity: `T_r, n = ${index}`,
  unit: 'MeV',
  formula: 'T_r at which the fluid is 0.4 of one kind of neutrino at 1 MeV; (15.4)^(1/n) in closed form',
  published: 15.4 ** (1 / index),
  within: 5e-3,
  withinBecause: 'the published 15.4 is (4/7)·10.75/0.4 = 15.36, rounded up',
  deviation: 'Rounding of 15.36 to 15.4.',
  source: 'D’Eramo, Fernandez, Profumo, JCAP 05 (2017) 012, §2; the share of 0.4 from memory',
  tag: 'published',
  ours: () => coldestEquality(index),
})

export const EXPANSION: readonly Comparison[] = [
  {
    id: 'time-temperature',
    name: 'Age of a universe of radiation',
    quantity: 'k in t = k g_*^(−1/2) (T/MeV)^(−2)',
    unit: 's',
    formula: 'from the age at 1e6 GeV in a bath of steps, g = 106.75 since the beginning',
    published: 2.42,
    within: 2e-3,
    withinBecause: 'the published value is rounded to three digits',
    deviation: 'Rounding: 2.4203.',
    source: 'Kolb & Turner, The Early Universe (1990), §3.4',
    tag: 'published',
    ours: () => ages(historyOf(STEPS), [1e6])[0]! * Math.sqrt(G_ALL) * 1e9 ** 2,
  },
  {
    id: 'age-today',
    name: 'Age of the universe',
    quantity: 't(T₀), h = 0.674, Ω_m h² = 0.143',
    unit: 'Gyr',
    formula: 'the age at T₀ with matter and Λ',
    published: 13.797,
    publishedError: 0.023,
    within: 1.7e-3,
    withinBecause: 'the published standard error',
    deviation: 'h and Ω_m h² are rounded here; the published age is fitted together with them.',
    source: 'Planck 2018 VI, Astron. Astrophys. 641 (2020) A6, table 2 (TT,TE,EE+lowE+lensing)',
    tag: 'published',
    ours: () => ages(historyOf({}), [2.7255 * GEV_PER_KELVIN])[0]! / SECONDS_PER_GIGAYEAR,
  },
  {
    id: 'wave-frequency',
    name: 'Frequency today of a wave that enters the horizon',
    quantity: 'f/T at g_ρ = g_s = 106.75',
    unit: 'Hz/GeV',
    formula: 'a H/(2π a₀) at T = 1e5 GeV in a bath of steps with three neutrinos, g_s(today) = 3.909',
    published: 2.65e-8,
    within: 2e-3,
    withinBecause: 'the published value is rounded to three digits',
    deviation: 'Rounding: 2.6495e-8, and 2.654e-8 for N_eff = 3.044.',
    source: 'Saikawa & Shirai, JCAP 05 (2018) 035, §2',
    tag: 'published',
    ours: () => historyRows(historyOf(STEPS), [1e5])[0]!.waveFrequencyHz / 1e5,
  },
  {
    id: 'dilution-prefactor',
    name: 'Dilution by a decaying field',
    quantity: 'k in D ≈ k ⟨g_*^(1/3)⟩^(3/4) m Y τ^(1/2)/M_Pl^(1/2)',
    unit: '',
    formula: 'from a solved era, T_RH = 20 MeV, ρ_φ = ρ_R at 1 TeV, with g_ρ(T_RH) for the mean',
    published: 1.83,
    within: 0.02,
    withinBecause: 'g at one temperature stands for its mean over the decay: 2 % here',
    deviation: 'The mean of g over the decay is replaced by g at T_RH.',
    source: 'Scherrer & Turner, Phys. Rev. D 31 (1985) 681',
    tag: 'published',
    ours: dilutionPrefactor,
  },
  fluidLimit(1),
  fluidLimit(2),
  fluidLimit(4),
]
