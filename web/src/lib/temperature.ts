const STEPS: readonly (readonly [unit: string, size: number])[] = [
  ['TeV', 1e3],
  ['GeV', 1],
  ['MeV', 1e-3],
  ['keV', 1e-6],
  ['eV', 1e-9],
]

/** An energy in the unit that suits it, four digits at most: 156.5 MeV. */
export function temperatureText(energyGeV: number): string {
  if (energyGeV === 0) return '0 GeV'
  if (energyGeV >= 1e7) return `${energyGeV.toExponential(2).replace('e+', 'e')} GeV`
  const [unit, size] = STEPS.find(([, size]) => energyGeV >= size * 0.99999) ?? STEPS.at(-1)!
  return `${Number((energyGeV / size).toPrecision(4))} ${unit}`
}
