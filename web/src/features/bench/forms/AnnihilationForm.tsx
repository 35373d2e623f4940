import type { AnnihilationInput } from '#core/wire/index'
import { Select } from '../../../components/ui/Select.tsx'
import { SigmaV } from '../../../components/ui/symbols.tsx'
import { ANNIHILATION_TITLES } from '../../../lib/describe.tsx'
import { CoannihilationFields } from './CoannihilationFields.tsx'
import { PointsField } from './PointsField.tsx'
import { CrossSectionField, EnergyField, PlainField } from './fields.tsx'

type Of<K extends AnnihilationInput['kind']> = Extract<AnnihilationInput, { kind: K }>

interface FieldsProps<T> {
  path: string
  value: T
  onChange: (value: T) => void
}

/** A kind with numbers near the measured density, to begin from. */
const beginning = (kind: AnnihilationInput['kind'], massGeV: number): AnnihilationInput => {
  const kinds: Record<AnnihilationInput['kind'], AnnihilationInput> = {
    'partial-waves': { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26, pWaveCm3PerS: 0 },
    'power-law': { kind: 'power-law', coefficientCm3PerS: 1e-24, exponent: 1 },
    resonance: {
      kind: 'resonance',
      massGeV: 2.1 * massGeV,
      widthGeV: 1e-3 * massGeV,
      spin: 1,
      branchingProduct: 1e-5,
    },
    sommerfeld: { kind: 'sommerfeld', sWaveCm3PerS: 2e-26, couplingAlpha: 0.03 },
    'cross-section': {
      kind: 'cross-section',
      points: [
        [2 * massGeV, 5e-9],
        [2e6 * massGeV, 5e-21],
      ],
    },
    table: {
      kind: 'table',
      against: 'x',
      points: [
        [1, 2.2e-26],
        [1000, 2.2e-26],
      ],
    },
    coannihilation: {
      kind: 'coannihilation',
      weights: 'exact',
      others: [{ massGeV: 1.05 * massGeV, degreesOfFreedom: 2, statistics: 'fermion' }],
      pairs: [
        { first: 0, second: 0, sWaveCm3PerS: 1e-27, pWaveCm3PerS: 0 },
        { first: 0, second: 1, sWaveCm3PerS: 3e-26, pWaveCm3PerS: 0 },
        { first: 1, second: 1, sWaveCm3PerS: 1e-25, pWaveCm3PerS: 0 },
      ],
    },
  }
  return kinds[kind]
}

function ResonanceFields({ path, value, onChange }: FieldsProps<Of<'resonance'>>) {
  return (
    <>
      <EnergyField
        path={`${path}.massGeV`}
        label="Mass of the resonance"
        value={value.massGeV}
        onChange={(massGeV) => onChange({ ...value, massGeV })}
      />
      <EnergyField
        path={`${path}.widthGeV`}
        label="Width"
        value={value.widthGeV}
        onChange={(widthGeV) => onChange({ ...value, widthGeV })}
      />
      <PlainField
        path={`${path}.spin`}
        label="Spin J"
        value={value.spin}
        onChange={(spin) => onChange({ ...value, spin })}
      />
      <PlainField
        path={`${path}.branchingProduct`}
        label="Product of branchings B"
        hint="On the peak, at most 1/4"
        value={value.branchingProduct}
        onChange={(branchingProduct) => onChange({ ...value, branchingProduct })}
      />
    </>
  )
}

