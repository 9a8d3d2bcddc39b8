import { Link } from 'react-router-dom'
import type { AthleteRow } from '#shared/contract/athlete'
import { paths } from '@/app/paths'
import { columnsOf, DataTable } from '@/components/ui/data-table'
import { capitalise, jointWords } from '@/lib/words'

const RED = 100
/** A red flag is worse than any rating. */
const need = ({ sore }: AthleteRow): number =>
  sore.reduce((worst, report) => Math.max(worst, report.state === 'redFlag' ? RED : report.rating), -1)

const column = columnsOf<AthleteRow>()
const COLUMNS = column.columns([
  column.accessor('name', {
    header: 'Athlete',
    sortFn: 'text',
    cell: ({ row: { original } }) => (
      <div className="min-w-36">
        <Link
          to={paths.athlete(original.id)}
          className="-my-2.5 inline-flex min-h-target items-center font-semibold link"
        >
          {original.name}
        </Link>
        <p className="text-pencil">
          {original.clubName}
          {original.minor && ', under 18'}
        </p>
      </div>
    ),
  }),
  column.accessor(need, {
    id: 'sore',
    header: 'Sore joints',
    sortFn: 'basic',
    sortDescFirst: true,
    cell: ({ row: { original } }) =>
      original.sore.length === 0 ? (
        <span className="text-pencil">none</span>
      ) : (
        <ul className="min-w-44">
          {original.sore.map((report) => (
            <li key={report.id}>
              {capitalise(jointWords(report.joint, report.side))}{' '}
              {report.state === 'redFlag' ? (
                <b className="text-oxide">red flag</b>
              ) : (
                <span className="whitespace-nowrap">{report.rating} of 10</span>
              )}
            </li>
          ))}
        </ul>
      ),
  }),
  column.accessor((row) => row.todayTitle ?? '', {
    id: 'today',
    header: 'Today',
    sortFn: 'text',
    cell: ({ row: { original } }) => original.todayTitle ?? <span className="text-pencil">rest day</span>,
  }),
  column.accessor('affectedSlots', {
    header: 'Affected exercises',
    sortFn: 'basic',
    sortDescFirst: true,
    meta: { align: 'end' },
    cell: ({ row: { original } }) =>
      original.affectedSlots === 0 ? (
        <span className="text-pencil">0</span>
      ) : (
        <b className="text-oxide">{original.affectedSlots}</b>
      ),
  }),
])

/** In the order of need until a column is chosen. */
export function AthletesTable({ caption, rows }: { caption: string; rows: AthleteRow[] }) {
  return <DataTable caption={caption} columns={COLUMNS} rows={rows} rowKey={({ id }) => id} />
}
