/** What feeds freeze-in: decays, collisions, non-renormalisable interactions. */
import { decaySum } from '../bath/speciesTable.ts'
import { HOTTEST_GEV } from '../history/radiation.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { LeastRecentlyUsed } from '../numerics/leastRecentlyUsed.ts'
import { lazyPositive } from '../numerics/interpolation/lazyPositive.ts'
import type { FreezeInScatteringInput, FreezeInUltravioletInput } from '../wire/candidate.ts'
import type { EquilibriumSpecies } from './equilibrium.ts'
import type { FreezeInSource } from './freezeIn.ts'
import { logLogTable, zeroOutside } from './rates/logLogTable.ts'
import { constantMatrixElementRate, scaledScatteringRate } from './rates/scatteringRate.ts'

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

const REACTION_TOLERANCE = 1e-10

type TabulatedScattering = Extract<FreezeInScatteringInput['scattering'], { incoming: unknown }>

/** σ(√s) of an input, GeV⁻², and where its derivative jumps. */
function crossSectionOf(scattering: TabulatedScattering): {
  sigma: (rootS: number) => number
  knots: number[]
} {
  if (scattering.kind === 'table') {
    const table = logLogTable(scattering.points)
    return { sigma: (rootS) => zeroOutside(table, rootS), knots: scattering.points.map((point) => point[0]) }
  }
  const { crossSectionGeVMinus2, referenceEnergyGeV, exponent } = scattering
  return { sigma: (rootS) => crossSectionGeVMinus2 * (rootS / referenceEnergyGeV) ** exponent, knots: [] }
}

const memo = new LeastRecentlyUsed<(temperatureGeV: number) => number>(32)

/** γ e^{√s_min/T}, tabulated as it is asked for, once for each distinct input among the last few dozen. */
function scaledReactionDensity(
  scattering: TabulatedScattering,
  least: number,
): (temperatureGeV: number) => number {
  return memo.get(JSON.stringify([scattering, least]), () => {
    const { sigma, knots } = crossSectionOf(scattering)
    return lazyPositive(
      (temperature) => scaledScatteringRate(temperature, sigma, scattering.incoming, least, knots),
      REACTION_TOLERANCE,
    )
  })
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
  const { incoming } = scattering
  const least = Math.max(incoming[0].massGeV + incoming[1].massGeV, massGeV)
  const scaled = scaledReactionDensity(scattering, least)
  return {
    scaleGeV: least,
    reactionDensity: (temperature) => scaled(temperature) * Math.exp(-least / temperature),
    hottestGeV,
    coldestGeV: least / LATEST_X,
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
