/**
 * What drives an annihilating particle at x = m/T: its equilibrium yield and the strength of annihilation,
 *
 *   dY/d ln x = −k (Y² − Y_eq²),   k = s⟨σv⟩(1 + δ_s)/H,
 *
 * for Y the sum of particle and antiparticle; one that is not its own antiparticle has half of k.
 * Source: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145.
 */
import { emptyExpansion } from '../history/thermalHistory.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import type { AnnihilationRate } from './rates/annihilationRate.ts'
import { logEquilibriumYield } from './equilibrium.ts'
import type { EquilibriumSpecies } from './equilibrium.ts'

/** Distance in ln T kept from the hot edge of a segment, so that a bath that steps there is read on the cold side. */
const EDGE = 1e-13

/** The state at the x last asked for. */
export class AnnihilatingState {
  readonly history: ThermalHistory
  readonly lnMass: number
  /** k, and ln Y_eq. */
  strength = 0
  lnEquilibrium = 0
  private readonly species: EquilibriumSpecies
  private readonly rate: AnnihilationRate
  private readonly share: number
  private readonly point = emptyExpansion()
  private hotEdge = Number.MAX_VALUE

  constructor(
    history: ThermalHistory,
    species: EquilibriumSpecies,
    rate: AnnihilationRate,
    selfConjugate: boolean,
  ) {
    this.history = history
    this.species = species
    this.rate = rate
    this.lnMass = Math.log(species.massGeV)
    this.share = selfConjugate ? 1 : 0.5
  }

  /** Reads the history from now on below ln T = `hot` only, on the cold side of a step there. */
  stayBelow(hot: number): void {
    this.hotEdge = hot - EDGE * Math.max(1, Math.abs(hot))
  }

  /** Reads the whole history again. */
  stayAnywhere(): void {
    this.hotEdge = Number.MAX_VALUE
  }

  /** Moves to ln x. */
  moveTo(lnX: number): void {
    const x = Math.exp(lnX)
    const { point, history } = this
    history.at(Math.min(this.lnMass - lnX, this.hotEdge), point)
    this.strength = ((point.entropy * (1 + point.delta)) / point.hubble) * this.rate(x) * this.share
    this.lnEquilibrium = logEquilibriumYield(this.species, x, point.gS)
  }

  /** ⟨σv⟩, GeV⁻². */
  crossSection(x: number): number {
    return this.rate(x)
  }

  /** n_eq⟨σv⟩/H at x, with the total n_eq and no factor one half; moves there. */
  rateOverHubble(lnX: number): number {
    this.moveTo(lnX)
    return (Math.exp(this.lnEquilibrium) * this.point.entropy * this.rate(Math.exp(lnX))) / this.point.hubble
  }
}
