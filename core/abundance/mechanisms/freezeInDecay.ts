/** Freeze-in by decay: of a parent in equilibrium, with or without inverse decays, or through the parent's own freeze-out. */
import { HBAR_GEV_S } from '../../constants/natural.ts'
import { emptyExpansion } from '../../history/expansionPoint.ts'
import { ages } from '../../history/time.ts'
import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { AnnihilationInput } from '../../wire/annihilation.ts'
import type { FreezeInDecayInput } from '../../wire/candidate.ts'
import type { AbundanceResult } from '../../wire/compute.ts'
import { InputError } from '../../wire/fault.ts'
import { AnnihilatingState } from '../annihilatingState.ts'
import { BACK_REACTION_TOLERANCES, solveWithBackReaction } from '../backReaction.ts'
import { checked } from '../checked.ts'
import { solveDecayingParent } from '../decayingParent.ts'
import type { DecayedParent } from '../decayingParent.ts'
import { FREEZE_IN_RULES, addField, fieldSource, solveFreezeIn } from '../freezeIn.ts'
import type { FreezeInSource } from '../freezeIn.ts'
import { decaySource } from '../freezeInSources.ts'
import type { Effort } from '../freezeOutEffort.ts'
import { DECAY_EFFORTS, LEFT_OF_DECAY_TOLERANCE, LEFT_OF_TOLERANCE } from '../freezeOutEffort.ts'
import { OF_THE_INVERSE, decayGuards } from '../guards/freezeInGuards.ts'
import { annihilationTableGuards } from '../guards/tableGuards.ts'
import { annihilationRate } from '../rates/annihilationRate.ts'
import { relicDensity } from '../relicDensity.ts'
import { emptySamples } from '../yieldSamples.ts'
import { checkedFreezeIn, freezeInResult } from './freezeInResult.ts'
import { checkedFreezeOut, factsAtFreezeOut, startX } from './freezeOut.ts'
import type { Mechanism } from './mechanism.ts'

/** Width of the parent, GeV: as given, or ħ/τ. */
export function widthOf(candidate: FreezeInDecayInput): number {
  const { widthGeV, lifetimeS } = candidate.parent
  return widthGeV ?? HBAR_GEV_S / lifetimeS!
}

function sourceOf(history: ThermalHistory, candidate: FreezeInDecayInput): FreezeInSource {
  const source = decaySource(history, candidate.parent, widthOf(candidate), candidate.perDecay)
  if (source.hottestGeV > source.scaleGeV / 40 && source.coldestGeV > history.temperatureToday) return source
  const maximum = history.input.maximumTemperatureGeV
  const path = maximum === null ? 'candidate.parent.massGeV' : 'history.maximumTemperatureGeV'
  const message =
    'allowed: a hottest temperature above a fortieth of the parent’s mass; below it no parents are left to decay'
  throw new InputError([{ path, value: maximum ?? source.scaleGeV, message }])
}

/** The annihilation of a parent that is followed through its freeze-out; undefined when it is kept in equilibrium. */
const followed = (candidate: FreezeInDecayInput): AnnihilationInput | undefined =>
  candidate.lateDecay ? candidate.parent.annihilation : undefined

function parentState(
  history: ThermalHistory,
  { parent }: FreezeInDecayInput,
  annihilation: AnnihilationInput,
): AnnihilatingState {
  const { massGeV, degreesOfFreedom, statistics, selfConjugate } = parent
  return new AnnihilatingState(history, {
    massGeV,
    species: [{ massGeV, degreesOfFreedom, statistics }],
    rate: annihilationRate({ massGeV, degreesOfFreedom, selfConjugate, annihilation }),
    selfConjugate,
    shareOfField: 0,
  })
}

/** What a decaying field makes beside the parent; null when none does. */
const besideParent = (history: ThermalHistory, source: FreezeInSource): FreezeInSource | null =>
  history.expansion.producesUntil === null ? null : fieldSource(source.scaleGeV, source.hottestGeV)

/** The parent through its freeze-out and decay. */
function decayed(candidate: FreezeInDecayInput, state: AnnihilatingState, effort: Effort): DecayedParent {
  const result = solveDecayingParent(state, widthOf(candidate), candidate.perDecay, effort)
  if (result) return result
  const field = candidate.parent.lifetimeS === undefined ? 'widthGeV' : 'lifetimeS'
  const message = 'allowed: a lifetime after which all parents have decayed by today'
  throw new InputError([{ path: `candidate.parent.${field}`, value: candidate.parent[field], message }])
}

