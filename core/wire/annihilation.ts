import { z } from 'zod'
import { degreesOfFreedom, massGeV, nonNegative, positive, quantumStatistics } from './numbers.ts'

/** Largest ⟨σv⟩ taken, cm³/s: far above any unitarity limit, low enough that Γ/H stays a finite double. */
const crossSection = nonNegative.max(1e-3)

const positiveCrossSection = positive.max(1e-3)

/** Rows of a table: pairs of positive numbers, the first ascending. */
export const tablePoints = (rows: string) =>
  z
    .array(z.tuple([positive, positive]))
    .min(2)
    .max(100_000)
    .describe(rows)
    .superRefine((points, context) => {
      const at = points.findIndex((point, i) => i > 0 && !(point[0] > points[i - 1]![0]))
      if (at > 0)
        context.addIssue({
          code: 'custom',
          path: [at, 0],
          message: `allowed: above ${points[at - 1]![0]}, the row before; rows ascend`,
        })
    })

const partialWaves = z
  .strictObject({
    kind: z.literal('partial-waves'),
    sWaveCm3PerS: crossSection.describe('a in σv = a + b v², cm³/s'),
    pWaveCm3PerS: crossSection.default(0).describe('b in σv = a + b v², cm³/s'),
  })
  .refine((rate) => rate.sWaveCm3PerS + rate.pWaveCm3PerS > 0, {
    path: ['sWaveCm3PerS'],
    message: 'allowed: a positive s-wave or p-wave part; with both zero nothing annihilates',
  })

const powerLaw = z.strictObject({
  kind: z.literal('power-law'),
  coefficientCm3PerS: positiveCrossSection.describe('σ₀ in ⟨σv⟩ = σ₀ x^-n, cm³/s'),
  exponent: z.number().min(-0.75).max(10).describe('n in ⟨σv⟩ = σ₀ x^-n'),
})

const crossSectionTable = z.strictObject({
  kind: z.literal('cross-section'),
  points: tablePoints('[√s in GeV, σ in GeV^-2], log–log between the rows, zero outside'),
})

const resonance = z
  .strictObject({
    kind: z.literal('resonance'),
    massGeV: massGeV.describe('Mass of the resonance M_R, GeV'),
    widthGeV: positive.describe('Width Γ_R, GeV'),
    spin: z.number().min(0).max(4).multipleOf(0.5).describe('Spin J_R'),
    branchingProduct: positive.max(0.25).describe('B = B_i B_f, product of branchings on the peak'),
  })
  .refine((pole) => pole.widthGeV < pole.massGeV, {
    path: ['widthGeV'],
    message: 'allowed: below the mass of the resonance',
  })
  .refine((pole) => pole.widthGeV >= 1e-9 * pole.massGeV, {
    path: ['widthGeV'],
    message: 'allowed: at least 1e-9 of the mass; narrower ones are not resolved',
  })

const sommerfeld = z.strictObject({
  kind: z.literal('sommerfeld'),
  sWaveCm3PerS: positiveCrossSection.describe('a before enhancement, cm³/s'),
  couplingAlpha: positive.max(1).describe('Coupling α of the mediator'),
  mediatorMassGeV: massGeV.optional().describe('Mass of the mediator, GeV; massless (Coulomb) when left out'),
})

const coannihilation = z
  .strictObject({
    kind: z.literal('coannihilation'),
    weights: z
      .enum(['exact', 'nonrelativistic'])
      .default('exact')
      .describe('Equilibrium weights of the species'),
    others: z
      .array(z.strictObject({ massGeV, degreesOfFreedom, statistics: quantumStatistics }))
      .min(1)
      .max(30)
      .describe('The other species; index 0 is the candidate, these follow'),
    pairs: z
      .array(
        z.strictObject({
          first: z.number().int().min(0),
          second: z.number().int().min(0),
          sWaveCm3PerS: crossSection.default(0),
          pWaveCm3PerS: crossSection.default(0),
        }),
      )
      .min(1)
      .max(500)
      .describe(
        '⟨σv⟩ of each pair, averaged over particle and antiparticle; an off-diagonal pair is given once',
      ),
  })
  .superRefine(({ others, pairs }, context) => {
    const seen = new Set<string>()
    pairs.forEach(({ first, second }, i) => {
      for (const [name, index] of Object.entries({ first, second }))
        if (index > others.length)
          context.addIssue({
            code: 'custom',
            path: ['pairs', i, name],
            message: `allowed: 0 to ${others.length}`,
          })
      const key = [first, second].sort((a, b) => a - b).join('-')
      if (seen.has(key))
        context.addIssue({
          code: 'custom',
          path: ['pairs', i],
          message: 'this pair is given twice; an off-diagonal pair counts twice by itself',
        })
      seen.add(key)
    })
    if (pairs.every((pair) => pair.sWaveCm3PerS + pair.pWaveCm3PerS === 0))
      context.addIssue({
        code: 'custom',
        path: ['pairs'],
        message: 'allowed: at least one pair that annihilates',
      })
  })

const averaged = z.strictObject({
  kind: z.literal('table'),
  against: z.enum(['temperatureGeV', 'x']).describe('What the first column is: T in GeV, or x = m/T'),
  points: tablePoints('[T or x, ⟨σv⟩ in cm³/s], log–log between the rows, the end value held outside'),
})

/** Thermally averaged annihilation cross-section ⟨σv⟩. */
export const annihilationInput = z
  .discriminatedUnion('kind', [
    partialWaves,
    powerLaw,
    crossSectionTable,
    resonance,
    sommerfeld,
    coannihilation,
    averaged,
  ])
  .meta({ id: 'Annihilation' })

export type AnnihilationInput = z.output<typeof annihilationInput>
