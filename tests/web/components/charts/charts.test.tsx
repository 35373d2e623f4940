import { cleanup, render, screen } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { AbundanceBar } from '../../../../web/src/components/charts/AbundanceBar.tsx'
import { TemperatureTick, TickNumber } from '../../../../web/src/components/charts/AxisLabels.tsx'
import { FactorLadder } from '../../../../web/src/components/charts/FactorLadder.tsx'
import { layOut } from '../layOut.ts'

beforeEach(() => layOut(300))
afterEach(() => {
  cleanup()
  vi.restoreAllMocks()
  vi.unstubAllGlobals()
})

const MEASURED = { omegaH2: 0.12, standardError: 0.0012 }

describe('the factor ladder, drawn', () => {
  const factors = [
    { label: 'bath', factor: 0.941 },
    { label: 'expansion', factor: 1.925 },
    { label: 'neutrinos', factor: null },
  ]
  const draw = () =>
    render(<FactorLadder baseline={0.0665} factors={factors} result={0.1205} measured={0.12} />)

  it('fills what raises the abundance, outlines what lowers it, and draws nothing for what is not known', () => {
    const { container } = draw()
    expect([...container.querySelectorAll('rect')].map((bar) => bar.getAttribute('fill'))).toEqual([
      'var(--paper)',
      'var(--ember)',
    ])
    expect(screen.getByText('not computable')).toBeTruthy()
  })

  it('tells the same in words', () => {
    draw()
    expect(screen.getByRole('img').getAttribute('aria-label')).toBe(
      'From 0.06650 in the baseline to 0.1205; bath times 0.9410; expansion times 1.925; neutrinos not computable; measured 0.12',
    )
  })
})

describe('the abundance bar, drawn', () => {
  const dot = (container: HTMLElement) => container.querySelector('circle')

  it('shows measurement and verdict in words, and the answer as a dot', () => {
    const { container } = render(<AbundanceBar omegaH2={0.1205} measured={MEASURED} verdict="0.4 % above" />)
    expect(screen.getByText('measured 0.1200 ± 0.0012')).toBeTruthy()
    expect(screen.getByText('0.4 % above')).toBeTruthy()
    expect(dot(container)).not.toBeNull()
  })

  it('has no dot for an answer of nothing, and none of a measurement that reaches below its axis is lost', () => {
    const wide = { omegaH2: 0.12, standardError: 0.2 }
    const { container } = render(<AbundanceBar omegaH2={0} measured={wide} verdict="none left" />)
    expect(dot(container)).toBeNull()
    expect(container.innerHTML).not.toContain('NaN')
  })
})

describe('labels of axes', () => {
  const text = (element: React.ReactNode): string => render(<svg>{element}</svg>).container.textContent

  it('write numbers out while they are short, and as powers of ten beyond', () => {
    expect(text(<TickNumber value={0.01} />)).toBe('0.01')
    expect(text(<TickNumber value={1e-4} />)).toBe('10−4')
    expect(text(<TickNumber value={2e-4} />)).toBe('2 × 10−4')
    expect(text(<TickNumber value={0.01} powers />)).toBe('10−2')
    expect(text(<TickNumber value={1} powers />)).toBe('1')
    expect(text(<TickNumber value={-2.5} />)).toBe('−2.5')
  })

  it('write temperatures in the unit that suits, and in powers of ten beyond the units', () => {
    expect(text(<TemperatureTick temperatureGeV={100} />)).toBe('100 GeV')
    expect(text(<TemperatureTick temperatureGeV={1e-3} />)).toBe('1 MeV')
    expect(text(<TemperatureTick temperatureGeV={1e-5} />)).toBe('10 keV')
    expect(text(<TemperatureTick temperatureGeV={1e7} />)).toBe('107 GeV')
  })
})
