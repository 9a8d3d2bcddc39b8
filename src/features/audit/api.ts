import { infiniteQueryOptions } from '@tanstack/react-query'
import { listAudit } from '#shared/contract/audit'
import { call } from '@/lib/api-client'

export const auditQuery = () =>
  infiniteQueryOptions({
    queryKey: ['audit'],
    queryFn: ({ signal, pageParam }) => call(listAudit, { query: { cursor: pageParam } }, signal),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: ({ nextCursor }) => nextCursor ?? undefined,
  })
