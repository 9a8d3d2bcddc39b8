import { keepPreviousData, queryOptions, useMutation } from '@tanstack/react-query'
import { raiseFlag } from '#shared/contract/flag'
import { rankForExercise, rankForSlot, takeSwap, undoSwap } from '#shared/contract/swap'
import { call, type Input } from '@/lib/api-client'

/** What narrows a ranking; the same for a slot and for any exercise. */
export type RankingFilters = Pick<Input<typeof rankForSlot>['query'], 'placeId' | 'guidance'> & {
  maxCoordination?: number
}
/** What a swap for any exercise is wanted for; a slot knows it by itself. */
export type RankingWish = Pick<Input<typeof rankForExercise>['query'], 'target' | 'intent'> & {
  sets: number
  repetitions: number
  rir: number
}

export const swapKeys = {
  all: ['swaps'] as const,
  slot: (slotId: string, filters: RankingFilters) => [...swapKeys.all, 'slot', slotId, filters] as const,
  exercise: (athleteId: string, exerciseId: string, wish: RankingWish, filters: RankingFilters) =>
    [...swapKeys.all, 'exercise', athleteId, exerciseId, wish, filters] as const,
}

/** Swaps for what stands in a slot; the last table stays in view while another filter loads. */
export const slotRankingQuery = (slotId: string, filters: RankingFilters) =>
  queryOptions({
    queryKey: swapKeys.slot(slotId, filters),
    queryFn: ({ signal }) => call(rankForSlot, { params: { slotId }, query: filters }, signal),
    placeholderData: keepPreviousData,
  })

export const exerciseRankingQuery = (
  athleteId: string,
  exerciseId: string,
  wish: RankingWish,
  filters: RankingFilters,
) =>
  queryOptions({
    queryKey: swapKeys.exercise(athleteId, exerciseId, wish, filters),
    queryFn: ({ signal }) =>
      call(rankForExercise, { params: { athleteId, exerciseId }, query: { ...wish, ...filters } }, signal),
    placeholderData: keepPreviousData,
  })

export const useTakeSwap = (slotId: string, filters: RankingFilters) =>
  useMutation({
    mutationFn: (body: { exerciseId: string; fingerprint: string }) =>
      call(takeSwap, { params: { slotId }, query: filters, body }),
  })

export const useUndoTaken = () =>
  useMutation({ mutationFn: (swapId: string) => call(undoSwap, { params: { swapId } }) })

export const useRaiseFlag = () =>
  useMutation({ mutationFn: (body: Input<typeof raiseFlag>['body']) => call(raiseFlag, { body }) })
