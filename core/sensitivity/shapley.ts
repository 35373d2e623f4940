/**
 * Exact Shapley values: the split of v(all) − v(none) over players, each player's part being its mean marginal effect over
 * all orders in which the players can join. The parts add up to the whole.
 * Source: Shapley, in Contributions to the Theory of Games II (1953) 307.
 * @param players number of players, at most 12: all 2^players subsets are asked for
 * @param valueOf value of a subset given as a bit mask
 */
export function shapleyValues(players: number, valueOf: (subset: number) => number): number[] {
  const values = Float64Array.from({ length: 2 ** players }, (_, subset) => valueOf(subset))
  const weights = joinWeights(players)
  return Array.from({ length: players }, (_, player) => {
    const bit = 1 << player
    let part = 0
    for (let subset = 0; subset < values.length; subset++) {
      if ((subset & bit) === 0) part += weights[bitCount(subset)]! * (values[subset | bit]! - values[subset]!)
    }
    return part
  })
}

/** |S|! (n − |S| − 1)!/n! for each size of S: the share of orders in which a player joins right after S. */
function joinWeights(players: number): number[] {
  let choose = 1
  return Array.from({ length: players }, (_, size) => {
    const weight = 1 / (players * choose)
    choose = (choose * (players - 1 - size)) / (size + 1)
    return weight
  })
}

function bitCount(subset: number): number {
  let count = 0
  for (let rest = subset; rest > 0; rest &= rest - 1) count++
  return count
}
