/** Physics warnings: what each is about, and how one is raised. A guard warns; it never refuses. */
import type { Guard } from '../../wire/compute.ts'
import type { Mechanism } from '../../wire/candidate.ts'

/** What a guard is about, whether raised or not. */
export interface GuardTitle {
  code: GuardCode
  title: string
}

export const COMMON_PRACTICE = 'common practice, no source'

const TITLES = {
  unitarity: 'Partial-wave unitarity at freeze-out',
  'not-cold': 'Freeze-out while relativistic',
  'never-in-equilibrium': 'Equilibrium at the start',
  'start-near-freeze-out': 'Maximum temperature against freeze-out',
  'late-annihilation': 'Freeze-out after nucleosynthesis began',
  'kinetic-equilibrium': 'Kinetic equilibrium near a narrow resonance or bound state',
  'table-extrapolated': 'A table used outside its rows',
  'not-freeze-in': 'Yield against equilibrium',
  'production-cut-off': 'Maximum temperature against the production peak',
  'late-decay': 'Lifetime against nucleosynthesis',
  'decay-near-freeze-out': 'Decay of the parent against its freeze-out',
  'structure-formation': 'Mass against structure formation',
  'not-hot': 'Decoupling while relativistic',
  'fluid-too-late': 'End of the fluid against nucleosynthesis',
  'entropy-too-late': 'Entropy release against nucleosynthesis',
  'reheating-too-late': 'Reheating against nucleosynthesis',
  'production-above-expansion': 'Production rate against the expansion',
  'massless-today': 'Massless species still coupled today',
} as const

export type GuardCode = keyof typeof TITLES

const HISTORY: readonly GuardCode[] = [
  'fluid-too-late',
  'entropy-too-late',
  'reheating-too-late',
  'massless-today',
  'table-extrapolated',
]
const ANNIHILATION: readonly GuardCode[] = [
  'unitarity',
  'not-cold',
  'never-in-equilibrium',
  'start-near-freeze-out',
  'late-annihilation',
  'kinetic-equilibrium',
]
const FREEZE_IN: readonly GuardCode[] = [
  'not-freeze-in',
  'production-above-expansion',
  'production-cut-off',
  'structure-formation',
]

const BY_MECHANISM: Record<Mechanism, readonly GuardCode[]> = {
  'freeze-out': ANNIHILATION,
  'freeze-in-decay': [...FREEZE_IN, 'late-decay', 'decay-near-freeze-out'],
  'freeze-in-scattering': FREEZE_IN,
  'freeze-in-ultraviolet': FREEZE_IN,
  asymmetric: ANNIHILATION,
  'hot-relic': ['not-hot'],
}

/** Every guard that is looked at for a mechanism, raised or not. */
export function guardsLookedAt(mechanism: Mechanism): GuardTitle[] {
  return [...BY_MECHANISM[mechanism], ...HISTORY].map((code) => ({ code, title: TITLES[code] }))
}

/** A guard with the number it rests on and the limit that number is held against. */
export const raise = (
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
