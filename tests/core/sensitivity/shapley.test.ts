import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { shapleyValues } from '#core/sensitivity/shapley'

/** A game: the number of its players, and the value of every subset of them. */
interface Game {
  players: number
  values: number[]
}

const value = fc.double({ min: -5, max: 5, noNaN: true })
const playing = (least: number) => fc.integer({ min: least, max: 10 })
const valuesFor = (players: number) => fc.array(value, { minLength: 2 ** players, maxLength: 2 ** players })
const game = (least = 1) =>
  playing(least).chain((players) => valuesFor(players).map((values): Game => ({ players, values })))

const parts = ({ players, values }: Game): number[] => shapleyValues(players, (subset) => values[subset]!)

/** Every part is a mean of differences of numbers up to 5 over 512 subsets: rounding is far below this. */
const ROUNDING = 1e-12

describe('Shapley values (Shapley 1953: the only split with these properties)', () => {
  it('add up to the whole change (efficiency)', () => {
    fc.assert(
      fc.property(game(), (any) => {
        const sum = parts(any).reduce((total, part) => total + part, 0)
        expect(Math.abs(sum - (any.values.at(-1)! - any.values[0]!))).toBeLessThan(ROUNDING)
      }),
    )
  })

  it('give a player that adds the same to everyone just that, and one that adds nothing nothing (dummy)', () => {
    fc.assert(
      fc.property(
        game(2),
        fc.nat(),
        fc.oneof(fc.constant(0), value),
        ({ players, values }, chosen, alone) => {
          const bit = 1 << (chosen % players)
          const withDummy = values.map((_, subset) => values[subset & ~bit]! + (subset & bit ? alone : 0))
          const own = parts({ players, values: withDummy })[chosen % players]!
          expect(Math.abs(own - alone)).toBeLessThan(ROUNDING)
        },
      ),
    )
  })

  it('are those of the renamed players when players are renamed (symmetry, and no order of reading)', () => {
    fc.assert(
      fc.property(
        game(2).chain((any) =>
          fc
            .shuffledSubarray([...Array(any.players).keys()], { minLength: any.players })
            .map((order) => ({ any, order })),
        ),
        ({ any, order }) => {
          const renamed = (subset: number): number =>
            order.reduce((set, old, i) => (subset & (1 << i) ? set | (1 << old) : set), 0)
          const there = shapleyValues(any.players, (subset) => any.values[renamed(subset)]!)
          const here = parts(any)
          order.forEach((old, i) => expect(Math.abs(there[i]! - here[old]!)).toBeLessThan(ROUNDING))
        },
      ),
    )
  })

  it('of a sum of games are the sums (additivity)', () => {
    fc.assert(
      fc.property(
        playing(1).chain((players) => fc.tuple(valuesFor(players), valuesFor(players), fc.constant(players))),
        ([first, second, players]) => {
          const [a, b] = [parts({ players, values: first }), parts({ players, values: second })]
          const sum = parts({ players, values: first.map((each, i) => each + second[i]!) })
          sum.forEach((part, i) => expect(Math.abs(part - (a[i]! + b[i]!))).toBeLessThan(ROUNDING))
        },
      ),
    )
  })

  it('are the mean marginal effects over all orders', () => {
    const orders = (players: number[]): number[][] =>
      players.length === 0
        ? [[]]
        : players.flatMap((player) =>
            orders(players.filter((other) => other !== player)).map((rest) => [player, ...rest]),
          )
    fc.assert(
      fc.property(valuesFor(5), (values) => {
        const all = orders([0, 1, 2, 3, 4])
        const mean = [0, 0, 0, 0, 0]
        for (const order of all) {
          let subset = 0
          for (const player of order) {
            mean[player]! += (values[subset | (1 << player)]! - values[subset]!) / all.length
            subset |= 1 << player
          }
        }
        parts({ players: 5, values }).forEach((part, i) =>
          expect(Math.abs(part - mean[i]!)).toBeLessThan(ROUNDING),
        )
      }),
      { numRuns: 20 },
    )
  })
})
