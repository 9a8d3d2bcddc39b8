import type { LeftOutRow } from '#shared/contract/swap'
import { LEFT_OUT_WORDS } from '@/lib/exercise-words'

/** Everything the table does not offer, each with its reason, by kind of reason. */
export function LeftOut({ rows }: { rows: readonly LeftOutRow[] }) {
  if (rows.length === 0) return null
  const kinds = (Object.keys(LEFT_OUT_WORDS) as LeftOutRow['why'][]).filter((why) =>
    rows.some((row) => row.why === why),
  )
  return (
    <details className="mt-5">
      <summary className="min-h-target cursor-pointer py-2">
        <h2 className="inline">Left out, {rows.length}, each with its reason</h2>
      </summary>
      {kinds.map((why) => (
        <section key={why} className="mt-3">
          <h3 className="text-pencil">{LEFT_OUT_WORDS[why]}</h3>
          <dl className="grid gap-x-6 gap-y-1 sm:grid-cols-[minmax(12rem,max-content)_1fr]">
            {rows
              .filter((row) => row.why === why)
              .map(({ exercise, reason }) => (
                <div key={exercise.id} className="contents">
                  <dt className="font-semibold max-sm:mt-2">{exercise.name}</dt>
                  <dd className="text-pencil">{reason}</dd>
                </div>
              ))}
          </dl>
        </section>
      ))}
    </details>
  )
}
