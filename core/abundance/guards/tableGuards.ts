/** Guards on tables: whether an abundance rests on what lies outside their rows. */
import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { AnnihilationInput } from '../../wire/annihilation.ts'
import type { CandidateInput, FreezeInScatteringInput } from '../../wire/candidate.ts'
import type { AbundanceResult, Guard } from '../../wire/compute.ts'
import { lowestEnergy, scaledCollisionIntegral } from '../rates/collisionIntegral.ts'
import type { Collision } from '../rates/collisionIntegral.ts'
import { heldAtEnds, piecesOfTable } from '../rates/powerLawPieces.ts'
import { collisionOf } from '../rates/scatteringRate.ts'
import { COMMON_PRACTICE, raise } from './guard.ts'

const CODE = 'table-extrapolated'

/** Share of a rate that may come from beyond the rows. */
const LARGEST_SHARE = 0.01

/** A share that is no finite double: nothing came from the rows. */
const EVERYTHING = 1e300

/** The guard on a table of σ(√s), by its rate at T, GeV, as it is used and with the end values held outside the rows. */
function missedShare(
  points: readonly (readonly [number, number])[],
  temperatureGeV: number,
  collision: Collision,
  message: string,
): Guard[] {
  const used = piecesOfTable(points)
  const held = heldAtEnds(used)
  const gained = (lowestEnergy(used, collision) - lowestEnergy(held, collision)) / temperatureGeV
  const ratio =
    (scaledCollisionIntegral(temperatureGeV, held, collision) /
      scaledCollisionIntegral(temperatureGeV, used, collision)) *
    Math.exp(gained)
  const share = Math.min(ratio - 1, EVERYTHING)
  return share <= LARGEST_SHARE
    ? []
    : [raise(CODE, message, share, LARGEST_SHARE, 'of the rate', COMMON_PRACTICE)]
}

type Of<K extends AnnihilationInput['kind']> = Extract<AnnihilationInput, { kind: K }>

function averagedTable(massGeV: number, { against, points }: Of<'table'>, x: number): Guard[] {
  const at = against === 'x' ? x : massGeV / x
  const [first, last] = [points[0]![0], points.at(-1)![0]]
  if (at >= first && at <= last) return []
  const message = 'At freeze-out the table of ⟨σv⟩ is used outside its rows, where its end value is held.'
  const unit = against === 'x' ? 'x' : 'GeV'
  return [raise(CODE, message, at, at < first ? first : last, unit, COMMON_PRACTICE)]
}

function crossSectionTable(massGeV: number, { points }: Of<'cross-section'>, x: number): Guard[] {
  const message =
    'At freeze-out energies outside the rows of the cross-section table count, where it is taken as zero: with its end values held there ⟨σv⟩ would be larger.'
  const pair = { sum: 2 * massGeV, difference: 0, least: 2 * massGeV }
  return missedShare(points, massGeV / x, pair, message)
}

/** Guards on the table of an annihilation that decides at x = m/T. */
export function annihilationTableGuards(
  { massGeV, annihilation }: { massGeV: number; annihilation: AnnihilationInput },
  x: number,
): Guard[] {
  if (annihilation.kind === 'table') return averagedTable(massGeV, annihilation, x)
  if (annihilation.kind === 'cross-section') return crossSectionTable(massGeV, annihilation, x)
  return []
}

/** Guards on the table of a scattering whose production peaks at temperature T, GeV. */
export function scatteringTableGuards(
  { scattering, massGeV }: FreezeInScatteringInput,
  temperatureGeV: number,
): Guard[] {
  if (scattering.kind !== 'table') return []
  const message =
    'Where most is produced energies outside the rows of the cross-section table count, where it is taken as zero: with its end values held there production would be larger.'
  return missedShare(scattering.points, temperatureGeV, collisionOf(scattering.incoming, massGeV), message)
}

/** Guard on an uploaded bath, by the temperatures, GeV, that decide the abundance. */
export function bathTableGuards(history: ThermalHistory, decisiveGeV: readonly number[]): Guard[] {
  const { rows } = history.radiation.bath
  if (!rows) return []
  const outside = decisiveGeV.find((T) => T < rows.lowestGeV || T > rows.highestGeV)
  if (outside === undefined) return []
  const limit = outside < rows.lowestGeV ? rows.lowestGeV : rows.highestGeV
  const message =
    'The abundance is decided where the uploaded bath has no rows: ideal gases stand in for it there.'
  return [raise(CODE, message, outside, limit, 'GeV', COMMON_PRACTICE)]
}

/** x = m/T near which annihilation into an asymmetry ends, and near which production from nothing peaks. */
export const USUAL_X = { asymmetric: 25, 'freeze-out': 3 }

/** The temperatures, GeV, that decide an abundance: those its result names, or where such a mechanism usually ends. */
export function decisiveTemperatures(candidate: CandidateInput, result: AbundanceResult): number[] {
  const named = [
    result.freezeOutTemperatureGeV,
    result.productionTemperatureGeV,
    result.parentFreezeOut?.freezeOutTemperatureGeV,
  ].filter((temperature) => temperature !== undefined)
  if (named.length > 0) return named
  switch (candidate.mechanism) {
    case 'hot-relic':
      return [candidate.decouplingTemperatureGeV]
    case 'freeze-out':
    case 'asymmetric':
      return [candidate.massGeV / USUAL_X[candidate.mechanism]]
    default:
      return []
  }
}
