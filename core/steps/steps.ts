/**
 * Long computations as steps: a generator that does a piece of the work between two `yield`s, each some milliseconds at most, says
 * how far it has come, and returns the result. Whoever drives it decides what happens in between: nothing (`complete`), or pauses,
 * news of the progress, and an end before time (`completeAsync`). It owns nothing, so that it may be dropped anywhere.
 */

/** How far a computation has come. `done` never falls and `of` does not change; neither need be whole. */
export interface Progress {
  done: number
  of: number
}

export type Steps<T> = Generator<Progress, T, void>

/** What is looked at of an AbortSignal. */
export interface CancelSignal {
  readonly aborted: boolean
  /** Thrown when aborted. */
  readonly reason?: unknown
}

export interface Driver {
  signal?: CancelSignal | undefined
  onProgress?: ((progress: Progress) => void) | undefined
  /** Asked after every step; a promise is waited for, so that others get their turn and the signal can come. See `inSlices`. */
  pause?: (() => Promise<void> | undefined) | undefined
}

/** Goes through all steps at once. */
export function complete<T>(steps: Steps<T>): T {
  for (;;) {
    const next = steps.next()
    if (next.done) return next.value
  }
}

/**
 * Goes through the steps with pauses.
 * @throws the signal's reason as soon as it is aborted, and whatever the computation throws
 */
export async function completeAsync<T>(steps: Steps<T>, driver: Driver = {}): Promise<T> {
  const { signal, onProgress, pause } = driver
  for (;;) {
    if (signal?.aborted) throw signal.reason
    const next = steps.next()
    if (next.done) return next.value
    onProgress?.(next.value)
    const paused = pause?.()
    if (paused) await paused
  }
}

/**
 * A pause that is made only when a slice of time is over. The core has no clock and no timer: both are given.
 * @param sliceMs work between two pauses, ms
 * @param now clock, ms
 * @param pause gives others their turn
 */
export function inSlices(
  sliceMs: number,
  now: () => number,
  pause: () => Promise<void>,
): () => Promise<void> | undefined {
  let end = now() + sliceMs
  return () =>
    now() < end
      ? undefined
      : pause().then(() => {
          end = now() + sliceMs
        })
}

/** A part of a longer computation: its progress runs from `before` to `before + share`, out of `of`. */
export function* part<T>(steps: Steps<T>, before: number, share: number, of: number): Steps<T> {
  for (;;) {
    const next = steps.next()
    if (next.done) return next.value
    yield { done: before + (share * next.value.done) / next.value.of, of }
  }
}

/** What a function makes of each of a list, so many to a step. */
export function* mapped<A, B>(
  list: readonly A[],
  toAStep: number,
  make: (each: A, index: number) => B,
): Steps<B[]> {
  const made: B[] = []
  for (const [i, each] of list.entries()) {
    made.push(make(each, i))
    if ((i + 1) % toAStep === 0) yield { done: i + 1, of: list.length }
  }
  return made
}

/** A computation of one step. */
// eslint-disable-next-line require-yield -- nothing to tell before its only step is over
export function* atOnce<T>(compute: () => T): Steps<T> {
  return compute()
}
