/** What feeds freeze-in: decays, collisions, non-renormalisable interactions. */
import { decaySum } from '../bath/speciesTable.ts'
import { HOTTEST_GEV } from '../history/radiation.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { LeastRecentlyUsed } from '../numerics/leastRecentlyUsed.ts'
import type { FreezeInScatteringInput, FreezeInUltravioletInput } from '../wire/candidate.ts'
import type { EquilibriumSpecies } from './equilibrium.ts'
import type { FreezeInSource } from './freezeIn.ts'
import type { Collision } from './rates/collisionIntegral.ts'
import { piecesOfTable, singlePower } from './rates/powerLawPieces.ts'
import { collisionOf, constantMatrixElementRate, scatteringRate } from './rates/scatteringRate.ts'

/** x = m/T where decays begin when nothing bounds the temperature; what is missing is below 1e-14. */
const EARLIEST_X = 1e-5
/** x beyond which e^{−x} leaves nothing. */
const LATEST_X = 45

/** Where production begins: at the maximum temperature, where the bath begins to count, or as soon as a decaying field does. */
function hottest(history: ThermalHistory, unbounded: number): number {
  const maximum = history.input.maximumTemperatureGeV
  const beginning = history.expansion.producesUntil === null ? unbounded : HOTTEST_GEV
  return Math.min(maximum ?? Infinity, beginning, HOTTEST_GEV)
}

/**
 * Decay of a parent B in equilibrium, B → n_X X + …, width Γ:
 *   γ = n_X g_B m_B² T Γ/(2π²) · Σ_k (−η)^{k+1} K₁(k m_B/T)/k,
 * the first term alone for Maxwell–Boltzmann.
 * Source: Hall, Jedamzik, March-Russell, West, JHEP 03 (2010) 080, eq. 4.5; the sum: exact statistics of the parent.
 */
export function decaySource(
  history: ThermalHistory,
  parent: EquilibriumSpecies,
  widthGeV: number,
  perDecay: number,
): FreezeInSource {
  const { massGeV, degreesOfFreedom, statistics } = parent
  const factor = (perDecay * degreesOfFreedom * massGeV ** 2 * widthGeV) / (2 * Math.PI ** 2)
  return {
    scaleGeV: massGeV,
    reactionDensity: (temperature) => factor * temperature * decaySum(massGeV / temperature, statistics),
    hottestGeV: hottest(history, massGeV / EARLIEST_X),
    coldestGeV: massGeV / LATEST_X,
    breaks: [],
  }
}

/** Where collisions begin when nothing bounds the temperature, GeV: they keep a tail ∝ m/T. */
export const UNBOUNDED_SCATTERING_GEV = 9e15

/** Error of ln γ where it is tabulated. */
const REACTION_TOLERANCE = 1e-10

type TabulatedScattering = Extract<FreezeInScatteringInput['scattering'], { incoming: unknown }>

const memo = new LeastRecentlyUsed<(temperatureGeV: number) => number>(32)

/** γ, GeV⁴, tabulated as it is asked for, once for all inputs that differ in strength only. */
function reactionDensity(
  scattering: TabulatedScattering,
  collision: Collision,
): (temperatureGeV: number) => number {
  const [one, two] = scattering.incoming
  let strength = one.degreesOfFreedom * two.degreesOfFreedom
  if (scattering.kind === 'table') {
    const rate = memo.get(JSON.stringify([scattering.points, collision]), () =>
      scatteringRate(piecesOfTable(scattering.points), collision, REACTION_TOLERANCE),
    )
    return (temperature) => strength * rate(temperature)
  }
  const { crossSectionGeVMinus2, referenceEnergyGeV, exponent } = scattering
  // (√s/√s_min)^k, of which the strength at √s_min is a factor.
  const { least } = collision
  strength *= crossSectionGeVMinus2 * (least / referenceEnergyGeV) ** exponent
  const rate = memo.get(JSON.stringify([exponent, collision]), () =>
    scatteringRate(singlePower(exponent, least), collision, REACTION_TOLERANCE),
  )
  return (temperature) => strength * rate(temperature)
}

/** Collisions 1 + 2 → X + 3; see rates/scatteringRate.ts. */
export function scatteringSource(
  history: ThermalHistory,
  { massGeV, scattering }: FreezeInScatteringInput,
): FreezeInSource {
  const hottestGeV = hottest(history, UNBOUNDED_SCATTERING_GEV)
  if (scattering.kind === 'constant-matrix-element') {
    return {
      scaleGeV: massGeV,
      reactionDensity: (temperature) =>
        constantMatrixElementRate(temperature, massGeV, scattering.matrixElementSquared),
      hottestGeV,
      coldestGeV: massGeV / LATEST_X,
      breaks: [],
    }
  }
  const collision = collisionOf(scattering.incoming, massGeV)
  return {
    scaleGeV: collision.least,
    reactionDensity: reactionDensity(scattering, collision),
    hottestGeV,
    coldestGeV: collision.least / LATEST_X,
    breaks: [],
  }
}

/** Span of temperature below the hottest over which a production that falls as T^{2q−1} is followed. */
const ULTRAVIOLET_SPAN = 1e13

/**
 * Ultraviolet freeze-in, γ = C T^{2q+4}/Λ^{2q}: made at the maximum temperature, Y ∝ T_max^{2q−1}.
 * Source: Elahi, Kolda, Unwin, JHEP 03 (2015) 048.
 */
export function ultravioletSource(
  history: ThermalHistory,
  { ultraviolet }: FreezeInUltravioletInput,
): FreezeInSource {
  const { coefficient, scaleGeV, index } = ultraviolet
  const hottestGeV = history.input.maximumTemperatureGeV!
  return {
    scaleGeV: hottestGeV,
    reactionDensity: (temperature) =>
      coefficient * temperature ** 4 * (temperature / scaleGeV) ** (2 * index),
    hottestGeV,
    coldestGeV: Math.max(history.temperatureToday * 1.001, hottestGeV / ULTRAVIOLET_SPAN),
    breaks: [],
  }
}
