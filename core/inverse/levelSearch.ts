/**
 * All places in an interval where a function crosses zero. It may be undefined (NaN) in parts and may leap. The interval is scanned
 * evenly; the edges of undefined parts are closed in on, so that a crossing beside one is seen; where the function bends towards
 * zero without reaching it, its turning point is looked at, so that two crossings close together are both found; and every change
 * of sign is followed to its root or its leap. What may be missed: a pair of crossings within one stretch of a third, and a dip
 * narrower than a stretch that does not show beside it.
 */
import { brentSearch } from '../numerics/roots/brent.ts'
import type { Sample } from '../numerics/roots/brent.ts'
import { part } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'

export interface LevelQuestion {
  f: (x: number) => number
  low: number
  high: number
  /** Stretches of the even scan. */
  stretches: number
  /** Allowed error of a root. */
  tolerance: number
  /** |f| at most this at a root; a change of sign without it is a leap. */
  reached: number
  /** Differences of f that mean nothing. */
  noise: number
}

export interface LevelAnswer {
  /** Ascending. */
  roots: number[]
  /** Where f changes sign without passing through zero, ascending. */
  leaps: number[]
  /** The scan with edges and turning points, ascending; NaN where f is undefined. */
  samples: Sample[]
}

/** Golden-section steps that narrow a turning point to 1e-4 of two stretches. */
const TURNING_STEPS = 20
const GOLDEN = (Math.sqrt(5) - 1) / 2

/** Halvings that narrow an edge to 1e-6 of a stretch. */
const HALVINGS = 20

/** More edges than these are no parts where f is undefined, but scattered failures. */
const MOST_EDGES = 8

function* scan({ f, low, high, stretches }: LevelQuestion): Steps<Sample[]> {
  const samples: Sample[] = []
  for (let i = 0; i <= stretches; i++) {
    const at = i === stretches ? high : low + ((high - low) * i) / stretches
    samples.push({ at, value: f(at) })
    yield { done: i + 1, of: stretches + 1 }
  }
  return samples
}

const isDefined = ({ value }: Sample): boolean => !Number.isNaN(value)
const byPlace = (a: Sample, b: Sample): number => a.at - b.at

/** The outermost samples found beside each undefined part. */
function* edges({ f }: LevelQuestion, samples: readonly Sample[]): Steps<Sample[]> {
  const pairs = samples.flatMap((sample, i): [Sample, Sample][] => {
    const next = samples[i + 1]
    return next && isDefined(sample) !== isDefined(next) ? [[sample, next]] : []
  })
  const of = Math.min(pairs.length, MOST_EDGES)
  const found: Sample[] = []
  for (const [i, pair] of pairs.slice(0, of).entries()) {
    let [inside, outside] = isDefined(pair[0]) ? pair : [pair[1], pair[0]]
    for (let k = 0; k < HALVINGS; k++) {
      const at = (inside.at + outside.at) / 2
      const middle = { at, value: f(at) }
      if (isDefined(middle)) inside = middle
      else outside = middle
      yield { done: i + (k + 1) / HALVINGS, of }
    }
    found.push(inside)
  }
  return found
}

/** Distance from a sample that is exactly zero at which the sign beside it is taken, in stretches. */
const BESIDE = 1e-6

/** Samples close to those that are exactly zero: which side they are on decides whether another crossing is near. */
function besideZeros({ f, low, high, stretches }: LevelQuestion, samples: readonly Sample[]): Sample[] {
  const distance = (BESIDE * (high - low)) / stretches
  return samples
    .filter(({ value }) => value === 0)
    .flatMap(({ at }) => [at - distance, at + distance])
    .filter((at) => at > low && at < high)
    .map((at) => ({ at, value: f(at) }))
}

/** The extreme towards zero between two samples by golden section, or the first sample found beyond zero. */
function* turningPoint({ f }: LevelQuestion, low: number, high: number, sign: number): Steps<Sample> {
  const sampled = (at: number): Sample => ({ at, value: f(at) })
  let [a, b] = [low, high]
  let [left, right] = [sampled(b - GOLDEN * (b - a)), sampled(a + GOLDEN * (b - a))]
  for (let i = 0; i < TURNING_STEPS; i++) {
    const nearer = sign * left.value < sign * right.value ? left : right
    if (!(sign * nearer.value > 0)) return nearer
    if (nearer === left) {
      ;[b, right] = [right.at, left]
      left = sampled(b - GOLDEN * (b - a))
    } else {
      ;[a, left] = [left.at, right]
      right = sampled(a + GOLDEN * (b - a))
    }
    yield { done: i + 1, of: TURNING_STEPS }
  }
  return sign * left.value < sign * right.value ? left : right
}

/** The turning point of each three samples that bend towards zero without reaching it. */
function* turningPoints(question: LevelQuestion, samples: readonly Sample[]): Steps<Sample[]> {
  const found: Sample[] = []
  for (let i = 1; i + 1 < samples.length; i++) {
    const [before, here, after] = [samples[i - 1]!, samples[i]!, samples[i + 1]!]
    const sign = Math.sign(here.value)
    const oneSide = Math.sign(before.value) === sign && Math.sign(after.value) === sign
    const rises = Math.min(sign * (before.value - here.value), sign * (after.value - here.value))
    const most = Math.max(sign * (before.value - here.value), sign * (after.value - here.value))
    if (oneSide && rises >= 0 && most > question.noise)
      found.push(yield* part(turningPoint(question, before.at, after.at, sign), i, 1, samples.length))
  }
  return found
}

function* crossings(
  { f, tolerance, reached }: LevelQuestion,
  samples: readonly Sample[],
): Steps<Pick<LevelAnswer, 'roots' | 'leaps'>> {
  const [roots, leaps]: [number[], number[]] = [[], []]
  const of = samples.length
  for (let i = 0; i < of; i++) {
    const [a, b] = [samples[i]!, samples[i + 1]]
    if (a.value === 0) roots.push(a.at)
    else if (b && a.value * b.value < 0) {
      const search = brentSearch(a, b, tolerance)
      let next = search.next()
      while (!next.done) {
        next = search.next(f(next.value))
        yield { done: i, of }
      }
      const list = Math.abs(f(next.value)) < reached ? roots : leaps
      list.push(next.value)
    }
  }
  return { roots, leaps }
}

/** Shares of the stages in the progress told: about those of the time. */
const SHARES = { scan: 70, edges: 5, turns: 10, crossings: 15 } as const
const WHOLE = SHARES.scan + SHARES.edges + SHARES.turns + SHARES.crossings

export function* levelSearch(question: LevelQuestion): Steps<LevelAnswer> {
  let before = 0
  function* stage<T>(steps: Steps<T>, share: number): Steps<T> {
    const result = yield* part(steps, before, share, WHOLE)
    before += share
    return result
  }
  const even = yield* stage(scan(question), SHARES.scan)
  const beside = yield* stage(edges(question, even), SHARES.edges)
  const scanned = [...even, ...beside, ...besideZeros(question, even)].sort(byPlace)
  const turns = yield* stage(turningPoints(question, scanned), SHARES.turns)
  const samples = [...scanned, ...turns].sort(byPlace)
  return { samples, ...(yield* stage(crossings(question, samples), SHARES.crossings)) }
}
