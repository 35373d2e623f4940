/** Histories and candidates in which the published values are met. */
import { abundance } from '../abundance/abundance.ts'
import { buildHistory } from '../history/thermalHistory.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { candidateInput } from '../wire/candidate.ts'
import type { AbundanceResult } from '../wire/compute.ts'
import { historyInput } from '../wire/history.ts'
import type { HistoryInput } from '../wire/history.ts'

/** Effective number of the whole Standard Model, and so of textbook steps above the top quark. */
export const G_ALL = 106.75

/** A history from as much as differs from the defaults. */
export const historyOf = (differing: Partial<Record<keyof HistoryInput, unknown>>): ThermalHistory =>
  buildHistory(historyInput.parse(differing))

/** Three neutrinos that let go at once: g_s = 43/11 today. */
export const INSTANTANEOUS = { treatment: 'instantaneous' }

/** Textbook steps: g is constant above 172.57 GeV, where the closed forms hold. */
export const STEPS = { bath: { treatment: 'thresholds' }, neutrinos: INSTANTANEOUS }

/** A fermion of two states, its own antiparticle. */
export const FERMION = { degreesOfFreedom: 2, statistics: 'fermion' }

export const abundanceOf = (history: ThermalHistory, candidate: unknown): AbundanceResult =>
  abundance(history, candidateInput.parse(candidate))
