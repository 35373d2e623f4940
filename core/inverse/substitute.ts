/** A place in a JSON value: names and indices from the outside in. */
export type JsonPath = readonly (string | number)[]

/** Reads `candidate.others[2].massGeV` as a path. */
export function readPath(text: string): JsonPath {
  return [...text.matchAll(/[^.[\]]+/g)].map(([key]) => (/^\d+$/.test(key) ? Number(key) : key))
}

/** The value with the number put in at the path; objects on the way are copied, missing ones made. */
export function substitute(value: unknown, path: JsonPath, number: number): unknown {
  const [key, ...rest] = path
  if (key === undefined) return number
  if (typeof key === 'number') {
    const list: unknown[] = Array.isArray(value) ? [...(value as unknown[])] : []
    list[key] = substitute(list[key], rest, number)
    return list
  }
  const object = value !== null && typeof value === 'object' ? (value as Record<string, unknown>) : {}
  return { ...object, [key]: substitute(object[key], rest, number) }
}
