/** What a treatment says about the bath at one temperature; effective numbers in the photons' temperature. */
export interface BathPoint {
  /** g_ρ = ρ/(π²T⁴/30). */
  gRho: number
  /** g_s = s/(2π²T³/45). */
  gS: number
  /** dg_s/d ln T. */
  gSSlope: number
  /** p/(π²T⁴/90); NaN where the treatment leaves the pressure undefined. */
  gP: number
}

/** What one species gives to the bath, or several that cannot be told apart; effective numbers in the photons' temperature. */
export interface Contribution {
  name: string
  /** Its own temperature, GeV. */
  temperatureGeV: number
  gRho: number
  gS: number
  /** NaN where the treatment leaves the pressure undefined. */
  gP: number
}

/** A range in which a bath follows rows: cheap to read there, and with a kink in a higher derivative at every row. */
export interface FollowedRows {
  readonly lowestGeV: number
  readonly highestGeV: number
  /** Temperatures, GeV, ascending, of rows between which a quadrature finds it smooth. */
  readonly edgesGeV: readonly number[]
  /** Those where a higher derivative jumps so much that an integrator does better to restart. */
  readonly kinksGeV: readonly number[]
}

/** A part of the bath, or the whole, as a function of temperature. */
export interface BathPart {
  /** Temperatures, GeV, where a value or one of its first derivatives jumps. */
  readonly breaks: readonly number[]
  /** Temperatures, GeV, around which it changes within a fraction of an e-fold: where a table has to look closely. */
  readonly sharp?: readonly number[]
  /** Where it follows rows of its own. Absent where it follows none. */
  readonly rows?: FollowedRows
  /** Writes the part at temperature T, GeV, into `out`. At a step the cold side is taken. */
  evaluate(temperatureGeV: number, out: BathPoint): void
  /** What it is made of at temperature T, GeV: adds up to what `evaluate` writes. What is not there is left out. */
  contributions(temperatureGeV: number): Contribution[]
}

export const emptyPoint = (): BathPoint => ({ gRho: 0, gS: 0, gSSlope: 0, gP: 0 })
