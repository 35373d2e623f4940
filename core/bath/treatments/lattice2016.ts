/**
 * The tabulated whole bath of Borsanyi et al., Nature 539 (2016) 69, Table S2: natural cubic splines in log₁₀T of g_ρ and
 * of g_ρ/g_s. Natural, because not-a-knot ends overshoot by 1 % before the last row.
 */
import { evaluateSpline, naturalCubicSpline } from '../../numerics/interpolation/naturalCubicSpline.ts'
import { LATTICE_2016_TABLE } from './lattice2016Table.ts'
import type { WholeBathPoint } from './fit2018.ts'

const logMeV = LATTICE_2016_TABLE.map((row) => row[0])
const gRhoSpline = naturalCubicSpline(
  logMeV,
  LATTICE_2016_TABLE.map((row) => row[1]),
)
const ratioSpline = naturalCubicSpline(
  logMeV,
  LATTICE_2016_TABLE.map((row) => row[2]),
)

const temperatureOfRow = (log10MeV: number): number => 10 ** (log10MeV - 3)

/** The rows' temperatures from 10^0.5 MeV up, GeV: third derivatives jump there. */
export const LATTICE_2016_KNOTS_GEV: readonly number[] = logMeV.slice(1).map(temperatureOfRow)

/** Below this, 10^0.5 MeV, the exact content of photons, electrons and neutrinos takes over. */
export const LATTICE_2016_LOWEST_GEV = temperatureOfRow(0.5)

/** Temperature of the last row, GeV, and its g_ρ and g_s. */
export const LATTICE_2016_LAST = {
  temperatureGeV: temperatureOfRow(logMeV.at(-1)!),
  gRho: LATTICE_2016_TABLE.at(-1)![1],
  gS: LATTICE_2016_TABLE.at(-1)![1] / LATTICE_2016_TABLE.at(-1)![2],
}

/** The table at temperature T, GeV, between its second and last row. */
export function lattice2016(temperatureGeV: number, out: WholeBathPoint): void {
  const at = Math.log10(temperatureGeV) + 3
  const g = evaluateSpline(gRhoSpline, at)
  const ratio = evaluateSpline(ratioSpline, at)
  out.gRho = g.value
  out.gS = g.value / ratio.value
  out.logSlope = (g.slope / g.value - ratio.slope / ratio.value) / Math.LN10
}
