import { Num } from '../ui/Num.tsx'
import type { Series } from './series.ts'
import { valueAtTemperature } from './curvePath.ts'

const MOST_ROWS = 36

/** The curves in numbers, at temperatures spread evenly over those of the first. */
export function DataTable({ series }: { series: readonly Series[] }) {
  const grid = [...(series[0]?.curve.temperatureGeV ?? [])]
  const every = Math.max(1, Math.ceil(grid.length / MOST_ROWS))
  return (
    <div className="overflow-x-auto border-y border-rule">
      <table className="w-full text-small">
        <thead className="text-left text-soft">
          <tr>
            <th scope="col" className="pr-4 font-normal">
              <i className="font-serif">T</i>
            </th>
            {series.map((each) => (
              <th key={each.id} scope="col" className="pr-4 font-normal">
                {each.name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody className="rows">
          {grid
            .filter((_temperature, i) => i % every === 0)
            .map((temperature, row) => (
              <tr key={row}>
                <td className="py-0.5 pr-4">
                  <Num value={temperature} unit="GeV" />
                </td>
                {series.map((each) => {
                  const value = valueAtTemperature(each.curve, temperature)
                  return (
                    <td key={each.id} className="py-0.5 pr-4">
                      {Number.isFinite(value) ? <Num value={value} /> : '–'}
                    </td>
                  )
                })}
              </tr>
            ))}
        </tbody>
      </table>
    </div>
  )
}
