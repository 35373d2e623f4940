import { cleanup, fireEvent, render, screen, within } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { RecordTable } from '../../../../web/src/features/records/RecordTable.tsx'
import type { RecordColumn } from '../../../../web/src/features/records/RecordTable.tsx'

interface Row {
  id: string
  name: string
  mass: number
}

const COLUMNS: RecordColumn<Row>[] = [
  { id: 'name', title: 'Name', sortBy: (row) => row.name, cell: (row) => row.name },
  { id: 'mass', title: 'Mass', sortBy: (row) => row.mass, cell: (row) => row.mass },
]

const ROWS: Row[] = [
  { id: 'a', name: 'Fermion 2', mass: 100 },
  { id: 'b', name: 'scalar', mass: 9 },
  { id: 'c', name: 'Fermion 10', mass: 1e-5 },
]

const names = (): (string | null)[] =>
  screen
    .getAllByRole('row')
    .slice(1)
    .map((row) => within(row).getAllByRole('cell')[0]!.textContent)

const heading = (name: string) => screen.getByRole('columnheader', { name })
const sortBy = (name: string): void => {
  fireEvent.click(within(heading(name)).getByRole('button'))
}
const filter = (words: string): void => {
  fireEvent.change(screen.getByRole('searchbox', { name: 'Filter' }), { target: { value: words } })
}

beforeEach(() => {
  render(
    <RecordTable
      caption="Particles"
      columns={COLUMNS}
      rows={ROWS}
      searchText={(row) => `${row.name} thermal`}
      newestBy="mass"
    />,
  )
})
afterEach(cleanup)

describe('RecordTable', () => {
  it('comes sorted by the column it is told, largest first, and says so', () => {
    expect(names()).toEqual(['Fermion 2', 'scalar', 'Fermion 10'])
    expect(heading('Mass').getAttribute('aria-sort')).toBe('descending')
    expect(heading('Name').getAttribute('aria-sort')).toBe('none')
  })

  it('sorts by a column when its heading is pressed, and the other way when pressed again', () => {
    sortBy('Name')
    expect(names()).toEqual(['Fermion 2', 'Fermion 10', 'scalar'])
    expect(heading('Name').getAttribute('aria-sort')).toBe('ascending')
    sortBy('Name')
    expect(names()).toEqual(['scalar', 'Fermion 10', 'Fermion 2'])
    expect(heading('Name').getAttribute('aria-sort')).toBe('descending')
  })

  it('sorts numbers by their size', () => {
    sortBy('Mass')
    expect(names()).toEqual(['Fermion 10', 'scalar', 'Fermion 2'])
  })

  it('shows only the rows that hold every word typed, and how many they are', () => {
    filter('thermal FERMION')
    expect(names()).toEqual(['Fermion 2', 'Fermion 10'])
    expect(screen.getByRole('status').textContent).toBe('2 of 3')
    filter('')
    expect(names()).toHaveLength(3)
  })

  it('says so when no row holds the words', () => {
    filter('gravitino')
    expect(names()).toEqual([])
    expect(screen.getByText('Nothing here holds these words.')).toBeDefined()
  })

  it('names each cell for the narrow screen, where the headings do not stand above it', () => {
    const cells = within(screen.getAllByRole('row')[1]!).getAllByRole('cell')
    expect(cells.map((cell) => cell.dataset['label'])).toEqual(['Name', 'Mass'])
  })
})
