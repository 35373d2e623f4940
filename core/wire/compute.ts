import { z } from 'zod'
import { candidateInput } from './candidate.ts'
import { historyInput } from './history.ts'
import { positive, temperatureGeV } from './numbers.ts'

/** Input of `abundance`: one history and one candidate. */
export const abundanceRequest = z
  .strictObject({ history: historyInput, candidate: candidateInput })
  .meta({ id: 'AbundanceRequest' })
export type AbundanceRequest = z.output<typeof abundanceRequest>

/** A physics warning with the number it rests on. It warns; it never refuses. */
export const guard = z
  .object({
    code: z.string(),
    message: z.string(),
    value: z.number().describe('The number found'),
    limit: z.number().describe('The number it is held against'),
    unit: z.string().describe('Unit of value and limit; empty when they are pure numbers'),
    source: z.string(),
  })
  .meta({ id: 'Guard' })
export type Guard = z.output<typeof guard>

/** The parent's own freeze-out, as if it were stable. */
const parentFreezeOut = z.object({
  yieldToday: z.number(),
  omegaH2IfStable: z.number(),
  freezeOutX: z.number().optional(),
  freezeOutTemperatureGeV: z.number().optional(),
  sigmaVAtFreezeOutCm3PerS: z.number().optional(),
  rateOverHubbleAtFreezeOut: z.number().optional(),
  rateEqualsHubbleTemperatureGeV: z.number().optional(),
  widthOverHubble: z.number().optional().describe('Γ/H at x_f'),
})

export const abundanceResult = z
  .object({
    omegaH2: z.number().describe('Ω_χ h²'),
    yieldToday: z.number().describe('Y = n/s today'),
    numericalError: z
      .number()
      .describe('Estimated relative error of omegaH2 from the numerical method alone'),
    freezeOutX: z.number().optional().describe('x_f, where Y = 2.5 Y_eq'),
    freezeOutTemperatureGeV: z.number().optional(),
    sigmaVAtFreezeOutCm3PerS: z.number().optional(),
    rateOverHubbleAtFreezeOut: z.number().optional().describe('n_eq⟨σv⟩/H at x_f'),
    rateEqualsHubbleTemperatureGeV: z
      .number()
      .optional()
      .describe('T where n_eq⟨σv⟩ = H, the last time, GeV'),
    yieldFreezeIn: z.number().optional().describe('From the parent in equilibrium, or from collisions'),
    yieldLateDecay: z.number().optional().describe('perDecay times the yield of the parent were it stable'),
    parentFreezeOut: parentFreezeOut.optional(),
    decayTimeS: z.number().optional().describe('Age when half of the parents have decayed, s'),
    yieldParticle: z.number().optional(),
    yieldAntiparticle: z.number().optional(),
    dilution: z.number().optional().describe('Growth of s a³ in an era of matter'),
    lifetimeS: z.number().optional(),
    widthGeV: z.number().optional(),
    productionTemperatureGeV: z.number().optional().describe('T where dY/dln T is largest, GeV'),
    guards: z.array(guard),
  })
  .meta({ id: 'AbundanceResult' })
export type AbundanceResult = z.output<typeof abundanceResult>

/** Rows that may be told apart into their contributions at once: each is a list of up to a hundred species. */
const MOST_WITH_CONTRIBUTIONS = 2000

/** Input of `history`: rows are answered in the order of the temperatures, or of the ages. */
export const historyRequest = z
  .strictObject({
    history: historyInput,
    temperaturesGeV: z
      .array(temperatureGeV)
      .min(1)
      .max(20_000)
      .optional()
      .describe('Temperatures of the rows, GeV; give these or ages'),
    timesS: z
      .array(positive.max(1e20))
      .min(1)
      .max(20_000)
      .optional()
      .describe('Ages of the rows, s; give these or temperatures'),
    contributions: z
      .boolean()
      .default(false)
      .describe(
        `Whether rows say what the bath is made of; at most ${MOST_WITH_CONTRIBUTIONS} rows at once then`,
      ),
  })
  .superRefine(({ temperaturesGeV, timesS, contributions }, context) => {
    if ((temperaturesGeV === undefined) === (timesS === undefined))
      context.addIssue({
        code: 'custom',
        path: [timesS === undefined ? 'temperaturesGeV' : 'timesS'],
        message: `${timesS === undefined ? 'missing; ' : ''}allowed: exactly one of temperaturesGeV and timesS`,
      })
    for (const [path, list] of Object.entries({ temperaturesGeV, timesS }))
      if (contributions && list !== undefined && list.length > MOST_WITH_CONTRIBUTIONS)
        context.addIssue({
          code: 'custom',
          path: [path],
          message: `allowed: at most ${MOST_WITH_CONTRIBUTIONS} in the list with contributions`,
        })
  })
  .meta({ id: 'HistoryRequest' })
