import { Link } from 'react-router-dom'
import type { SoreJoint } from '#shared/contract/sore-joint'
import { capitalise, jointWords } from '@/lib/words'

/** Standing reports on one line each, for the top of a page. */
export function SoreSummary({ reports, to }: { reports: SoreJoint[]; to?: string }) {
  if (reports.length === 0) return null
  return (
    <ul aria-label="Sore joints" className="flex flex-wrap gap-x-6 gap-y-1 border-l-3 border-oxide pl-3">
      {reports.map((report) => (
        <li key={report.id}>
          <span className="font-semibold text-oxide">{capitalise(jointWords(report.joint, report.side))}</span>{' '}
          {report.state === 'redFlag' ? 'red flag' : `${report.rating} of 10`}
        </li>
      ))}
      {to !== undefined && (
        <li>
          <Link to={to} className="-my-2.5 inline-flex min-h-target items-center link">
            {reports.length === 1 ? 'this report' : 'these reports'}
          </Link>
        </li>
      )}
    </ul>
  )
}
