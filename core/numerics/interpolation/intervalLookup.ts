/**
 * Finds the interval between ascending edges that holds a number: an even grid over the whole range says between which edges to
 * search, so that it takes constant time unless the edges crowd together.
 */
export class IntervalLookup {
  private readonly edges: Float64Array
  private readonly start: number
  private readonly cellsPerUnit: number
  private readonly cells: number
  /** Interval at the left edge of each cell, and last the last interval. */
  private readonly first: Uint32Array

  /** @param edges at least two, ascending */
  constructor(edges: Float64Array) {
    const intervals = edges.length - 1
    const low = edges[0]!
    const width = edges[intervals]! - low
    this.edges = edges
    this.start = low
    this.cells = 4 * intervals
    this.cellsPerUnit = this.cells / width
    this.first = new Uint32Array(this.cells + 1)
    let interval = 0
    for (let cell = 0; cell < this.cells; cell++) {
      // A hair to the left of the cell, so that rounding never puts a number left of where the search begins.
      const left = low + ((cell - 1e-6) / this.cells) * width
      while (interval < intervals - 1 && edges[interval + 1]! <= left) interval++
      this.first[cell] = interval
    }
    this.first[this.cells] = intervals - 1
  }

  /** Index of the interval that holds x; the first or last one outside the range. At an edge, the one to its right. */
  find(x: number): number {
    const { edges, first } = this
    const at = (x - this.start) * this.cellsPerUnit
    if (!(at >= 0)) return 0
    const cell = at < this.cells ? at | 0 : this.cells - 1
    let low = first[cell]!
    let high = first[cell + 1]!
    // The edge at the end of a cell may lie a hair within it.
    if (edges[high + 1]! <= x) high = edges.length - 2
    while (low < high) {
      const middle = (low + high + 1) >> 1
      if (edges[middle]! <= x) low = middle
      else high = middle - 1
    }
    return low
  }
}
