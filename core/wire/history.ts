import { z } from 'zod'
import { degreesOfFreedom, nonNegative, positive, quantumStatistics, temperatureGeV } from './numbers.ts'
import { bathRows } from './uploadedBath.ts'

const transitionTemperatureGeV = z
  .number()
  .min(0.05)
  .max(1)
  .default(0.1565)
  .describe('Temperature of the strong-interaction crossover T_c, GeV (HotQCD 2019: 0.1565)')

const transitionWidthGeV = z
  .number()
  .min(5e-4)
  .max(0.1)
  .default(0.02)
  .describe('Width ΔT of the entropy blend, GeV')

const hadronList = (byDefault: 'short' | 'long') =>
  z.enum(['short', 'long']).default(byDefault).describe('Which hadrons the gas below the transition holds')

/** How the Standard Model bath is counted. Each variant takes only the numbers it uses: an unused one is refused. */
export const bathInput = z
  .discriminatedUnion('treatment', [
    z.strictObject({ treatment: z.literal('thresholds'), transitionTemperatureGeV }),
    z.strictObject({
      treatment: z.literal('ideal-switch'),
      transitionTemperatureGeV,
      hadrons: hadronList('short'),
    }),
    z.strictObject({
      treatment: z.literal('crossover'),
      transitionTemperatureGeV,
      transitionWidthGeV,
      hadrons: hadronList('short'),
    }),
    z.strictObject({ treatment: z.literal('lattice-2014'), hadrons: hadronList('long') }),
    z.strictObject({ treatment: z.literal('lattice-2016') }),
    z.strictObject({
      treatment: z.literal('fit-2018'),
      band: z
        .number()
        .min(-1)
        .max(1)
        .default(0)
        .describe(
          'Place within the spread of the two published whole-bath determinations: 0 the fit, +1 the 2016 table',
        ),
    }),
    z.strictObject({ treatment: z.literal('uploaded'), points: bathRows }),
  ])
  .meta({ id: 'Bath' })

const decouplingTemperatureGeV = z
  .number()
  .min(1e-4)
  .max(0.05)
  .default(0.002)
  .describe('Temperature at which neutrinos decouple, GeV')

export const neutrinosInput = z
  .discriminatedUnion('treatment', [
    z.strictObject({ treatment: z.literal('instantaneous'), decouplingTemperatureGeV }),
    z.strictObject({
      treatment: z.literal('specified'),
      nEff: positive.max(20).default(3.044).describe('Effective number of neutrinos N_eff, neutrinos only'),
      decouplingTemperatureGeV,
      entropyScaling: z
        .enum(['heated', 'linear'])
        .default('heated')
        .describe("Today's entropy: heated neutrinos 2 + (21/11)(N_eff/3)^(3/4), or linear 2 + (7/11)N_eff"),
    }),
  ])
  .meta({ id: 'Neutrinos' })

export const couplingInput = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('bath') }),
  z.strictObject({ kind: z.literal('decoupled'), temperatureGeV }),
  z.strictObject({ kind: z.literal('ratio'), ratio: positive.max(10).describe('T_X/T, constant') }),
])

const startGiven = (era: {
  startTemperatureGeV?: number | undefined
  dilution?: number | undefined
}): boolean => (era.startTemperatureGeV === undefined) !== (era.dilution === undefined)

/** A decaying matter field that dominates for a while. */
const earlyMatterInput = z
  .strictObject({
    kind: z.literal('early-matter'),
    reheatTemperatureGeV: temperatureGeV.describe(
      'T_RH, GeV: the field’s width is H of pure radiation at this temperature',
    ),
    startTemperatureGeV: temperatureGeV
      .optional()
      .describe('Temperature at which field and radiation are equal, GeV; give this or the dilution'),
    dilution: z
      .number()
      .gt(1)
      .max(1e12)
      .optional()
      .describe('Factor D by which s a³ grows; give this or the start'),
    branching: nonNegative.max(1e6).default(0).describe('Particles of the candidate per decay of the field'),
    fieldMassGeV: positive.max(1e19).optional().describe('Mass of the field, GeV; needed with a branching'),
  })
  .refine(startGiven, {
    path: ['startTemperatureGeV'],
    message: 'allowed: exactly one of startTemperatureGeV and dilution',
  })
  .refine(
    (era) => era.startTemperatureGeV === undefined || era.startTemperatureGeV >= era.reheatTemperatureGeV,
    {
      path: ['startTemperatureGeV'],
      message:
        'allowed: at least the reheating temperature; a field that decays before it dominates makes no era of matter',
    },
  )
  .refine((era) => era.branching === 0 || era.fieldMassGeV !== undefined, {
    path: ['fieldMassGeV'],
    message: 'needed when the field makes candidates: their number is ρ_φ over this mass',
  })

