/** Places in JSON values, and values with something else put in there. */
import { InputError, pathText } from '../wire/fault.ts'

/** A place in a JSON value: names and indices from the outside in. */
export type JsonPath = readonly (string | number)[]

/** Reads `candidate.others[2].massGeV` as a path. */
export function readPath(text: string): JsonPath {
  return [...text.matchAll(/[^.[\]]+/g)].map(([key]) => (/^\d+$/.test(key) ? Number(key) : key))
}

/** What stands at the path; undefined where nothing does. */
export function valueAt(value: unknown, path: JsonPath): unknown {
  return path.reduce<unknown>(
    (each, key) =>
      each !== null && typeof each === 'object' ? (each as Record<string | number, unknown>)[key] : undefined,
    value,
  )
}

/**
 * The value with another put in at the path; objects on the way are copied, missing ones made.
 * @throws InputError when an index would leave a gap in a list
 */
export function substitute(value: unknown, path: JsonPath, replacement: unknown): unknown {
  const put = (here: unknown, depth: number): unknown => {
    const key = path[depth]
    if (key === undefined) return replacement
    if (typeof key === 'number') {
      const list: unknown[] = Array.isArray(here) ? [...(here as unknown[])] : []
      if (key > list.length) refuseGap(path.slice(0, depth + 1), list.length)
      list[key] = put(list[key], depth + 1)
      return list
    }
    const object = here !== null && typeof here === 'object' ? (here as Record<string, unknown>) : {}
    return { ...object, [key]: put(object[key], depth + 1) }
  }
  return put(value, 0)
}

function refuseGap(path: JsonPath, length: number): never {
  const message =
    length === 0 ? 'no list stands there' : `allowed: an index below ${length}, the length of the list`
  throw new InputError([{ path: pathText(path), message }])
}
