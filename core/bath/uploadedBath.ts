/**
 * The bath of an uploaded table, completed where its rows end.
 *
 * Below the first row the ideal gases of photons, leptons and hadrons go on, neutrinos letting go at once as their entropy has it (so
 * does the 2016 table); the row must lie within a twentieth of them, and the small step left is a step of the bath. Above the last
 * row g_s keeps its ratio j to the ideal gas of the whole Standard Model, and ρ follows from dρ = T ds:
 *
 *   g_s = j g_s,ideal,   g_ρ = j g_ρ,ideal + (g_ρ,last − j g_ρ,ideal(T_last)) (T_last/T)⁴.
 *
 * How to complete a table is this project's own choice; a guard says when an abundance rests on it.
 */
import type { BathInput, NeutrinosInput } from '../wire/history.ts'
import { InputError } from '../wire/fault.ts'
import type { BathColumn, BathRow } from '../wire/uploadedBath.ts'
import { emptyPoint } from './bath.ts'
import type { BathPart, BathPoint } from './bath.ts'
import { gasContributions, gasJet, pointOfJet } from './gas.ts'
import { withNeutrinos } from './neutrinos.ts'
import { SHORT_HADRON_LIST } from './particles/hadrons.ts'
import type { Particle } from './particles/species.ts'
import { NEUTRINO_G, WITHOUT_COLOUR, WITH_COLOUR } from './particles/standardModel.ts'
import { emptyRowsPoint, joinRows } from './treatments/uploaded.ts'
import type { JoinedRows } from './treatments/uploaded.ts'
import { finishWhole, wholeContributions } from './wholeBath.ts'

/** Largest distance of the first row from the ideal gases below it, relative. */
const LARGEST_STEP = 0.05

const STANDARD_MODEL = [...WITHOUT_COLOUR, ...WITH_COLOUR]

/** Ideal gases of photons, leptons, hadrons and further species, with their neutrinos. */
const coldGases = (neutrinos: NeutrinosInput, others: readonly Particle[]): BathPart => {
  const species = [...WITHOUT_COLOUR, ...SHORT_HADRON_LIST, ...others]
  return withNeutrinos(
    {
      breaks: [],
      evaluate: (temperatureGeV, out) => pointOfJet(gasJet(species, temperatureGeV), out),
      contributions: (temperatureGeV) => gasContributions(species, temperatureGeV),
    },
    { treatment: 'instantaneous', decouplingTemperatureGeV: neutrinos.decouplingTemperatureGeV },
  )
}

/** The ideal gas of the whole Standard Model. */
function hotGas(temperatureGeV: number, out: BathPoint): void {
  pointOfJet(gasJet(STANDARD_MODEL, temperatureGeV), out)
  out.gRho += NEUTRINO_G
  out.gS += NEUTRINO_G
  out.gP += NEUTRINO_G
}

const refuse = (row: number, column: BathColumn, value: number | undefined, message: string): never => {
  throw new InputError([{ path: `history.bath.points[${row}].${column}`, value, message }])
}

/** The first row continues the ideal gases below it. */
function checkColdJoin({ temperatureGeV, gRho, gS }: BathRow, ideal: BathPoint): void {
  for (const [column, value, expected] of [
    ['gRho', gRho, ideal.gRho],
    ['gS', gS, ideal.gS],
  ] as const)
    if (value !== undefined && Math.abs(value / expected - 1) > LARGEST_STEP)
      refuse(
        0,
        column,
        value,
        `allowed: within 5 % of ${expected.toPrecision(5)}, that of the ideal gases which go on below ${temperatureGeV} GeV; further species belong to extraSpecies`,
      )
}

/** Places in a piece at which it is looked at. */
const LOOKED_AT = [0, 0.2, 0.4, 0.6, 0.8, 1 - 1e-9]

/** Between the rows, too, both densities rise with T, c_s² ≤ 1 and 0 ≤ p ≤ ρ. */
function checkBetweenRows(points: readonly BathRow[], { lnT, evaluate }: JoinedRows): void {
  const column: BathColumn = points[0]!.gS === undefined ? 'gRho' : 'gS'
  const point = emptyRowsPoint()
  for (let i = 0; i + 1 < lnT.length; i++) {
    for (const share of LOOKED_AT) {
      evaluate(lnT[i]! + share * (lnT[i + 1]! - lnT[i]!), point)
      const { gRho, gRhoSlope, gS, gSSlope } = point
      const between = 'between this row and the one before'
      const value = points[i + 1]![column]
      if (!(4 * gRho + gRhoSlope > 0))
        refuse(i + 1, column, value, `allowed: an energy density that rises ${between}`)
      if (!(2 * gS + gSSlope >= 0))
        refuse(i + 1, column, value, `allowed: a speed of sound at most that of light ${between}`)
      if (!(gRho <= (4 / 3) * gS && gRho >= (2 / 3) * gS))
        refuse(i + 1, column, value, `allowed: a pressure Ts − ρ between 0 and ρ ${between}`)
    }
  }
}

export function uploadedBath(
  { points }: Extract<BathInput, { treatment: 'uploaded' }>,
  neutrinos: NeutrinosInput,
  others: readonly Particle[],
): BathPart {
  const [first, last] = [points[0]!.temperatureGeV, points.at(-1)!.temperatureGeV]
  const ideal = emptyPoint()
  coldGases(neutrinos, []).evaluate(first, ideal)
  checkColdJoin(points[0]!, ideal)
  const joined = joinRows(points, { ofEntropy: ideal.gP / ideal.gS, ofEnergy: ideal.gP / ideal.gRho })
  checkBetweenRows(points, joined)

  const cold = coldGases(neutrinos, others)
  const rows = emptyRowsPoint()
  const whole = { gRho: 0, gS: 0, logSlope: 0 }
  joined.evaluate(Math.log(last), rows)
  hotGas(last, ideal)
  const ratio = rows.gS / ideal.gS
  const excess = rows.gRho - ratio * ideal.gRho

  /** From the first row on. */
  const setWhole = (temperatureGeV: number): void => {
    if (temperatureGeV <= last) {
      joined.evaluate(Math.log(temperatureGeV), rows)
      whole.gRho = rows.gRho
      whole.gS = rows.gS
      whole.logSlope = rows.gSSlope / rows.gS
      return
    }
    hotGas(temperatureGeV, ideal)
    whole.gRho = ratio * ideal.gRho + excess * (last / temperatureGeV) ** 4
    whole.gS = ratio * ideal.gS
    whole.logSlope = ideal.gSSlope / ideal.gS
  }

  return {
    breaks: [...cold.breaks.filter((temperature) => temperature < first), first, last],
    rows: {
      lowestGeV: first,
      highestGeV: last,
      edgesGeV: joined.edges.map((i) => points[i]!.temperatureGeV),
      kinksGeV: joined.kinks.map((i) => points[i]!.temperatureGeV),
    },
    evaluate(temperatureGeV, out) {
      if (temperatureGeV < first) {
        cold.evaluate(temperatureGeV, out)
        return
      }
      setWhole(temperatureGeV)
      finishWhole(whole, others, temperatureGeV, out)
    },
    contributions(temperatureGeV) {
      if (temperatureGeV < first) return cold.contributions(temperatureGeV)
      setWhole(temperatureGeV)
      return wholeContributions(whole, others, temperatureGeV)
    },
  }
}
