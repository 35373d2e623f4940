/**
 * The lifetime of the parent that gives the measured density, as a function of the candidate's mass. While the parent stays in
 * equilibrium and inverse decays are left out, Ωh² is exactly inverse to τ: one abundance gives the lifetime. Otherwise all lifetimes
 * in a bracket are searched, of which there may be several or none.
 */
import { abundance } from '../abundance/abundance.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { abundanceSearch, nearest } from '../inverse/abundanceSearch.ts'
import type { Tried } from '../inverse/abundanceSearch.ts'
import { usualBracket } from '../inverse/brackets.ts'
import { part } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { InputError } from '../wire/fault.ts'
import type { LaboratoryRequest, LifetimeForDensity } from '../wire/laboratory.ts'
import { PLACES, decayingCandidate } from './decayingCandidate.ts'
import type { DecayNumbers } from './decayingCandidate.ts'
import { bandsThatHold, meanFlight } from './flight.ts'

/** What the lifetime is wanted for. */
interface Wanted extends Omit<DecayNumbers, 'lifetimeS'> {
  omegaH2: number
}

interface Lifetimes {
  solutions: readonly number[]
  closest: Tried | null
}

/** Abundances in one history, kept: unless inverse decays know the candidate's mass, its number does not depend on it. */
export class Abundances {
  readonly history: ThermalHistory
  readonly request: LaboratoryRequest
  private readonly known = new Map<string, number>()

  constructor(history: ThermalHistory, request: LaboratoryRequest) {
    this.history = history
    this.request = request
  }

  at(numbers: DecayNumbers): number {
    const { parentMassGeV, lifetimeS, massGeV } = numbers
    const key = `${parentMassGeV} ${lifetimeS} ${this.request.candidate.backReaction ? massGeV : ''}`
    let perMass = this.known.get(key)
    if (perMass === undefined) {
      perMass = abundance(this.history, decayingCandidate(this.request, numbers)).omegaH2 / massGeV
      this.known.set(key, perMass)
    }
    return perMass * massGeV
  }

  /** Whether Ωh² ∝ 1/τ: each decay adds its share, and nothing else makes or destroys candidates. */
  isInverseToLifetime(): boolean {
    const { candidate, parent } = this.request
    const followed = parent.annihilation !== undefined && candidate.lateDecay
    return !followed && !candidate.backReaction && this.history.expansion.producesUntil === null
  }
}

function* lifetimesFor(abundances: Abundances, wanted: Wanted): Steps<Lifetimes> {
  if (abundances.isInverseToLifetime()) {
    const lifetimeS = abundances.request.measured.lifetimeS.value
    const ratio = abundances.at({ ...wanted, lifetimeS }) / wanted.omegaH2
    yield { done: 1, of: 1 }
    return { solutions: [lifetimeS * ratio], closest: null }
  }
  const { solutions, tried } = yield* abundanceSearch(
    (lifetimeS) => abundances.at({ ...wanted, lifetimeS }),
    wanted.omegaH2,
    usualBracket(PLACES.lifetimeS, {}),
  )
  return { solutions, closest: solutions.length > 0 ? null : nearest(tried, wanted.omegaH2) }
}

/** The question with one input moved to one end of its error; by source of error, without those of none. */
function movedByErrors({ measured, measuredDensity }: LaboratoryRequest, central: Wanted): Wanted[][] {
  const moved = (field: keyof Wanted, { minus, plus }: { minus: number; plus: number }): Wanted[] =>
    [-minus, plus].filter((by) => by !== 0).map((by) => ({ ...central, [field]: central[field] + by }))
  return [moved('omegaH2', measuredDensity), moved('parentMassGeV', measured.parentMassGeV)]
}

/** Shifts of ln τ up and down, each source's largest, in quadrature; null where a solution has no counterpart. */
function spread(central: readonly number[], moved: readonly (readonly (readonly number[] | null)[])[]) {
  return central.map((lifetime, i) => {
    let [down, up] = [0, 0]
    for (const source of moved) {
      if (source.some((solutions) => solutions?.length !== central.length)) return null
      const shifts = source.map((solutions) => Math.log(solutions![i]! / lifetime))
      down = Math.hypot(down, Math.min(0, ...shifts))
      up = Math.hypot(up, Math.max(0, ...shifts))
    }
    return { lowS: lifetime * Math.exp(-down), highS: lifetime * Math.exp(up) }
  })
}

/** The lifetimes for the measured density at one mass of the candidate, GeV. */
export function* lifetimeForDensitySteps(abundances: Abundances, massGeV: number): Steps<LifetimeForDensity> {
  const { request } = abundances
  const central = {
    massGeV,
    parentMassGeV: request.measured.parentMassGeV.value,
    omegaH2: request.measuredDensity.value,
  }
  const sources = movedByErrors(request, central)
  const of = 1 + sources.flat().length
  const { solutions, closest } = yield* part(lifetimesFor(abundances, central), 0, 1, of)
  const moved: (readonly number[] | null)[][] = []
  let done = 1
  for (const source of sources) {
    const found: (readonly number[] | null)[] = []
    for (const wanted of source) found.push(yield* part(movedLifetimes(abundances, wanted), done++, 1, of))
    moved.push(found)
  }
  const bands = spread(solutions, moved)
  return {
    massGeV,
    lifetimes: solutions.map((lifetimeS, i) => {
      const meanFlightM = meanFlight(lifetimeS, request.betaGamma)
      return {
        lifetimeS,
        lowS: bands[i]?.lowS ?? null,
        highS: bands[i]?.highS ?? null,
        meanFlightM,
        bands: bandsThatHold(request.reachBands, { meanFlightM, lifetimeS }),
      }
    }),
    closest: closest && { lifetimeS: closest.value, omegaH2: closest.omegaH2 },
  }
}

/** The lifetimes for a moved input; null where the error leads to no possible input. */
function* movedLifetimes(abundances: Abundances, wanted: Wanted): Steps<readonly number[] | null> {
  const { massGeV, parentMassGeV } = wanted
  if (!(parentMassGeV > 0 && abundances.request.perDecay * massGeV <= parentMassGeV)) return null
  return (yield* lifetimesFor(abundances, wanted)).solutions
}

/** The line over masses evenly in the logarithm. @throws InputError when it runs beyond the parent's mass */
export function* lifetimeMassLineSteps(
  abundances: Abundances,
  { fromGeV, toGeV, points }: NonNullable<LaboratoryRequest['line']>,
): Steps<LifetimeForDensity[]> {
  const { request } = abundances
  const most = request.measured.parentMassGeV.value / request.perDecay
  if (toGeV > most) {
    const message = `allowed: at most ${most}, the mass of the parent divided by perDecay`
    throw new InputError([{ path: 'line.toGeV', value: toGeV, message }])
  }
  const line: LifetimeForDensity[] = []
  for (let i = 0; i < points; i++) {
    const massGeV = i === points - 1 ? toGeV : fromGeV * (toGeV / fromGeV) ** (i / (points - 1))
    line.push(yield* part(lifetimeForDensitySteps(abundances, massGeV), i, 1, points))
  }
  return line
}
