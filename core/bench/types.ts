import type { AbundanceResult, AssumptionGroup, CandidateInput, Fault, HistoryInput } from '../wire/index.ts'

/** What the Bench asks for: a history and a candidate, measured against a baseline history. */
export interface BenchRequest {
  history: HistoryInput
  /** The group's adopted baseline, or the history itself when there is none. */
  baseline: HistoryInput
  candidate: CandidateInput
  /** Temperatures drawn, GeV; hot above cold. */
  window: { hotGeV: number; coldGeV: number }
}

/** One curve against temperature, hot to cold; NaN where the quantity is not defined there. */
export interface Curve {
  temperatureGeV: Float64Array
  value: Float64Array
}

/** Effect of one group of assumptions on Ω_χh². */
export interface AssumptionFactor {
  group: AssumptionGroup
  /** Whether history and baseline differ in this group. */
  differs: boolean
  /** Ω_χh² of the baseline with this group alone taken from the history, over Ω_χh² of the baseline; null if not computable. */
  oneAtATime: number | null
  /** exp of the Shapley value of ln Ω_χh²: these factors' product is the whole ratio. Null if a mixed history is not computable. */
  attributed: number | null
}

/** A temperature with a name on the ember line. Higher importance is kept when labels would collide. */
export interface EpochMark {
  code:
    | 'electroweak-crossover'
    | 'qcd-crossover'
    | 'neutrino-decoupling'
    | 'electron-positron'
    | 'fluid-equality'
    | 'entropy-step'
    | 'matter-begins'
    | 'matter-ends'
    | 'maximum-temperature'
    | 'species-decoupling'
  label: string
  temperatureGeV: number
  importance: number
}

/** One line of "how this number comes about": a quantity, its value and unit, its formula and source. */
export interface Working {
  symbol: string
  name: string
  value: number
  unit: string
  formula: string
  source: string
}

export interface BenchReport {
  result: AbundanceResult
  /** Ω_χh² of the same candidate in the baseline. */
  baselineOmegaH2: number
  /** Ω_χh² at the two ends of the bath's own band; null for a treatment that has none. */
  band: { low: number; high: number; because: string } | null
  /** In the order of ASSUMPTION_GROUPS, always all of them. */
  factors: AssumptionFactor[]
  /** Codes and titles of every guard that applies to this mechanism, raised or not. */
  guardsLookedAt: { code: string; title: string }[]
  yieldCurve: Curve
  /** Y_eq of the candidate (freeze-out) or of the parent (freeze-in by decay). */
  equilibriumCurve: Curve
  equilibriumOf: 'candidate' | 'parent'
  baselineYieldCurve: Curve
  /** Γ/H: n_eq⟨σv⟩/H for freeze-out, Γ_B/H for decay of the parent. */
  rateOverHubbleCurve: Curve
  gRhoCurve: Curve
  gSCurve: Curve
  baselineGRhoCurve: Curve
  /** g_ρ of this history over that of the baseline. */
  gRhoRatioCurve: Curve
  /** Where the abundance is decided: freeze-out temperature, or peak of production. */
  mark: { kind: 'freeze-out' | 'production'; temperatureGeV: number } | null
  epochs: EpochMark[]
  /** Age of the universe at the powers of ten of temperature inside the window, for the axis beneath. */
  times: { temperatureGeV: number; timeS: number }[]
  workings: Working[]
}

/** What comes back from the worker: a report, or what was wrong with the input, or why it did not converge. */
export type BenchAnswer =
  | { status: 'done'; report: BenchReport }
  | { status: 'refused'; faults: readonly Fault[] }
  | { status: 'failed'; reason: string }
