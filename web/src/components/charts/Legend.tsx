import type { Curve } from '#core/bench/types'
import { temperatureText } from '../../lib/temperature.ts'
import { Num } from '../ui/Num.tsx'
import { valueAtTemperature } from './curvePath.ts'
import type { Series } from './series.ts'

interface LegendProps {
  series: readonly Series[]
  hidden: ReadonlySet<string>
  onToggle: (id: string) => void
  cursorGeV: number | null
}

/** Names with their dash, to show and hide; beside them the values at the cursor, in room kept for them. */
export function Legend({ series, hidden, onToggle, cursorGeV }: LegendProps) {
  return (
    <div className="flex min-h-6 flex-wrap items-center gap-x-3 text-caption text-soft">
      {series.map((each) => {
        const shown = !hidden.has(each.id)
        return (
          <span key={each.id} className="flex items-center gap-1.5">
            <button
              type="button"
              aria-pressed={shown}
              className="flex min-h-[24px] items-center gap-1.5 hover:text-ink aria-[pressed=false]:line-through"
              onClick={() => onToggle(each.id)}
            >
              <svg aria-hidden="true" width="22" height="6" opacity={shown ? 1 : 0.4}>
                <path
                  d="M0 3h22"
                  stroke={`var(${each.colour})`}
                  strokeWidth={each.width ?? 1.5}
                  strokeDasharray={each.dash}
                />
              </svg>
              {each.name}
            </button>
            <span className="inline-block min-w-[6.2em] text-ink">
              {cursorGeV !== null && shown ? <ValueAtCursor curve={each.curve} at={cursorGeV} /> : null}
            </span>
          </span>
        )
      })}
      <span className="ml-auto min-w-[5.5em] text-right whitespace-nowrap">
        {cursorGeV === null ? null : temperatureText(Number(cursorGeV.toPrecision(3)))}
      </span>
    </div>
  )
}

function ValueAtCursor({ curve, at }: { curve: Curve; at: number }) {
  const value = valueAtTemperature(curve, at)
  return Number.isFinite(value) ? <Num value={value} digits={3} /> : <>–</>
}
