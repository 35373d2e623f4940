type Fields = Record<string, unknown>

const isObject = (value: unknown): value is Fields => value !== null && typeof value === 'object'

/** Whether two inputs say the same: order of fields does not matter, and a field left out is undefined. */
export function equal(a: unknown, b: unknown): boolean {
  if (a === b) return true
  if (!isObject(a) || !isObject(b) || Array.isArray(a) !== Array.isArray(b)) return false
  return [...new Set([...Object.keys(a), ...Object.keys(b)])].every((field) => equal(a[field], b[field]))
}
