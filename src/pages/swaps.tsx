import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { useNavigate, useParams } from 'react-router-dom'
import type { SwapRow } from '#shared/contract/swap'
import { paths } from '@/app/paths'
import { useToast } from '@/components/ui/toast'
import { slotRankingQuery } from '@/features/swaps/api'
import { FlagDialog } from '@/features/swaps/components/flag-dialog'
import { TakeNotice } from '@/features/swaps/components/take-notice'
import { useSwapFilters } from '@/features/swaps/hooks/use-swap-filters'
import { useTakeFlow } from '@/features/swaps/hooks/use-take-flow'
import { formatDose } from '@/lib/format'
import { hasRole, usePerson } from '@/lib/person'
import { SwapsBody } from './swaps-body'

/** Swaps for one slot of a session, to take or to flag. */
export function Component() {
  const { slotId = '' } = useParams()
  const person = usePerson()
  const navigate = useNavigate()
  const toast = useToast()
  const [filters, setFilters] = useSwapFilters()
  const [flagged, setFlagged] = useState<SwapRow | null>(null)
  const query = useQuery(slotRankingQuery(slotId, filters))
  const athlete = query.data?.athlete
  const own = athlete === undefined || athlete.id === person.id
  const back = own ? { to: paths.today(), label: 'Today' } : { to: paths.athlete(athlete.id), label: athlete.name }
  const { start, takingId, notice } = useTakeFlow({
    slotId,
    filters,
    reload: () => void query.refetch(),
    sayDose: ({ dose }) => formatDose(dose, person.units),
    onTaken: () => void navigate(back.to),
  })
  return (
    <>
      <SwapsBody
        query={query}
        filters={filters}
        onFilter={setFilters}
        back={back}
        between={<TakeNotice text={notice} />}
        onTake={own || hasRole(person, 'coach') ? (ranking, row) => void start(ranking, row) : undefined}
        takingId={takingId}
        onFlag={setFlagged}
      />
      {flagged !== null && (
        <FlagDialog
          slotId={slotId}
          exercise={flagged.exercise}
          onClose={() => setFlagged(null)}
          onRaised={() => {
            setFlagged(null)
            toast({ text: 'The flag is on its way to an admin.' })
          }}
        />
      )}
    </>
  )
}