export type HistoryRequest = z.output<typeof historyRequest>

const undefinedHere = z.number().nullable()

/** A part of the bath, or a species apart from it. */
const contribution = z
  .object({
    name: z.string(),
    temperatureGeV: z.number().describe('Its own temperature'),
    gRho: z.number(),
    gS: z.number().describe('Zero for a species apart, whose entropy is its own'),
    gP: undefinedHere.describe('p/(π²T⁴/90)'),
  })
  .meta({ id: 'Contribution' })

/** One row of a derived history; null where the treatment leaves the quantity undefined. */
export const historyRow = z
  .object({
    temperatureGeV: z.number(),
    gRho: z.number().describe('Effective number of all radiation in energy density, extra species included'),
    gS: z.number().describe('Effective number in entropy density'),
    gStarHalf: z.number().describe('g_*^(1/2) = (g_s/√g_ρ)(1 + δ_s)'),
    dLnGsDLnT: z.number(),
    energyDensityGeV4: z.number().describe('Of everything: fluid, matter and Λ included'),
    pressureGeV4: undefinedHere,
    entropyDensityGeV3: z.number(),
    hubbleGeV: z.number(),
    timeS: z.number(),
    scaleFactor: z.number().describe('a/a₀'),
    redshift: z.number().describe('z = a₀/a − 1'),
    equationOfState: undefinedHere.describe('w = p/ρ'),
    soundSpeedSquared: undefinedHere.describe('dp/dρ at fixed composition'),
    identityResidual: undefinedHere.describe(
      '(dρ/dT)/(T ds/dT) − 1 of the bath: what a fitted or tabulated bath misses of dρ = T ds',
    ),
    waveFrequencyHz: z.number().describe('Present-day frequency of a wave entering the horizon, Hz'),
    horizonMassSolar: z.number().describe('Mass inside the Hubble radius, solar masses'),
    matterDensityGeV4: z.number().optional(),
    darkEnergyDensityGeV4: z.number().optional(),
    contributions: z
      .array(contribution)
      .optional()
      .describe('What g_ρ and g_s are made of, in the photons’ temperature: they add up to the row’s'),
  })
  .meta({ id: 'HistoryRow' })
export type HistoryRow = z.output<typeof historyRow>

/** Radiation beside the photons after e± annihilation. */
export const effectiveNeutrinos = z
  .object({
    temperatureGeV: z.number().describe('Where the numbers are taken'),
    neutrinos: z.number().describe('N_eff of the neutrinos: ρ_ν/[(7/8)(4/11)^(4/3) ρ_γ]'),
    extraSpecies: z
      .array(
        z.object({
          name: z.string(),
          deltaNEff: undefinedHere.describe('null when not relativistic there'),
          because: z.string().optional().describe('Why there is no number'),
        }),
      )
      .describe('In the order of the input'),
    deltaNEff: z.number().describe('Of all extra species together, as far as they are relativistic'),
  })
  .meta({ id: 'EffectiveNeutrinos' })
export type EffectiveNeutrinos = z.output<typeof effectiveNeutrinos>

export const historyResult = z
  .object({
    rows: z.array(historyRow),
    entropyTodayPerCm3: z.number(),
    effectiveNeutrinos,
    numericalError: z
      .number()
      .describe('Estimated relative error of the ages; the other columns are exact to 1e-10'),
    pressureUndefinedBecause: z.string().optional(),
  })
  .meta({ id: 'HistoryResult' })
export type HistoryResult = z.output<typeof historyResult>
