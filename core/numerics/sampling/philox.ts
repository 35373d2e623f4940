/**
 * Philox4x32-10, a counter-based generator: four 32-bit words that look random from a counter of four and a key of two. It keeps
 * no state, so any word of any stream can be had by itself, and is the same on every machine.
 * Source: Salmon, Moraes, Dror, Shaw, "Parallel random numbers: as easy as 1, 2, 3", SC11 (2011).
 */
const ROUNDS = 10
const MULTIPLIER_0 = 0xd2511f53
const MULTIPLIER_1 = 0xcd9e8d57
/** What the key grows by each round: the golden ratio and √3 − 1, as binary fractions. */
const WEYL_0 = 0x9e3779b9
const WEYL_1 = 0xbb67ae85

/** The upper 32 bits of a product of two 32-bit words; every step is exact in a double. */
function upper(a: number, b: number): number {
  const low = (a & 0xffff) * b
  const high = (a >>> 16) * b + Math.floor(low / 0x10000)
  return Math.floor(high / 0x10000)
}

/** Writes the four words, 0 to 2³² − 1, that belong to a counter and a key into `out`. */
export function philox(counter: Readonly<Uint32Array>, key: Readonly<Uint32Array>, out: Uint32Array): void {
  let [c0, c1, c2, c3] = [counter[0]!, counter[1]!, counter[2]!, counter[3]!]
  let [k0, k1] = [key[0]!, key[1]!]
  for (let round = 0; round < ROUNDS; round++) {
    const high0 = upper(MULTIPLIER_0, c0)
    const high1 = upper(MULTIPLIER_1, c2)
    const low0 = Math.imul(MULTIPLIER_0, c0)
    const low1 = Math.imul(MULTIPLIER_1, c2)
    c0 = (high1 ^ c1 ^ k0) >>> 0
    c1 = low1 >>> 0
    c2 = (high0 ^ c3 ^ k1) >>> 0
    c3 = low0 >>> 0
    k0 = (k0 + WEYL_0) >>> 0
    k1 = (k1 + WEYL_1) >>> 0
  }
  out[0] = c0
  out[1] = c1
  out[2] = c2
  out[3] = c3
}