/** A species beyond the Standard Model bath. */
export const extraSpeciesInput = z
  .strictObject({
    name: z.string().trim().min(1).max(80),
    degreesOfFreedom,
    statistics: quantumStatistics,
    massGeV: nonNegative.max(1e19).describe('Mass, GeV; zero for radiation'),
    coupling: couplingInput,
  })
  .refine(
    ({ massGeV, coupling }) => coupling.kind !== 'decoupled' || massGeV <= 500 * coupling.temperatureGeV,
    {
      path: ['coupling', 'temperatureGeV'],
      message:
        'allowed: at least a 500th of the mass; colder than that none of the species is left to decouple',
    },
  )
  .meta({ id: 'ExtraSpecies' })

export const expansionInput = z
  .discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('radiation') }),
    z.strictObject({
      kind: z.literal('fluid'),
      index: positive.max(8).describe('n in ρ ∝ a^-(4+n); 2 is kination'),
      equalityTemperatureGeV: temperatureGeV.describe(
        'Temperature at which fluid and radiation are equal, GeV',
      ),
    }),
    z.strictObject({
      kind: z.literal('entropy-step'),
      temperatureGeV: temperatureGeV.describe('Temperature of the sudden entropy release, GeV'),
      factor: z.number().min(1).max(1e12).describe('Factor D by which s a³ grows'),
    }),
    earlyMatterInput,
  ])
  .meta({ id: 'Expansion' })

export const todayInput = z
  .strictObject({
    temperatureK: z
      .number()
      .min(1)
      .max(10)
      .default(2.7255)
      .describe('Photon temperature today T₀, K (Fixsen 2009)'),
    hubbleParameter: z.number().min(0.2).max(2).default(0.674).describe('h (Planck 2018 VI)'),
    omegaMatterH2: positive.max(1).default(0.143).describe('Ω_m h² (Planck 2018 VI)'),
  })
  .refine((today) => today.omegaMatterH2 < today.hubbleParameter ** 2, {
    path: ['omegaMatterH2'],
    message: 'allowed: below h², for the universe is taken as flat with a positive cosmological constant',
  })
  .meta({ id: 'Today' })

/** What is wrong with a maximum temperature below the reheating that follows a matter era; null when nothing is. */
export function maximumTemperatureFault(history: {
  expansion: z.output<typeof expansionInput>
  maximumTemperatureGeV: number | null
}): string | null {
  const { expansion, maximumTemperatureGeV: maximum } = history
  if (expansion.kind !== 'early-matter' || maximum === null || maximum >= expansion.reheatTemperatureGeV)
    return null
  return `allowed: at least the reheating temperature of the matter era, ${expansion.reheatTemperatureGeV} GeV`
}

/** One set of thermal-history assumptions. Parsing fills the defaults in, so the parsed value is the whole record. */
export const historyInput = z
  .strictObject({
    bath: bathInput.prefault({ treatment: 'fit-2018' }),
    neutrinos: neutrinosInput.prefault({ treatment: 'specified' }),
    extraSpecies: z.array(extraSpeciesInput).max(20).default([]),
    expansion: expansionInput.prefault({ kind: 'radiation' }),
    maximumTemperatureGeV: temperatureGeV
      .nullable()
      .default(null)
      .describe('Highest temperature of the bath (instant reheating), GeV; null when not bounded'),
    today: todayInput.prefault({}),
  })
  .superRefine((history, context) => {
    const message = maximumTemperatureFault(history)
    if (message !== null) context.addIssue({ code: 'custom', path: ['maximumTemperatureGeV'], message })
  })
  .meta({ id: 'History' })

export type HistoryInput = z.output<typeof historyInput>
export type BathInput = HistoryInput['bath']
export type BathTreatment = BathInput['treatment']
export type NeutrinosInput = HistoryInput['neutrinos']
export type ExtraSpeciesInput = HistoryInput['extraSpecies'][number]
export type ExpansionInput = HistoryInput['expansion']
export type TodayInput = HistoryInput['today']

/** The groups of assumptions in a history, in the order they are shown: one card each on the Bench. */
export const ASSUMPTION_GROUPS = [
  'bath',
  'neutrinos',
  'extraSpecies',
  'expansion',
  'maximumTemperatureGeV',
  'today',
] as const satisfies readonly (keyof HistoryInput)[]
export type AssumptionGroup = (typeof ASSUMPTION_GROUPS)[number]
