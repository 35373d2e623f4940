import { readPath, valueAt } from '../variation/jsonPath.ts'

/** Where an unknown is looked for unless the question says, by its path; the first that fits counts. */
export interface UsualBracket {
  path: RegExp
  low: number
  high: number
  why: string
  /** For which inputs; for all when left out. */
  when?: (inputs: unknown) => boolean
}

/** From no abundance there are two branches: so few collisions that hardly any are made, or so many that most are lost. */
const startsFromNothing = (inputs: unknown): boolean =>
  valueAt(inputs, readPath('candidate.initialAbundance')) === 'zero'

/** Far on both sides of what is usual, within what the input allows. Evenly scanned in the logarithm, or in the number if low ≤ 0. */
export const USUAL_BRACKETS: readonly UsualBracket[] = [
  {
    path: /Cm3PerS$/,
    low: 1e-50,
    high: 1e-20,
    why: 'from nothing: both the freeze-in and the freeze-out branch',
    when: startsFromNothing,
  },
  {
    path: /Cm3PerS$/,
    low: 1e-34,
    high: 1e-20,
    why: 'from ten decades below a weak cross-section to unitarity',
  },
  { path: /lifetimeS$/, low: 1e-16, high: 1e6, why: 'from prompt decays to the end of nucleosynthesis' },
  { path: /parent\.widthGeV$/, low: 1e-30, high: 1e-8, why: 'the same as widths' },
  {
    path: /annihilation\.widthGeV$/,
    low: 1e-12,
    high: 1e3,
    why: 'from the narrowest that is resolved to wide',
  },
  { path: /^candidate\.massGeV$/, low: 1e-6, high: 1e6, why: 'from keV to PeV' },
  { path: /mediatorMassGeV$/, low: 1e-6, high: 1e4, why: 'from as good as massless to heavy' },
  { path: /fieldMassGeV$/, low: 1, high: 1e16, why: 'from a GeV to grand unification' },
  { path: /massGeV$/, low: 1e-3, high: 1e6, why: 'from MeV to PeV' },
  { path: /referenceEnergyGeV$/, low: 1e-3, high: 1e6, why: 'from MeV to PeV' },
  { path: /scaleGeV$/, low: 1e3, high: 1e19, why: 'from TeV to the Planck scale' },
  {
    path: /reheatTemperatureGeV$/,
    low: 1e-3,
    high: 1e3,
    why: 'from nucleosynthesis to above the weak scale',
  },
  { path: /neutrinos\.decouplingTemperatureGeV$/, low: 1e-4, high: 0.05, why: 'all that is allowed' },
  { path: /transitionTemperatureGeV$/, low: 0.05, high: 1, why: 'all that is allowed' },
  { path: /transitionWidthGeV$/, low: 5e-4, high: 0.1, why: 'all that is allowed' },
  {
    path: /^history\.maximumTemperatureGeV$/,
    low: 1e-2,
    high: 1e15,
    why: 'from nucleosynthesis to unification',
  },
  { path: /startHubbleGeV$/, low: 1e-20, high: 1e10, why: 'from the weak scale to far above' },
  { path: /temperatureGeV$/i, low: 1e-4, high: 1e6, why: 'from below nucleosynthesis to PeV' },
  { path: /temperatureK$/, low: 1, high: 10, why: 'all that is allowed' },
  { path: /hubbleParameter$/, low: 0.2, high: 2, why: 'all that is allowed' },
  { path: /omegaMatterH2$/, low: 1e-3, high: 1, why: 'from empty to more than the critical density' },
  { path: /nEff$/, low: 0.1, high: 20, why: 'as good as all that is allowed' },
  { path: /bath\.band$/, low: -1, high: 1, why: 'all that is allowed' },
  { path: /coupling\.ratio$/, low: 1e-3, high: 10, why: 'from negligible to the largest allowed' },
  { path: /(factor|dilution)$/, low: 1.0001, high: 1e9, why: 'from hardly any to far too much' },
  { path: /expansion\.index$/, low: 0.1, high: 8, why: 'to the largest allowed' },
  { path: /ultraviolet\.index$/, low: 1, high: 10, why: 'all that is allowed' },
  { path: /ultraviolet\.coefficient$/, low: 1e-12, high: 1e12, why: 'twelve decades about one' },
  { path: /scattering\.exponent$/, low: -20, high: 4, why: 'all that is allowed' },
  { path: /annihilation\.exponent$/, low: -0.75, high: 10, why: 'all that is allowed' },
  { path: /matrixElementSquared$/, low: 1e-32, high: 1e-8, why: 'from feeble to thermal couplings' },
  { path: /crossSectionGeVMinus2$/, low: 1e-40, high: 1e-15, why: 'from feeble to thermal couplings' },
  { path: /asymmetry$/, low: 1e-16, high: 1e-6, why: 'six decades about that of the baryons' },
  { path: /couplingAlpha$/, low: 1e-5, high: 1, why: 'to the largest allowed' },
  { path: /branchingProduct$/, low: 1e-12, high: 0.25, why: 'to the largest allowed' },
  { path: /branching$/, low: 1e-12, high: 1e3, why: 'from one in a million million decays to showers' },
  { path: /perDecay$/, low: 1e-6, high: 100, why: 'from rare decays to the most allowed' },
  { path: /degreesOfFreedom$/, low: 0.01, high: 1e3, why: 'as if they were continuous' },
  { path: /startX$/, low: 1e-3, high: 500, why: 'all that is allowed' },
]

/** Factor on each side of a number that stands in the input and has no bracket of its own, such as a row of a table. */
const ABOUT = 1e6

/** The bracket for a path in an input. */
export function usualBracket(path: string, inputs: unknown): readonly [number, number] {
  const found = USUAL_BRACKETS.find((usual) => usual.path.test(path) && (usual.when?.(inputs) ?? true))
  if (found) return [found.low, found.high]
  const there = valueAt(inputs, readPath(path))
  const centre = typeof there === 'number' && there > 0 ? there : 1
  return [centre / ABOUT, centre * ABOUT]
}
