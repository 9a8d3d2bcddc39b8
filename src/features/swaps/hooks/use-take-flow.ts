import { useState } from 'react'
import type { Ranking, SwapRow, SwapTaken } from '#shared/contract/swap'
import { useToast } from '@/components/ui/toast'
import { ApiError, isApiError } from '@/lib/api-error'
import { useTakeSwap, useUndoTaken, type RankingFilters } from '../api'

interface TakeFlow {
  slotId: string
  filters: RankingFilters
  /** Fetches the table again after it turned out to be out of date. */
  reload: () => void
  /** Says the dose in words, for the message. */
  sayDose: (taken: SwapTaken) => string
  onTaken: (taken: SwapTaken) => void
}

const messageOf = (error: unknown, otherwise: string): string => (error instanceof ApiError ? error.message : otherwise)

/** Takes a row of the table, says so with a way back, and explains when the table was out of date. */
export function useTakeFlow({ slotId, filters, reload, sayDose, onTaken }: TakeFlow) {
  const toast = useToast()
  const { mutateAsync: take } = useTakeSwap(slotId, filters)
  const { mutateAsync: undo } = useUndoTaken()
  const [takingId, setTakingId] = useState<string>()
  const [notice, setNotice] = useState<string | null>(null)

  const putBack = (taken: SwapTaken) => {
    undo(taken.id).then(
      () => toast({ text: `${taken.exercise.name} is taken out again; the planned exercise is back.` }),
      (error: unknown) => toast({ text: messageOf(error, 'The swap could not be undone. Try again on Today.') }),
    )
  }

  const start = async (ranking: Ranking, row: SwapRow): Promise<void> => {
    setTakingId(row.exercise.id)
    setNotice(null)
    try {
      const taken = await take({ exerciseId: row.exercise.id, fingerprint: ranking.fingerprint })
      toast({
        text: `${taken.exercise.name} is in for today: ${sayDose(taken)}.`,
        action: { label: 'Undo', run: () => putBack(taken) },
      })
      onTaken(taken)
    } catch (error) {
      if (isApiError(error, 'ranking_changed')) {
        setNotice(
          'The numbers changed while you looked, so nothing was taken. The table below is up to date; choose again.',
        )
        reload()
      } else if (isApiError(error, 'swap_already_taken')) {
        setNotice('Another swap already stands in this slot. Undo it on Today first, then choose again.')
        reload()
      } else if (isApiError(error, 'red_flag', 'not_a_swap')) {
        setNotice(error.message)
        reload()
      } else {
        setNotice(messageOf(error, 'The swap could not be taken. Try again.'))
      }
    } finally {
      setTakingId(undefined)
    }
  }
  return { start, takingId, notice }
}
