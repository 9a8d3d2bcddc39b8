import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import {
  clearRedFlag,
  closeSoreJoint,
  listSoreJoints,
  reportSoreJoint,
  type SoreJointReport,
} from '#shared/contract/sore-joint'
import { call } from '@/lib/api-client'

export const soreJointKeys = {
  all: ['soreJoints'] as const,
  of: (athleteId: string) => [...soreJointKeys.all, athleteId] as const,
  standing: (athleteId: string) => [...soreJointKeys.of(athleteId), 'standing'] as const,
  closed: (athleteId: string) => [...soreJointKeys.of(athleteId), 'closed'] as const,
}

/** Open reports and red flags. */
export const standingQuery = (athleteId: string) =>
  queryOptions({
    queryKey: soreJointKeys.standing(athleteId),
    queryFn: ({ signal }) => call(listSoreJoints, { params: { athleteId }, query: { state: 'standing' } }, signal),
  })

export const closedQuery = (athleteId: string) =>
  infiniteQueryOptions({
    queryKey: soreJointKeys.closed(athleteId),
    queryFn: ({ signal, pageParam }) =>
      call(listSoreJoints, { params: { athleteId }, query: { state: 'closed', limit: 20, cursor: pageParam } }, signal),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: ({ nextCursor }) => nextCursor ?? undefined,
  })

export const useReportSoreJoint = (athleteId: string) =>
  useMutation({ mutationFn: (body: SoreJointReport) => call(reportSoreJoint, { params: { athleteId }, body }) })

/** The report leaves the list at once and comes back if the server refuses. */
export function useCloseSoreJoint(athleteId: string) {
  const client = useQueryClient()
  const { queryKey } = standingQuery(athleteId)
  return useMutation({
    mutationFn: (soreJointId: string) => call(closeSoreJoint, { params: { athleteId, soreJointId } }),
    onMutate: async (soreJointId) => {
      await client.cancelQueries({ queryKey })
      const before = client.getQueryData(queryKey)
      client.setQueryData(
        queryKey,
        (list) => list && { ...list, items: list.items.filter(({ id }) => id !== soreJointId) },
      )
      return { before }
    },
    onError: (_error, _id, kept) => {
      if (kept?.before !== undefined) client.setQueryData(queryKey, kept.before)
    },
  })
}

export const useClearRedFlag = (athleteId: string) =>
  useMutation({
    mutationFn: ({ soreJointId, note }: { soreJointId: string; note: string }) =>
      call(clearRedFlag, { params: { athleteId, soreJointId }, body: { note } }),
  })
