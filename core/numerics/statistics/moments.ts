export interface Moments {
  mean: number
  /** With n − 1 in the denominator; zero for one value. */
  standardDeviation: number
}

/** Mean and standard deviation, in one pass: Welford, Technometrics 4 (1962) 419. */
export function moments(values: ArrayLike<number>): Moments {
  let mean = 0
  let squares = 0
  for (let i = 0; i < values.length; i++) {
    const difference = values[i]! - mean
    mean += difference / (i + 1)
    squares += difference * (values[i]! - mean)
  }
  return { mean, standardDeviation: values.length > 1 ? Math.sqrt(squares / (values.length - 1)) : 0 }
}
