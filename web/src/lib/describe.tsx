/** Inputs in words: one line for each group of assumptions, one for a candidate. */
import type { ReactNode } from 'react'
import type {
  AnnihilationInput,
  AssumptionGroup,
  BathRow,
  CandidateInput,
  HistoryInput,
  Mechanism,
} from '#core/wire/index'
import { Num } from '../components/ui/Num.tsx'
import { NEff, SigmaV } from '../components/ui/symbols.tsx'
import { temperatureText } from './temperature.ts'

export const ASSUMPTION_TITLES: Record<AssumptionGroup, string> = {
  bath: 'Bath',
  neutrinos: 'Neutrinos',
  extraSpecies: 'Extra species',
  expansion: 'Expansion',
  maximumTemperatureGeV: 'Maximum temperature',
  today: 'Today',
}

export const ASSUMPTION_ORDER = Object.keys(ASSUMPTION_TITLES) as AssumptionGroup[]

export const BATH_TITLES: Record<HistoryInput['bath']['treatment'], string> = {
  thresholds: 'textbook steps',
  'ideal-switch': 'ideal gases, sharp switch',
  crossover: 'smooth crossover',
  'lattice-2014': 'lattice pressure of 2014',
  'lattice-2016': 'lattice bath of 2016',
  'fit-2018': '2018 fit',
  uploaded: 'uploaded table',
}

export const MECHANISM_TITLES: Record<Mechanism, string> = {
  'freeze-out': 'freeze-out',
  'freeze-in-decay': 'freeze-in by decay',
  'freeze-in-scattering': 'freeze-in by scattering',
  'freeze-in-ultraviolet': 'ultraviolet freeze-in',
  asymmetric: 'asymmetric',
  'hot-relic': 'hot relic',
}

export const ANNIHILATION_TITLES: Record<AnnihilationInput['kind'], string> = {
  'partial-waves': 's- and p-wave',
  'power-law': 'power law in x',
  'cross-section': 'cross-section table σ(√s)',
  resonance: 'resonance',
  sommerfeld: 'Sommerfeld-enhanced s-wave',
  coannihilation: 'coannihilation',
  table: 'table of ⟨σv⟩',
}

const percent = (share: number): string => `${share > 0 ? '+' : '−'}${Math.abs(share * 100).toFixed(0)} %`

/** How many rows, from where to where, and of what. */
function uploadedWords(points: readonly BathRow[]): string {
  const [first, last] = [points[0], points.at(-1)]
  if (!first || !last) return 'no rows yet'
  const columns = first.gRho === undefined ? 'g_s' : first.gS === undefined ? 'g_ρ' : 'g_ρ and g_s'
  const range = `${temperatureText(first.temperatureGeV)} to ${temperatureText(last.temperatureGeV)}`
  return `${points.length} rows of ${columns}, ${range}`
}

function bathWords({ bath }: HistoryInput): ReactNode {
  const title = BATH_TITLES[bath.treatment]
  switch (bath.treatment) {
    case 'fit-2018':
      return bath.band === 0 ? `${title}, middle of its band` : `${title}, ${percent(bath.band)} of its band`
    case 'thresholds':
      return `${title}, QCD at ${temperatureText(bath.transitionTemperatureGeV)}`
    case 'ideal-switch':
      return `${title} at ${temperatureText(bath.transitionTemperatureGeV)}, ${bath.hadrons} hadron list`
    case 'crossover':
      return `${title} at ${temperatureText(bath.transitionTemperatureGeV)}, ${temperatureText(bath.transitionWidthGeV)} wide`
    case 'lattice-2014':
      return `${title}, ${bath.hadrons} hadron list`
    case 'lattice-2016':
      return title
    case 'uploaded':
      return `${title}, ${uploadedWords(bath.points)}`
  }
}

function neutrinoWords({ neutrinos }: HistoryInput): ReactNode {
  const decouple = `decouple at ${temperatureText(neutrinos.decouplingTemperatureGeV)}`
  if (neutrinos.treatment === 'instantaneous') return `${decouple}, instantly`
  return (
    <>
      {decouple}, <NEff /> {neutrinos.nEff}
      {neutrinos.entropyScaling === 'linear' ? ', linear entropy' : ''}
    </>
  )
}

function extraSpeciesWords({ extraSpecies }: HistoryInput): ReactNode {
  if (extraSpecies.length === 0) return 'none'
  return extraSpecies.map((species) => `${species.name} (g = ${species.degreesOfFreedom})`).join(', ')
}

function expansionWords({ expansion }: HistoryInput): ReactNode {
  switch (expansion.kind) {
    case 'radiation':
      return 'radiation'
    case 'fluid': {
      const name = expansion.index === 2 ? 'kination' : `fluid n = ${expansion.index}`
      return `${name}, equal to radiation at ${temperatureText(expansion.equalityTemperatureGeV)}`
    }
    case 'entropy-step':
      return `entropy × ${expansion.factor} at ${temperatureText(expansion.temperatureGeV)}`
    case 'early-matter': {
      const start =
        expansion.startTemperatureGeV === undefined
          ? `dilution ${expansion.dilution}`
          : `from ${temperatureText(expansion.startTemperatureGeV)}`
      return `matter era ${start}, reheating at ${temperatureText(expansion.reheatTemperatureGeV)}`
    }
  }
}

function todayWords({ today }: HistoryInput): ReactNode {
  return (
    <>
      <i className="font-serif">
        T<sub>0</sub>
      </i>{' '}
      {today.temperatureK} K, <i className="font-serif">h</i> {today.hubbleParameter}
    </>
  )
}

/** The present choice of one group of assumptions, in one line. */
export function describeAssumption(group: AssumptionGroup, history: HistoryInput): ReactNode {
  switch (group) {
    case 'bath':
      return bathWords(history)
    case 'neutrinos':
      return neutrinoWords(history)
    case 'extraSpecies':
      return extraSpeciesWords(history)
    case 'expansion':
      return expansionWords(history)
    case 'maximumTemperatureGeV':
      return history.maximumTemperatureGeV === null
        ? 'not bounded'
        : temperatureText(history.maximumTemperatureGeV)
    case 'today':
      return todayWords(history)
  }
}

function annihilationWords(annihilation: AnnihilationInput): ReactNode {
  switch (annihilation.kind) {
    case 'partial-waves': {
      const pOnly = annihilation.sWaveCm3PerS === 0
      return (
        <>
          {annihilation.pWaveCm3PerS === 0 ? 's-wave' : pOnly ? 'p-wave' : 's- and p-wave'} <SigmaV />{' '}
          <Num value={pOnly ? annihilation.pWaveCm3PerS : annihilation.sWaveCm3PerS} unit="cm³/s" />
        </>
      )
    }
    case 'resonance':
      return `resonance at ${temperatureText(annihilation.massGeV)}`
    default:
      return ANNIHILATION_TITLES[annihilation.kind]
  }
}

/** A candidate in one line. */
export function describeCandidate(candidate: CandidateInput): ReactNode {
  const mass = temperatureText(candidate.massGeV)
  switch (candidate.mechanism) {
    case 'freeze-out':
    case 'asymmetric':
      return (
        <>
          {mass} {candidate.selfConjugate ? 'self-conjugate ' : ''}
          {candidate.statistics}, {annihilationWords(candidate.annihilation)}
        </>
      )
    case 'freeze-in-decay':
      return `${mass} ${candidate.statistics} from a ${temperatureText(candidate.parent.massGeV)} parent`
    default:
      return `${mass} ${candidate.statistics}, ${MECHANISM_TITLES[candidate.mechanism]}`
  }
}
