/** One form for each group of assumptions. */
import { LATTICE_2016_ROWS } from '#core/bath/treatments/lattice2016Table'
import type { HistoryInput } from '#core/wire/index'
import { NEff } from '../../../components/ui/symbols.tsx'
import { Select } from '../../../components/ui/Select.tsx'
import { Switch } from '../../../components/ui/Switch.tsx'
import { BATH_TITLES } from '../../../lib/describe.tsx'
import { BathTableField } from './BathTableField.tsx'
import { EnergyField, PlainField } from './fields.tsx'
import { ExpansionForm } from './ExpansionForm.tsx'
import { ExtraSpeciesForm } from './ExtraSpeciesForm.tsx'

export interface FormProps<T> {
  value: T
  onChange: (value: T) => void
}

type Bath = HistoryInput['bath']

/** A treatment with its defaults, as the wire fills them in. */
const BATHS: Record<Bath['treatment'], Bath> = {
  thresholds: { treatment: 'thresholds', transitionTemperatureGeV: 0.1565 },
  'ideal-switch': { treatment: 'ideal-switch', transitionTemperatureGeV: 0.1565, hadrons: 'short' },
  crossover: {
    treatment: 'crossover',
    transitionTemperatureGeV: 0.1565,
    transitionWidthGeV: 0.02,
    hadrons: 'short',
  },
  'lattice-2014': { treatment: 'lattice-2014', hadrons: 'long' },
  'lattice-2016': { treatment: 'lattice-2016' },
  'fit-2018': { treatment: 'fit-2018', band: 0 },
  // A table to be replaced, that shows what one looks like.
  uploaded: { treatment: 'uploaded', points: [...LATTICE_2016_ROWS] },
}

const BATH_OPTIONS = (Object.keys(BATHS) as Bath['treatment'][]).map((value) => ({
  value,
  label: BATH_TITLES[value],
}))
const HADRON_OPTIONS = [
  { value: 'short', label: 'short, to 1.02 GeV' },
  { value: 'long', label: 'long, to 2.05 GeV' },
] as const

function BathForm({ value, onChange }: FormProps<Bath>) {
  return (
    <>
      <Select
        label="Treatment"
        value={value.treatment}
        options={BATH_OPTIONS}
        onChange={(treatment) => onChange(BATHS[treatment])}
      />
      {'transitionTemperatureGeV' in value ? (
        <EnergyField
          path="history.bath.transitionTemperatureGeV"
          label="Crossover temperature"
          value={value.transitionTemperatureGeV}
          onChange={(transitionTemperatureGeV) => onChange({ ...value, transitionTemperatureGeV })}
        />
      ) : null}
      {'transitionWidthGeV' in value ? (
        <EnergyField
          path="history.bath.transitionWidthGeV"
          label="Width"
          value={value.transitionWidthGeV}
          onChange={(transitionWidthGeV) => onChange({ ...value, transitionWidthGeV })}
        />
      ) : null}
      {'hadrons' in value ? (
        <Select
          label="Hadrons below the crossover"
          value={value.hadrons}
          options={HADRON_OPTIONS}
          onChange={(hadrons) => onChange({ ...value, hadrons })}
        />
      ) : null}
      {'points' in value ? (
        <BathTableField
          path="history.bath.points"
          value={value.points}
          onChange={(points) => onChange({ ...value, points })}
        />
      ) : null}
      {'band' in value ? (
        <PlainField
          path="history.bath.band"
          label="Place in the band"
          hint="−1 to 1. 0 is the fit, 1 the 2016 lattice table inside its range: this project’s measure of how well the bath is known."
          value={value.band}
          onChange={(band) => onChange({ ...value, band })}
        />
      ) : null}
    </>
  )
}

type Neutrinos = HistoryInput['neutrinos']

