import type { FreezeInDecayInput } from '#core/wire/index'
import { Select } from '../../../components/ui/Select.tsx'
import { Switch } from '../../../components/ui/Switch.tsx'
import { AnnihilationForm } from './AnnihilationForm.tsx'
import { EnergyField, PlainField, TimeField } from './fields.tsx'

/** The parent of freeze-in by decay, and what becomes of it. */
export function ParentForm({
  value,
  onChange,
}: {
  value: FreezeInDecayInput
  onChange: (value: FreezeInDecayInput) => void
}) {
  const { parent } = value
  const set = (changed: Partial<FreezeInDecayInput['parent']>): void =>
    onChange({ ...value, parent: { ...parent, ...changed } })
  const { lifetimeS, widthGeV, ...rest } = parent
  const { annihilation, ...inEquilibrium } = parent
  return (
    <>
      <EnergyField
        path="candidate.parent.massGeV"
        label="Mass of the parent"
        value={parent.massGeV}
        onChange={(massGeV) => set({ massGeV })}
      />
      {widthGeV === undefined ? (
        <TimeField
          path="candidate.parent.lifetimeS"
          label="Lifetime of the parent"
          value={lifetimeS}
          onChange={(time) => onChange({ ...value, parent: { ...rest, lifetimeS: time } })}
        />
      ) : (
        <EnergyField
          path="candidate.parent.widthGeV"
          label="Width of the parent"
          value={widthGeV}
          onChange={(width) => onChange({ ...value, parent: { ...rest, widthGeV: width } })}
        />
      )}
      <PlainField
        path="candidate.parent.degreesOfFreedom"
        label="Internal states of the parent"
        value={parent.degreesOfFreedom}
        onChange={(degreesOfFreedom) => set({ degreesOfFreedom })}
      />
      <Select
        label="Statistics of the parent"
        value={parent.statistics}
        options={[
          { value: 'boson', label: 'boson' },
          { value: 'fermion', label: 'fermion' },
          { value: 'maxwell-boltzmann', label: 'Maxwell–Boltzmann' },
        ]}
        onChange={(statistics) => set({ statistics })}
      />
      <PlainField
        path="candidate.perDecay"
        label="Candidates per decay"
        value={value.perDecay}
        onChange={(perDecay) => onChange({ ...value, perDecay })}
      />
      <Switch
        label="The parent annihilates"
        hint="Then it is followed through its own freeze-out and decay."
        checked={annihilation !== undefined}
        onChange={(annihilates) =>
          onChange({
            ...value,
            backReaction: false,
            parent: annihilates
              ? {
                  ...inEquilibrium,
                  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 1e-26, pWaveCm3PerS: 0 },
                }
              : inEquilibrium,
          })
        }
      />
      {annihilation === undefined ? (
        <Switch
          label="Inverse decays kept"
          checked={value.backReaction}
          onChange={(backReaction) => onChange({ ...value, backReaction })}
        />
      ) : (
        <AnnihilationForm
          path="candidate.parent.annihilation"
          massGeV={parent.massGeV}
          value={annihilation}
          without={['coannihilation']}
          onChange={(changed) => set({ annihilation: changed })}
        />
      )}
    </>
  )
}
