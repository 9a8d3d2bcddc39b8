import {
  createColumnHelper,
  createSortedRowModel,
  metaHelper,
  rowExpandingFeature,
  rowSortingFeature,
  sortFn_alphanumeric,
  sortFn_basic,
  sortFn_datetime,
  sortFn_text,
  tableFeatures,
  useTable,
  type ColumnDef,
  type RowData,
  type SortingState,
} from '@tanstack/react-table'
import { ArrowDown, ArrowUp, ArrowUpDown, ChevronDown, ChevronRight } from 'lucide-react'
import { Fragment, type ReactNode } from 'react'
import { cx } from '@/lib/cx'
import { Icon } from './icon'

interface ColumnLook {
  align?: 'end'
  /** Stands out in the head, for the column of a sore joint. */
  hot?: boolean
  /** Column header for screen readers when the visible one is empty. */
  label?: string
}

const features = tableFeatures({
  rowSortingFeature,
  rowExpandingFeature,
  sortedRowModel: createSortedRowModel(),
  sortFns: { alphanumeric: sortFn_alphanumeric, basic: sortFn_basic, datetime: sortFn_datetime, text: sortFn_text },
  columnMeta: metaHelper<ColumnLook>(),
})
type Features = typeof features

/** Columns for DataTable: `columnsOf<Row>().accessor('name', { header: 'Name' })`, kept at module scope or in a memo. */
export const columnsOf = <Row extends RowData>() => createColumnHelper<Features, Row>()
// The value type differs from column to column, as in the library's own signatures.
// eslint-disable-next-line @typescript-eslint/no-explicit-any
export type Columns<Row extends RowData> = Array<ColumnDef<Features, Row, any>>

interface DataTableProps<Row extends RowData> {
  /** Says what the table holds; read by screen readers before it. */
  caption: string
  columns: Columns<Row>
  rows: Row[]
  rowKey: (row: Row) => string
  /** Content of an opened row; rows open only when given. */
  detail?: (row: Row) => ReactNode
  /** Names the row in its open button. */
  rowName?: (row: Row) => string
  sort?: SortingState
  /** Closer columns, for tables with many of them. */
  dense?: boolean
}

/** Sortable table; the first column stays in view when a narrow screen scrolls sideways. */
export function DataTable<Row extends RowData>({
  caption,
  columns,
  rows,
  rowKey,
  detail,
  rowName,
  sort,
  dense = false,
}: DataTableProps<Row>) {
  const table = useTable({
    features,
    columns,
    data: rows,
    getRowId: rowKey,
    getRowCanExpand: () => detail !== undefined,
    enableSortingRemoval: false,
    initialState: { sorting: sort ?? [] },
  })
  const width = columns.length + (detail === undefined ? 0 : 1)
  return (
    <div
      className="relative overflow-x-auto rounded-xl border border-rule bg-card"
      tabIndex={0}
      role="region"
      aria-label={caption}
    >
      <table className="w-full border-separate border-spacing-0">
        <caption className="sr-only">{caption}</caption>
        <thead>
          {table.getHeaderGroups().map((group) => (
            <tr key={group.id}>
              {group.headers.map((header, index) => {
                const look = header.column.columnDef.meta
                const sorted = header.column.getIsSorted()
                const content = <table.FlexRender header={header} />
                return (
                  <th
                    key={header.id}
                    scope="col"
                    aria-sort={
                      sorted === 'asc'
                        ? 'ascending'
                        : sorted === 'desc'
                          ? 'descending'
                          : header.column.getCanSort()
                            ? 'none'
                            : undefined
                    }
                    className={cx(
                      'bg-wash align-bottom font-semibold',
                      dense ? 'px-2 first:pl-3' : 'px-3',
                      look?.hot ? 'text-oxide' : 'text-pencil',
                      look?.align === 'end' ? 'text-right' : 'text-left',
                      index === 0 && 'sticky left-0 z-10',
                    )}
                  >
                    {header.column.getCanSort() ? (
                      <button
                        type="button"
                        onClick={header.column.getToggleSortingHandler()}
                        className={cx(
                          'inline-flex min-h-target items-center gap-1 font-semibold hover:text-ink',
                          look?.align === 'end' ? 'text-right' : 'text-left',
                        )}
                      >
                        {content}
                        <Icon
                          of={sorted === 'asc' ? ArrowUp : sorted === 'desc' ? ArrowDown : ArrowUpDown}
                          size={16}
                          className={cx('shrink-0', !sorted && 'opacity-45')}
                        />
                      </button>
                    ) : (
                      <span className="inline-flex min-h-target items-center">
                        {content}
                        {look?.label !== undefined && <span className="sr-only">{look.label}</span>}
                      </span>
                    )}
                  </th>
                )
              })}
              {detail !== undefined && (
                <th scope="col" className="bg-wash">
                  <span className="sr-only">Details</span>
                </th>
              )}
            </tr>
          ))}
        </thead>
        <tbody>
          {table.getRowModel().rows.map((row) => {
            const open = row.getIsExpanded()
            const detailId = `detail-${row.id}`
            return (
              <Fragment key={row.id}>
                <tr className={open ? 'bg-opened' : undefined}>
                  {row.getAllCells().map((cell, index) => {
                    const Cell = index === 0 ? 'th' : 'td'
                    return (
                      <Cell
                        key={cell.id}
                        {...(index === 0 ? { scope: 'row' as const } : {})}
                        className={cx(
                          'border-t border-rule py-2 text-left align-middle font-normal',
                          dense ? 'px-2 first:pl-3' : 'px-3',
                          cell.column.columnDef.meta?.align === 'end' && 'text-right',
                          index === 0 && cx('sticky left-0 z-10', open ? 'bg-opened' : 'bg-card'),
                        )}
                      >
                        <table.FlexRender cell={cell} />
                      </Cell>
                    )
                  })}
                  {detail !== undefined && (
                    <td className="border-t border-rule px-1">
                      <button
                        type="button"
                        aria-expanded={open}
                        aria-controls={detailId}
                        onClick={() => row.toggleExpanded()}
                        className="inline-flex size-11 items-center justify-center rounded-md text-slate hover:bg-wash"
                      >
                        <Icon of={open ? ChevronDown : ChevronRight} />
                        <span className="sr-only">
                          {open ? 'Close' : 'Open'} {rowName?.(row.original) ?? 'row'}
                        </span>
                      </button>
                    </td>
                  )}
                </tr>
                {open && detail !== undefined && (
                  <tr id={detailId} className="bg-opened">
                    <td colSpan={width} className="px-3 pb-4">
                      {detail(row.original)}
                    </td>
                  </tr>
                )}
              </Fragment>
            )
          })}
        </tbody>
      </table>
    </div>
  )
}
