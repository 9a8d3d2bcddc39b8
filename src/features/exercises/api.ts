import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query'
import { getExercise, listExercises, previewExercise, type Exercise } from '#shared/contract/exercise'
import { LIMITS } from '#shared/contract/limits'
import { call, type Input } from '@/lib/api-client'

export const exerciseKeys = {
  all: ['exercises'] as const,
  list: (search: string) => [...exerciseKeys.all, 'list', search] as const,
  byIds: (ids: readonly string[]) => [...exerciseKeys.all, 'byIds', ids] as const,
  one: (slug: string) => [...exerciseKeys.all, 'one', slug] as const,
  preview: (body: PreviewBody) => [...exerciseKeys.all, 'preview', body] as const,
}

/** Published versions change seldom. */
const STALE = 10 * 60_000

export const catalogueQuery = (search: string) =>
  infiniteQueryOptions({
    queryKey: exerciseKeys.list(search),
    queryFn: ({ signal, pageParam }) =>
      call(
        listExercises,
        { query: { search: search === '' ? undefined : search, cursor: pageParam, limit: 100 } },
        signal,
      ),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: ({ nextCursor }) => nextCursor ?? undefined,
    placeholderData: keepPreviousData,
    staleTime: STALE,
  })

/** Some exercises by id, in as few requests as the API's page allows. */
export function exercisesQuery(ids: readonly string[]) {
  const sorted = [...new Set(ids)].sort()
  return queryOptions({
    queryKey: exerciseKeys.byIds(sorted),
    queryFn: async ({ signal }) => {
      const size = LIMITS.pageSize.max
      const batches = Array.from({ length: Math.ceil(sorted.length / size) }, (_, index) =>
        sorted.slice(index * size, (index + 1) * size),
      )
      const pages = await Promise.all(
        batches.map((batch) => call(listExercises, { query: { ids: batch.join(','), limit: size } }, signal)),
      )
      return new Map(pages.flatMap(({ items }) => items).map((exercise): [string, Exercise] => [exercise.id, exercise]))
    },
    enabled: sorted.length > 0,
    placeholderData: keepPreviousData,
    staleTime: STALE,
  })
}

export const exerciseQuery = (slug: string) =>
  queryOptions({
    queryKey: exerciseKeys.one(slug),
    queryFn: ({ signal }) => call(getExercise, { params: { slug } }, signal),
    staleTime: STALE,
  })

export type PreviewBody = Input<typeof previewExercise>['body']

/** What an exercise asks of a body at a load; the last answer stays in view while the next is computed. */
export const previewQuery = (body: PreviewBody) =>
  queryOptions({
    queryKey: exerciseKeys.preview(body),
    queryFn: ({ signal }) => call(previewExercise, { body }, signal),
    placeholderData: keepPreviousData,
  })
