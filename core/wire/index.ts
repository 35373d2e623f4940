/** Everything that crosses a boundary: zod schemas, their types, and how a bad input is reported. */
export * from './annihilation.ts'
export * from './candidate.ts'
export * from './compute.ts'
export * from './digest.ts'
export * from './fault.ts'
export * from './history.ts'
export * from './problem.ts'
export * from './records.ts'
