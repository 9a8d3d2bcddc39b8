import type { ReactNode } from 'react'
import type { Ranking } from '#shared/contract/swap'
import { LoadStrip } from '@/components/ui/load-strip'
import { formatDose } from '@/lib/format'
import type { Units } from '@/lib/units'
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

/** What every swap is measured against: the original, done as planned. */
export function OriginalAsPlanned({ ranking, units, loadKind, thumbnail }: OriginalAsPlannedProps) {
  const { originalRow, original, target } = ranking
  return (
    <section aria-label="For comparison" className="mb-4 rounded-xl border border-dashed border-edge px-3 py-2">
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
    </section>
  )
}