function NeutrinosForm({ value, onChange }: FormProps<Neutrinos>) {
  const { decouplingTemperatureGeV } = value
  const choose = (treatment: Neutrinos['treatment']): void =>
    onChange(
      treatment === 'instantaneous'
        ? { treatment, decouplingTemperatureGeV }
        : { treatment, nEff: 3.044, decouplingTemperatureGeV, entropyScaling: 'heated' },
    )
  return (
    <>
      <Select
        label="Decoupling"
        value={value.treatment}
        options={[
          { value: 'specified', label: 'to a given number' },
          { value: 'instantaneous', label: 'instantaneous' },
        ]}
        onChange={choose}
      />
      {value.treatment === 'specified' ? (
        <>
          <PlainField
            path="history.neutrinos.nEff"
            label={<NEff />}
            hint="Neutrinos only; other radiation is an extra species."
            value={value.nEff}
            onChange={(nEff) => onChange({ ...value, nEff })}
          />
          <Select
            label="Today’s entropy"
            value={value.entropyScaling}
            options={[
              { value: 'heated', label: 'of heated neutrinos' },
              { value: 'linear', label: 'linear in their number' },
            ]}
            hint={
              <>
                Heated: 2 + (21/11)(N/3)<sup>3/4</sup>; linear, as in some papers: 2 + (7/11)N.
              </>
            }
            onChange={(entropyScaling) => onChange({ ...value, entropyScaling })}
          />
        </>
      ) : null}
      <EnergyField
        path="history.neutrinos.decouplingTemperatureGeV"
        label="Decoupling temperature"
        value={value.decouplingTemperatureGeV}
        onChange={(temperature) => onChange({ ...value, decouplingTemperatureGeV: temperature })}
      />
    </>
  )
}

function MaximumTemperatureForm({ value, onChange }: FormProps<number | null>) {
  return (
    <>
      <Switch
        label="The bath had a highest temperature"
        checked={value !== null}
        hint="Instant reheating: nothing happens above it."
        onChange={(bounded) => onChange(bounded ? 1000 : null)}
      />
      {value === null ? null : (
        <EnergyField
          path="history.maximumTemperatureGeV"
          label="Maximum temperature"
          value={value}
          onChange={onChange}
        />
      )}
    </>
  )
}

function TodayForm({ value, onChange }: FormProps<HistoryInput['today']>) {
  return (
    <>
      <PlainField
        path="history.today.temperatureK"
        label="Photon temperature, K"
        hint="2.7255 K: Fixsen 2009."
        value={value.temperatureK}
        onChange={(temperatureK) => onChange({ ...value, temperatureK })}
      />
      <PlainField
        path="history.today.hubbleParameter"
        label="Hubble parameter h"
        value={value.hubbleParameter}
        onChange={(hubbleParameter) => onChange({ ...value, hubbleParameter })}
      />
      <PlainField
        path="history.today.omegaMatterH2"
        label="Matter density Ω h²"
        hint="Enters ages and redshifts below 1 keV; the abundance does not use it."
        value={value.omegaMatterH2}
        onChange={(omegaMatterH2) => onChange({ ...value, omegaMatterH2 })}
      />
    </>
  )
}

interface AssumptionFormProps {
  group: keyof HistoryInput
  history: HistoryInput
  onChange: (history: HistoryInput) => void
}

/** The form of one group. */
export function AssumptionForm({ group, history, onChange }: AssumptionFormProps) {
  switch (group) {
    case 'bath':
      return <BathForm value={history.bath} onChange={(bath) => onChange({ ...history, bath })} />
    case 'neutrinos':
      return (
        <NeutrinosForm
          value={history.neutrinos}
          onChange={(neutrinos) => onChange({ ...history, neutrinos })}
        />
      )
    case 'extraSpecies':
      return (
        <ExtraSpeciesForm
          value={history.extraSpecies}
          onChange={(extraSpecies) => onChange({ ...history, extraSpecies })}
        />
      )
    case 'expansion':
      return (
        <ExpansionForm
          value={history.expansion}
          onChange={(expansion) => onChange({ ...history, expansion })}
        />
      )
    case 'maximumTemperatureGeV':
      return (
        <MaximumTemperatureForm
          value={history.maximumTemperatureGeV}
          onChange={(maximumTemperatureGeV) => onChange({ ...history, maximumTemperatureGeV })}
        />
      )
    case 'today':
      return <TodayForm value={history.today} onChange={(today) => onChange({ ...history, today })} />
  }
}
