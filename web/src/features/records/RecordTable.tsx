import {
  flexRender,
  getCoreRowModel,
  getFilteredRowModel,
  getSortedRowModel,
  useReactTable,
} from '@tanstack/react-table'
import type { ColumnDef, Header, SortingState } from '@tanstack/react-table'
import { useMemo, useState } from 'react'
import type { ReactNode } from 'react'
import { Field } from '../../components/ui/Field.tsx'

export interface RecordColumn<T> {
  id: string
  title: string
  /** The title with its symbols set, where letters alone do not do. */
  heading?: ReactNode
  /** What the column is sorted by. */
  sortBy: (row: T) => string | number
  cell: (row: T) => ReactNode
}

interface RecordTableProps<T extends { id: string }> {
  caption: string
  columns: readonly RecordColumn<T>[]
  rows: T[]
  /** The words the filter box looks among. */
  searchText: (row: T) => string
  /** Column the rows come sorted by, newest or largest first. */
  newestBy: string
  /** What stands under the rows, such as a button for more of them. */
  children?: ReactNode
}

const compared = (a: string | number, b: string | number): number =>
  typeof a === 'number' && typeof b === 'number'
    ? a - b
    : String(a).localeCompare(String(b), undefined, { numeric: true })

const columnDefinition = <T,>(column: RecordColumn<T>): ColumnDef<T> => ({
  id: column.id,
  header: () => column.heading ?? column.title,
  accessorFn: column.sortBy,
  sortingFn: (a, b) => compared(column.sortBy(a.original), column.sortBy(b.original)),
  cell: ({ row }) => column.cell(row.original),
  sortDescFirst: false,
})

/** Every word typed must occur somewhere in the row. */
const holdsEveryWord = (text: string, typed: string): boolean =>
  typed
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.toLowerCase().includes(word))

/** A table that can be filtered and sorted; on a phone each row becomes a block. */
export function RecordTable<T extends { id: string }>(props: RecordTableProps<T>) {
  const { caption, columns, rows, searchText, newestBy, children } = props
  const [sorting, setSorting] = useState<SortingState>([{ id: newestBy, desc: true }])
  const [filter, setFilter] = useState('')
  const table = useReactTable<T>({
    data: rows,
    columns: useMemo(() => columns.map(columnDefinition), [columns]),
    state: { sorting, globalFilter: filter },
    onSortingChange: setSorting,
    enableSortingRemoval: false,
    enableMultiSort: false,
    getRowId: (row) => row.id,
    getColumnCanGlobalFilter: () => true,
    globalFilterFn: (row, _column, typed: string) => holdsEveryWord(searchText(row.original), typed),
    getCoreRowModel: getCoreRowModel(),
    getFilteredRowModel: getFilteredRowModel(),
    getSortedRowModel: getSortedRowModel(),
  })
  const shown = table.getRowModel().rows
  const titles = new Map(columns.map((column) => [column.id, column.title]))
  return (
    <div className="grid gap-3">
      <FilterBox value={filter} onChange={setFilter} shown={shown.length} all={rows.length} />
      <table className="w-full border-collapse text-left max-md:block">
        <caption className="sr-only">{caption}</caption>
        <thead className="max-md:block">
          {table.getHeaderGroups().map((group) => (
            <tr
              key={group.id}
              className="border-b border-rule max-md:flex max-md:flex-wrap max-md:items-baseline max-md:gap-x-4 max-md:before:text-caption max-md:before:content-['Sorted_by']"
            >
              {group.headers.map((header) => (
                <HeaderCell key={header.id} header={header} />
              ))}
            </tr>
          ))}
        </thead>
        <tbody className="max-md:block">
          {shown.map((row) => (
            <tr key={row.id} className="border-b border-rule align-baseline max-md:block max-md:py-3">
              {row.getVisibleCells().map((cell) => (
                <td
                  key={cell.id}
                  data-label={titles.get(cell.column.id)}
                  className="py-2.5 pr-5 last:pr-0 max-md:grid max-md:grid-cols-[7.5rem_minmax(0,1fr)] max-md:gap-x-3 max-md:py-0.5 max-md:pr-0 max-md:before:text-caption max-md:before:text-soft max-md:before:content-[attr(data-label)]"
                >
                  <div className="min-w-0 break-words">
                    {flexRender(cell.column.columnDef.cell, cell.getContext())}
                  </div>
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      {shown.length === 0 ? <p className="text-soft">Nothing here holds these words.</p> : null}
      {children}
    </div>
  )
}

function HeaderCell<T>({ header }: { header: Header<T, unknown> }) {
  const { column } = header
  const sorted = column.getIsSorted()
  const direction = sorted === false ? 'none' : sorted === 'asc' ? 'ascending' : 'descending'
  return (
    <th scope="col" aria-sort={direction} className="py-2 pr-5 font-normal last:pr-0 max-md:pr-0">
      <button
        type="button"
        onClick={() => column.toggleSorting(sorted === 'asc')}
        className={`text-caption hover:text-ink ${sorted === false ? 'text-soft' : 'font-semibold text-ink'}`}
      >
        {flexRender(column.columnDef.header, header.getContext())}
        <span aria-hidden="true" className="inline-block w-[1.2em] text-center">
          {sorted === 'asc' ? '↑' : sorted === 'desc' ? '↓' : ''}
        </span>
      </button>
    </th>
  )
}

interface FilterBoxProps {
  value: string
  onChange: (value: string) => void
  shown: number
  all: number
}

function FilterBox({ value, onChange, shown, all }: FilterBoxProps) {
  return (
    <div className="flex flex-wrap items-end gap-x-5">
      <div className="w-72 max-w-full">
        <Field label="Filter">
          {(control) => (
            <input
              {...control}
              type="search"
              className="input"
              autoComplete="off"
              value={value}
              onChange={(event) => onChange(event.target.value)}
            />
          )}
        </Field>
      </div>
      <p role="status" className="pb-3 text-small text-soft">
        {shown === all ? `${all} in all` : `${shown} of ${all}`}
      </p>
    </div>
  )
}
