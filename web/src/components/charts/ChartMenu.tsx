import type { RefObject } from 'react'
import type { Series } from './series.ts'
import { saveCsv, savePng, saveSvg } from './exportChart.ts'

interface ChartMenuProps {
  title: string
  svg: RefObject<SVGSVGElement | null>
  series: readonly Series[]
  tableShown: boolean
  onTable: () => void
}

/** What can be taken from a chart. */
export function ChartMenu({ title, svg, series, tableShown, onTable }: ChartMenuProps) {
  const withDrawing = (use: (svg: SVGSVGElement) => void) => () => {
    if (svg.current) use(svg.current)
  }
  const action = 'min-h-[24px] min-w-[24px] px-1 hover:text-ember'
  return (
    <span
      className="flex gap-1.5 text-caption text-soft"
      role="group"
      aria-label={`${title}: data and files`}
    >
      <button type="button" className={action} aria-pressed={tableShown} onClick={onTable}>
        data
      </button>
      <button type="button" className={action} onClick={() => saveCsv(series, title)}>
        CSV
      </button>
      <button type="button" className={action} onClick={withDrawing((drawing) => saveSvg(drawing, title))}>
        SVG
      </button>
      <button
        type="button"
        className={action}
        onClick={withDrawing((drawing) => void savePng(drawing, title))}
      >
        PNG
      </button>
    </span>
  )
}
