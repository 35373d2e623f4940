/** Density of cold dark matter measured from the cosmic microwave background, with its standard error. */
export const MEASURED_DENSITY = {
  omegaH2: 0.12,
  standardError: 0.0012,
  source: 'Planck 2018 VI (TT,TE,EE+lowE+lensing)',
} as const
