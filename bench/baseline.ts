/** One millisecond or less of exponentials and square roots: how fast this machine is just now. */
export function baselineWork(): number {
  let sum = 0
  for (let i = 1; i <= 40_000; i++) sum += Math.exp(-i / 40_000) * Math.sqrt(i)
  return sum
}

export const BASELINE = 'baseline: 40,000 exp and sqrt'
