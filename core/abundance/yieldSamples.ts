/** Wanted values of ln x, ascending, and the ln Y found there; NaN where the particle does not exist yet. */
export interface YieldSamples {
  readonly lnX: Float64Array
  readonly lnYield: Float64Array
}

export const emptySamples = (lnX: Float64Array): YieldSamples => ({
  lnX,
  lnYield: new Float64Array(lnX.length).fill(NaN),
})

/** Fills samples in as a solution advances. */
export class Sampler {
  private readonly samples: YieldSamples | null
  private next = 0

  constructor(samples: YieldSamples | null) {
    this.samples = samples
  }

  /** Whether there is a curve to fill in. */
  get wanted(): boolean {
    return this.samples !== null
  }

  /** Fills every sample not yet filled with ln x ≤ `to`. */
  upTo(to: number, lnYieldAt: (lnX: number) => number): void {
    const { samples } = this
    if (!samples) return
    while (this.next < samples.lnX.length && samples.lnX[this.next]! <= to) {
      samples.lnYield[this.next] = lnYieldAt(samples.lnX[this.next]!)
      this.next++
    }
  }
}
