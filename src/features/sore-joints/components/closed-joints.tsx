import { useInfiniteQuery } from '@tanstack/react-query'
import { Loaded } from '@/components/ui/states'
import { MoreButton } from '@/components/ui/more-button'
import { formatShortDay, formatInstant } from '@/lib/format'
import { capitalise, jointWords } from '@/lib/words'
import { closedQuery } from '../api'

/** Reports that no longer stand, newest first. */
export function ClosedJoints({ athleteId }: { athleteId: string }) {
  const query = useInfiniteQuery(closedQuery(athleteId))
  return (
    <Loaded query={query} what="earlier reports">
      {({ pages }) => {
        const items = pages.flatMap((page) => page.items)
        if (items.length === 0) return <p className="text-pencil">No earlier reports.</p>
        return (
          <>
            <ul className="divide-y divide-rule rounded-xl border border-rule bg-card">
              {items.map((report) => (
                <li key={report.id} className="flex flex-wrap justify-between gap-x-6 px-4 py-2">
                  <span>
                    <b>{capitalise(jointWords(report.joint, report.side))}</b>, {report.rating} of 10
                    {report.redFlags.length > 0 && ', red flag'}
                    {report.clearedBy !== null && ` cleared by ${report.clearedBy}`}
                  </span>
                  <span className="text-pencil">
                    {formatShortDay(report.day)}
                    {report.closedAt !== null && `, closed ${formatInstant(report.closedAt)}`}
                  </span>
                </li>
              ))}
            </ul>
            <MoreButton query={query} />
          </>
        )
      }}
    </Loaded>
  )
}
