import { infiniteQueryOptions } from '@tanstack/react-query'
import { listFlags } from '#shared/contract/flag'
import { call, type Input } from '@/lib/api-client'

export type FlagState = NonNullable<Input<typeof listFlags>['query']['state']>

export const flagsQuery = (state: FlagState) =>
  infiniteQueryOptions({
    queryKey: ['flags', state],
    queryFn: ({ signal, pageParam }) => call(listFlags, { query: { state, cursor: pageParam } }, signal),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: ({ nextCursor }) => nextCursor ?? undefined,
  })
