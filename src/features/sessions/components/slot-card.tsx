import { Undo2 } from 'lucide-react'
import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import type { ExerciseDocument } from '#shared/contract/exercise'
import type { Slot } from '#shared/contract/session'
import { paths } from '@/app/paths'
import { Button } from '@/components/ui/button'
import { Card } from '@/components/ui/card'
import { Icon } from '@/components/ui/icon'
import { formatDose, formatOverCap } from '@/lib/format'
import type { Units } from '@/lib/units'
import { capitalise, INTENT_WORDS, jointWords, TARGET_WORDS } from '@/lib/words'

export type LoadKind = ExerciseDocument['load']['kind']

interface SlotCardProps {
  slot: Slot
  units: Units
  /** How the load of an exercise is meant, once it is known. */
  loadKind: (exerciseId: string) => LoadKind | undefined
  figure?: (exerciseId: string) => ReactNode
  onUndo?: (swapId: string) => void
}

/** What stands in one slot now, and what a sore joint means for it. */
export function SlotCard({ slot, units, loadKind, figure, onUndo }: SlotCardProps) {
  const { swap, planned, affected } = slot
  const exercise = swap?.exercise ?? slot.exercise
  const dose = swap?.dose ?? planned
  const stopped = affected.some(({ verdict }) => verdict === 'redFlag')
  return (
    <Card hit={affected.length > 0} className="flex gap-3 p-3 sm:gap-5 sm:p-4">
      {figure !== undefined && (
        <div className="flex h-26 w-20 shrink-0 items-center justify-center sm:h-30 sm:w-32">{figure(exercise.id)}</div>
      )}
      <div className="min-w-0 flex-1">
        <h3 className="text-lg">{exercise.name}</h3>
        <p>{formatDose(dose, units, loadKind(exercise.id))}</p>
        <p className="text-pencil">
          {INTENT_WORDS[slot.intent]} · {TARGET_WORDS[slot.target]}
        </p>
        {swap !== null && (
          <p className="text-pencil">
            instead of {slot.exercise.name}, {formatDose(planned, units, loadKind(slot.exercise.id))}
          </p>
        )}
        {affected.map((hit) => (
          <p key={`${hit.joint}-${hit.side}`} className="mt-1 leading-snug font-semibold text-oxide">
            {hit.verdict === 'overCap'
              ? formatOverCap(hit)
              : `${capitalise(jointWords(hit.joint, hit.side))}: red flag. No swaps until a clinician has seen it.`}
          </p>
        ))}
        <div className="flex flex-wrap items-center gap-x-5">
          {slot.can.swap && !stopped && (
            <Link to={paths.slotSwaps(slot.id)} className="inline-flex min-h-target items-center font-semibold link">
              See swaps<span className="sr-only"> for {exercise.name}</span>
            </Link>
          )}
          {swap?.can.undo && onUndo !== undefined && (
            <Button kind="quiet" className="-ml-4" onClick={() => onUndo(swap.id)}>
              <Icon of={Undo2} />
              Undo the swap
            </Button>
          )}
        </div>
      </div>
    </Card>
  )
}
