/** Whether distributions fit the places they vary, told of the distribution and not of the inputs made from it. */
import { InputError, faultLine, pathText } from '../wire/fault.ts'
import type { Fault } from '../wire/fault.ts'
import type { DistributionInput } from '../wire/propagation.ts'
import { ConvergenceError } from '../numerics/convergence.ts'
import { readPath } from '../variation/jsonPath.ts'
import type { VariedInput } from '../variation/variedInput.ts'
import { quantileOf } from './distributions.ts'

/** The path as it is always written. */
export const writtenPath = (path: string): string => pathText(readPath(path))

const isInside = (path: string, place: string): boolean =>
  path === place || path.startsWith(`${place}.`) || path.startsWith(`${place}[`)

/** @throws InputError when one place is another's, or inside it: which counts would depend on their order */
export function refuseOverlaps(distributions: readonly DistributionInput[]): void {
  const places = distributions.map(({ path }) => writtenPath(path))
  const faults = places.flatMap((place, i): Fault[] => {
    const other = places.findIndex((each, j) => j < i && (isInside(place, each) || isInside(each, place)))
    return other < 0
      ? []
      : [
          {
            path: `distributions[${i}].path`,
            value: place,
            message: `allowed: a place apart from that of distributions[${other}], ${places[other]!}`,
          },
        ]
  })
  refuse(faults)
}

/** What is put in the place: the number itself, or the choice of that index. */
export function placedValue(distribution: DistributionInput, drawn: number): unknown {
  return distribution.kind === 'discrete' ? distribution.values[drawn] : drawn
}

/** Each number at its median or the value quoted with two errors, each choice at its first value. */
export function centralValues(distributions: readonly DistributionInput[]): unknown[] {
  return distributions.map((each) => {
    if (each.kind === 'discrete') return each.values[0]
    return each.kind === 'two-piece-normal' ? each.value : quantileOf(each, 0.5)
  })
}

/** Field of a distribution that its central value comes from. */
const CENTRE: Record<DistributionInput['kind'], string> = {
  normal: 'mean',
  'two-piece-normal': 'value',
  'log-normal': 'median',
  uniform: 'low',
  'log-uniform': 'low',
  discrete: 'values[0]',
}

/** The values at which a distribution ends, by the field they stand in. */
function endsOf(distribution: DistributionInput): [field: string, value: unknown][] {
  switch (distribution.kind) {
    case 'uniform':
    case 'log-uniform':
      return [
        ['low', distribution.low],
        ['high', distribution.high],
      ]
    case 'discrete':
      return distribution.values.map((value, i) => [`values[${i}]`, value])
    default:
      return []
  }
}

/** The fault told of the field it comes from. */
function moved(fault: Fault, place: string, distribution: number, field: string): Fault {
  // Without a value found there, the place itself is wrong.
  const at =
    fault.value === undefined && fault.path === place ? 'path' : `${field}${fault.path.slice(place.length)}`
  return {
    ...fault,
    path: `distributions[${distribution}].${at}`,
    message: `${fault.path}: ${fault.message}`,
  }
}

/**
 * Tries the central values and the ends of every distribution.
 * @throws InputError naming the distribution that does not fit its place, or what is wrong with the rest of the input
 */
export function checkPlaces(varied: VariedInput, distributions: readonly DistributionInput[]): void {
  const central = centralValues(distributions)
  const places = distributions.map(({ path }) => writtenPath(path))
  const faultsWith = (values: readonly unknown[]): readonly Fault[] => {
    try {
      varied.at(values)
      return []
    } catch (error) {
      if (error instanceof InputError) return error.faults
      if (error instanceof ConvergenceError) return []
      throw error
    }
  }
  const atEnds = distributions.flatMap((distribution, i) =>
    endsOf(distribution).flatMap(([field, value]) =>
      faultsWith(central.with(i, value))
        // A fault elsewhere is one of the combination, which the samples count.
        .filter((fault) => isInside(fault.path, places[i]!))
        .map((fault) => moved(fault, places[i]!, i, field)),
    ),
  )
  refuse(atEnds)
  const atCentre = faultsWith(central).map((fault) => {
    const i = places.findIndex((place) => isInside(fault.path, place))
    return i < 0 ? fault : moved(fault, places[i]!, i, CENTRE[distributions[i]!.kind])
  })
  refuse(atCentre)
}

/** @throws InputError of the faults, each once, when there are any */
function refuse(faults: readonly Fault[]): void {
  if (faults.length > 0)
    throw new InputError([...new Map(faults.map((each) => [faultLine(each), each])).values()])
}
