import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import type { AuditEntry } from '#shared/contract/audit'
import { columnsOf, DataTable } from '@/components/ui/data-table'
import { MoreButton } from '@/components/ui/more-button'
import { EmptyState, Loaded, Skeleton } from '@/components/ui/states'
import { formatInstant } from '@/lib/format'
import { itemsOf } from '@/lib/paged'
import { unhump } from '@/lib/words'
import { auditQuery } from '../api'

/** “take.swap” reads “take swap”. */
const actionWords = (action: string) => unhump(action.replace('.', ' '))

const column = columnsOf<AuditEntry>()
const COLUMNS = column.columns([
  column.accessor('at', {
    header: 'When',
    sortFn: 'text',
    sortDescFirst: true,
    cell: ({ getValue }) => <time dateTime={getValue()}>{formatInstant(getValue())}</time>,
  }),
  column.accessor((entry) => entry.actor?.name ?? '', {
    id: 'who',
    header: 'Who',
    sortFn: 'text',
    cell: ({ row: { original } }) => original.actor?.name ?? <span className="text-pencil">nobody signed in</span>,
  }),
  column.accessor((entry) => actionWords(entry.action), { id: 'action', header: 'Did', sortFn: 'text' }),
  column.accessor((entry) => entry.subject?.name ?? '', {
    id: 'whose',
    header: 'Whose',
    sortFn: 'text',
    cell: ({ row: { original } }) => original.subject?.name ?? <span className="text-pencil">nobody’s</span>,
  }),
])

function detail({ action, details }: AuditEntry) {
  const rows = Object.entries(details)
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1 py-2">
      <dt className="text-pencil">action</dt>
      <dd>
        <code>{action}</code>
      </dd>
      {rows.map(([name, value]) => (
        <div key={name} className="contents">
          <dt className="text-pencil">{unhump(name)}</dt>
          <dd className="wrap-anywhere">{value}</dd>
        </div>
      ))}
    </dl>
  )
}

/** Who read or changed what, newest first. It holds names, never a health value. */
export function Trail() {
  const query = useInfiniteQuery(auditQuery())
  const { data } = query
  const rows = useMemo(() => (data === undefined ? [] : itemsOf(data)), [data])
  return (
    <Loaded query={query} what="trail" skeleton={<Skeleton className="h-96 rounded-xl" />}>
      {() =>
        rows.length === 0 ? (
          <EmptyState title="Nothing is in the trail yet.">
            Every read of another person’s data and every change is kept here.
          </EmptyState>
        ) : (
          <>
            <DataTable
              caption="Audit trail of your clubs"
              columns={COLUMNS}
              rows={rows}
              rowKey={({ id }) => id}
              rowName={(entry) => `${actionWords(entry.action)} at ${formatInstant(entry.at)}`}
              detail={detail}
            />
            <MoreButton query={query} />
          </>
        )
      }
    </Loaded>
  )
}
