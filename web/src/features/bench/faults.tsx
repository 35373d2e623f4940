import { createContext, useContext } from 'react'
import type { Fault } from '#core/wire/index'

/** The faults the core found, by JSON path, for whichever field shows that path. */
const Faults = createContext<ReadonlyMap<string, string>>(new Map())

export function FaultProvider({ faults, children }: { faults: readonly Fault[]; children: React.ReactNode }) {
  return <Faults value={new Map(faults.map((fault) => [fault.path, fault.message]))}>{children}</Faults>
}

/** What is wrong with the number at that path, if anything. */
export function useFault(path: string): string | undefined {
  return useContext(Faults).get(path)
}
