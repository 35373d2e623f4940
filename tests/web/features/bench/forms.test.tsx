import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { useState } from 'react'
import { afterEach, describe, expect, it } from 'vitest'
import { candidateInput, historyInput } from '#core/wire/index'
import type { AssumptionGroup, CandidateInput, HistoryInput, Mechanism } from '#core/wire/index'
import { Formula } from '../../../../web/src/components/ui/Formula.tsx'
import { FaultProvider } from '../../../../web/src/features/bench/faults.tsx'
import { CandidateForm } from '../../../../web/src/features/bench/forms/CandidateForm.tsx'
import { AssumptionForm } from '../../../../web/src/features/bench/forms/HistoryForms.tsx'
import { ANNIHILATION_TITLES, BATH_TITLES, MECHANISM_TITLES } from '../../../../web/src/lib/describe.tsx'

afterEach(cleanup)

const wimp = candidateInput.parse({
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
})

let candidate: CandidateInput
let history: HistoryInput

function CandidateBench({ start }: { start: CandidateInput }) {
  const [value, setValue] = useState(start)
  candidate = value
  return <CandidateForm value={value} onChange={setValue} />
}

function HistoryBench({ group }: { group: AssumptionGroup }) {
  const [value, setValue] = useState(() => historyInput.parse({}))
  history = value
  return <AssumptionForm group={group} history={value} onChange={setValue} />
}

const choose = (label: string, option: string): void => {
  fireEvent.change(screen.getByLabelText(label), { target: { value: option } })
}

describe('the candidate’s form', () => {
  it.each(Object.keys(MECHANISM_TITLES) as Mechanism[])(
    'begins %s with an input the core takes',
    (mechanism) => {
      render(<CandidateBench start={wimp} />)
      choose('Mechanism', mechanism)
      expect(candidateInput.safeParse(candidate).error?.issues ?? []).toEqual([])
      expect(candidate.mechanism).toBe(mechanism)
    },
  )

  it.each(Object.keys(ANNIHILATION_TITLES))(
    'begins annihilation by %s with an input the core takes',
    (kind) => {
      render(<CandidateBench start={wimp} />)
      choose('Annihilation', kind)
      expect(candidateInput.safeParse(candidate).error?.issues ?? []).toEqual([])
    },
  )

  it('takes a quantity in another unit, keeps what was typed, and hands on the base unit', () => {
    render(<CandidateBench start={wimp} />)
    const mass = screen.getByLabelText<HTMLInputElement>('Mass')
    fireEvent.change(mass, { target: { value: '0.25 TeV' } })
    expect(mass.value).toBe('0.25 TeV')
    expect(candidate.massGeV).toBe(250)
  })

  it('leaves the last good number when the text is none, and says what would do', () => {
    render(<CandidateBench start={wimp} />)
    const mass = screen.getByLabelText<HTMLInputElement>('Mass')
    fireEvent.change(mass, { target: { value: 'about ten' } })
    expect(screen.getByRole('alert').textContent).toContain('does not begin with a number')
    expect(mass.getAttribute('aria-invalid')).toBe('true')
    expect(candidate.massGeV).toBe(100)
  })

  it('shows what the core found wrong beside the field of that path', () => {
    render(
      <FaultProvider faults={[{ path: 'candidate.massGeV', message: 'allowed: above 0', value: -1 }]}>
        <CandidateForm value={wimp} onChange={() => undefined} />
      </FaultProvider>,
    )
    const mass = screen.getByLabelText('Mass')
    const described = mass.getAttribute('aria-describedby')!
    expect(document.getElementById(described)?.textContent).toBe('allowed: above 0')
  })

  it('reads pasted rows and names the first that is none', () => {
    render(<CandidateBench start={wimp} />)
    choose('Annihilation', 'table')
    const rows = screen.getByLabelText(/^Rows/)
    fireEvent.change(rows, { target: { value: '# x, rate\n1; 2e-26\n10\t3e-26\n' } })
    expect(candidate).toMatchObject({
      annihilation: {
        points: [
          [1, 2e-26],
          [10, 3e-26],
        ],
      },
    })
    fireEvent.change(rows, { target: { value: '1 2e-26\nten 3e-26' } })
    expect(screen.getByText(/^Line 2 is not two numbers/)).toBeDefined()
  })

  it('takes a partner of coannihilation away together with its pairs', () => {
    render(<CandidateBench start={wimp} />)
    choose('Annihilation', 'coannihilation')
    fireEvent.click(screen.getByRole('button', { name: 'Add a partner' }))
    fireEvent.click(screen.getByRole('button', { name: 'Remove partner 1' }))
    expect(candidateInput.safeParse(candidate).error?.issues ?? []).toEqual([])
    expect(candidate).toMatchObject({ annihilation: { pairs: [{ first: 0, second: 0 }] } })
  })
})

