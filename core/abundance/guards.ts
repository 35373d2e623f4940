/**
 * Physics warnings. Each names the number it rests on, the limit and the source of the limit. A guard warns; it never refuses.
 */
import type { Guard } from '../wire/compute.ts'
import type { HistoryInput } from '../wire/history.ts'

/** What a guard is about, whether raised or not. */
export interface GuardTitle {
  code: string
  title: string
}

const COMMON_PRACTICE = 'common practice, no source'

const TITLES = {
  unitarity: 'Partial-wave unitarity at freeze-out',
  'not-cold': 'Freeze-out while relativistic',
  'never-in-equilibrium': 'Equilibrium at the start',
  'hot-start-too-cold': 'Maximum temperature against freeze-out',
  'late-annihilation': 'Freeze-out after nucleosynthesis began',
  'not-freeze-in': 'Yield against equilibrium',
  'production-cut-off': 'Maximum temperature against the production peak',
  'late-decay': 'Lifetime against nucleosynthesis',
  'structure-formation': 'Mass against structure formation',
  'fluid-too-late': 'End of the fluid against nucleosynthesis',
  'entropy-too-late': 'Entropy release against nucleosynthesis',
  'massless-today': 'Massless species still coupled today',
} as const

export type GuardCode = keyof typeof TITLES

const HISTORY_GUARDS: readonly GuardCode[] = ['fluid-too-late', 'entropy-too-late', 'massless-today']
const BY_MECHANISM: Record<'freeze-out' | 'freeze-in-decay', readonly GuardCode[]> = {
  'freeze-out': ['unitarity', 'not-cold', 'never-in-equilibrium', 'hot-start-too-cold', 'late-annihilation'],
  'freeze-in-decay': ['not-freeze-in', 'production-cut-off', 'late-decay', 'structure-formation'],
}

/** Every guard that is looked at for a mechanism, raised or not. */
export function guardsLookedAt(mechanism: 'freeze-out' | 'freeze-in-decay'): GuardTitle[] {
  return [...BY_MECHANISM[mechanism], ...HISTORY_GUARDS].map((code) => ({ code, title: TITLES[code] }))
}

const raise = (
  code: GuardCode,
  message: string,
  value: number,
  limit: number,
  unit: string,
  source: string,
): Guard => ({
  code,
  message,
  value,
  limit,
  unit,
  source,
})

/** Temperature, GeV, above which whatever disturbs the expansion must be over for nucleosynthesis to be left alone. */
const NUCLEOSYNTHESIS_GEV = 4e-3

/** Guards on the history alone. */
export function historyGuards(history: HistoryInput): Guard[] {
  const guards: Guard[] = []
  const { expansion, extraSpecies } = history
  if (expansion.kind === 'fluid') {
    const limit = 1e-3 * 15.4 ** (1 / expansion.index)
    const found = expansion.equalityTemperatureGeV
    if (found < limit) {
      const message = 'The fluid still drives the expansion when the light elements form.'
      guards.push(
        raise(
          'fluid-too-late',
          message,
          found,
          limit,
          'GeV',
          "D'Eramo, Fernandez, Profumo, JCAP 05 (2017) 012",
        ),
      )
    }
  }
  if (
    expansion.kind === 'entropy-step' &&
    expansion.factor > 1 &&
    expansion.temperatureGeV < NUCLEOSYNTHESIS_GEV
  ) {
    const message =
      'Entropy is released after neutrinos and light elements have begun to form their abundances.'
    const source =
      'Hannestad, Phys. Rev. D 70 (2004) 043506; de Salas et al., Phys. Rev. D 92 (2015) 123534, from memory'
    guards.push(
      raise('entropy-too-late', message, expansion.temperatureGeV, NUCLEOSYNTHESIS_GEV, 'GeV', source),
    )
  }
  for (const species of extraSpecies) {
    if (species.massGeV > 0 || species.coupling.kind !== 'bath') continue
    const message = `${species.name} is massless and shares the bath's temperature to this day: today's entropy leaves it out.`
    guards.push(raise('massless-today', message, species.degreesOfFreedom, 0, '', COMMON_PRACTICE))
  }
  return guards
}

/** Numbers that the guards of freeze-out rest on. */
export interface FreezeOutFacts {
  massGeV: number
  /** x_f, and ⟨σv⟩ there in GeV⁻²; null when the particle never was in equilibrium. */
  freezeOut: { x: number; crossSectionGeVMinus2: number } | null
  /** Whether the annihilation is p-wave at freeze-out, for the partial wave that unitarity caps. */
  highestWave: 0 | 1
  startsFromEquilibrium: boolean
  rateAtStart: number
  startX: number
  boundedByMaximumTemperature: boolean
}

