import type { AnnihilationInput } from '#core/wire/index'
import { Button } from '../../../components/ui/Button.tsx'
import { Select } from '../../../components/ui/Select.tsx'
import { CrossSectionField, EnergyField, PlainField } from './fields.tsx'

type Coannihilation = Extract<AnnihilationInput, { kind: 'coannihilation' }>

const nameOf = (index: number): string => (index === 0 ? 'the candidate' : `partner ${index}`)

function Partners({
  path,
  value,
  onChange,
}: {
  path: string
  value: Coannihilation
  onChange: (value: Coannihilation) => void
}) {
  const set = (index: number, changed: Partial<Coannihilation['others'][number]>): void =>
    onChange({
      ...value,
      others: value.others.map((other, i) => (i === index ? { ...other, ...changed } : other)),
    })
  /** A partner takes its pairs with it; those behind it move up. */
  const remove = (index: number): void => {
    const gone = index + 1
    const moved = (at: number): number => (at > gone ? at - 1 : at)
    const pairs = value.pairs
      .filter(({ first, second }) => first !== gone && second !== gone)
      .map((pair) => ({ ...pair, first: moved(pair.first), second: moved(pair.second) }))
    onChange({ ...value, others: value.others.filter((_other, i) => i !== index), pairs })
  }
  return value.others.map((other, index) => (
    <fieldset key={index} className="border-t border-rule py-2">
      <legend className="sr-only">Partner {index + 1}</legend>
      <EnergyField
        path={`${path}.others[${index}].massGeV`}
        label={`Mass of partner ${index + 1}`}
        value={other.massGeV}
        onChange={(massGeV) => set(index, { massGeV })}
      />
      <PlainField
        path={`${path}.others[${index}].degreesOfFreedom`}
        label="Internal states g"
        value={other.degreesOfFreedom}
        onChange={(degreesOfFreedom) => set(index, { degreesOfFreedom })}
      />
      {value.others.length > 1 ? (
        <Button variant="link" onClick={() => remove(index)} aria-label={`Remove partner ${index + 1}`}>
          remove
        </Button>
      ) : null}
    </fieldset>
  ))
}

/** The first pair not yet given. */
function missingPair({ others, pairs }: Coannihilation): { first: number; second: number } | null {
  for (let first = 0; first <= others.length; first++)
    for (let second = first; second <= others.length; second++)
      if (
        !pairs.some(
          (pair) =>
            (pair.first === first && pair.second === second) ||
            (pair.first === second && pair.second === first),
        )
      )
        return { first, second }
  return null
}

/** Species that annihilate together, and the cross-section of each pair. */
export function CoannihilationFields({
  path,
  value,
  onChange,
}: {
  path: string
  value: Coannihilation
  onChange: (value: Coannihilation) => void
}) {
  const missing = missingPair(value)
  return (
    <>
      <Select
        label="Equilibrium weights"
        value={value.weights}
        options={[
          { value: 'exact', label: 'exact' },
          { value: 'nonrelativistic', label: 'non-relativistic' },
        ]}
        onChange={(weights) => onChange({ ...value, weights })}
      />
      <Partners path={path} value={value} onChange={onChange} />
      <Button onClick={() => onChange({ ...value, others: [...value.others, { ...value.others.at(-1)! }] })}>
        Add a partner
      </Button>
      {value.pairs.map((pair, index) => (
        <CrossSectionField
          key={`${pair.first}-${pair.second}`}
          path={`${path}.pairs[${index}].sWaveCm3PerS`}
          label={`s-wave of ${nameOf(pair.first)} with ${pair.first === pair.second ? 'itself' : nameOf(pair.second)}`}
          value={pair.sWaveCm3PerS}
          onChange={(sWaveCm3PerS) =>
            onChange({
              ...value,
              pairs: value.pairs.map((each, i) => (i === index ? { ...each, sWaveCm3PerS } : each)),
            })
          }
        />
      ))}
      {missing ? (
        <Button
          onClick={() =>
            onChange({
              ...value,
              pairs: [...value.pairs, { ...missing, sWaveCm3PerS: 1e-27, pWaveCm3PerS: 0 }],
            })
          }
        >
          Add {nameOf(missing.first)} with{' '}
          {missing.first === missing.second ? 'itself' : nameOf(missing.second)}
        </Button>
      ) : null}
    </>
  )
}
