import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import { getMe, updateMe } from '#shared/contract/me'
import { call, type Input } from '@/lib/api-client'

export const meKeys = { all: ['me'] as const }

export const meQuery = () =>
  queryOptions({ queryKey: meKeys.all, queryFn: ({ signal }) => call(getMe, undefined, signal), staleTime: 5 * 60_000 })

export type MeChange = Input<typeof updateMe>['body']

export function useUpdateMe() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (body: MeChange) => call(updateMe, { body }),
    onSuccess: (me) => client.setQueryData(meQuery().queryKey, me),
  })
}
