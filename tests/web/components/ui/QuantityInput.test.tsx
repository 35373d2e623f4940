import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { useState } from 'react'
import { afterEach, describe, expect, it } from 'vitest'
import { QuantityInput } from '../../../../web/src/components/ui/QuantityInput.tsx'

/** A form that keeps what it is told, and can be told otherwise from outside. */
function Form({ fault, hint }: { fault?: string; hint?: string }) {
  const [mass, setMass] = useState(100)
  return (
    <>
      <QuantityInput
        label="Mass"
        hint={hint}
        value={mass}
        dimension="energy"
        unit="GeV"
        fault={fault}
        onCommit={setMass}
      />
      <output>{mass}</output>
      <button type="button" onClick={() => setMass(7)}>
        Set 7
      </button>
    </>
  )
}

const field = () => screen.getByLabelText<HTMLInputElement>('Mass')
const kept = () => screen.getByRole('status').textContent
const type = (text: string): void => {
  fireEvent.change(field(), { target: { value: text } })
}
const described = () =>
  (field().getAttribute('aria-describedby') ?? '')
    .split(' ')
    .map((id) => document.getElementById(id)?.textContent)
    .join(' ')

afterEach(cleanup)

describe('the input of a quantity', () => {
  it('takes what is typed at once, in the unit typed, and leaves the text as it is', () => {
    render(<Form />)
    type('156.5 MeV')
    expect(kept()).toBe('0.1565')
    expect(field().value).toBe('156.5 MeV')
  })

  it('says beside the field what is wrong, keeps the text, and keeps the last good number', () => {
    render(<Form hint="Rest mass" />)
    type('250')
    type('heavy')
    expect(field().value).toBe('heavy')
    expect(kept()).toBe('250')
    expect(field().getAttribute('aria-invalid')).toBe('true')
    expect(described()).toContain('Rest mass')
    expect(described()).toContain('“heavy” does not begin with a number')
    fireEvent.blur(field())
    expect(field().value).toBe('heavy')
  })

  it('shows a fault found by the core as its own', () => {
    render(<Form fault="allowed: above 0" />)
    expect(described()).toBe('allowed: above 0')
    expect(screen.getByRole('alert').textContent).toBe('allowed: above 0')
  })

  it('steps the last digit with the arrow keys and keeps the unit', () => {
    render(<Form />)
    type('2.50 TeV')
    fireEvent.keyDown(field(), { key: 'ArrowUp' })
    expect(field().value).toBe('2.51 TeV')
    fireEvent.keyDown(field(), { key: 'ArrowDown' })
    fireEvent.keyDown(field(), { key: 'ArrowDown' })
    expect(field().value).toBe('2.49 TeV')
    expect(Number(kept())).toBeCloseTo(2490, 9)
  })

  it('shows the number that replaces what was typed, as when a change is undone', () => {
    render(<Form />)
    type('250 GeV')
    fireEvent.click(screen.getByRole('button', { name: 'Set 7' }))
    expect(field().value).toBe('7')
  })
})
