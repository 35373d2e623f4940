/** Conversions between quantities: moments of a history by way of the temperature, and units of a particle's numbers. */
import { buildHistory } from '../history/thermalHistory.ts'
import { complete, mapped } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { convertRequest, isEpochQuantity } from '../wire/convert.ts'
import type {
  ConvertRequest,
  ConvertResult,
  EpochQuantity,
  ParticleQuantity,
  Quantity,
} from '../wire/convert.ts'
import { InputError, parseInput } from '../wire/fault.ts'
import type { Fault } from '../wire/fault.ts'
import { epochReader } from './epoch.ts'
import { NoSuchMoment, invertEpoch } from './invertEpoch.ts'
import { PARTICLE_UNITS } from './units.ts'

type Row = ConvertResult['rows'][number]

/** Values to a step: a few milliseconds. */
const VALUES_TO_A_STEP = 20

/** The wanted quantities of one kind. @throws InputError naming those of another */
function ofOneKind<Q extends Quantity>(
  { from, to }: ConvertRequest,
  isSame: (name: Quantity) => name is Q,
): Q[] {
  const faults = to.flatMap((name, i): Fault[] =>
    isSame(name)
      ? []
      : [{ path: `to[${i}]`, value: name, message: `allowed: what can be told from ${from.quantity}` }],
  )
  if (faults.length > 0) throw new InputError(faults)
  return to.filter(isSame)
}

/** A row for each value; faults of all values are told together. */
function* rowsOf(values: readonly number[], rowOf: (value: number) => Row | string): Steps<Row[]> {
  const rows = yield* mapped(values, VALUES_TO_A_STEP, rowOf)
  const faults = rows.flatMap((row, i): Fault[] =>
    typeof row === 'string' ? [{ path: `from.values[${i}]`, value: values[i], message: row }] : [],
  )
  if (faults.length > 0) throw new InputError(faults)
  return rows.filter((row) => typeof row !== 'string')
}

function epochRows(request: ConvertRequest, given: EpochQuantity): Steps<Row[]> {
  const wanted = ofOneKind(request, isEpochQuantity)
  const history = buildHistory(request.history)
  const read = epochReader(history)
  const inverse = invertEpoch(given, history, read)
  return rowsOf(request.from.values, (value) => {
    try {
      const lnT = inverse(value)
      // The given value stays as it is written.
      const row: Row = {
        ...Object.fromEntries(wanted.map((name) => [name, read(name, lnT)])),
        [given]: value,
      }
      const without = wanted.find((name) => !Number.isFinite(row[name]))
      return without === undefined
        ? row
        : `allowed: a moment at which ${without} is a finite number in this history`
    } catch (error) {
      if (error instanceof NoSuchMoment) return error.message
      throw error
    }
  })
}

function particleRows(request: ConvertRequest, given: ParticleQuantity): Steps<Row[]> {
  const { kind, toBase } = PARTICLE_UNITS[given]
  const wanted = ofOneKind(
    request,
    (name): name is ParticleQuantity => !isEpochQuantity(name) && PARTICLE_UNITS[name].kind === kind,
  )
  return rowsOf(request.from.values, (value) => {
    if (!(value > 0)) return 'allowed: above 0'
    const base = toBase(value)
    const row = {
      ...Object.fromEntries(wanted.map((name) => [name, PARTICLE_UNITS[name].fromBase(base)])),
      [given]: value,
    }
    return Object.values(row).every(Number.isFinite)
      ? row
      : 'allowed: a value whose conversions are finite numbers'
  })
}

/** From the wire: parses, fills defaults in. @throws InputError */
export function* convertSteps(input: unknown): Steps<ConvertResult> {
  const request = parseInput(convertRequest, input)
  const { quantity } = request.from
  const rows = yield* isEpochQuantity(quantity)
    ? epochRows(request, quantity)
    : particleRows(request, quantity)
  return { rows }
}

export const computeConversion = (input: unknown): ConvertResult => complete(convertSteps(input))
