/**
 * Quantile of ascending values: linear between them, the smallest at 0 and the largest at 1.
 * Source: Hyndman & Fan, The American Statistician 50 (1996) 361, definition 7.
 */
export function quantile(ascending: ArrayLike<number>, probability: number): number {
  const place = (ascending.length - 1) * probability
  const below = Math.floor(place)
  const low = ascending[below]!
  return below + 1 < ascending.length ? low + (place - below) * (ascending[below + 1]! - low) : low
}
