/** Sought in this order: most browsers also call themselves by the names further down. */
const BROWSERS = [
  ['Firefox', /Firefox\//],
  ['Edge', /Edg(e|A|iOS)?\//],
  ['Opera', /OPR\//],
  ['Chrome', /(Chrome|CriOS)\//],
  ['Safari', /Safari\//],
  ['curl', /^curl\//],
] as const

const SYSTEMS = [
  ['Android', /Android/],
  ['iPhone', /iPhone/],
  ['iPad', /iPad/],
  ['Windows', /Windows/],
  ['macOS', /Macintosh/],
  ['Linux', /Linux/],
] as const

const nameIn = (names: readonly (readonly [string, RegExp])[], text: string): string | undefined =>
  names.find(([, pattern]) => pattern.test(text))?.[0]

/** What a person would call the device, from what the browser said of itself. */
export function deviceName(userAgent: string): string {
  const browser = nameIn(BROWSERS, userAgent)
  const system = nameIn(SYSTEMS, userAgent)
  if (browser === undefined) return system ?? 'Unknown device'
  return system === undefined ? browser : `${browser} on ${system}`
}
