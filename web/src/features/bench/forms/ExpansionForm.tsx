import type { HistoryInput } from '#core/wire/index'
import { Select } from '../../../components/ui/Select.tsx'
import { EnergyField, PlainField } from './fields.tsx'

type Expansion = HistoryInput['expansion']

const EXPANSIONS: Record<Expansion['kind'], Expansion> = {
  radiation: { kind: 'radiation' },
  fluid: { kind: 'fluid', index: 2, equalityTemperatureGeV: 1 },
  'early-matter': { kind: 'early-matter', reheatTemperatureGeV: 0.02, startTemperatureGeV: 10, branching: 0 },
  'entropy-step': { kind: 'entropy-step', temperatureGeV: 0.05, factor: 10 },
}

const OPTIONS = [
  { value: 'radiation', label: 'radiation all along' },
  { value: 'fluid', label: 'a fast fluid first' },
  { value: 'early-matter', label: 'an era of matter' },
  { value: 'entropy-step', label: 'a sudden entropy release' },
] as const satisfies readonly { value: Expansion['kind']; label: string }[]

function FluidFields({
  value,
  onChange,
}: {
  value: Extract<Expansion, { kind: 'fluid' }>
  onChange: (value: Expansion) => void
}) {
  return (
    <>
      <PlainField
        path="history.expansion.index"
        label="Index n"
        hint="ρ falls as a to the −(4 + n); 2 is kination."
        value={value.index}
        onChange={(index) => onChange({ ...value, index })}
      />
      <EnergyField
        path="history.expansion.equalityTemperatureGeV"
        label="Equal to radiation at"
        value={value.equalityTemperatureGeV}
        onChange={(equalityTemperatureGeV) => onChange({ ...value, equalityTemperatureGeV })}
      />
    </>
  )
}

function MatterFields({
  value,
  onChange,
}: {
  value: Extract<Expansion, { kind: 'early-matter' }>
  onChange: (value: Expansion) => void
}) {
  const { startTemperatureGeV, dilution, ...rest } = value
  return (
    <>
      <EnergyField
        path="history.expansion.reheatTemperatureGeV"
        label="Reheating temperature"
        hint="The field decays when radiation alone would have this temperature."
        value={value.reheatTemperatureGeV}
        onChange={(reheatTemperatureGeV) => onChange({ ...value, reheatTemperatureGeV })}
      />
      <Select
        label="The era is given by"
        value={dilution === undefined ? 'start' : 'dilution'}
        options={[
          { value: 'start', label: 'its start' },
          { value: 'dilution', label: 'the entropy it makes' },
        ]}
        onChange={(by) =>
          onChange(by === 'start' ? { ...rest, startTemperatureGeV: 10 } : { ...rest, dilution: 100 })
        }
      />
      {dilution === undefined ? (
        <EnergyField
          path="history.expansion.startTemperatureGeV"
          label="Matter equals radiation at"
          value={startTemperatureGeV}
          onChange={(start) => onChange({ ...rest, startTemperatureGeV: start })}
        />
      ) : (
        <PlainField
          path="history.expansion.dilution"
          label="Dilution factor D"
          value={dilution}
          onChange={(factor) => onChange({ ...rest, dilution: factor })}
        />
      )}
      <PlainField
        path="history.expansion.branching"
        label="Candidates per decay of the field"
        value={value.branching}
        onChange={(branching) => onChange({ ...value, branching, fieldMassGeV: value.fieldMassGeV ?? 1e6 })}
      />
      {value.branching > 0 ? (
        <EnergyField
          path="history.expansion.fieldMassGeV"
          label="Mass of the field"
          value={value.fieldMassGeV}
          onChange={(fieldMassGeV) => onChange({ ...value, fieldMassGeV })}
        />
      ) : null}
    </>
  )
}

/** What ran the expansion. */
export function ExpansionForm({
  value,
  onChange,
}: {
  value: Expansion
  onChange: (value: Expansion) => void
}) {
  return (
    <>
      <Select
        label="What ran the expansion"
        value={value.kind}
        options={OPTIONS}
        onChange={(kind) => onChange(EXPANSIONS[kind])}
      />
      {value.kind === 'fluid' ? <FluidFields value={value} onChange={onChange} /> : null}
      {value.kind === 'early-matter' ? <MatterFields value={value} onChange={onChange} /> : null}
      {value.kind === 'entropy-step' ? (
        <>
          <EnergyField
            path="history.expansion.temperatureGeV"
            label="Released at"
            value={value.temperatureGeV}
            onChange={(temperatureGeV) => onChange({ ...value, temperatureGeV })}
          />
          <PlainField
            path="history.expansion.factor"
            label="Entropy grows by the factor"
            value={value.factor}
            onChange={(factor) => onChange({ ...value, factor })}
          />
        </>
      ) : null}
    </>
  )
}
