import { PLANCK_MASS_GEV } from '../constants/natural.ts'

/** s/(g_s T³). */
export const ENTROPY_FACTOR = (2 * Math.PI ** 2) / 45
/** ρ/(g_ρ T⁴). */
export const ENERGY_FACTOR = Math.PI ** 2 / 30

/** H of an energy density, both in powers of GeV. */
export const hubbleOf = (energyDensity: number): number =>
  Math.sqrt((8 * Math.PI * energyDensity) / 3) / PLANCK_MASS_GEV

/** What the expansion is doing at one temperature; natural units, GeV. */
export interface ExpansionPoint {
  temperature: number
  gRho: number
  gS: number
  /** −d ln a/d ln T: 1 + δ_s with δ_s = (1/3) d ln g_s/d ln T while entropy is conserved, more while it grows. */
  stretch: number
  entropy: number
  /** Of everything but matter and Λ, which the abundance solver leaves out. */
  energy: number
  /** Of a fluid or a decaying field alone. */
  otherEnergy: number
  otherPressure: number
  hubble: number
  /** ln of what s a³ still grows by until today: zero when entropy is conserved from here on. */
  lnDilution: number
  /** Candidates that a decaying matter field makes per volume and time, GeV⁴. */
  candidatesPerTime: number
}

export const emptyExpansion = (): ExpansionPoint => ({
  temperature: 0,
  gRho: 0,
  gS: 0,
  stretch: 0,
  entropy: 0,
  energy: 0,
  otherEnergy: 0,
  otherPressure: 0,
  hubble: 0,
  lnDilution: 0,
  candidatesPerTime: 0,
})

/** Sets what radiation alone gives, from T, g_ρ, g_s and d ln g_s/d ln T; entropy conserved. */
export function setRadiation(
  out: ExpansionPoint,
  temperature: number,
  gRho: number,
  gS: number,
  logSlope: number,
): void {
  const cubed = temperature * temperature * temperature
  out.temperature = temperature
  out.gRho = gRho
  out.gS = gS
  out.stretch = 1 + logSlope / 3
  out.entropy = ENTROPY_FACTOR * gS * cubed
  out.energy = ENERGY_FACTOR * gRho * cubed * temperature
  out.otherEnergy = out.otherPressure = out.lnDilution = out.candidatesPerTime = 0
  out.hubble = hubbleOf(out.energy)
}
