import { render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import { columnsOf, DataTable } from '@/components/ui/data-table'

interface Row {
  name: string
  score: number
}
const column = columnsOf<Row>()
const COLUMNS = column.columns([
  column.accessor('name', { header: 'Name', sortFn: 'text' }),
  column.accessor('score', { header: 'Score', sortFn: 'basic', sortDescFirst: true }),
  column.display({ id: 'take', header: '', cell: () => <button type="button">Take</button>, meta: { label: 'Take' } }),
])
const ROWS: Row[] = [
  { name: 'Row', score: 70 },
  { name: 'Dip', score: 91 },
  { name: 'Pull', score: 63 },
]
const names = () => screen.getAllByRole('rowheader').map(({ textContent }) => textContent)
const open = (detail?: (row: Row) => string) =>
  render(
    <DataTable
      caption="Swaps"
      columns={COLUMNS}
      rows={ROWS}
      rowKey={({ name }) => name}
      rowName={({ name }) => name}
      detail={detail}
    />,
  )

describe('a table', () => {
  it('keeps the order it was given until a column is chosen', () => {
    open()
    expect(names()).toEqual(['Row', 'Dip', 'Pull'])
    expect(screen.getByRole('columnheader', { name: 'Name' })).toHaveAttribute('aria-sort', 'none')
  })

  it('sorts by a column, best first where that is meant, and says so', async () => {
    open()
    const head = screen.getByRole('columnheader', { name: 'Score' })
    await userEvent.click(within(head).getByRole('button'))
    expect(names()).toEqual(['Dip', 'Row', 'Pull'])
    expect(head).toHaveAttribute('aria-sort', 'descending')
    await userEvent.click(within(head).getByRole('button'))
    expect(names()).toEqual(['Pull', 'Row', 'Dip'])
    expect(head).toHaveAttribute('aria-sort', 'ascending')
  })

  it('has no sort button where there is nothing to sort', () => {
    open()
    const head = screen.getByRole('columnheader', { name: 'Take' })
    expect(within(head).queryByRole('button')).not.toBeInTheDocument()
    expect(head).not.toHaveAttribute('aria-sort')
  })

  it('opens and closes a row by a button that names it', async () => {
    open(({ score }) => `Scored ${score}`)
    await userEvent.click(screen.getByRole('button', { name: 'Open Dip' }))
    expect(screen.getByText('Scored 91')).toBeInTheDocument()
    const button = screen.getByRole('button', { name: 'Close Dip' })
    expect(button).toHaveAttribute('aria-expanded', 'true')
    await userEvent.click(button)
    expect(screen.queryByText('Scored 91')).not.toBeInTheDocument()
  })
})
