import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { colourDifference, contrast, DICHROMACY, rgbOf, seenBy } from './colour.ts'

const SHEET = readFileSync('web/src/styles/tokens.css', 'utf8')

/** The colours a rule sets, by name. */
function coloursOf(selector: string): Record<string, string> {
  const start = SHEET.indexOf(`${selector} {`)
  if (start < 0) throw new Error(`tokens.css has no rule ${selector}`)
  const body = SHEET.slice(start, SHEET.indexOf('}', start))
  return Object.fromEntries(
    [...body.matchAll(/--([\w-]+):\s*(#[0-9a-f]{6})/gi)].map((match) => [match[1]!, match[2]!]),
  )
}

const DAY = coloursOf(':root')
const THEMES = { day: DAY, night: { ...DAY, ...coloursOf("[data-theme='night']") } }
const SERIES = [1, 2, 3, 4, 5, 6, 7, 8].map((number) => `series-${number}`)

/** ΔE below which two thin lines are easily mistaken for one another. */
const SEPARATE = 7

const pairs = SERIES.flatMap((one, index) => SERIES.slice(index + 1).map((other) => [one, other] as const))

describe.each(Object.entries(THEMES))('the colours of the %s', (_theme, colours) => {
  it.each(['ink', 'soft', 'ember', 'fault', 'good'])(
    'set text in --%s that can be read on every ground',
    (name) => {
      for (const ground of ['paper', 'raised', 'sunk'])
        expect(contrast(colours[name]!, colours[ground]!), `on --${ground}`).toBeGreaterThanOrEqual(4.5)
    },
  )

  it('set words and links that can be read on the ground of what stands out', () => {
    for (const name of ['ink', 'ember'])
      expect(contrast(colours[name]!, colours['ember-wash']!), `--${name}`).toBeGreaterThanOrEqual(4.5)
  })

  it('set the words of a primary button so that they can be read', () => {
    expect(contrast(colours['on-ink']!, colours['ink']!)).toBeGreaterThanOrEqual(4.5)
  })

  it('draw the edge of an input so that it can be seen', () => {
    expect(contrast(colours['faint']!, colours['raised']!)).toBeGreaterThanOrEqual(3)
  })

  it.each(SERIES)('draw --%s so that it can be seen on the paper', (name) => {
    expect(contrast(colours[name]!, colours['paper']!)).toBeGreaterThanOrEqual(3)
  })

  it.each(Object.entries(DICHROMACY))('keep every two series apart under %s', (_name, matrix) => {
    const close = pairs
      .map(([one, other]) => ({
        pair: `${one} and ${other}`,
        difference: colourDifference(
          seenBy(matrix, rgbOf(colours[one]!)),
          seenBy(matrix, rgbOf(colours[other]!)),
        ),
      }))
      .filter(({ difference }) => difference <= SEPARATE)
    expect(close).toEqual([])
  })
})

describe('what the browser draws itself, such as lists and scroll bars', () => {
  it.each([
    [':root', 'light'],
    ["[data-theme='night']", 'dark'],
  ])('is told by %s to be %s, whatever the system is', (selector, scheme) => {
    const rule = SHEET.slice(SHEET.indexOf(`${selector} {`))
    expect(rule.slice(0, rule.indexOf('}'))).toContain(`color-scheme: ${scheme};`)
  })
})

describe('the colour arithmetic', () => {
  it('finds the contrast of black on white', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10)
  })
  it('leaves greys grey in every kind of colour blindness', () => {
    for (const matrix of Object.values(DICHROMACY))
      for (const part of seenBy(matrix, [0.5, 0.5, 0.5])) expect(part).toBeCloseTo(0.5, 5)
  })
  it('puts red and green closer together without red or green cones', () => {
    const red = rgbOf('#c0392b')
    const green = rgbOf('#3f7f2a')
    for (const name of ['protanopia', 'deuteranopia'] as const) {
      const matrix = DICHROMACY[name]
      expect(colourDifference(seenBy(matrix, red), seenBy(matrix, green))).toBeLessThan(
        colourDifference(red, green) / 2,
      )
    }
  })
})