/** Guards of freeze-out. */
export function freezeOutGuards(facts: FreezeOutFacts): Guard[] {
  const guards: Guard[] = []
  const { massGeV, freezeOut } = facts
  if (freezeOut) {
    // ⟨1/v⟩ = √(x/π) for two Maxwell–Boltzmann particles of equal mass.
    const limit =
      ((4 * Math.PI * (2 * facts.highestWave + 1)) / massGeV ** 2) * Math.sqrt(freezeOut.x / Math.PI)
    if (freezeOut.crossSectionGeVMinus2 > limit) {
      const message =
        'The annihilation cross-section at freeze-out is above what unitarity allows one partial wave.'
      const source = 'Griest & Kamionkowski, Phys. Rev. Lett. 64 (1990) 615'
      guards.push(raise('unitarity', message, freezeOut.crossSectionGeVMinus2, limit, 'GeV⁻²', source))
    }
    if (freezeOut.x < 3) {
      const message = 'It freezes out while still relativistic: the abundance is not that of a cold relic.'
      guards.push(
        raise('not-cold', message, freezeOut.x, 3, '', 'Kolb & Turner, The Early Universe (1990), §5.2'),
      )
    }
    const temperature = massGeV / freezeOut.x
    if (temperature < 1e-3) {
      const message =
        'It freezes out after nucleosynthesis began: its annihilation can change the light elements.'
      guards.push(raise('late-annihilation', message, temperature, 1e-3, 'GeV', COMMON_PRACTICE))
    }
  }
  if (facts.startsFromEquilibrium && facts.rateAtStart < 1) {
    const message =
      'At the start annihilation is slower than the expansion: nothing would have brought it into equilibrium.'
    guards.push(raise('never-in-equilibrium', message, facts.rateAtStart, 1, 'Γ/H', COMMON_PRACTICE))
  }
  if (facts.boundedByMaximumTemperature && facts.startX > 10) {
    const message =
      'The maximum temperature lies close to freeze-out: the abundance rests on what is assumed at the start.'
    guards.push(raise('hot-start-too-cold', message, facts.startX, 10, 'm/T_max', COMMON_PRACTICE))
  }
  return guards
}

/** Numbers that the guards of freeze-in by decay rest on. */
export interface DecayFacts {
  massGeV: number
  parentMassGeV: number
  lifetimeS: number
  yieldToday: number
  /** Y_eq of the candidate while relativistic, at the production peak. */
  equilibriumYield: number
  maximumTemperatureGeV: number | null
}

const KEV = 1e-6

/** Guards of freeze-in by decay. */
export function decayGuards(facts: DecayFacts): Guard[] {
  const guards: Guard[] = []
  const fraction = facts.yieldToday / facts.equilibriumYield
  if (fraction > 0.1) {
    const message = 'The yield comes near that of equilibrium: inverse decays, left out here, would lower it.'
    guards.push(
      raise('not-freeze-in', message, fraction, 0.1, 'Y/Y_eq', 'Hall et al., JHEP 03 (2010) 080, §2'),
    )
  }
  const { maximumTemperatureGeV } = facts
  if (maximumTemperatureGeV !== null && maximumTemperatureGeV < facts.parentMassGeV / 2) {
    const message =
      'The maximum temperature lies below the production peak at about half the parent’s mass: only the tail is made.'
    guards.push(
      raise(
        'production-cut-off',
        message,
        maximumTemperatureGeV,
        facts.parentMassGeV / 2,
        'GeV',
        COMMON_PRACTICE,
      ),
    )
  }
  if (facts.lifetimeS > 0.1) {
    const message = 'Parents decay after 0.1 s: their late decays can change the light elements.'
    guards.push(raise('late-decay', message, facts.lifetimeS, 0.1, 's', COMMON_PRACTICE))
  }
  if (facts.massGeV < 10 * KEV) {
    const message = 'A freeze-in candidate this light moves fast enough to smooth structure on small scales.'
    const source = 'D’Eramo & Lenoci, JCAP 10 (2021) 045, from memory'
    guards.push(raise('structure-formation', message, facts.massGeV / KEV, 10, 'keV', source))
  }
  return guards
}
