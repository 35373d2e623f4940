import { GEV_MINUS2_PER_CM3_S } from '../../constants/natural.ts'
import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { AsymmetricInput, FreezeOutInput } from '../../wire/candidate.ts'
import type { Guard } from '../../wire/compute.ts'
import type { AnnihilatingState } from '../annihilatingState.ts'
import type { FreezeOut, FreezeOutStart } from '../freezeOut.ts'
import { COMMON_PRACTICE, raise } from './guard.ts'
import { USUAL_X, annihilationTableGuards } from './tableGuards.ts'

/** Candidates whose own annihilation decides. */
type Annihilating = FreezeOutInput | AsymmetricInput

/** Whether the p-wave dominates at x: then unitarity caps the next partial wave. */
function pWaveDominates({ annihilation }: Annihilating, x: number): boolean {
  return (
    annihilation.kind === 'partial-waves' && (6 * annihilation.pWaveCm3PerS) / x > annihilation.sWaveCm3PerS
  )
}

const UNITARITY_SOURCE = 'Griest & Kamionkowski, Phys. Rev. Lett. 64 (1990) 615'

/**
 * The guard on ⟨σv⟩ ≤ 4π(2J + 1)/m² ⟨1/v⟩ at x, with ⟨1/v⟩ = √(x/π) for two Maxwell–Boltzmann particles of equal mass.
 * @param rate ⟨σv⟩, GeV⁻²
 */
function unitarity(candidate: Annihilating, x: number, rate: number, message: string): Guard[] {
  const wave = pWaveDominates(candidate, x) ? 1 : 0
  const limit = ((4 * Math.PI * (2 * wave + 1)) / candidate.massGeV ** 2) * Math.sqrt(x / Math.PI)
  if (rate <= limit) return []
  const inCm3PerS = (value: number): number => value / GEV_MINUS2_PER_CM3_S
  return [raise('unitarity', message, inCm3PerS(rate), inCm3PerS(limit), 'cm³/s', UNITARITY_SOURCE)]
}

/** Unitarity at freeze-out and, where the enhancement goes on growing as the candidate slows down, later. */
function unitarityGuards(
  history: ThermalHistory,
  candidate: Annihilating,
  state: AnnihilatingState,
  x: number,
): Guard[] {
  const { rate } = state.particle
  const now = 'The annihilation cross-section at freeze-out is above what unitarity allows one partial wave.'
  const atFreezeOut = unitarity(candidate, x, rate.at(x), now)
  const { annihilation } = candidate
  const grows = annihilation.kind === 'sommerfeld' && annihilation.mediatorMassGeV !== undefined
  if (atFreezeOut.length > 0 || !grows) return atFreezeOut
  const later =
    'After freeze-out the enhanced cross-section grows above what unitarity allows one partial wave, which caps it there.'
  for (let late = 10 * x; late < candidate.massGeV / history.temperatureToday; late *= 10) {
    const found = unitarity(candidate, late, rate.at(late), later)
    if (found.length > 0) return found
  }
  return []
}

/** Guards on x_f. */
function freezeOutTemperatureGuards(candidate: Annihilating, x: number): Guard[] {
  const guards: Guard[] = []
  if (x < 3) {
    const message = 'It freezes out while still relativistic: the abundance is not that of a cold relic.'
    guards.push(raise('not-cold', message, x, 3, 'x_f', 'Kolb & Turner, The Early Universe (1990), §5.2'))
  }
  const temperature = candidate.massGeV / x
  if (temperature < 1e-3) {
    const message =
      'It freezes out after nucleosynthesis began: its annihilation can change the light elements.'
    guards.push(raise('late-annihilation', message, temperature, 1e-3, 'GeV', COMMON_PRACTICE))
  }
  return guards
}

/** Width over mass of a resonance below which elastic scattering may not keep up, when the pole is near threshold. */
const NARROW = 1e-3

function kineticEquilibrium({ annihilation, massGeV }: Annihilating): Guard[] {
  const source = 'Binder, Bringmann, Gustafsson, Hryczuk, Phys. Rev. D 96 (2017) 115010, from memory'
  if (annihilation.kind === 'resonance') {
    const ratio = annihilation.widthGeV / annihilation.massGeV
    const distance = Math.abs(annihilation.massGeV / (2 * massGeV) - 1)
    if (ratio > NARROW || distance > 0.3) return []
    const message =
      'A narrow resonance near threshold: elastic scattering may not keep the candidate at the bath’s temperature.'
    return [raise('kinetic-equilibrium', message, ratio, NARROW, 'Γ/M', source)]
  }
  if (annihilation.kind === 'sommerfeld' && annihilation.mediatorMassGeV !== undefined) {
    // Bound states at threshold of the Hulthén potential: 6αm/(π²m_φ) = n².
    const level = Math.sqrt(
      (6 * annihilation.couplingAlpha * massGeV) / (Math.PI ** 2 * annihilation.mediatorMassGeV),
    )
    const distance = Math.abs(level - Math.round(level))
    if (Math.round(level) < 1 || distance > 0.02) return []
    const message =
      'A bound state lies near threshold: kinetic equilibrium is doubtful, and unitarity caps the enhancement.'
    return [raise('kinetic-equilibrium', message, distance, 0.02, 'levels', source)]
  }
  return []
}

/** Guards on how the problem begins. */
function startGuards(history: ThermalHistory, start: FreezeOutStart, solution: FreezeOut): Guard[] {
  const guards: Guard[] = []
  if (start.initialAbundance === 'equilibrium' && solution.rateAtStart < 1) {
    const message =
      'At the start annihilation is slower than the expansion: nothing would have brought it into equilibrium.'
    guards.push(raise('never-in-equilibrium', message, solution.rateAtStart, 1, 'Γ/H', COMMON_PRACTICE))
  }
  if (history.input.maximumTemperatureGeV !== null && start.x > 10) {
    const message =
      'The maximum temperature lies close to freeze-out: the abundance rests on what is assumed at the start.'
    guards.push(raise('start-near-freeze-out', message, start.x, 10, 'm/T_max', COMMON_PRACTICE))
  }
  return guards
}

/** Guards of freeze-out, of a symmetric or an asymmetric candidate. */
export function freezeOutGuards(
  history: ThermalHistory,
  candidate: Annihilating,
  state: AnnihilatingState,
  start: FreezeOutStart,
  solution: FreezeOut,
): Guard[] {
  const x = solution.freezeOutX
  return [
    ...(x === null ? [] : unitarityGuards(history, candidate, state, x)),
    ...(x === null ? [] : freezeOutTemperatureGuards(candidate, x)),
    ...annihilationTableGuards(candidate, x ?? USUAL_X[candidate.mechanism]),
    ...startGuards(history, start, solution),
    ...kineticEquilibrium(candidate),
  ]
}
