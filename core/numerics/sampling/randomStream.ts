/** Random words in a row: a stream of its own for each name and seed. */
import { sha256 } from '@noble/hashes/sha2.js'
import { utf8ToBytes } from '@noble/hashes/utils.js'
import { philox } from './philox.ts'

const WORDS = 4
const TWO_32 = 2 ** 32

export class RandomStream {
  private readonly key: Uint32Array
  private readonly counter: Uint32Array
  private readonly block = new Uint32Array(WORDS)
  private used = WORDS

  /**
   * @param name what the numbers are for; streams of different names have nothing to do with each other
   * @param seed whole number from 0 to 2⁵³ − 1
   */
  constructor(name: string, seed: number) {
    const digest = sha256(utf8ToBytes(name))
    const words = new DataView(digest.buffer, digest.byteOffset)
    this.key = Uint32Array.of(words.getUint32(0), words.getUint32(4))
    this.counter = Uint32Array.of(0, 0, seed % TWO_32, Math.floor(seed / TWO_32))
  }

  /** The next word, 0 to 2³² − 1. */
  word(): number {
    if (this.used === WORDS) {
      philox(this.counter, this.key, this.block)
      this.counter[0]!++
      if (this.counter[0] === 0) this.counter[1]!++
      this.used = 0
    }
    return this.block[this.used++]!
  }

  /** The next number strictly between 0 and 1, a multiple of 2⁻³³. */
  fraction(): number {
    return (this.word() + 0.5) / TWO_32
  }

  /** The next whole number from 0 to n − 1, each equally likely: words beyond the last full round of n are left out. */
  below(n: number): number {
    const full = TWO_32 - (TWO_32 % n)
    for (;;) {
      const word = this.word()
      if (word < full) return word % n
    }
  }
}
