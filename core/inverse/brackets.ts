/** Where an unknown is looked for unless the question says: far on both sides of what is usual for it. */
const BRACKETS: readonly (readonly [name: RegExp, low: number, high: number])[] = [
  [/Cm3PerS$/, 1e-34, 1e-20],
  [/lifetimeS$/, 1e-16, 1e6],
  [/parent\.widthGeV$/, 1e-30, 1e-8],
  [/^candidate\.massGeV$/, 1e-6, 1e6],
  [/massGeV$/i, 1e-3, 1e6],
  [/reheatTemperatureGeV$/, 1e-3, 1e3],
  [/^history\.maximumTemperatureGeV$/, 1e-2, 1e15],
  [/TemperatureGeV$/i, 1e-4, 1e6],
  [/factor$|dilution$/, 1.0001, 1e9],
  [/matrixElementSquared$/, 1e-32, 1e-8],
  [/crossSectionGeVMinus2$/, 1e-40, 1e-15],
  [/asymmetry$/, 1e-16, 1e-6],
  [/couplingAlpha$/, 1e-5, 1],
  [/branchingProduct$/, 1e-12, 0.25],
]

/** For any other number: six decades on each side of one. */
const OTHERWISE: readonly [number, number] = [1e-6, 1e6]

export function usualBracket(path: string): readonly [number, number] {
  const found = BRACKETS.find(([name]) => name.test(path))
  return found ? [found[1], found[2]] : OTHERWISE
}
