/**
 * The whole bath as tabulated by Borsanyi et al., Nature 539 (2016) 69, Table S2: log₁₀(T/MeV), g_ρ, g_ρ/g_s.
 */
export const LATTICE_2016_TABLE: readonly (readonly [
  logTemperatureMeV: number,
  gRho: number,
  gRhoOverGS: number,
])[] = [
  [0.0, 10.71, 1.00228],
  [0.5, 10.74, 1.00029],
  [1.0, 10.76, 1.00048],
  [1.25, 11.09, 1.00505],
  [1.6, 13.68, 1.02159],
  [2.0, 17.61, 1.02324],
  [2.15, 24.07, 1.05423],
  [2.2, 29.84, 1.07578],
  [2.4, 47.83, 1.06118],
  [2.5, 53.04, 1.0469],
  [3.0, 73.48, 1.01778],
  [4.0, 83.1, 1.00123],
  [4.3, 85.56, 1.00389],
  [4.6, 91.97, 1.00887],
  [5.0, 102.17, 1.0075],
  [5.45, 104.98, 1.00023],
]

/** The same as rows of T in GeV, g_ρ and g_s, with the digits the table has. */
export const LATTICE_2016_ROWS: readonly { temperatureGeV: number; gRho: number; gS: number }[] =
  LATTICE_2016_TABLE.map(([logTemperatureMeV, gRho, gRhoOverGS]) => ({
    temperatureGeV: Number((10 ** (logTemperatureMeV - 3)).toPrecision(6)),
    gRho,
    gS: Number((gRho / gRhoOverGS).toPrecision(6)),
  }))
