import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { createCursor } from '../../../../web/src/components/charts/cursor.ts'
import { EmberLine } from '../../../../web/src/components/ember-line/EmberLine.tsx'
import { layOut } from '../layOut.ts'

const onWindow = vi.fn()
const cursor = createCursor()

const draw = (props: Partial<Parameters<typeof EmberLine>[0]> = {}) =>
  render(
    <EmberLine
      range={{ hotGeV: 1e4, coldGeV: 1e-4 }}
      window={{ hotGeV: 250, coldGeV: 2e-4 }}
      onWindow={onWindow}
      cursor={cursor}
      epochs={[
        { code: 'qcd-crossover', label: 'QCD crossover', temperatureGeV: 0.1565, importance: 9 },
        { code: 'maximum-temperature', label: 'maximum', temperatureGeV: 1e8, importance: 9 },
      ]}
      times={[{ temperatureGeV: 1, timeS: 1.7e-7 }]}
      mark={{ kind: 'freeze-out', temperatureGeV: 4.3532 }}
      {...props}
    />,
  )

const handle = (end: 'Hot' | 'Cold'): HTMLElement =>
  screen.getByRole('slider', { name: `${end} end of the window` })

beforeEach(() => layOut(1200))
afterEach(() => {
  cleanup()
  vi.restoreAllMocks()
  vi.unstubAllGlobals()
  onWindow.mockReset()
})

describe('the ends of the window', () => {
  it('tell their temperature in units', () => {
    draw()
    expect(handle('Hot').getAttribute('aria-valuetext')).toBe('250 GeV')
    expect(handle('Cold').getAttribute('aria-valuetext')).toBe('200 keV')
  })

  it('move to the hot at the left arrow and to the cold at the right', () => {
    draw()
    fireEvent.keyDown(handle('Hot'), { key: 'ArrowLeft' })
    expect(onWindow).toHaveBeenLastCalledWith(312.5, 2e-4)
    fireEvent.keyDown(handle('Cold'), { key: 'ArrowRight' })
    expect(onWindow).toHaveBeenLastCalledWith(250, 1.6e-4)
  })

  it('go to the ends of the line at Home and End, and no farther', () => {
    draw()
    fireEvent.keyDown(handle('Hot'), { key: 'Home' })
    expect(onWindow).toHaveBeenLastCalledWith(1e4, 2e-4)
    fireEvent.keyDown(handle('Cold'), { key: 'End' })
    expect(onWindow).toHaveBeenLastCalledWith(250, 1e-4)
  })

  it('leave the window alone at any other key and at the end of the line', () => {
    draw({ window: { hotGeV: 1e4, coldGeV: 2e-4 } })
    fireEvent.keyDown(handle('Hot'), { key: 'Enter' })
    fireEvent.keyDown(handle('Hot'), { key: 'ArrowLeft' })
    expect(onWindow).not.toHaveBeenCalled()
  })
})

describe('the ember line', () => {
  it('names the mark with its temperature, and the epochs that lie on it', () => {
    draw()
    expect(screen.getByText('freeze-out, 4.35 GeV')).toBeTruthy()
    expect(screen.getByText('QCD crossover')).toBeTruthy()
    expect(screen.queryByText('maximum')).toBeNull()
  })

  it('writes ages beneath on a wide page and leaves them out on a narrow one', () => {
    draw()
    expect(screen.getByText('170 ns')).toBeTruthy()
    cleanup()
    layOut(360)
    draw()
    expect(screen.queryByText('170 ns')).toBeNull()
    expect(handle('Hot')).toBeTruthy()
  })

  it('draws nothing, without fault, before it has a width', () => {
    layOut(0)
    const { container } = draw()
    expect(container.querySelector('svg')).toBeNull()
  })

  it('stands without a report', () => {
    draw({ epochs: [], times: [], mark: null })
    expect(screen.getByText('100 MeV')).toBeTruthy()
  })
})
