/** Where a number comes from: a named publication, memory of one, or common practice without a source. */
export type SourceTag = 'published' | 'from memory' | 'common practice'

/** One number the core rests on, with its pedigree. */
export interface Constant {
  symbol: string
  name: string
  value: number
  unit: string
  /** Standard uncertainty in the same unit; zero when exact by definition. */
  uncertainty: number
  source: string
  tag: SourceTag
}
