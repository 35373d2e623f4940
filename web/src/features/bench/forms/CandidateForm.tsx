import type { CandidateInput, Mechanism } from '#core/wire/index'
import { Select } from '../../../components/ui/Select.tsx'
import { Switch } from '../../../components/ui/Switch.tsx'
import { MECHANISM_TITLES } from '../../../lib/describe.tsx'
import { AnnihilationForm } from './AnnihilationForm.tsx'
import { ParentForm } from './ParentForm.tsx'
import { ScatteringForm } from './ScatteringForm.tsx'
import { EnergyField, PlainField } from './fields.tsx'

interface FormProps<T> {
  value: T
  onChange: (value: CandidateInput) => void
}

type Of<K extends Mechanism> = Extract<CandidateInput, { mechanism: K }>

/** A mechanism to begin from, keeping what every candidate has. */
function beginning(
  mechanism: Mechanism,
  { massGeV, degreesOfFreedom, statistics }: CandidateInput,
): CandidateInput {
  const common = { massGeV, degreesOfFreedom, statistics }
  const annihilation = { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26, pWaveCm3PerS: 0 } as const
  const kinds: Record<Mechanism, CandidateInput> = {
    'freeze-out': {
      mechanism: 'freeze-out',
      ...common,
      selfConjugate: true,
      annihilation,
      equilibriumStatistics: 'exact',
      initialAbundance: 'equilibrium',
    },
    'freeze-in-decay': {
      mechanism: 'freeze-in-decay',
      ...common,
      massGeV: Math.min(massGeV, 1e-5),
      parent: {
        massGeV: 300,
        degreesOfFreedom: 1,
        statistics: 'boson',
        lifetimeS: 1e-9,
        selfConjugate: true,
      },
      perDecay: 1,
      backReaction: false,
      lateDecay: true,
    },
    'freeze-in-scattering': {
      mechanism: 'freeze-in-scattering',
      ...common,
      scattering: { kind: 'constant-matrix-element', matrixElementSquared: 1e-21 },
    },
    'freeze-in-ultraviolet': {
      mechanism: 'freeze-in-ultraviolet',
      ...common,
      ultraviolet: { coefficient: 0.01, scaleGeV: 1e15, index: 1 },
    },
    asymmetric: {
      mechanism: 'asymmetric',
      ...common,
      degreesOfFreedom: 4,
      selfConjugate: false,
      annihilation: { ...annihilation, sWaveCm3PerS: 5e-26 },
      equilibriumStatistics: 'exact',
      asymmetry: 1e-11,
    },
    'hot-relic': {
      mechanism: 'hot-relic',
      ...common,
      massGeV: Math.min(massGeV, 1e-8),
      decouplingTemperatureGeV: 0.1,
    },
  }
  return kinds[mechanism]
}

function FreezeOutFields({ value, onChange }: FormProps<Of<'freeze-out'>>) {
  return (
    <>
      <Switch
        label="Its own antiparticle"
        checked={value.selfConjugate}
        onChange={(selfConjugate) => onChange({ ...value, selfConjugate })}
      />
      <AnnihilationForm
        path="candidate.annihilation"
        massGeV={value.massGeV}
        value={value.annihilation}
        onChange={(annihilation) => onChange({ ...value, annihilation })}
      />
      <Select
        label="Abundance at the start"
        value={value.initialAbundance}
        options={[
          { value: 'equilibrium', label: 'equilibrium' },
          { value: 'zero', label: 'none' },
        ]}
        onChange={(initialAbundance) => onChange({ ...value, initialAbundance })}
      />
      <EquilibriumField
        value={value.equilibriumStatistics}
        onChange={(equilibriumStatistics) => onChange({ ...value, equilibriumStatistics })}
      />
    </>
  )
}

function EquilibriumField({
  value,
  onChange,
}: {
  value: 'exact' | 'maxwell-boltzmann'
  onChange: (value: 'exact' | 'maxwell-boltzmann') => void
}) {
  return (
    <Select
      label="Statistics of equilibrium"
      value={value}
      options={[
        { value: 'exact', label: 'exact' },
        { value: 'maxwell-boltzmann', label: 'Maxwell–Boltzmann' },
      ]}
      onChange={onChange}
    />
  )
}

