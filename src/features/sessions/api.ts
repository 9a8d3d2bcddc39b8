import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import { getToday, type Today } from '#shared/contract/session'
import { undoSwap } from '#shared/contract/swap'
import { call } from '@/lib/api-client'

export const sessionKeys = {
  all: ['sessions'] as const,
  today: (athleteId: string, day: string) => [...sessionKeys.all, 'today', athleteId, day] as const,
}

export const todayQuery = (athleteId: string, day: string) =>
  queryOptions({
    queryKey: sessionKeys.today(athleteId, day),
    queryFn: ({ signal }) => call(getToday, { params: { athleteId }, query: { day } }, signal),
  })

/** The planned exercise is back at once, and the swap returns if the server refuses. */
export function useUndoSwap(athleteId: string, day: string) {
  const client = useQueryClient()
  const { queryKey } = todayQuery(athleteId, day)
  return useMutation({
    mutationFn: (swapId: string) => call(undoSwap, { params: { swapId } }),
    onMutate: async (swapId) => {
      await client.cancelQueries({ queryKey })
      const before = client.getQueryData(queryKey)
      client.setQueryData(queryKey, (today) => today && withoutSwap(today, swapId))
      return { before }
    },
    onError: (_error, _swapId, kept) => {
      if (kept?.before !== undefined) client.setQueryData(queryKey, kept.before)
    },
  })
}

/** What the planned exercise means for a sore joint is the server’s to say; until it does, nothing is claimed. */
const withoutSwap = (today: Today, swapId: string): Today => ({
  ...today,
  session: today.session && {
    ...today.session,
    slots: today.session.slots.map((slot) => (slot.swap?.id === swapId ? { ...slot, swap: null, affected: [] } : slot)),
  },
})
