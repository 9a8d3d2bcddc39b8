import type { LoadKind } from './types'
import type { Ranking } from '#shared/contract/swap'
import { formatDose, formatPercent } from '@/lib/format'
import type { Units } from '@/lib/units'
import { jointWords, listWords } from '@/lib/words'
import { provocationWords, wantedWords } from '../words'

interface SwapFactsProps {
  ranking: Ranking
  units: Units
  loadKind?: LoadKind
}

/** What was planned, what it was for, and which joints bind the table. */
export function SwapFacts({ ranking, units, loadKind }: SwapFactsProps) {
  return (
    <dl className="mb-4 flex flex-wrap gap-x-10 gap-y-3">
      <div>
        <dt className="text-pencil">planned</dt>
        <dd className="font-semibold">{formatDose(ranking.planned, units, loadKind)}</dd>
      </div>
      <div>
        <dt className="text-pencil">wanted</dt>
        <dd className="font-semibold">{wantedWords(ranking)}</dd>
      </div>
      {ranking.sore.length > 0 && (
        <div className="border-l-3 border-oxide pl-3">
          <dt className="text-pencil">{ranking.sore.length === 1 ? 'sore joint' : 'sore joints'}</dt>
          {ranking.sore.map(({ soreJointId, joint, side, rating, provocations, cap, otherCap }) => (
            <dd key={soreJointId}>
              <span className="font-semibold">
                {jointWords(joint, side)} {rating} of 10, {listWords(provocations.map(provocationWords))}
              </span>
              <span className="block text-oxide">
                cap {formatPercent(cap)} of its strength
                {otherCap !== null && ` where that provokes it, ${formatPercent(otherCap)} for its other work`}
              </span>
            </dd>
          ))}
        </div>
      )}
    </dl>
  )
}
