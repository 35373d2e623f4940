/** How long an abundance takes in a history that is at hand: the first time for its cross-section, and again. */
import type { Bench } from 'tinybench'
import { abundance, buildHistory } from '#core/index'
import { emptyExpansion } from '#core/history/expansionPoint'
import { logEquilibriumYield } from '#core/abundance/equilibrium'
import { GEV_MINUS2_PER_CM3_S } from '#core/constants/natural'
import type { CandidateInput } from '#core/wire/index'
import * as inputs from './inputs.ts'
import { freezeOutTables, plainFreezeOut } from './plainFreezeOut.ts'
import type { FreezeOutTables } from './plainFreezeOut.ts'

/** Steps of the plain code: with these it is right to 1e-6. */
const PLAIN_STEPS = 12_000

/** Tables of the case that `S_WAVE` is, for the plain code: from where equilibrium is certain to x = 1e6. */
export function plainTables(steps = PLAIN_STEPS): FreezeOutTables {
  const history = buildHistory(inputs.FIT)
  const massGeV = 100
  const sigmaV = 2.2e-26 * GEV_MINUS2_PER_CM3_S
  const point = emptyExpansion()
  return freezeOutTables(Math.log(15), Math.log(1e6), steps, (lnX) => {
    history.at(Math.log(massGeV) - lnX, point)
    const species = [{ massGeV, degreesOfFreedom: 2, statistics: 'fermion' as const }]
    return {
      lambda: (point.entropy * sigmaV * point.stretch) / point.hubble,
      lnEquilibrium: logEquilibriumYield(species, massGeV, Math.exp(lnX), point.gS),
    }
  })
}

const AGAIN: Record<string, CandidateInput> = {
  'freeze-out, s-wave': inputs.S_WAVE,
  'freeze-out, p-wave': inputs.P_WAVE,
  'freeze-out, coannihilation': inputs.coannihilating(),
  'freeze-out, asymmetric': inputs.asymmetric(),
  'freeze-out, resonance Γ/M = 1e-5': inputs.resonant(1e-5),
  'freeze-out, Coulomb': inputs.enhanced({}),
  'freeze-out, cross-section': inputs.withCrossSection(),
  'freeze-in by decay': inputs.fromDecay(),
  'freeze-in by decay, inverse decays kept': inputs.fromDecay({ backReaction: true }),
  'freeze-in by decay, of a parent that freezes out': inputs.fromAnnihilatingParent(),
  'freeze-in by collisions, constant |M|²': inputs.CONSTANT_MATRIX_ELEMENT,
  'freeze-in by collisions, power law': inputs.fromPowerLaw(),
}

const FIRST: Record<string, () => CandidateInput> = {
  'freeze-out, resonance Γ/M = 1e-2': () => inputs.resonant(1e-2),
  'freeze-out, resonance Γ/M = 1e-5': () => inputs.resonant(1e-5),
  'freeze-out, resonance Γ/M = 1e-8': () => inputs.resonant(1e-8),
  'freeze-out, Coulomb': () => inputs.enhanced({}),
  'freeze-out, Hulthén': () => inputs.enhanced({ mediatorMassGeV: 1 }),
  'freeze-out, cross-section': inputs.withCrossSection,
  'freeze-in by collisions, power law': inputs.fromPowerLaw,
  'freeze-in by collisions, table': inputs.fromTable,
}

export function addAbundanceBenchmarks(bench: Bench): void {
  const history = buildHistory(inputs.FIT)
  const tables = plainTables()
  bench.add('plain freeze-out, 12,000 fixed steps', () => void plainFreezeOut(tables))
  for (const [name, candidate] of Object.entries(AGAIN))
    bench.add(name, () => void abundance(history, candidate))
  for (const [name, candidate] of Object.entries(FIRST))
    bench.add(`first: ${name}`, () => void abundance(history, candidate()))
  bench.add('first: freeze-out in a new era of matter', () => {
    abundance(buildHistory(inputs.history({ expansion: inputs.newEarlyMatter() })), inputs.S_WAVE)
  })
  const steps = buildHistory(inputs.STEPS)
  bench.add('freeze-out, s-wave, bath of steps', () => void abundance(steps, inputs.S_WAVE))
}
