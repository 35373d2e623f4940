const SIGNS: Record<string, string> = { '-': '⁻' }

/** An integer in raised figures, for where text cannot be marked up: 10⁻²¹. */
export const superscript = (power: number): string =>
  String(power).replace(/[-\d]/g, (sign) => SIGNS[sign] ?? '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(sign)]!)
