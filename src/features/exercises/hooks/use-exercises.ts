import { useQuery } from '@tanstack/react-query'
import { useCallback } from 'react'
import type { Exercise } from '#shared/contract/exercise'
import { exercisesQuery } from '../api'

/** Looks exercises up by id, fetched in one batch; undefined while they load, and for good when that fails. */
export function useExercises(ids: readonly string[]): (id: string) => Exercise | undefined {
  const { data } = useQuery(exercisesQuery(ids))
  return useCallback((id: string) => data?.get(id), [data])
}
