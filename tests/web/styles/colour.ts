/** Colour arithmetic for the checks of the tokens. Components are linear-light sRGB between 0 and 1. */
export type Rgb = readonly [number, number, number]
type Matrix = readonly [Rgb, Rgb, Rgb]

const linear = (byte: number): number => {
  const share = byte / 255
  return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4
}

/** Linear-light components of #rrggbb (IEC 61966-2-1). */
export function rgbOf(hex: string): Rgb {
  const bytes = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(hex)
  if (!bytes) throw new Error(`${hex} is not a colour of six digits`)
  return [1, 2, 3].map((index) => linear(parseInt(bytes[index]!, 16))) as unknown as Rgb
}

const times = (matrix: Matrix, [r, g, b]: Rgb): Rgb =>
  matrix.map((row) => row[0] * r + row[1] * g + row[2] * b) as unknown as Rgb

/** Contrast ratio between two colours (WCAG 2.2, relative luminance). */
export function contrast(a: string, b: string): number {
  const [dark, light] = [a, b]
    .map((hex) => rgbOf(hex))
    .map(([red, green, blue]) => 0.2126 * red + 0.7152 * green + 0.0722 * blue)
    .sort((one, other) => one - other) as [number, number]
  return (light + 0.05) / (dark + 0.05)
}

/** Full dichromacy, Machado, Oliveira and Fernandes 2009, severity 1; [from memory]. Each row sums to one. */
export const DICHROMACY: Record<'protanopia' | 'deuteranopia' | 'tritanopia', Matrix> = {
  protanopia: [
    [0.152286, 1.052583, -0.204868],
    [0.114503, 0.786281, 0.099216],
    [-0.003882, -0.048116, 1.051998],
  ],
  deuteranopia: [
    [0.367322, 0.860646, -0.227968],
    [0.280085, 0.672501, 0.047413],
    [-0.01182, 0.04294, 0.968881],
  ],
  tritanopia: [
    [1.255528, -0.076749, -0.178779],
    [-0.078411, 0.930809, 0.147602],
    [0.004733, 0.691367, 0.3039],
  ],
}

export const seenBy = (matrix: Matrix, colour: Rgb): Rgb =>
  times(matrix, colour).map((part) => Math.min(1, Math.max(0, part))) as unknown as Rgb

const TO_XYZ: Matrix = [
  [0.4124564, 0.3575761, 0.1804375],
  [0.2126729, 0.7151522, 0.072175],
  [0.0193339, 0.119192, 0.9503041],
]
const WHITE: Rgb = [0.95047, 1, 1.08883]

function lab(colour: Rgb): Rgb {
  const [x, y, z] = times(TO_XYZ, colour).map((part, index) => {
    const share = part / WHITE[index]!
    return share > 216 / 24389 ? Math.cbrt(share) : ((24389 / 27) * share + 16) / 116
  }) as [number, number, number]
  return [116 * y - 16, 500 * (x - y), 200 * (y - z)]
}

/** CIE 1976 colour difference ΔE*ab, reference white D65. */
export function colourDifference(a: Rgb, b: Rgb): number {
  const [first, second] = [lab(a), lab(b)]
  return Math.hypot(first[0] - second[0], first[1] - second[1], first[2] - second[2])
}