describe('the forms of the assumptions', () => {
  it('take a pasted bath, say what its only column is, and show what the core found in a row', () => {
    const fault = { path: 'history.bath.points[2].gS', message: 'allowed: above 17', value: 1 }
    render(
      <FaultProvider faults={[fault]}>
        <HistoryBench group="bath" />
      </FaultProvider>,
    )
    choose('Treatment', 'uploaded')
    expect(screen.getByText('row 3, gS: allowed: above 17')).toBeDefined()
    expect(screen.queryByLabelText('The column beside T')).toBeNull()
    const rows = screen.getByLabelText<HTMLTextAreaElement>(/^Rows of T/)
    fireEvent.change(rows, { target: { value: 'T\tg_s\n0.01 11\n0.1 17\n0.5 62\n2 73' } })
    expect(history.bath).toEqual({
      treatment: 'uploaded',
      points: [
        { temperatureGeV: 0.01, gS: 11 },
        { temperatureGeV: 0.1, gS: 17 },
        { temperatureGeV: 0.5, gS: 62 },
        { temperatureGeV: 2, gS: 73 },
      ],
    })
    expect(historyInput.safeParse(history).success).toBe(true)
    choose('The column beside T', 'gRho')
    expect(history.bath).toMatchObject({ points: [{ temperatureGeV: 0.01, gRho: 11 }, {}, {}, {}] })
    fireEvent.change(rows, { target: { value: '0.01 11\n0.1 17\nhalf 62' } })
    expect(screen.getByText(/^Line 3 is not two or three numbers/)).toBeDefined()
    expect(history.bath).toMatchObject({ points: [{}, {}, {}, {}] })
  })

  it.each(Object.keys(BATH_TITLES))('begin the bath %s with its defaults', (treatment) => {
    render(<HistoryBench group="bath" />)
    choose('Treatment', treatment)
    // A table has no default: it begins with one to be replaced.
    const points = 'points' in history.bath ? { points: history.bath.points } : {}
    expect(history).toEqual(historyInput.parse({ bath: { treatment, ...points } }))
  })

  it.each(['radiation', 'fluid', 'early-matter', 'entropy-step'])(
    'begin the expansion %s with an input the core takes',
    (kind) => {
      render(<HistoryBench group="expansion" />)
      choose('What ran the expansion', kind)
      expect(historyInput.safeParse(history).error?.issues ?? []).toEqual([])
    },
  )

  it('add and remove an extra species', () => {
    render(<HistoryBench group="extraSpecies" />)
    fireEvent.click(screen.getByRole('button', { name: 'Add a species' }))
    choose('Temperature', 'decoupled')
    expect(historyInput.safeParse(history).error?.issues ?? []).toEqual([])
    expect(history.extraSpecies).toHaveLength(1)
    fireEvent.click(screen.getByRole('button', { name: /^Remove/ }))
    expect(history.extraSpecies).toEqual([])
  })

  it('bound the maximum temperature and free it again', () => {
    render(<HistoryBench group="maximumTemperatureGeV" />)
    const bounded = screen.getByRole('switch')
    fireEvent.click(bounded)
    expect(history.maximumTemperatureGeV).toBe(1000)
    fireEvent.click(bounded)
    expect(history.maximumTemperatureGeV).toBeNull()
  })
})

describe('a formula', () => {
  it('sets its scripts', () => {
    const { container } = render(<Formula text="2 + (21/11)(N_eff/3)^(3/4) Ω_χh²" />)
    expect([...container.querySelectorAll('sub')].map((each) => each.textContent)).toEqual(['eff', 'χ'])
    expect(container.querySelector('sup')?.textContent).toBe('3/4')
    expect(container.textContent).toBe('2 + (21/11)(Neff/3)3/4 Ωχh²')
  })
})
