/**
 * Fit of the whole bath, neutrinos included: Saikawa & Shirai, JCAP 05 (2018) 035, Appendix C.
 * Rational functions of ln T above 120 MeV; below, sums of thresholds with the fitted masses and weights.
 * The two parts differ by 2e-4 (g_ρ) and 4e-4 (g_s) at 120 MeV: the step is the fit's own.
 */
import { A, B, C, D } from './fit2018Coefficients.ts'

export const FIT_JOIN_GEV = 0.12

/** g_ρ, g_s and d ln g_s/d ln T. */
export interface WholeBathPoint {
  gRho: number
  gS: number
  logSlope: number
}

type Shape = readonly [decay: number, c1: number, c2: number, c3: number]

const FERMION_RHO: Shape = [1.04855, 1.03757, 0.50863, 0.0893988]
const BOSON_RHO: Shape = [1.03149, 1.03317, 0.398264, 0.0648056]
const FERMION_S: Shape = [1.0419, 1.034, 0.456426, 0.0595248]
const BOSON_S: Shape = [1.03365, 1.03397, 0.342548, 0.0506182]
const NEUTRINO_S: Shape = [1.0419, 1.034, 0.456426, 0.0595249]

const ELECTRON_GEV = 511e-6
const MUON_GEV = 0.1056

/** Masses, GeV, of the pions and of four effective hadrons, with their weights in g_ρ and g_s. */
const HADRON_THRESHOLDS: readonly (readonly [massGeV: number, inRho: number, inS: number])[] = [
  [0.135, 1.05, 1.034],
  [0.14, 2.08, 2.068],
  [0.5, 4.165, 4.16],
  [0.77, 30.55, 30.55],
  [1.2, 89.4, 90],
  [2, 8209, 6209],
]

/** e^(−αx)(1 + c₁x + c₂x² + c₃x³). */
function threshold(x: number, [decay, c1, c2, c3]: Shape): number {
  return Math.exp(-decay * x) * (1 + x * (c1 + x * (c2 + x * c3)))
}

/** Its derivative in ln T, for x = m/T. */
function thresholdSlope(x: number, [decay, c1, c2, c3]: Shape): number {
  if (x > 700) return 0
  return (
    -x * Math.exp(-decay * x) * (c1 + x * (2 * c2 + 3 * x * c3) - decay * (1 + x * (c1 + x * (c2 + x * c3))))
  )
}

/** Below x = 700 the thresholds are representable; beyond they are nothing. */
function coldFit(temperatureGeV: number, out: WholeBathPoint): void {
  const electron = ELECTRON_GEV / temperatureGeV
  const muon = MUON_GEV / temperatureGeV
  const far = electron > 700
  const neutrino = far ? 1 : 1 + 1.75 * threshold(electron, NEUTRINO_S)
  let gRho = 2.03 + 1.353 * neutrino ** (4 / 3)
  let gS = 2.008 + 1.923 * neutrino
  let slope = far ? 0 : 1.923 * 1.75 * thresholdSlope(electron, NEUTRINO_S)
  if (!far) {
    gRho += 3.495 * threshold(electron, FERMION_RHO)
    gS += 3.442 * threshold(electron, FERMION_S)
    slope += 3.442 * thresholdSlope(electron, FERMION_S)
  }
  if (muon < 700) {
    gRho += 3.446 * threshold(muon, FERMION_RHO)
    gS += 3.468 * threshold(muon, FERMION_S)
    slope += 3.468 * thresholdSlope(muon, FERMION_S)
    for (const [massGeV, inRho, inS] of HADRON_THRESHOLDS) {
      const x = massGeV / temperatureGeV
      if (x > 700) continue
      gRho += inRho * threshold(x, BOSON_RHO)
      gS += inS * threshold(x, BOSON_S)
      slope += inS * thresholdSlope(x, BOSON_S)
    }
  }
  out.gRho = gRho
  out.gS = gS
  out.logSlope = slope / gS
}

/** Value and derivative of a polynomial, coefficients from the constant up. */
function polynomial(coefficients: readonly number[], t: number): { value: number; slope: number } {
  let value = 0
  let slope = 0
  for (let i = coefficients.length - 1; i >= 0; i--) {
    slope = slope * t + value
    value = value * t + coefficients[i]!
  }
  return { value, slope }
}

function hotFit(temperatureGeV: number, out: WholeBathPoint): void {
  const t = Math.log(temperatureGeV)
  const a = polynomial(A, t)
  const b = polynomial(B, t)
  const c = polynomial(C, t)
  const d = polynomial(D, t)
  const ratio = 1 + c.value / d.value
  out.gRho = a.value / b.value
  out.gS = out.gRho / ratio
  out.logSlope =
    a.slope / a.value - b.slope / b.value - (c.slope - (c.value * d.slope) / d.value) / d.value / ratio
}

/** The fit at temperature T, GeV; at 120 MeV itself the hot side. */
export function fit2018(temperatureGeV: number, out: WholeBathPoint): void {
  if (temperatureGeV >= FIT_JOIN_GEV) hotFit(temperatureGeV, out)
  else coldFit(temperatureGeV, out)
}
