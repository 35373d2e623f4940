/**
 * An era of matter: a field that dominates for a while and decays into the bath,
 *
 *   dρ_φ/dN = −3ρ_φ − Γρ_φ/H,   d(s a³)/dN = Γρ_φ a³/(HT),   H² = 8π(ρ_φ + ρ_R)/(3M_Pl²),   N = ln a,
 *
 * with Γ = H of pure radiation at T_RH, and ρ_φ = ρ_R at the start temperature. Solved against ln T with F = ln(ρ_φ a³) and
 * S = ln(s a³), which go on unchanged where the bath steps and ln a = (S − ln s)/3 jumps:
 *
 *   dN/d ln T = −(1 + δ_s)/(1 − σ/3),   dS/d ln T = σ dN/d ln T,   dF/d ln T = −(Γ/H) dN/d ln T,   σ = Γρ_φ/(HTs).
 *
 * Sources: Scherrer & Turner, Phys. Rev. D 31 (1985) 681; Giudice, Kolb, Riotto, Phys. Rev. D 64 (2001) 023508.
 */
import { ConvergenceError } from '../../numerics/convergence.ts'
import { OdeFailure, denseOde } from '../../numerics/ode/dense.ts'
import type { DenseSolution } from '../../numerics/ode/dense.ts'
import { brent } from '../../numerics/roots/brent.ts'
import { InputError } from '../../wire/fault.ts'
import type { ExpansionInput } from '../../wire/history.ts'
import { ENERGY_FACTOR, emptyExpansion, hubbleOf, setRadiation } from '../expansionPoint.ts'
import type { ExpansionPoint } from '../expansionPoint.ts'
import { COLUMNS, G_RHO, G_S, HOTTEST_GEV, LOG_SLOPE } from '../radiation.ts'
import type { Radiation } from '../radiation.ts'
import { RADIATION, USUAL_AGE_START_GEV } from './expansion.ts'
import type { Expansion } from './expansion.ts'

export type EarlyMatterInput = Extract<ExpansionInput, { kind: 'early-matter' }>

/** What an era of matter did. */
export interface MatterEra extends Expansion {
  /** Γ of the field, GeV. */
  readonly widthGeV: number
  readonly startTemperatureGeV: number
  /** (s a³)_late/(s a³)_early. */
  readonly dilution: number
  /** ρ_φ/(ρ_φ + ρ_R) at ln T. */
  matterFraction(lnT: number): number
}

export const isMatterEra = (expansion: Expansion): expansion is MatterEra => 'dilution' in expansion

/** Allowed error of ln(ρ_φ a³) and ln(s a³) in each step. */
const TOLERANCE = 1e-10

/** ln(T/T_start) up to which the field is followed backwards; what it has heated by then is below e^−36. */
const BACK = 12

/** T_RH over the temperature at which the last of the field, e^{−Γt} ≈ e^−128, is dropped. */
const AFTER_DECAY = 16

const F = 0
const S = 1

/** Width of a field that decays when radiation alone would have T_RH: Γ = √(4π³g_ρ/45) T_RH²/M_Pl. */
function widthOf(reheatTemperature: number, radiation: Radiation): number {
  const columns = new Float64Array(COLUMNS)
  radiation.read(Math.log(reheatTemperature), columns)
  return hubbleOf(ENERGY_FACTOR * columns[G_RHO]! * reheatTemperature ** 4)
}

/** Solves the era from its start both ways. */
function solveEra(radiation: Radiation, width: number, start: number, coldest: number): DenseSolution {
  const columns = new Float64Array(COLUMNS)
  const point = emptyExpansion()
  const radiationAt = (lnT: number): void => {
    radiation.read(lnT, columns)
    setRadiation(point, Math.exp(lnT), columns[G_RHO]!, columns[G_S]!, columns[LOG_SLOPE]!)
  }
  radiationAt(Math.log(start))
  const initial = [Math.log(point.energy), Math.log(point.entropy)]
  return denseOde(
    {
      dimension: 2,
      evaluate(lnT, y, slope, jacobian) {
        radiationAt(lnT)
        const field = Math.exp(y[F]! - y[S]!) * point.entropy
        const hubble = hubbleOf(point.energy + field)
        const heating = (width * field) / (hubble * point.temperature * point.entropy)
        // Heating by more than the expansion cools would make T rise again: no function of T any more.
        const perLnT = heating < 3 ? -point.stretch / (1 - heating / 3) : NaN
        const fraction = field / (point.energy + field)
        slope[F] = -(width / hubble) * perLnT
        slope[S] = heating * perLnT
        // The field and its heating depend on F − S only, so the two columns of the Jacobian are opposite.
        const heatingSlope = heating * (1 - fraction / 2)
        const perLnTSlope = (perLnT * heatingSlope) / (3 - heating)
        jacobian[0] = -(width / hubble) * (perLnTSlope - (perLnT * fraction) / 2)
        jacobian[1] = -jacobian[0]!
        jacobian[2] = (3 * perLnT * heatingSlope) / (3 - heating)
        jacobian[3] = -jacobian[2]!
      },
    },
    Math.log(start),
    initial,
    { low: Math.log(coldest), high: Math.min(Math.log(start) + BACK, Math.log(HOTTEST_GEV)) },
    [...radiation.breaks, ...radiation.kinks].map(Math.log),
    TOLERANCE,
  )
}

