/** The public surface of the core. */
export { abundance, computeAbundance } from './abundance/abundance.ts'
export { ConvergenceError } from './numerics/convergence.ts'
export { benchAnswer } from './bench/report.ts'
export type * from './bench/types.ts'
export { MEASURED_DENSITY } from './constants/measured.ts'
export { computeHistory } from './history/computeHistory.ts'
export { buildHistory } from './history/thermalHistory.ts'
export { CORE_VERSION } from './version.ts'
