/** Decades always shown about the measured density. */
const USUAL: readonly [number, number] = [1e-3, 10]

/** Ends of the abundance bar: from 0.001 to 10, and as many whole decades more as the answer needs. */
export function barDomain(omegaH2: number): [number, number] {
  if (!(omegaH2 > 0 && omegaH2 < Infinity)) return [...USUAL]
  const power = Math.log10(omegaH2)
  return [
    Math.min(USUAL[0], Number(`1e${Math.floor(power)}`)),
    Math.max(USUAL[1], Number(`1e${Math.ceil(power)}`)),
  ]
}
