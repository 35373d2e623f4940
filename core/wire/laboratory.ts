import { z } from 'zod'
import { annihilationInput } from './annihilation.ts'
import { historyInput } from './history.ts'
import { MEASURED, measuredDensity, measuredNumber } from './measured.ts'
import { degreesOfFreedom, massGeV, positive, quantumStatistics } from './numbers.ts'
import { comparison, sampledAbundance, sampling } from './propagation.ts'

const DAY = 86_400
const JULIAN_YEAR = 365.25 * DAY

const PRACTICE = 'common practice, no source'

/** Where, or when, the decay of a parent can be seen. */
export const reachBand = z
  .strictObject({
    name: z.string().trim().min(1).max(80).describe('What it is called'),
    quantity: z
      .enum(['meanFlightM', 'lifetimeS'])
      .describe('What decides: the mean flight βγcτ in metres, or the lifetime at rest in seconds'),
    from: positive.nullable().describe('Lower end; null for none'),
    to: positive.nullable().describe('Upper end; null for none'),
    source: z.string().max(300).default('given').describe('Where the ends come from'),
  })
  .refine(({ from, to }) => from === null || to === null || from < to, {
    path: ['to'],
    message: 'allowed: above from',
  })
  .meta({ id: 'ReachBand' })
export type ReachBand = z.output<typeof reachBand>

/** Bands most would agree on, until a group writes its own. */
export const USUAL_REACH_BANDS: readonly ReachBand[] = [
  { name: 'prompt', quantity: 'meanFlightM', from: null, to: 1e-4, source: PRACTICE },
  { name: 'displaced', quantity: 'meanFlightM', from: 1e-4, to: 1, source: PRACTICE },
  { name: 'inside the detector', quantity: 'meanFlightM', from: 1, to: 10, source: PRACTICE },
  { name: 'leaves the detector', quantity: 'meanFlightM', from: 10, to: null, source: PRACTICE },
  {
    name: 'stopped, decaying later',
    quantity: 'lifetimeS',
    from: 1e-7,
    to: 10 * JULIAN_YEAR,
    source: PRACTICE,
  },
]

const parent = z.strictObject({
  degreesOfFreedom,
  statistics: z.enum(['fermion', 'boson', 'maxwell-boltzmann']).describe('Statistics of the parent'),
  selfConjugate: z.boolean().default(true).describe('Whether the parent is its own antiparticle'),
  annihilation: annihilationInput
    .optional()
    .describe('With it the parent has a freeze-out of its own; without, it stays in equilibrium'),
})

const line = z
  .strictObject({
    fromGeV: massGeV.describe('Lowest mass of the candidate, GeV'),
    toGeV: massGeV.describe('Highest mass of the candidate, GeV'),
    points: z.number().int().min(2).max(200).default(30).describe('Masses, evenly in the logarithm'),
  })
  .refine(({ fromGeV, toGeV }) => fromGeV < toGeV, { path: ['toGeV'], message: 'allowed: above fromGeV' })

/** Input of `laboratory`: whether what was measured of a parent's decay makes the dark matter. */
export const laboratoryRequest = z
  .strictObject({
    history: historyInput,
    measured: z
      .strictObject({
        parentMassGeV: measuredNumber.describe('Mass of the parent, GeV'),
        lifetimeS: measuredNumber.describe('Lifetime of the parent, s'),
        massGeV: measuredNumber.describe('Mass of the candidate, GeV'),
      })
      .describe('What was measured, with errors'),
    parent,
    perDecay: positive.max(100).default(1).describe('Particles of the candidate per decay'),
    candidate: z
      .strictObject({
        degreesOfFreedom: degreesOfFreedom.default(2),
        statistics: quantumStatistics.default('fermion'),
        backReaction: z.boolean().default(false).describe('Whether inverse decays are kept'),
        lateDecay: z
          .boolean()
          .default(true)
          .describe('Whether an annihilating parent is followed through its freeze-out and decay'),
      })
      .prefault({})
      .describe('The candidate apart from its mass: decides when it is near equilibrium'),
    betaGamma: positive.max(1e6).default(1).describe('βγ of the parent in the laboratory'),
    measuredDensity: measuredDensity.default(MEASURED).describe('The density to compare with'),
    reachBands: z
      .array(reachBand)
      .max(30)
      .default([...USUAL_REACH_BANDS])
      .describe('Where a decay is seen; the usual ones are common practice without a source'),
    line: line.optional().describe('Masses at which the lifetime for the measured density is wanted'),
    ...sampling,
  })
  .meta({ id: 'LaboratoryRequest' })
export type LaboratoryRequest = z.output<typeof laboratoryRequest>

/** A reach band and what a parent does there. */
const reach = reachBand
  .extend({
    holdsMean: z.boolean().describe('Whether the mean flight, or the lifetime, lies in the band'),
    decayShare: z.number().describe('Share of the parents that decay in the band'),
  })
  .meta({ id: 'Reach' })
export type Reach = z.output<typeof reach>

/** Lifetimes that give the measured density at one mass of the candidate. */
const lifetimeForDensity = z
  .object({
    massGeV: z.number().describe('Mass of the candidate, GeV'),
    lifetimes: z
      .array(
        z.object({
          lifetimeS: z.number().describe('Lifetime that gives the measured density, s'),
          lowS: z.number().nullable().describe('One standard deviation below'),
          highS: z
            .number()
            .nullable()
            .describe(
              'One standard deviation above: errors of density and parent’s mass, in ln and in quadrature; null where such a solution comes or goes within them',
            ),
          meanFlightM: z.number().describe('Mean flight βγcτ, m'),
          bands: z.array(z.string()).describe('Reach bands that hold the mean'),
        }),
      )
      .describe(
        'All that were found; more than one, or none, when the abundance is not inverse to the lifetime',
      ),
    closest: z
      .object({ lifetimeS: z.number(), omegaH2: z.number() })
      .nullable()
      .describe('Where the abundance came nearest when there is none'),
  })
  .meta({ id: 'LifetimeForDensity' })
export type LifetimeForDensity = z.output<typeof lifetimeForDensity>

export const laboratoryResult = z
  .object({
    flight: z
      .object({
        decayLengthM: measuredNumber.describe('cτ, m'),
        betaGamma: z.number().describe('βγ'),
        meanFlightM: measuredNumber.describe('βγcτ, m'),
        bands: z.array(reach).describe('Reach bands and the share of decays in each'),
      })
      .describe('How far the parent flies'),
    central: z
      .object({ omegaH2: z.number(), numericalError: z.number() })
      .describe('The abundance for the best values of what was measured'),
    ...sampledAbundance,
    rankCorrelations: z
      .array(z.object({ path: z.string(), value: z.number().nullable() }))
      .describe(
        'Spearman’s rank correlation of each measured number with the abundance; null for an exact one',
      ),
    comparison: comparison.describe('The predicted distribution beside the measured density'),
    needed: lifetimeForDensity.describe(
      'The lifetime that would give the measured density at the measured masses',
    ),
    line: z.array(lifetimeForDensity).optional().describe('The lifetime–mass line, when asked for'),
    samples: z
      .object({
        omegaH2: z.array(z.number().nullable()),
        inputs: z.array(z.object({ path: z.string(), values: z.array(z.number()) })),
      })
      .optional()
      .describe('The samples, when asked for'),
  })
  .meta({ id: 'LaboratoryResult' })
export type LaboratoryResult = z.output<typeof laboratoryResult>
