import { createContext, useContext } from 'react'
import type { Fault } from '#core/wire/index'

/** The faults the core found, by JSON path, for whichever field shows that path. */
const Faults = createContext<ReadonlyMap<string, string>>(new Map())

export function FaultProvider({ faults, children }: { faults: readonly Fault[]; children: React.ReactNode }) {
  return <Faults value={new Map(faults.map((fault) => [fault.path, fault.message]))}>{children}</Faults>
}

/** What is wrong with a list or with the first of its rows that is at fault, if anything: “row 3, gS: allowed: …”. */
export function useFaultWithin(path: string): string | undefined {
  const faults = useContext(Faults)
  const own = faults.get(path)
  if (own !== undefined) return own
  for (const [at, message] of faults) {
    const inside = at.startsWith(`${path}[`) ? /^\[(\d+)\](.*)$/.exec(at.slice(path.length)) : null
    if (!inside) continue
    const place = inside[2]!
      .replace(/^\./, '')
      .replace(/^\[(\d+)\]$/, (_, column) => `column ${Number(column) + 1}`)
    return `row ${Number(inside[1]) + 1}${place === '' ? '' : `, ${place}`}: ${message}`
  }
  return undefined
}

/** What is wrong with the number at that path, if anything. */
export function useFault(path: string): string | undefined {
  return useContext(Faults).get(path)
}
