import { queryOptions } from '@tanstack/react-query'
import { listPlaces } from '#shared/contract/place'
import { call } from '@/lib/api-client'

export const placesQuery = () =>
  queryOptions({
    queryKey: ['places'],
    queryFn: ({ signal }) => call(listPlaces, undefined, signal),
    staleTime: 10 * 60_000,
  })
