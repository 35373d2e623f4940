import { ApiProblem } from './apiProblem.ts'

/** What the server says is wrong with the field at `path`. */
export const faultAt = (error: Error | null, path: string): string | undefined =>
  error instanceof ApiProblem ? error.faults.find((fault) => fault.path === path)?.message : undefined

/** Whether everything wrong is said beside one of these fields. */
export const isSaidBeside = (error: Error, paths: readonly string[]): boolean =>
  error instanceof ApiProblem &&
  error.faults.length > 0 &&
  error.faults.every((fault) => paths.includes(fault.path))

/** Whether the server answered with this kind of problem. */
export const isProblem = (error: Error | null, kind: string): boolean =>
  error instanceof ApiProblem && error.type === `urn:emberline:problem:${kind}`
