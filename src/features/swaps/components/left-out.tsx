import type { LeftOutRow } from '#shared/contract/swap'
import { LEFT_OUT_WORDS } from '@/lib/exercise-words'

const KINDS = Object.keys(LEFT_OUT_WORDS) as LeftOutRow['why'][]

/** Everything the table does not offer, each with its reason, by kind of reason; the long and obvious kind stays folded. */
export function LeftOut({ rows }: { rows: readonly LeftOutRow[] }) {
  if (rows.length === 0) return null
  const groups = KINDS.map((why) => ({ why, members: rows.filter((row) => row.why === why) })).filter(
    ({ members }) => members.length > 0,
  )
  return (
    <details className="mt-5">
      <summary className="min-h-target cursor-pointer py-2">
        <h2 className="inline">Left out, {rows.length}, each with its reason</h2>
      </summary>
      {groups.map(({ why, members }) =>
        why === 'targetNotTrained' && groups.length > 1 ? (
          <details key={why} className="mt-3">
            <summary className="min-h-target cursor-pointer py-2">
              <h3 className="inline">
                {LEFT_OUT_WORDS[why]}, {members.length}
              </h3>
            </summary>
            <Reasons rows={members} />
          </details>
        ) : (
          <section key={why} className="mt-3">
            <h3 className="text-pencil">
              {LEFT_OUT_WORDS[why]}, {members.length}
            </h3>
            <Reasons rows={members} />
          </section>
        ),
      )}
    </details>
  )
}

function Reasons({ rows }: { rows: readonly LeftOutRow[] }) {
  return (
    <dl className="grid gap-x-6 gap-y-1 sm:grid-cols-[minmax(12rem,max-content)_1fr]">
      {rows.map(({ exercise, reason }) => (
        <div key={exercise.id} className="contents">
          <dt className="font-semibold max-sm:mt-2">{exercise.name}</dt>
          <dd className="text-pencil">{reason}</dd>
        </div>
      ))}
    </dl>
  )
}
