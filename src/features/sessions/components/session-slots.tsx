import type { Session } from '#shared/contract/session'
import { SlotCard, type SlotCardProps } from './slot-card'

/** The slots in the order they are trained. */
export function SessionSlots({ session, ...rest }: Omit<SlotCardProps, 'slot'> & { session: Session }) {
  return (
    <ol aria-label={`Exercises of ${session.title}`} className="grid grid-cols-1 gap-3">
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
