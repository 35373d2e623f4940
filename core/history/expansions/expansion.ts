import type { ExpansionPoint } from '../expansionPoint.ts'

/** What a kind of expansion adds to radiation. */
export interface Expansion {
  /** Temperatures, GeV, where it makes something jump. */
  readonly breaks: readonly number[]
  /** n of the fluid that dominates at the highest temperatures, for t = 2/((4 + n)H) there; 0 for radiation. */
  readonly earlyIndex: number
  /** Temperature, GeV, from which on the age can be taken from H alone; hotter than anything of interest. */
  readonly ageStartsAt: number
  /** Temperature, GeV, down to which a decaying field makes candidates; null when none does. */
  readonly producesUntil: number | null
  /** Whether radiation alone fills the universe at that temperature, GeV. */
  radiationOnly(temperatureGeV: number): boolean
  /** Completes a point whose radiation is set. */
  complete(lnT: number, out: ExpansionPoint): void
}

/** Where the age is taken from the local expansion rate, unless something happens even earlier, GeV. */
export const USUAL_AGE_START_GEV = 1e8

/** Radiation and nothing else. */
export const RADIATION: Expansion = {
  breaks: [],
  earlyIndex: 0,
  ageStartsAt: USUAL_AGE_START_GEV,
  producesUntil: null,
  radiationOnly: () => true,
  complete: () => undefined,
}
