import type { HistoryInput } from '#core/wire/index'
import { Button } from '../../../components/ui/Button.tsx'
import { Field } from '../../../components/ui/Field.tsx'
import { Select } from '../../../components/ui/Select.tsx'
import { EnergyField, PlainField } from './fields.tsx'

type Species = HistoryInput['extraSpecies'][number]

const NEW: Species = {
  name: 'dark photon',
  degreesOfFreedom: 3,
  statistics: 'boson',
  massGeV: 0.1,
  coupling: { kind: 'bath' },
}

const COUPLINGS: Record<Species['coupling']['kind'], Species['coupling']> = {
  bath: { kind: 'bath' },
  decoupled: { kind: 'decoupled', temperatureGeV: 1 },
  ratio: { kind: 'ratio', ratio: 0.5 },
}

function CouplingFields({
  path,
  value,
  onChange,
}: {
  path: string
  value: Species['coupling']
  onChange: (value: Species['coupling']) => void
}) {
  return (
    <>
      <Select
        label="Temperature"
        value={value.kind}
        options={[
          { value: 'bath', label: 'that of the bath' },
          { value: 'decoupled', label: 'its own, decoupled' },
          { value: 'ratio', label: 'a fixed ratio to the bath' },
        ]}
        onChange={(kind) => onChange(COUPLINGS[kind])}
      />
      {value.kind === 'decoupled' ? (
        <EnergyField
          path={`${path}.temperatureGeV`}
          label="Decouples at"
          value={value.temperatureGeV}
          onChange={(temperatureGeV) => onChange({ ...value, temperatureGeV })}
        />
      ) : null}
      {value.kind === 'ratio' ? (
        <PlainField
          path={`${path}.ratio`}
          label="Its temperature over the bath’s"
          value={value.ratio}
          onChange={(ratio) => onChange({ ...value, ratio })}
        />
      ) : null}
    </>
  )
}

function SpeciesFields({
  index,
  value,
  onChange,
  onRemove,
}: {
  index: number
  value: Species
  onChange: (value: Species) => void
  onRemove: () => void
}) {
  const path = `history.extraSpecies[${index}]`
  return (
    <fieldset className="border-t border-rule py-2">
      <legend className="sr-only">{value.name}</legend>
      <Field label="Name">
        {(control) => (
          <input
            {...control}
            className="input"
            maxLength={80}
            value={value.name}
            onChange={(event) => onChange({ ...value, name: event.target.value })}
          />
        )}
      </Field>
      <EnergyField
        path={`${path}.massGeV`}
        label="Mass"
        hint="0 for radiation"
        value={value.massGeV}
        onChange={(massGeV) => onChange({ ...value, massGeV })}
      />
      <PlainField
        path={`${path}.degreesOfFreedom`}
        label="Internal states g"
        value={value.degreesOfFreedom}
        onChange={(degreesOfFreedom) => onChange({ ...value, degreesOfFreedom })}
      />
      <Select
        label="Statistics"
        value={value.statistics}
        options={[
          { value: 'boson', label: 'boson' },
          { value: 'fermion', label: 'fermion' },
        ]}
        onChange={(statistics) => onChange({ ...value, statistics })}
      />
      <CouplingFields
        path={`${path}.coupling`}
        value={value.coupling}
        onChange={(coupling) => onChange({ ...value, coupling })}
      />
      <Button variant="link" onClick={onRemove} aria-label={`Remove ${value.name}`}>
        remove
      </Button>
    </fieldset>
  )
}

/** Species beyond the Standard Model. */
export function ExtraSpeciesForm({
  value,
  onChange,
}: {
  value: Species[]
  onChange: (value: Species[]) => void
}) {
  return (
    <>
      {value.map((species, index) => (
        <SpeciesFields
          key={index}
          index={index}
          value={species}
          onChange={(changed) => onChange(value.map((each, i) => (i === index ? changed : each)))}
          onRemove={() => onChange(value.filter((_species, i) => i !== index))}
        />
      ))}
      <Button onClick={() => onChange([...value, NEW])}>Add a species</Button>
    </>
  )
}
