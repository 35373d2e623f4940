/** Keeps the last `limit` values made, by key. A memo of pure functions: what it returns never depends on what it holds. */
export class LeastRecentlyUsed<T> {
  private readonly held = new Map<string, T>()
  private readonly limit: number

  constructor(limit: number) {
    this.limit = limit
  }

  /** The value under the key, made now if it is not held. */
  get(key: string, make: () => T): T {
    const known = this.held.get(key)
    const value = known ?? make()
    this.held.delete(key)
    this.held.set(key, value)
    if (this.held.size > this.limit) this.held.delete(this.held.keys().next().value!)
    return value
  }
}
