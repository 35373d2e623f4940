/**
 * An asymmetric candidate: Y₊ − Y₋ = η_X constant, the antiparticles annihilating with all particles.
 * Source: Graesser, Shoemaker, Vecchi, JHEP 10 (2011) 110.
 */
import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { AsymmetricInput } from '../../wire/candidate.ts'
import { AnnihilatingState } from '../annihilatingState.ts'
import { solveFreezeOut } from '../freezeOut.ts'
import { EFFORTS } from '../freezeOutEffort.ts'
import { freezeOutGuards } from '../guards/freezeOutGuards.ts'
import { historyGuards } from '../guards/historyGuards.ts'
import { annihilationRate } from '../rates/annihilationRate.ts'
import { relicDensity } from '../relicDensity.ts'
import { emptySamples } from '../yieldSamples.ts'
import { annihilatingSpecies, checkedFreezeOut, startX } from './freezeOut.ts'
import type { Mechanism } from './mechanism.ts'

/** The antiparticles as the equations see them: half of the internal states, and every particle a partner. */
function antiparticles(history: ThermalHistory, candidate: AsymmetricInput): AnnihilatingState {
  return new AnnihilatingState(history, {
    massGeV: candidate.massGeV,
    species: annihilatingSpecies(candidate).map((species) => ({
      ...species,
      degreesOfFreedom: species.degreesOfFreedom / 2,
    })),
    rate: annihilationRate(candidate),
    selfConjugate: true,
    asymmetry: candidate.asymmetry,
    // A field that decays without a preference makes as many antiparticles as particles.
    shareOfField: 0.5,
  })
}

const startOf = (history: ThermalHistory, candidate: AsymmetricInput) => ({
  x: startX(history, candidate),
  initialAbundance: 'equilibrium' as const,
})

export const asymmetric: Mechanism<AsymmetricInput> = {
  abundance(history, candidate) {
    const state = antiparticles(history, candidate)
    const start = startOf(history, candidate)
    const { value, error } = checkedFreezeOut(
      history,
      state,
      start,
      ({ yieldToday }) => candidate.asymmetry + 2 * yieldToday,
    )
    const yieldAntiparticle = value.yieldToday
    const yieldToday = candidate.asymmetry + 2 * yieldAntiparticle
    return {
      omegaH2: relicDensity(history, candidate.massGeV, yieldToday),
      yieldToday,
      numericalError: error,
      yieldParticle: candidate.asymmetry + yieldAntiparticle,
      yieldAntiparticle,
      guards: [...freezeOutGuards(history, candidate, state, start, value), ...historyGuards(history)],
    }
  },

  yields(history, candidate, lnX) {
    const samples = emptySamples(lnX)
    const state = antiparticles(history, candidate)
    solveFreezeOut(state, startOf(history, candidate), EFFORTS[1]!, samples)
    state.readAll()
    samples.lnYield.forEach((lnAntiparticles, i) => {
      state.moveTo(lnX[i]!)
      samples.lnYield[i] = Math.log(
        2 * Math.exp(lnAntiparticles) + candidate.asymmetry * Math.exp(state.lnDilution),
      )
    })
    return samples
  },

  scaleGeV: (_history, candidate) => candidate.massGeV,
  equilibrium: (candidate) => ({ of: 'candidate', species: annihilatingSpecies(candidate) }),
  rateOverHubble(history, candidate) {
    const state = antiparticles(history, candidate)
    return (temperature) => 2 * state.rateOverHubble(Math.log(candidate.massGeV / temperature))
  },
}