function AsymmetricFields({ value, onChange }: FormProps<Of<'asymmetric'>>) {
  return (
    <>
      <PlainField
        path="candidate.asymmetry"
        label="Asymmetry of the yields"
        value={value.asymmetry}
        onChange={(asymmetry) => onChange({ ...value, asymmetry })}
      />
      <AnnihilationForm
        path="candidate.annihilation"
        massGeV={value.massGeV}
        value={value.annihilation}
        without={['coannihilation']}
        onChange={(annihilation) => onChange({ ...value, annihilation })}
      />
      <EquilibriumField
        value={value.equilibriumStatistics}
        onChange={(equilibriumStatistics) => onChange({ ...value, equilibriumStatistics })}
      />
    </>
  )
}

function UltravioletFields({ value, onChange }: FormProps<Of<'freeze-in-ultraviolet'>>) {
  const set = (changed: Partial<typeof value.ultraviolet>): void =>
    onChange({ ...value, ultraviolet: { ...value.ultraviolet, ...changed } })
  return (
    <>
      <PlainField
        path="candidate.ultraviolet.coefficient"
        label="Coefficient C"
        hint="In C T⁴ (T/Λ)^2q reactions per volume and time"
        value={value.ultraviolet.coefficient}
        onChange={(coefficient) => set({ coefficient })}
      />
      <EnergyField
        path="candidate.ultraviolet.scaleGeV"
        label="Scale Λ"
        value={value.ultraviolet.scaleGeV}
        onChange={(scaleGeV) => set({ scaleGeV })}
      />
      <PlainField
        path="candidate.ultraviolet.index"
        label="Index q"
        value={value.ultraviolet.index}
        onChange={(index) => set({ index })}
      />
    </>
  )
}

function MechanismFields({ value, onChange }: FormProps<CandidateInput>) {
  switch (value.mechanism) {
    case 'freeze-out':
      return <FreezeOutFields value={value} onChange={onChange} />
    case 'freeze-in-decay':
      return <ParentForm value={value} onChange={onChange} />
    case 'freeze-in-scattering':
      return (
        <ScatteringForm
          value={value.scattering}
          onChange={(scattering) => onChange({ ...value, scattering })}
        />
      )
    case 'freeze-in-ultraviolet':
      return <UltravioletFields value={value} onChange={onChange} />
    case 'asymmetric':
      return <AsymmetricFields value={value} onChange={onChange} />
    case 'hot-relic':
      return (
        <EnergyField
          path="candidate.decouplingTemperatureGeV"
          label="Decouples at"
          value={value.decouplingTemperatureGeV}
          onChange={(decouplingTemperatureGeV) => onChange({ ...value, decouplingTemperatureGeV })}
        />
      )
  }
}

const MECHANISMS = (Object.keys(MECHANISM_TITLES) as Mechanism[]).map((value) => ({
  value,
  label: MECHANISM_TITLES[value],
}))

/** The candidate: mechanism and particle numbers. */
export function CandidateForm({ value, onChange }: FormProps<CandidateInput>) {
  const both = value.mechanism === 'freeze-out' || value.mechanism === 'asymmetric'
  return (
    <>
      <EnergyField
        path="candidate.massGeV"
        label="Mass"
        value={value.massGeV}
        onChange={(massGeV) => onChange({ ...value, massGeV })}
      />
      <Select
        label="Mechanism"
        value={value.mechanism}
        options={MECHANISMS}
        onChange={(mechanism) => onChange(beginning(mechanism, value))}
      />
      <MechanismFields value={value} onChange={onChange} />
      <PlainField
        path="candidate.degreesOfFreedom"
        label="Internal states g"
        {...(both ? { hint: 'Particle and antiparticle together; 4 for a Dirac fermion.' } : {})}
        value={value.degreesOfFreedom}
        onChange={(degreesOfFreedom) => onChange({ ...value, degreesOfFreedom })}
      />
      <Select
        label="Statistics"
        value={value.statistics}
        options={[
          { value: 'fermion', label: 'fermion' },
          { value: 'boson', label: 'boson' },
        ]}
        onChange={(statistics) => onChange({ ...value, statistics })}
      />
    </>
  )
}
