/** Moves label heights apart so that none are closer than `gap`, in their order, within the frame. */
export function spread(
  heights: readonly number[],
  gap: number,
  frame: readonly [top: number, bottom: number],
): number[] {
  const order = heights.map((_, i) => i).sort((a, b) => heights[a]! - heights[b]!)
  const placed = new Array<number>(heights.length).fill(0)
  let floor = frame[0]
  for (const i of order) {
    placed[i] = Math.max(heights[i]!, floor)
    floor = placed[i]! + gap
  }
  let ceiling = frame[1]
  for (const i of [...order].reverse()) {
    placed[i] = Math.min(placed[i]!, ceiling)
    ceiling = placed[i]! - gap
  }
  return placed
}
