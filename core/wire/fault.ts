import type { z } from 'zod'
import { faultWords } from './faultWords.ts'

/** One thing wrong with an input: where, what stands there, what would do. */
export interface Fault {
  /** JSON path as in `candidate.annihilation.sWaveCm3PerS` or `temperaturesGeV[3]`; empty for the whole input. */
  path: string
  /** What was found there; absent when nothing was. */
  value?: unknown
  /** What is wrong and what is allowed, one sentence. */
  message: string
}

/** An input that cannot be computed from, with every fault found in it. */
export class InputError extends Error {
  readonly faults: readonly Fault[]
  constructor(faults: readonly Fault[]) {
    super(faults.map(faultLine).join('\n'))
    this.name = 'InputError'
    this.faults = faults
  }
}

/** The fault on one line, as `compute` prints it. */
export function faultLine(fault: Fault): string {
  const found = fault.value === undefined ? '' : ` (found ${JSON.stringify(fault.value)})`
  return `${fault.path === '' ? 'input' : fault.path}: ${fault.message}${found}`
}

/** Writes a path the way JavaScript would read it. */
export function pathText(path: readonly PropertyKey[]): string {
  return path.reduce<string>(
    (text, key) =>
      typeof key === 'number' ? `${text}[${key}]` : text === '' ? String(key) : `${text}.${String(key)}`,
    '',
  )
}

function valueAt(input: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>(
    (value, key) =>
      value !== null && typeof value === 'object' ? (value as Record<PropertyKey, unknown>)[key] : undefined,
    input,
  )
}

function shownValue(input: unknown, path: readonly PropertyKey[]): unknown {
  const value = valueAt(input, path)
  if (typeof value === 'number') return Number.isFinite(value) ? value : String(value)
  if (typeof value === 'string') return value.length > 60 ? `${value.slice(0, 60)}…` : value
  return typeof value === 'object' && value !== null ? undefined : value
}

/** What is wrong with `input` by the reading of the zod error it caused. */
export function faultsOf(error: z.ZodError, input: unknown): Fault[] {
  return error.issues.flatMap((issue) => {
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => ({
        path: pathText([...issue.path, key]),
        message: 'not a name known here; remove it or correct its spelling',
      }))
    }
    const fault: Fault = {
      path: pathText(issue.path),
      message: faultWords(issue, valueAt(input, issue.path) === undefined),
    }
    const value = shownValue(input, issue.path)
    return [value === undefined ? fault : { ...fault, value }]
  })
}

/** Parses `input`, filling defaults in, or throws an InputError with every fault. */
export function parseInput<S extends z.ZodType>(schema: S, input: unknown): z.output<S> {
  const parsed = schema.safeParse(input)
  if (parsed.success) return parsed.data
  throw new InputError(faultsOf(parsed.error, input))
}
