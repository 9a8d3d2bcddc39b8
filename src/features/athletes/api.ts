import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import { listAthletes, listCareTeam, setConsent } from '#shared/contract/athlete'
import { call } from '@/lib/api-client'

export const athleteKeys = {
  all: ['athletes'] as const,
  list: (day: string) => [...athleteKeys.all, 'list', day] as const,
  careTeam: () => [...athleteKeys.all, 'careTeam'] as const,
}

/** Everyone who let the signed-in coach or physio in, by need. */
export const athletesQuery = (day: string) =>
  infiniteQueryOptions({
    queryKey: athleteKeys.list(day),
    queryFn: ({ signal, pageParam }) => call(listAthletes, { query: { day, cursor: pageParam } }, signal),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: ({ nextCursor }) => nextCursor ?? undefined,
  })

export const careTeamQuery = () =>
  queryOptions({ queryKey: athleteKeys.careTeam(), queryFn: ({ signal }) => call(listCareTeam, undefined, signal) })

/** The switch moves at once and moves back if the server refuses. */
export function useSetConsent(now: () => Date = () => new Date()) {
  const client = useQueryClient()
  const { queryKey } = careTeamQuery()
  return useMutation({
    mutationFn: ({ userId, letIn }: { userId: string; letIn: boolean }) =>
      call(setConsent, { params: { userId }, body: { letIn } }),
    onMutate: async ({ userId, letIn }) => {
      await client.cancelQueries({ queryKey })
      const before = client.getQueryData(queryKey)
      const consentSince = letIn ? now().toISOString() : null
      client.setQueryData(
        queryKey,
        (list) =>
          list && {
            ...list,
            items: list.items.map((member) => (member.userId === userId ? { ...member, consentSince } : member)),
          },
      )
      return { before }
    },
    onError: (_error, _change, kept) => {
      if (kept?.before !== undefined) client.setQueryData(queryKey, kept.before)
    },
  })
}
