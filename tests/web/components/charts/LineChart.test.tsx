import { act, cleanup, fireEvent, render, screen, within } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { LineChart } from '../../../../web/src/components/charts/LineChart.tsx'
import { createCursor } from '../../../../web/src/components/charts/cursor.ts'
import { csvText } from '../../../../web/src/components/charts/exportChart.ts'
import { usualDomain } from '../../../../web/src/components/charts/series.ts'
import type { Series } from '../../../../web/src/components/charts/series.ts'
import { layOut } from '../layOut.ts'

const grid = Float64Array.from({ length: 101 }, (_, i) => 10 ** (2 - i / 25))
const series = (id: string, valueAt: (temperatureGeV: number) => number): Series => ({
  id,
  name: id,
  shortName: id,
  curve: { temperatureGeV: grid, value: grid.map(valueAt) },
  colour: '--series-1',
})
const SERIES = [series('this history', (t) => 10 * t), series('baseline', (t) => (t > 1 ? NaN : 5))]

const onWindow = vi.fn()
const onReset = vi.fn()
let cursor = createCursor()

const draw = (cursorGeV: number | null = null, shown: readonly Series[] = SERIES) => {
  cursor.move(cursorGeV)
  return render(
    <LineChart
      title="Yield"
      description="Yield against temperature"
      height={300}
      window={{ hotGeV: 100, coldGeV: 0.01 }}
      onWindow={onWindow}
      onReset={onReset}
      cursor={cursor}
      y={{ scale: 'log', label: 'Y' }}
      series={shown}
      marks={[]}
    />,
  )
}
const plane = (): HTMLElement => screen.getByRole('slider', { name: /Temperature cursor of Yield/ })
const summaryOf = (container: HTMLElement): string => container.querySelector('p.sr-only')!.textContent

beforeEach(() => {
  layOut(800)
  cursor = createCursor()
})
afterEach(() => {
  cleanup()
  vi.restoreAllMocks()
  vi.unstubAllGlobals()
  vi.clearAllMocks()
})

describe('a chart', () => {
  it('tells start, end, least and greatest of each curve to those who hear it', () => {
    const { container } = draw()
    expect(summaryOf(container)).toContain(
      'this history: 1.00e+3 at the hot end, 0.100 at the cold end, between 0.100 and 1.00e+3.',
    )
    expect(summaryOf(container)).toContain('baseline: 5.00 at the hot end')
  })

  it('reads the shown curves at the cursor', () => {
    draw(1)
    expect(screen.getByText('1 GeV', { selector: 'span' })).toBeTruthy()
    expect(screen.getByText('10', { selector: '.number' })).toBeTruthy()
    expect(screen.getByText('5', { selector: '.number' })).toBeTruthy()
  })

  it('follows a cursor that is moved elsewhere on the page, and clears when it leaves', () => {
    draw()
    expect(screen.queryByText('1 GeV', { selector: 'span' })).toBeNull()
    act(() => cursor.move(1))
    expect(screen.getByText('10', { selector: '.number' })).toBeTruthy()
    act(() => cursor.move(null))
    expect(screen.queryByText('10', { selector: '.number' })).toBeNull()
  })

  it('hides and shows a curve by its name', () => {
    const { container } = draw()
    const button = screen.getByRole('button', { name: 'baseline' })
    fireEvent.click(button)
    expect(button.getAttribute('aria-pressed')).toBe('false')
    expect(summaryOf(container)).not.toContain('baseline')
    fireEvent.click(button)
    expect(summaryOf(container)).toContain('baseline')
  })

  it('opens its numbers in at most 40 rows, a dash where a curve is not defined', () => {
    draw()
    fireEvent.click(screen.getByRole('button', { name: 'data' }))
    const rows = within(screen.getByRole('table')).getAllByRole('row')
    expect(rows.length - 1).toBeGreaterThan(20)
    expect(rows.length - 1).toBeLessThanOrEqual(40)
    expect(rows[1]!.textContent).toContain('–')
  })

  it('moves its cursor, zooms and resets by keyboard, leaving the browser its own keys', () => {
    draw(1)
    fireEvent.keyDown(plane(), { key: 'ArrowRight' })
    expect(cursor.read()!).toBeLessThan(1)
    fireEvent.keyDown(plane(), { key: '+' })
    expect(onWindow.mock.lastCall![0]).toBeLessThan(100)
    fireEvent.keyDown(plane(), { key: '0' })
    expect(onReset).toHaveBeenCalledOnce()
    fireEvent.keyDown(plane(), { key: '+', ctrlKey: true })
    expect(onWindow).toHaveBeenCalledOnce()
  })

  it('stands with no curve and with nothing but undefined values', () => {
    draw(1, [])
    cleanup()
    const { container } = draw(1, [series('unknown', () => NaN)])
    expect(summaryOf(container)).toBe('unknown: nothing in this window.')
    expect(container.innerHTML).not.toContain('NaN')
  })
})

describe('its file of numbers', () => {
  it('has one row a temperature, empty where a curve is not defined', () => {
    const lines = csvText(SERIES).split('\r\n')
    expect(lines[0]).toBe('temperatureGeV,this history,baseline')
    expect(lines[1]).toBe('100,1000,')
    expect(lines).toHaveLength(103)
  })

  it('reads a curve of other temperatures at those of the first', () => {
    const other = series('other', () => 0)
    const curve = { temperatureGeV: Float64Array.of(100, 1, 0.01), value: Float64Array.of(0, 2, 4) }
    const lines = csvText([SERIES[0]!, { ...other, curve }]).split('\r\n')
    expect(Number(lines[26]!.split(',')[2])).toBeCloseTo(1)
  })
})

describe('the usual axis of values', () => {
  it('begins at zero when linear and holds whole decades when logarithmic', () => {
    expect(usualDomain(SERIES, 'linear')).toEqual([0, 1080])
    expect(usualDomain([series('one', (t) => 3 * t)], 'log')).toEqual([0.01, 1000])
  })

  it('exists without any value', () => {
    expect(usualDomain([], 'linear')).toEqual([0, 1])
    expect(usualDomain([], 'log')).toEqual([0.1, 1])
  })
})
