import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo, useState } from 'react'
import type { Flag } from '#shared/contract/flag'
import { Chip, ChoiceGroup } from '@/components/ui/choice-group'
import { columnsOf, DataTable } from '@/components/ui/data-table'
import { MoreButton } from '@/components/ui/more-button'
import { EmptyState, Loaded, Skeleton } from '@/components/ui/states'
import { formatInstant } from '@/lib/format'
import { itemsOf } from '@/lib/paged'
import { FLAG_REASON_WORDS } from '@/lib/words'
import { flagsQuery, type FlagState } from '../api'

const STATES: Record<FlagState, string> = { open: 'Open', settled: 'Settled', all: 'All' }

const column = columnsOf<Flag>()
const COLUMNS = column.columns([
  column.accessor((flag) => flag.exercise.name, {
    id: 'swap',
    header: 'Swap',
    sortFn: 'text',
    cell: ({ row: { original } }) => (
      <div className="min-w-36">
        <p className="font-semibold">{original.exercise.name}</p>
        <p className="text-pencil">instead of {original.original.name}</p>
      </div>
    ),
  }),
  column.accessor((flag) => FLAG_REASON_WORDS[flag.reason], { id: 'reason', header: 'What was wrong', sortFn: 'text' }),
  column.accessor((flag) => flag.raisedBy.name, { id: 'by', header: 'Raised by', sortFn: 'text' }),
  column.accessor('raisedAt', {
    header: 'When',
    sortFn: 'text',
    sortDescFirst: true,
    cell: ({ getValue }) => <span className="whitespace-nowrap">{formatInstant(getValue())}</span>,
  }),
  column.accessor('state', { header: 'State', sortFn: 'text' }),
])

const detail = (flag: Flag) => (
  <div className="max-w-prose py-2">
    <p className="whitespace-pre-line wrap-anywhere">{flag.note === '' ? 'No note was written.' : flag.note}</p>
    <p className="text-pencil">Ranked by rule set version {flag.ruleSetVersion}.</p>
  </div>
)

/** Objections to swaps: those of the admin’s clubs, or one’s own. */
export function FlagsList({ own }: { own: boolean }) {
  const [state, setState] = useState<FlagState>('open')
  const query = useInfiniteQuery(flagsQuery(state))
  const { data } = query
  const rows = useMemo(() => (data === undefined ? [] : itemsOf(data)), [data])
  return (
    <div className="grid grid-cols-1 gap-4">
      <ChoiceGroup legend={<span className="sr-only">Which flags</span>}>
        {(Object.keys(STATES) as FlagState[]).map((choice) => (
          <Chip
            key={choice}
            type="radio"
            name="flag-state"
            label={STATES[choice]}
            checked={state === choice}
            onChange={() => setState(choice)}
          />
        ))}
      </ChoiceGroup>
      <Loaded query={query} what="flags" skeleton={<Skeleton className="h-64 rounded-xl" />}>
        {() =>
          rows.length === 0 ? (
            <EmptyState title={state === 'open' ? 'No open flags.' : 'No flags.'}>
              {own
                ? 'When a swap feels wrong, flag it where swaps are shown; an admin looks at it.'
                : 'A swap that someone objected to stands here until it is settled.'}
            </EmptyState>
          ) : (
            <div>
              <DataTable
                caption={own ? 'Flags you raised' : 'Flags raised in your clubs'}
                columns={COLUMNS}
                rows={rows}
                rowKey={({ id }) => id}
                rowName={(flag) => `flag on ${flag.exercise.name}`}
                detail={detail}
              />
              <MoreButton query={query} />
            </div>
          )
        }
      </Loaded>
    </div>
  )
}
