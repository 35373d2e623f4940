import type { Curve } from '#core/bench/types'
import { temperatureText } from '../../lib/temperature.ts'
import { Num } from '../ui/Num.tsx'
import { useCursorAt } from './cursor.ts'
import type { Cursor } from './cursor.ts'
import { valueAtTemperature } from './curvePath.ts'
import type { Series } from './series.ts'

interface LegendProps {
  series: readonly Series[]
  hidden: ReadonlySet<string>
  onToggle: (id: string) => void
  cursor: Cursor
}

/** Names with their dash, to show and hide; beside them the values at the cursor, in room kept for them. */
export function Legend({ series, hidden, onToggle, cursor }: LegendProps) {
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
              {shown ? <ValueAtCursor curve={each.curve} cursor={cursor} /> : null}
            </span>
          </span>
        )
      })}
      <span className="ml-auto min-w-[5.5em] text-right whitespace-nowrap">
        <CursorTemperature cursor={cursor} />
      </span>
    </div>
  )
}

function CursorTemperature({ cursor }: { cursor: Cursor }) {
  const at = useCursorAt(cursor)
  return at === null ? null : <>{temperatureText(Number(at.toPrecision(3)))}</>
}

function ValueAtCursor({ curve, cursor }: { curve: Curve; cursor: Cursor }) {
  const at = useCursorAt(cursor)
  if (at === null) return null
  const value = valueAtTemperature(curve, at)
  return Number.isFinite(value) ? <Num value={value} digits={3} /> : <>–</>
}
