import type { ReactNode } from 'react'
import type { Ranking } from '#shared/contract/swap'
import { LoadStrip } from '@/components/ui/load-strip'
import { formatDose, formatPercent } from '@/lib/format'
import type { Units } from '@/lib/units'
import { useWide } from '@/lib/use-wide'
import { capitalise, jointWords, TARGET_WORDS } from '@/lib/words'
import { jointColumns, stressAt } from '../joints'
import type { LoadKind } from './types'

interface OriginalAsPlannedProps {
  ranking: Ranking
  units: Units
  loadKind?: LoadKind
  thumbnail: ReactNode
}

/** Name and strip: side by side on phones, one above the other where there is room for all in a row. */
const PAIR = 'max-sm:grid max-sm:grid-cols-[7.5rem_1fr] max-sm:items-center max-sm:gap-x-2'

/** What every swap is measured against: the original, done as planned. Folded on phones, where the swaps come first. */
export function OriginalAsPlanned(props: OriginalAsPlannedProps) {
  const wide = useWide()
  const frame = 'rounded-xl border border-dashed border-edge px-3'
  if (wide) {
    return (
      <section aria-label="For comparison" className={`mb-4 py-2 ${frame}`}>
        <Comparison {...props} />
      </section>
    )
  }
  return (
    <details className={`mb-3 ${frame}`}>
      <summary className="cursor-pointer py-2.5">
        <b>As planned</b> <span className="text-pencil">{hardestSore(props.ranking)}</span>
      </summary>
      <div className="pb-3">
        <Comparison {...props} />
      </div>
    </details>
  )
}

/** What the original asks of the sore joints, in a few words for the folded form. */
function hardestSore(ranking: Ranking): string {
  const { originalRow } = ranking
  if (originalRow === null) return 'beyond current strength'
  return jointColumns(ranking)
    .filter((joint) => joint.sore)
    .flatMap((joint) => {
      const stress = stressAt(originalRow.joints, joint)
      return stress === undefined ? [] : [`${jointWords(stress.joint, stress.side)} ${formatPercent(stress.stress)}`]
    })
    .join(', ')
}

function Comparison({ ranking, units, loadKind, thumbnail }: OriginalAsPlannedProps) {
  const { originalRow, original, target } = ranking
  return (
    <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
      <div className="flex min-w-60 flex-1 items-center gap-3">
        {thumbnail}
        <p className="leading-snug">
          <span className="text-pencil">as planned</span>
          <b className="block">{original.name}</b>
          <span className="text-pencil">{formatDose(ranking.planned, units, loadKind)}</span>
        </p>
      </div>
      {originalRow === null ? (
        <p className="min-w-0 flex-2 basis-80">
          As planned it is beyond current strength, so there is nothing to compare with.
        </p>
      ) : (
        <dl className="grid min-w-0 flex-3 basis-72 gap-x-5 gap-y-0.5 sm:grid-cols-[repeat(auto-fit,minmax(9rem,1fr))]">
          <div className={PAIR}>
            <dt className="text-pencil">{capitalise(TARGET_WORDS[target])} driven to</dt>
            <dd>
              <LoadStrip kind="drive" label={capitalise(TARGET_WORDS[target])} share={originalRow.targetDrive} />
            </dd>
          </div>
          {jointColumns(ranking).flatMap((joint) => {
            const stress = stressAt(originalRow.joints, joint)
            if (stress === undefined) return []
            return (
              <div key={joint.key} className={PAIR}>
                <dt className={joint.sore ? 'font-semibold text-oxide' : 'text-pencil'}>{joint.title}</dt>
                <dd>
                  <LoadStrip
                    label={capitalise(jointWords(stress.joint, stress.side))}
                    share={stress.stress}
                    cap={stress.cap}
                  />
                </dd>
              </div>
            )
          })}
        </dl>
      )}
    </div>
  )
}