function SommerfeldFields({ path, value, onChange }: FieldsProps<Of<'sommerfeld'>>) {
  const { mediatorMassGeV, ...coulomb } = value
  return (
    <>
      <CrossSectionField
        path={`${path}.sWaveCm3PerS`}
        label="s-wave before enhancement"
        value={value.sWaveCm3PerS}
        onChange={(sWaveCm3PerS) => onChange({ ...value, sWaveCm3PerS })}
      />
      <PlainField
        path={`${path}.couplingAlpha`}
        label="Coupling α"
        value={value.couplingAlpha}
        onChange={(couplingAlpha) => onChange({ ...value, couplingAlpha })}
      />
      <Select
        label="Mediator"
        value={mediatorMassGeV === undefined ? 'massless' : 'massive'}
        options={[
          { value: 'massless', label: 'massless (Coulomb)' },
          { value: 'massive', label: 'massive (Hulthén)' },
        ]}
        onChange={(kind) => onChange(kind === 'massless' ? coulomb : { ...coulomb, mediatorMassGeV: 1 })}
      />
      {mediatorMassGeV === undefined ? null : (
        <EnergyField
          path={`${path}.mediatorMassGeV`}
          label="Mass of the mediator"
          value={mediatorMassGeV}
          onChange={(mass) => onChange({ ...coulomb, mediatorMassGeV: mass })}
        />
      )}
    </>
  )
}

function KindFields({ path, value, onChange }: FieldsProps<AnnihilationInput>) {
  switch (value.kind) {
    case 'partial-waves':
      return (
        <>
          <CrossSectionField
            path={`${path}.sWaveCm3PerS`}
            label={
              <>
                <SigmaV />, s-wave a
              </>
            }
            value={value.sWaveCm3PerS}
            onChange={(sWaveCm3PerS) => onChange({ ...value, sWaveCm3PerS })}
          />
          <CrossSectionField
            path={`${path}.pWaveCm3PerS`}
            label="p-wave b, in σv = a + b v²"
            value={value.pWaveCm3PerS}
            onChange={(pWaveCm3PerS) => onChange({ ...value, pWaveCm3PerS })}
          />
        </>
      )
    case 'power-law':
      return (
        <>
          <CrossSectionField
            path={`${path}.coefficientCm3PerS`}
            label="σ₀"
            value={value.coefficientCm3PerS}
            onChange={(coefficientCm3PerS) => onChange({ ...value, coefficientCm3PerS })}
          />
          <PlainField
            path={`${path}.exponent`}
            label="n, in σ₀ x to the −n"
            value={value.exponent}
            onChange={(exponent) => onChange({ ...value, exponent })}
          />
        </>
      )
    case 'resonance':
      return <ResonanceFields path={path} value={value} onChange={onChange} />
    case 'sommerfeld':
      return <SommerfeldFields path={path} value={value} onChange={onChange} />
    case 'coannihilation':
      return <CoannihilationFields path={path} value={value} onChange={onChange} />
    case 'cross-section':
      return (
        <PointsField
          path={`${path}.points`}
          label="Rows: √s in GeV, σ in GeV⁻²"
          value={value.points}
          onChange={(points) => onChange({ ...value, points })}
        />
      )
    case 'table':
      return (
        <>
          <Select
            label="First column"
            value={value.against}
            options={[
              { value: 'x', label: 'x = m/T' },
              { value: 'temperatureGeV', label: 'T in GeV' },
            ]}
            onChange={(against) => onChange({ ...value, against })}
          />
          <PointsField
            path={`${path}.points`}
            label="Rows: x or T, ⟨σv⟩ in cm³/s"
            value={value.points}
            onChange={(points) => onChange({ ...value, points })}
          />
        </>
      )
  }
}

interface AnnihilationFormProps {
  path: string
  massGeV: number
  value: AnnihilationInput
  /** Kinds left out where they make no sense. */
  without?: readonly AnnihilationInput['kind'][]
  onChange: (value: AnnihilationInput) => void
}

/** How it annihilates. */
export function AnnihilationForm({ path, massGeV, value, without = [], onChange }: AnnihilationFormProps) {
  const kinds = (Object.keys(ANNIHILATION_TITLES) as AnnihilationInput['kind'][]).filter(
    (kind) => !without.includes(kind),
  )
  return (
    <>
      <Select
        label="Annihilation"
        value={value.kind}
        options={kinds.map((kind) => ({ value: kind, label: ANNIHILATION_TITLES[kind] }))}
        onChange={(kind) => onChange(beginning(kind, massGeV))}
      />
      <KindFields path={path} value={value} onChange={onChange} />
    </>
  )
}
