import type { Session } from '#shared/contract/session'
import { SlotCard, type LoadKind } from './slot-card'
import type { ComponentProps } from 'react'

interface SessionSlotsProps extends Omit<ComponentProps<typeof SlotCard>, 'slot'> {
  session: Session
}
export type { LoadKind }

/** The slots in the order they are trained. */
export function SessionSlots({ session, ...rest }: SessionSlotsProps) {
  return (
    <ol aria-label={`Exercises of ${session.title}`} className="grid gap-3">
      {session.slots
        .toSorted((a, b) => a.position - b.position)
        .map((slot) => (
          <li key={slot.id}>
            <SlotCard slot={slot} {...rest} />
          </li>
        ))}
    </ol>
  )
}
