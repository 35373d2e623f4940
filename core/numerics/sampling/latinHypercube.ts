import { RandomStream } from './randomStream.ts'

/**
 * One column of a Latin hypercube: `samples` numbers in (0, 1), one in each of as many equal strata, in random order. Columns of
 * different names are independent, and a column does not depend on which others there are.
 * Sources: McKay, Beckman, Conover, Technometrics 21 (1979) 239; the shuffle is Durstenfeld's, Comm. ACM 7 (1964) 420.
 * @param samples at most 2²⁰, so that stratum and place in it are exact in a double
 * @param seed whole number from 0 to 2⁵³ − 1
 */
export function latinHypercubeColumn(name: string, samples: number, seed: number): Float64Array {
  const stream = new RandomStream(name, seed)
  const column = Float64Array.from({ length: samples }, (_, stratum) => stratum)
  for (let last = samples - 1; last > 0; last--) {
    const other = stream.below(last + 1)
    const stratum = column[last]!
    column[last] = column[other]!
    column[other] = stratum
  }
  for (let i = 0; i < samples; i++) column[i] = (column[i]! + stream.fraction()) / samples
  return column
}
