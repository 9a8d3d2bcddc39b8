import type { Today } from '#shared/contract/session'
import { EmptyState } from '@/components/ui/states'
import { formatDay } from '@/lib/format'

/** No session on this day, and when the next one is. */
export function RestDay({ today, whose }: { today: Today; whose?: string }) {
  return (
    <EmptyState title={whose === undefined ? 'A rest day.' : `A rest day for ${whose}.`}>
      {today.nextDay === null
        ? 'Nothing is planned after it yet.'
        : `The next session is on ${formatDay(today.nextDay)}.`}
    </EmptyState>
  )
}
