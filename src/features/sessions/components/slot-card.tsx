import { Undo2 } from 'lucide-react'
import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import type { ExerciseDocument } from '#shared/contract/exercise'
import type { Slot } from '#shared/contract/session'
import { paths } from '@/app/paths'
import { Button, LinkButton } from '@/components/ui/button'
import { Card } from '@/components/ui/card'
import { Icon } from '@/components/ui/icon'
import { formatDose, formatOverCap } from '@/lib/format'
import type { Units } from '@/lib/units'
import { capitalise, INTENT_WORDS, jointWords, TARGET_WORDS } from '@/lib/words'

export interface SlotCardProps {
  slot: Slot
  units: Units
  /** How the load of an exercise is meant, once it is known. */
  loadKind: (exerciseId: string) => ExerciseDocument['load']['kind'] | undefined
  figure: (exerciseId: string, affected: Slot['affected']) => ReactNode
  /** Level under the page’s own headings. */
  heading?: 'h2' | 'h3'
  onUndo?: (swapId: string) => void
  undoing?: string
}

/** What stands in one slot now, and what a sore joint means for it. */
export function SlotCard(props: SlotCardProps) {
  const { slot, units, loadKind, figure, heading: Heading = 'h2' } = props
  const { swap, planned, affected } = slot
  const exercise = swap?.exercise ?? slot.exercise
  return (
    <Card hit={affected.length > 0} className="flex gap-3 p-3 sm:gap-5 sm:p-4">
      <div className="flex h-26 w-18 shrink-0 items-center justify-center sm:h-28 sm:w-28">
        {figure(exercise.id, affected)}
      </div>
      <div className="flex min-w-0 flex-1 flex-col sm:flex-row sm:gap-4">
        <div className="min-w-0 flex-1">
          <Heading className="text-lg">{exercise.name}</Heading>
          <p>{formatDose(swap?.dose ?? planned, units, loadKind(exercise.id))}</p>
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
        </div>
        <Actions {...props} name={exercise.name} />
      </div>
    </Card>
  )
}

/** Nothing stands here that this reader cannot do. */
function Actions({ slot, name, onUndo, undoing }: SlotCardProps & { name: string }) {
  const { swap, affected, can } = slot
  const stopped = affected.some(({ verdict }) => verdict === 'redFlag')
  const undo = swap?.can.undo === true && onUndo !== undefined ? () => onUndo(swap.id) : null
  if ((!can.swap || stopped) && undo === null) return null
  return (
    <div className="-mb-2 flex flex-wrap items-center gap-x-5 sm:mb-0 sm:flex-col sm:items-end sm:justify-center">
      {can.swap &&
        !stopped &&
        (affected.length > 0 ? (
          <LinkButton to={paths.slotSwaps(slot.id)} kind="primary" className="my-2 max-sm:w-full">
            <SeeSwaps name={name} />
          </LinkButton>
        ) : (
          <Link to={paths.slotSwaps(slot.id)} className="inline-flex min-h-target items-center font-semibold link">
            <SeeSwaps name={name} />
          </Link>
        ))}
      {undo !== null && (
        <Button
          kind="quiet"
          className="-ml-4 sm:-mr-4 sm:ml-0"
          busy={undoing === swap?.id}
          busyLabel="Undoing"
          onClick={undo}
        >
          <Icon of={Undo2} />
          Undo the swap
        </Button>
      )}
    </div>
  )
}

const SeeSwaps = ({ name }: { name: string }) => (
  <span>
    See swaps <span className="sr-only">for {name}</span>
  </span>
)
