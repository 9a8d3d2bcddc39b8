import { queryOptions } from '@tanstack/react-query'
import { getToday } from '#shared/contract/session'
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