/** The parent through its own freeze-out and decay, and the two limits beside it. */
function throughFreezeOut(
  history: ThermalHistory,
  candidate: FreezeInDecayInput,
  annihilation: AnnihilationInput,
  source: FreezeInSource,
): AbundanceResult {
  const state = parentState(history, candidate, annihilation)
  const width = widthOf(candidate)
  const result = checked(
    DECAY_EFFORTS.length,
    (i) => decayed(candidate, state, DECAY_EFFORTS[i]!),
    (found) => found.yieldToday,
    (i) => history.tableError + LEFT_OF_DECAY_TOLERANCE * DECAY_EFFORTS[i]!.tolerance,
  )
  const field = besideParent(history, source)
  const fromField = field === null ? { value: 0, error: 0 } : checkedFreezeIn(history, field)
  const stable = checkedFreezeOut(history, state, {
    x: startX(history, candidate.parent),
    initialAbundance: 'equilibrium',
  }).value
  const facts = stable.freezeOutX === null ? {} : factsAtFreezeOut(state, stable.freezeOutX)
  const point = emptyExpansion()
  if (stable.freezeOutX !== null) history.at(state.lnMass - Math.log(stable.freezeOutX), point)
  const widthOverHubble = stable.freezeOutX === null ? undefined : width / point.hubble
  const common = freezeInResult(history, candidate, source, {
    value: result.value.yieldToday + fromField.value,
    error: Math.max(result.error, fromField.error),
  })
  return {
    ...common,
    yieldFreezeIn: checkedFreezeIn(history, source).value,
    yieldLateDecay: candidate.perDecay * stable.yieldToday,
    parentFreezeOut: {
      ...facts,
      yieldToday: stable.yieldToday,
      omegaH2IfStable: relicDensity(history, candidate.parent.massGeV, stable.yieldToday),
      ...(widthOverHubble === undefined ? {} : { widthOverHubble }),
    },
    decayTimeS: ages(history, [Math.exp(result.value.lnHalfTemperature)])[0]!,
    guards: [
      ...common.guards,
      ...decayGuards({ lifetimeS: HBAR_GEV_S / width, widthOverHubble }),
      ...(stable.freezeOutX === null
        ? []
        : annihilationTableGuards({ massGeV: candidate.parent.massGeV, annihilation }, stable.freezeOutX)),
    ],
  }
}

/** The parent in equilibrium throughout. */
function fromEquilibrium(
  history: ThermalHistory,
  candidate: FreezeInDecayInput,
  source: FreezeInSource,
): AbundanceResult {
  const width = widthOf(candidate)
  const result = candidate.backReaction
    ? checked(
        BACK_REACTION_TOLERANCES.length,
        (i) =>
          solveWithBackReaction(history, source, candidate, candidate.perDecay, BACK_REACTION_TOLERANCES[i]!),
        (found) => found,
        (i) => history.tableError + LEFT_OF_TOLERANCE * BACK_REACTION_TOLERANCES[i]!,
      )
    : checkedFreezeIn(history, source)
  const common = freezeInResult(history, candidate, source, result)
  return {
    ...common,
    yieldFreezeIn: result.value,
    guards: [
      // With inverse decays kept, coming near equilibrium is no fault of the result.
      ...common.guards.filter((guard) => !(candidate.backReaction && OF_THE_INVERSE.includes(guard.code))),
      ...decayGuards({ lifetimeS: HBAR_GEV_S / width, widthOverHubble: undefined }),
    ],
  }
}

export const freezeInDecay: Mechanism<FreezeInDecayInput> = {
  abundance(history, candidate) {
    const source = sourceOf(history, candidate)
    const annihilation = followed(candidate)
    const result = annihilation
      ? throughFreezeOut(history, candidate, annihilation, source)
      : fromEquilibrium(history, candidate, source)
    const width = widthOf(candidate)
    return { ...result, lifetimeS: HBAR_GEV_S / width, widthGeV: width }
  },

  yields(history, candidate, lnX) {
    const samples = emptySamples(lnX)
    const source = sourceOf(history, candidate)
    const annihilation = followed(candidate)
    if (annihilation) {
      solveDecayingParent(
        parentState(history, candidate, annihilation),
        widthOf(candidate),
        candidate.perDecay,
        DECAY_EFFORTS[0]!,
        samples,
      )
      const field = besideParent(history, source)
      if (field !== null) addField(history, field, samples)
    } else if (candidate.backReaction)
      solveWithBackReaction(
        history,
        source,
        candidate,
        candidate.perDecay,
        BACK_REACTION_TOLERANCES[1]!,
        samples,
      )
    else solveFreezeIn(history, source, FREEZE_IN_RULES[1]!, samples)
    return samples
  },

  scaleGeV: (_history, candidate) => candidate.parent.massGeV,
  equilibrium: (candidate) => ({ of: 'parent', species: [candidate.parent] }),
  rateOverHubble(history, candidate) {
    const point = emptyExpansion()
    const width = widthOf(candidate)
    return (temperature) => {
      history.at(Math.log(temperature), point)
      return width / point.hubble
    }
  },
}
