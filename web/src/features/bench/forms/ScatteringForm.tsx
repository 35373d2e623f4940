import type { FreezeInScatteringInput } from '#core/wire/index'
import { Select } from '../../../components/ui/Select.tsx'
import { PointsField } from './PointsField.tsx'
import { EnergyField, PlainField } from './fields.tsx'

type Scattering = FreezeInScatteringInput['scattering']
type WithIncoming = Extract<Scattering, { incoming: unknown }>

const INCOMING: WithIncoming['incoming'] = [
  { massGeV: 80, degreesOfFreedom: 2 },
  { massGeV: 60, degreesOfFreedom: 1 },
]

const SCATTERINGS: Record<Scattering['kind'], Scattering> = {
  'constant-matrix-element': { kind: 'constant-matrix-element', matrixElementSquared: 1e-21 },
  'power-law': {
    kind: 'power-law',
    crossSectionGeVMinus2: 5e-27,
    referenceEnergyGeV: 200,
    exponent: -4,
    incoming: INCOMING,
  },
  table: {
    kind: 'table',
    points: [
      [140, 1e-27],
      [1e6, 1e-27],
    ],
    incoming: INCOMING,
  },
}

function IncomingFields({
  value,
  onChange,
}: {
  value: WithIncoming['incoming']
  onChange: (value: WithIncoming['incoming']) => void
}) {
  const set = (index: 0 | 1, changed: Partial<WithIncoming['incoming'][0]>): void =>
    onChange(index === 0 ? [{ ...value[0], ...changed }, value[1]] : [value[0], { ...value[1], ...changed }])
  return ([0, 1] as const).map((index) => (
    <div key={index}>
      <EnergyField
        path={`candidate.scattering.incoming[${index}].massGeV`}
        label={`Mass of incoming ${index + 1}`}
        value={value[index].massGeV}
        onChange={(massGeV) => set(index, { massGeV })}
      />
      <PlainField
        path={`candidate.scattering.incoming[${index}].degreesOfFreedom`}
        label="Its internal states"
        value={value[index].degreesOfFreedom}
        onChange={(degreesOfFreedom) => set(index, { degreesOfFreedom })}
      />
    </div>
  ))
}

/** The collisions that make the candidate. */
export function ScatteringForm({
  value,
  onChange,
}: {
  value: Scattering
  onChange: (value: Scattering) => void
}) {
  return (
    <>
      <Select
        label="Collisions"
        value={value.kind}
        options={[
          { value: 'constant-matrix-element', label: 'constant matrix element' },
          { value: 'power-law', label: 'power law in √s' },
          { value: 'table', label: 'table of σ(√s)' },
        ]}
        onChange={(kind) => onChange(SCATTERINGS[kind])}
      />
      {value.kind === 'constant-matrix-element' ? (
        <PlainField
          path="candidate.scattering.matrixElementSquared"
          label="|M|², summed over all spins"
          value={value.matrixElementSquared}
          onChange={(matrixElementSquared) => onChange({ ...value, matrixElementSquared })}
        />
      ) : (
        <IncomingFields value={value.incoming} onChange={(incoming) => onChange({ ...value, incoming })} />
      )}
      {value.kind === 'power-law' ? (
        <>
          <PlainField
            path="candidate.scattering.crossSectionGeVMinus2"
            label="σ₀, in GeV⁻²"
            value={value.crossSectionGeVMinus2}
            onChange={(crossSectionGeVMinus2) => onChange({ ...value, crossSectionGeVMinus2 })}
          />
          <EnergyField
            path="candidate.scattering.referenceEnergyGeV"
            label="at √s"
            value={value.referenceEnergyGeV}
            onChange={(referenceEnergyGeV) => onChange({ ...value, referenceEnergyGeV })}
          />
          <PlainField
            path="candidate.scattering.exponent"
            label="Exponent k"
            value={value.exponent}
            onChange={(exponent) => onChange({ ...value, exponent })}
          />
        </>
      ) : null}
      {value.kind === 'table' ? (
        <PointsField
          path="candidate.scattering.points"
          label="Rows: √s in GeV, σ in GeV⁻²"
          value={value.points}
          onChange={(points) => onChange({ ...value, points })}
        />
      ) : null}
    </>
  )
}
