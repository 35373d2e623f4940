/**
 * What drives an annihilating particle at x = m/T:
 *
 *   dZ/d ln x = −k (Z² − Z_eq²) + P,   k = (s⟨σv⟩/H)(−d ln a/d ln T) e^{lnDilution},
 *
 * where Z = n a³/(s a³)_today, for n the sum of particle and antiparticle; one that is not its own antiparticle has half of
 * k. Z = Y = n/s wherever entropy is conserved from there on, and Z alone is continuous through an entropy release.
 * P is what a decaying matter field feeds in. With a particle–antiparticle asymmetry η the same holds for the antiparticles
 * alone, k Z² becoming k Z (Z + η) (Graesser, Shoemaker, Vecchi, JHEP 10 (2011) 110).
 * Source: Gondolo & Gelmini, Nucl. Phys. B 360 (1991) 145.
 */
import { emptyExpansion } from '../history/expansionPoint.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { logEquilibriumYield } from './equilibrium.ts'
import type { EquilibriumSpecies } from './equilibrium.ts'
import { breaksBetween, panelEdges } from './panels.ts'
import type { AnnihilationRate } from './rates/annihilationRate.ts'

/** Distance in ln T kept from the ends of a segment, so that a bath that steps there is read on the segment's side. */
const EDGE = 1e-13

/** Whatever annihilates, as the equations see it. */
export interface AnnihilatingParticle {
  /** The mass in x = m/T, GeV. */
  massGeV: number
  /** Species that share the annihilation and whose equilibria add up; one, unless there is coannihilation. */
  species: readonly EquilibriumSpecies[]
  rate: AnnihilationRate
  selfConjugate: boolean
  /** η = Z₊ − Z₋; Z is then Z₋ alone. */
  asymmetry?: number
  /** Share of the candidates made by a decaying field that are these particles; all unless given. */
  shareOfField?: number
}

/** The state at the x last asked for. */
export class AnnihilatingState {
  readonly history: ThermalHistory
  readonly particle: AnnihilatingParticle
  readonly lnMass: number
  /** k, ln Z_eq, ln(Y/Z) and P. */
  strength = 0
  lnEquilibrium = 0
  lnDilution = 0
  production = 0
  /** η. */
  readonly asymmetry: number
  private readonly share: number
  private readonly shareOfField: number
  private readonly rateBreaks: readonly number[]
  private readonly point = emptyExpansion()
  private hotEdge = Number.MAX_VALUE
  private coldEdge = -Number.MAX_VALUE

  constructor(history: ThermalHistory, particle: AnnihilatingParticle) {
    this.history = history
    this.particle = particle
    this.lnMass = Math.log(particle.massGeV)
    this.asymmetry = particle.asymmetry ?? 0
    this.share = particle.selfConjugate ? 1 : 0.5
    this.shareOfField = particle.shareOfField ?? 1
    this.rateBreaks = particle.rate.breaks.map((x) => this.lnMass - Math.log(x))
  }

  /** Whether nothing but the bath produces the particle from the present x on. */
  get productionOver(): boolean {
    return this.production === 0
  }

  /** From now on reads the history inside the segment from ln x = `from` to `to` only, as an integration over it must. */
  stayWithin(from: number, to: number): void {
    const hot = this.lnMass - from
    const cold = this.lnMass - to
    this.hotEdge = hot - EDGE * Math.max(1, Math.abs(hot))
    this.coldEdge = cold + EDGE * Math.max(1, Math.abs(cold))
  }

  /** Reads the whole history again. */
  readAll(): void {
    this.hotEdge = Number.MAX_VALUE
    this.coldEdge = -Number.MAX_VALUE
  }

  /** Values of ln x strictly between two, ascending, where an integrator restarts. */
  breaksBetween(from: number, to: number): number[] {
    return breaksBetween(this.history, this.lnMass - from, this.lnMass - to, this.rateBreaks).map(
      (lnT) => this.lnMass - lnT,
    )
  }

  /** Edges in ln x, ascending, of panels on which k is smooth. */
  panelEdges(from: number, to: number, widest: number): number[] {
    return panelEdges(this.history, this.lnMass - from, this.lnMass - to, widest, this.rateBreaks).map(
      (lnT) => this.lnMass - lnT,
    )
  }

  /** ln T at ln x, kept inside the segment. */
  clampedLnT(lnX: number): number {
    return Math.max(Math.min(this.lnMass - lnX, this.hotEdge), this.coldEdge)
  }

  /** Moves to ln x. */
  moveTo(lnX: number): void {
    const x = Math.exp(lnX)
    const { point, history, particle } = this
    history.at(this.clampedLnT(lnX), point)
    this.lnDilution = point.lnDilution
    const dilution = point.lnDilution === 0 ? 1 : Math.exp(point.lnDilution)
    const perHubble = point.stretch / point.hubble
    this.strength = point.entropy * perHubble * dilution * particle.rate.at(x) * this.share
    this.lnEquilibrium =
      logEquilibriumYield(particle.species, particle.massGeV, x, point.gS) - point.lnDilution
    this.production =
      point.candidatesPerTime === 0
        ? 0
        : (this.shareOfField * point.candidatesPerTime * perHubble) / (point.entropy * dilution)
  }

  /** n_eq⟨σv⟩/H at x, with the total n_eq and no factor one half; moves there. */
  rateOverHubble(lnX: number): number {
    this.moveTo(lnX)
    return (
      (Math.exp(this.lnEquilibrium + this.lnDilution) *
        this.point.entropy *
        this.particle.rate.at(Math.exp(lnX))) /
      this.point.hubble
    )
  }
}
