import { CRITICAL_DENSITY_GEV4, HBARC_GEV_CM } from '../constants/natural.ts'
import { entropyNumberToday } from '../bath/neutrinos.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { entropyTodayPerCm3 } from '../history/rows.ts'
import type { CandidateInput } from '../wire/candidate.ts'
import type { AbundanceResult } from '../wire/compute.ts'
import type { Working } from './types.ts'

const EQUATION: Record<CandidateInput['mechanism'], Pick<Working, 'formula' | 'source'>> = {
  'freeze-out': {
    formula:
      'dY/d ln x = −(s⟨σv⟩/H)(1 + δ_s)(Y² − Y_eq²), solved to today; half of it when not self-conjugate',
    source: 'Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145',
  },
  'freeze-in-decay': {
    formula:
      'dY/d ln x = n_X g_B m_B² T Γ/(2π²) · Σ_k (−η)^(k+1) K₁(k m_B/T)/k · (1 + δ_s)/(sH), from nothing',
    source: 'Hall, Jedamzik, March-Russell, West, JHEP 03 (2010) 080',
  },
  'freeze-in-scattering': {
    formula:
      'dY/d ln x = γ(T)(1 + δ_s)/(sH), γ = g₁g₂T/(32π⁴) ∫ σ [s−(m₁+m₂)²][s−(m₁−m₂)²] K₁(√s/T)/√s ds, from nothing',
    source: 'Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145; Edsjö & Gondolo, Phys. Rev. D 56 (1997) 1879',
  },
  'freeze-in-ultraviolet': {
    formula: 'dY/d ln(1/T) = C T^(2q+4)/Λ^(2q) · (1 + δ_s)/(sH), from the maximum temperature down',
    source: 'Elahi, Kolda, Unwin, JHEP 03 (2015) 048',
  },
  asymmetric: {
    formula: 'dY₋/d ln x = −(s⟨σv⟩/H)(1 + δ_s)(Y₊Y₋ − Y_eq²), Y₊ − Y₋ = η_X; Y = Y₊ + Y₋',
    source: 'Graesser, Shoemaker, Vecchi, JHEP 10 (2011) 110',
  },
  'hot-relic': {
    formula: 'Y_eq(T_d) = n_eq(T_d)/s(T_d), over what entropy releases dilute it by',
    source: 'Kolb & Turner, The Early Universe (1990), §5.2',
  },
}

/** How Ω_χh² comes about: each quantity with its value, formula and source. */
export function workingsOf(
  history: ThermalHistory,
  candidate: CandidateInput,
  result: AbundanceResult,
): Working[] {
  const criticalPerCm3 = CRITICAL_DENSITY_GEV4 / HBARC_GEV_CM ** 3
  return [
    {
      symbol: 'Ω_χh²',
      name: 'relic abundance',
      value: result.omegaH2,
      unit: '',
      formula: 'm Y₀ s₀/(ρ_c/h²)',
      source: 'Kolb & Turner, The Early Universe (1990), §5.2',
    },
    {
      symbol: 'Y₀',
      name: 'yield today',
      value: result.yieldToday,
      unit: '',
      ...EQUATION[candidate.mechanism],
    },
    {
      symbol: 'm',
      name: 'mass of the candidate',
      value: candidate.massGeV,
      unit: 'GeV',
      formula: 'input',
      source: 'candidate',
    },
    {
      symbol: 's₀',
      name: 'entropy density today',
      value: entropyTodayPerCm3(history),
      unit: 'cm⁻³',
      formula: '(2π²/45) g_s,0 T₀³',
      source: 'Kolb & Turner, The Early Universe (1990), §3.4',
    },
    {
      symbol: 'g_s,0',
      name: 'effective number in entropy today',
      value: entropyNumberToday(history.input.neutrinos),
      unit: '',
      formula: neutrinoFormula(history),
      source: 'N_eff of the history; heated neutrinos, s ∝ T_ν³',
    },
    {
      symbol: 'T₀',
      name: 'photon temperature today',
      value: history.input.today.temperatureK,
      unit: 'K',
      formula: 'input',
      source: 'history; default Fixsen 2009',
    },
    {
      symbol: 'ρ_c/h²',
      name: 'critical density',
      value: criticalPerCm3,
      unit: 'GeV cm⁻³',
      formula: '3 (100 km/s/Mpc)² M_Pl²/(8π)',
      source: 'CODATA 2018 and the IAU parsec',
    },
  ]
}

function neutrinoFormula(history: ThermalHistory): string {
  const { neutrinos } = history.input
  return neutrinos.treatment === 'specified' && neutrinos.entropyScaling === 'linear'
    ? '2 + (7/11) N_eff'
    : '2 + (21/11)(N_eff/3)^(3/4)'
}
