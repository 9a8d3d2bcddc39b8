import type { ReactNode } from 'react'
import type { SoreJoint } from '#shared/contract/sore-joint'
import { Card } from '@/components/ui/card'
import { formatAgo, formatInstant, formatShortDay } from '@/lib/format'
import { capitalise, jointWords, listWords, PROVOCATION_WORDS, RED_FLAG_WORDS } from '@/lib/words'

interface SoreJointCardProps {
  report: SoreJoint
  /** Level under the page’s own headings. */
  heading?: 'h2' | 'h3'
  children?: ReactNode
}

/** One report with all it says; `children` are what can be done about it. */
export function SoreJointCard({ report, heading: Heading = 'h2', children }: SoreJointCardProps) {
  const red = report.state === 'redFlag'
  return (
    <Card hit={red} className="p-4">
      <div className="flex items-start justify-between gap-4">
        <Heading className="text-lg">{capitalise(jointWords(report.joint, report.side))}</Heading>
        {red ? (
          <span className="rounded-full border border-oxide px-3 font-semibold text-oxide">red flag</span>
        ) : (
          <span className="whitespace-nowrap">
            <b className="text-lg">{report.rating}</b> of 10
          </span>
        )}
      </div>
      <p className="text-pencil">
        <time dateTime={report.reportedAt} title={formatInstant(report.reportedAt)}>
          {formatShortDay(report.day)}, reported {formatAgo(report.reportedAt)}
        </time>
      </p>
      <dl className="mt-2 grid grid-cols-[auto_1fr] gap-x-4 gap-y-1">
        {red && (
          <>
            <dt className="text-pencil">rating</dt>
            <dd>{report.rating} of 10</dd>
          </>
        )}
        <dt className="text-pencil">provoked by</dt>
        <dd>
          {report.provocations.includes('unknown')
            ? 'not known'
            : listWords(report.provocations.map((provocation) => PROVOCATION_WORDS[provocation]))}
        </dd>
        {report.redFlags.length > 0 && (
          <>
            <dt className="text-pencil">said yes to</dt>
            <dd>{listWords(report.redFlags.map((flag) => RED_FLAG_WORDS[flag]))}</dd>
          </>
        )}
        {report.clearedBy !== null && report.clearedAt !== null && (
          <>
            <dt className="text-pencil">cleared</dt>
            <dd>
              by {report.clearedBy}, {formatInstant(report.clearedAt)}
            </dd>
          </>
        )}
        {report.note !== '' && (
          <>
            <dt className="text-pencil">note</dt>
            <dd className="whitespace-pre-line wrap-anywhere">{report.note}</dd>
          </>
        )}
      </dl>
      {children}
    </Card>
  )
}
