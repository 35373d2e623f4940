/** A chart as a file: the drawing with its colours written in, the picture, the numbers. */
import type { Curve } from '#core/bench/types'
import { valueAtTemperature } from './curvePath.ts'
import { saveFile } from '../../lib/saveFile.ts'
import type { Series } from './series.ts'

const fileName = (title: string, ending: string): string =>
  `${title
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '')}.${ending}`

const DRAWN = [
  'fill',
  'stroke',
  'stroke-width',
  'stroke-dasharray',
  'stroke-linejoin',
  'paint-order',
  'shape-rendering',
  'opacity',
  'font-family',
  'font-size',
  'font-weight',
  'font-style',
  'text-anchor',
] as const

/** The drawing with every style it inherits from the page written into it. */
function standalone(svg: SVGSVGElement): string {
  const copy = svg.cloneNode(true) as SVGSVGElement
  const originals = [svg, ...svg.querySelectorAll<SVGElement>('*')]
  const copies = [copy, ...copy.querySelectorAll<SVGElement>('*')]
  originals.forEach((original, i) => {
    const style = getComputedStyle(original)
    for (const property of DRAWN) copies[i]!.style.setProperty(property, style.getPropertyValue(property))
  })
  copy.setAttribute('xmlns', 'http://www.w3.org/2000/svg')
  copy.style.setProperty('background', getComputedStyle(document.documentElement).backgroundColor)
  return new XMLSerializer().serializeToString(copy)
}

export function saveSvg(svg: SVGSVGElement, title: string): void {
  saveFile(new Blob([standalone(svg)], { type: 'image/svg+xml' }), fileName(title, 'svg'))
}

const PNG_SCALE = 2

export async function savePng(svg: SVGSVGElement, title: string): Promise<void> {
  const image = new Image()
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(standalone(svg))}`
  await image.decode()
  const canvas = document.createElement('canvas')
  canvas.width = svg.clientWidth * PNG_SCALE
  canvas.height = svg.clientHeight * PNG_SCALE
  const context = canvas.getContext('2d')
  if (!context) return
  context.fillStyle = getComputedStyle(document.documentElement).backgroundColor
  context.fillRect(0, 0, canvas.width, canvas.height)
  context.drawImage(image, 0, 0, canvas.width, canvas.height)
  canvas.toBlob((blob) => {
    if (blob) saveFile(blob, fileName(title, 'png'))
  })
}

/** The value in row i: as computed where the curve has this very temperature, else by its neighbours. */
function cell(curve: Curve, temperature: number, i: number): number | '' {
  const same = curve.temperatureGeV[i] === temperature
  const value = same ? curve.value[i]! : valueAtTemperature(curve, temperature)
  return Number.isFinite(value) ? value : ''
}

/** Rows of the shown curves at the temperatures of the first, empty where a curve is not defined: RFC 4180. */
export function csvText(series: readonly Series[]): string {
  const header = ['temperatureGeV', ...series.map((each) => each.id)].join(',')
  const grid = series[0]?.curve.temperatureGeV ?? new Float64Array()
  const rows = [...grid].map((temperature, i) =>
    [temperature, ...series.map(({ curve }) => cell(curve, temperature, i))].join(','),
  )
  return [header, ...rows].join('\r\n') + '\r\n'
}

export function saveCsv(series: readonly Series[], title: string): void {
  saveFile(new Blob([csvText(series)], { type: 'text/csv' }), fileName(title, 'csv'))
}
