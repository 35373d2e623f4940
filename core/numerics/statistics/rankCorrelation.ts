/**
 * Spearman's rank correlation: the correlation coefficient of the ranks, equal values sharing the mean of their ranks.
 * Source: Spearman, Am. J. Psychol. 15 (1904) 72; ties as in Kendall, Rank Correlation Methods (1948), chapter 3.
 * @returns −1 to 1; null when all values of either are equal
 */
export function rankCorrelation(first: ArrayLike<number>, second: ArrayLike<number>): number | null {
  const [a, b] = [ranks(first), ranks(second)]
  const middle = (a.length + 1) / 2
  let [ab, aa, bb] = [0, 0, 0]
  for (let i = 0; i < a.length; i++) {
    const [da, db] = [a[i]! - middle, b[i]! - middle]
    ab += da * db
    aa += da * da
    bb += db * db
  }
  return aa > 0 && bb > 0 ? ab / Math.sqrt(aa * bb) : null
}

/** Rank of each value, 1 for the smallest. */
export function ranks(values: ArrayLike<number>): Float64Array {
  const order = Float64Array.from({ length: values.length }, (_, i) => i).sort(
    (i, j) => values[i]! - values[j]!,
  )
  const result = new Float64Array(values.length)
  for (let from = 0; from < order.length;) {
    let to = from + 1
    while (to < order.length && values[order[to]!] === values[order[from]!]) to++
    for (let i = from; i < to; i++) result[order[i]!] = (from + 1 + to) / 2
    from = to
  }
  return result
}