/**
 * The same, with a failure in words. Where the bath steps to far fewer states while the field decays, the cold side would be
 * heated above the step again: T would stand still there, which a bath of steps cannot express.
 */
function solvedEra(radiation: Radiation, width: number, start: number, coldest: number): DenseSolution {
  try {
    return solveEra(radiation, width, start, coldest)
  } catch (error) {
    if (!(error instanceof OdeFailure)) throw error
    const place = `${Math.exp(error.t).toPrecision(4)} GeV`
    throw new ConvergenceError(
      `the era of matter cannot be followed through ${place}, where this bath steps while the field heats it; a smooth bath can`,
    )
  }
}

function eraFromStart(input: EarlyMatterInput, radiation: Radiation, start: number): MatterEra {
  const { reheatTemperatureGeV, branching, fieldMassGeV } = input
  const width = widthOf(reheatTemperatureGeV, radiation)
  const coldest = Math.min(reheatTemperatureGeV, start) / AFTER_DECAY
  const solution = solvedEra(radiation, width, start, coldest)
  const lnColdest = Math.log(coldest)
  const late = solution.at(solution.low, S)
  const perField = branching > 0 ? (branching * width) / fieldMassGeV! : 0

  const complete = (lnT: number, out: ExpansionPoint): void => {
    if (lnT < lnColdest) return
    const within = Math.min(lnT, solution.high)
    const entropy = solution.at(within, S)
    const field = Math.exp(solution.at(within, F) - entropy) * out.entropy
    out.otherEnergy = field
    out.energy += field
    out.hubble = hubbleOf(out.energy)
    out.lnDilution = late - entropy
    out.stretch /= 1 - (width * field) / (out.hubble * out.temperature * out.entropy) / 3
    out.candidatesPerTime = perField * field
  }
  const point = emptyExpansion()
  return {
    ...RADIATION,
    widthGeV: width,
    startTemperatureGeV: start,
    dilution: Math.exp(late - solution.at(solution.high, S)),
    // The field starts at a finite time: a break of the table there costs nothing and keeps its edges honest.
    breaks: [coldest, start],
    ageStartsAt: Math.min(HOTTEST_GEV, Math.max(USUAL_AGE_START_GEV, start * 1e4)),
    producesUntil: branching > 0 ? coldest : null,
    radiationOnly: (temperatureGeV) => temperatureGeV < coldest,
    matterFraction(lnT) {
      const columns = new Float64Array(COLUMNS)
      radiation.read(lnT, columns)
      setRadiation(point, Math.exp(lnT), columns[G_RHO]!, columns[G_S]!, columns[LOG_SLOPE]!)
      complete(lnT, point)
      return point.otherEnergy / point.energy
    },
    complete,
  }
}

/** The start temperature that gives the wanted dilution; the dilution grows with it. @throws InputError out of reach */
function startForDilution(input: EarlyMatterInput, radiation: Radiation, dilution: number): number {
  const dilutionFrom = (lnStart: number): number => eraFromStart(input, radiation, Math.exp(lnStart)).dilution
  const refuse = (bound: string): never => {
    throw new InputError([
      {
        path: 'history.expansion.dilution',
        value: dilution,
        message: `allowed: ${bound} for this reheating temperature`,
      },
    ])
  }
  const excess = (lnStart: number): number => Math.log(dilutionFrom(lnStart) / dilution)
  // D ≈ T_start/T_RH up to a factor of order one, for matter that dominates; it starts no later than at T_RH.
  const guess = Math.log(input.reheatTemperatureGeV * dilution)
  const low = Math.max(Math.log(input.reheatTemperatureGeV), guess - 4)
  const high = Math.min(guess + 4, Math.log(HOTTEST_GEV) - 1)
  if (high <= low || excess(high) < 0)
    refuse(`at most ${dilutionFrom(Math.log(HOTTEST_GEV) - 1).toPrecision(3)}`)
  if (excess(low) > 0) refuse(`at least ${dilutionFrom(low).toPrecision(4)}`)
  return Math.exp(brent(excess, low, high, 1e-11))
}

export function earlyMatter(input: EarlyMatterInput, radiation: Radiation): MatterEra {
  const start = input.startTemperatureGeV ?? startForDilution(input, radiation, input.dilution!)
  return eraFromStart(input, radiation, start)
}
