import { expect, it } from 'vitest'
import { temperatureText } from '../../../web/src/lib/temperature.ts'

it.each([
  [0.1565, '156.5 MeV'],
  [1, '1 GeV'],
  [1000, '1 TeV'],
  [3e-6, '3 keV'],
  [0.002, '2 MeV'],
  [2.35e-13, '0.000235 eV'],
  [1e16, '1.00e16 GeV'],
  [0, '0 GeV'],
])('writes %d GeV as “%s”', (energyGeV, text) => {
  expect(temperatureText(energyGeV)).toBe(text)
})
