import { GEV_MINUS2_PER_CM3_S, GEV_PER_KELVIN } from '../constants/natural.ts'
import { SPEED_OF_LIGHT } from '../constants/codata2018.ts'

export type Dimension = 'energy' | 'time' | 'crossSection' | 'pure'

const MINUTE = 60
const DAY = 86_400
const JULIAN_YEAR = 365.25 * DAY

/** σ of one picobarn times the speed of light, cm³/s. */
const PICOBARN_C_CM3_S = 1e-36 * SPEED_OF_LIGHT.value * 100

/** Factor from each unit to the base unit of its dimension: energy GeV, time s, cross-section ⟨σv⟩ cm³/s. */
export const UNITS: Record<Dimension, Record<string, number>> = {
  energy: {
    GeV: 1,
    TeV: 1e3,
    MeV: 1e-3,
    keV: 1e-6,
    eV: 1e-9,
    PeV: 1e6,
    K: GEV_PER_KELVIN,
  },
  time: {
    s: 1,
    ms: 1e-3,
    us: 1e-6,
    µs: 1e-6,
    ns: 1e-9,
    ps: 1e-12,
    fs: 1e-15,
    min: MINUTE,
    h: 3600,
    d: DAY,
    yr: JULIAN_YEAR,
  },
  crossSection: { 'cm3/s': 1, 'GeV^-2': 1 / GEV_MINUS2_PER_CM3_S, 'pb·c': PICOBARN_C_CM3_S },
  pure: {},
}
