/** Fields that know their JSON path, so that what the core finds wrong there stands beside them. */
import type { ReactNode } from 'react'
import type { Dimension } from '#core/units/units'
import { QuantityInput } from '../../../components/ui/QuantityInput.tsx'
import { useFault } from '../faults.tsx'

interface NumberFieldProps {
  path: string
  label: ReactNode
  hint?: ReactNode
  value: number | undefined
  onChange: (value: number) => void
}

const field = (dimension: Dimension, unit: string) =>
  function NumberField({ path, label, hint, value, onChange }: NumberFieldProps) {
    return (
      <QuantityInput
        label={label}
        hint={hint}
        value={value}
        dimension={dimension}
        unit={unit}
        fault={useFault(path)}
        onCommit={onChange}
      />
    )
  }

/** A mass, temperature or width. */
export const EnergyField = field('energy', 'GeV')
export const TimeField = field('time', 's')
export const CrossSectionField = field('crossSection', 'cm3/s')
/** A pure number. */
export const PlainField = field('pure', '')
