import { useMemo } from 'react'
import { useSearchParams } from 'react-router-dom'
import { GUIDANCES, type Guidance } from '#shared/mechanics/vocabulary'
import type { RankingFilters } from '../api'

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i

/** Filters as the address has them; what cannot be a filter is passed over, so that an old link still opens. */
export function readFilters(search: URLSearchParams): RankingFilters {
  const filters: RankingFilters = {}
  const place = search.get('place')
  const path = search.get('path')
  const coordination = search.get('coordination')
  if (place !== null && UUID.test(place)) filters.placeId = place
  if (path !== null && (GUIDANCES as readonly string[]).includes(path)) filters.guidance = path as Guidance
  if (coordination !== null && /^\d{1,3}$/.test(coordination) && Number(coordination) < 100)
    filters.maxCoordination = Number(coordination)
  return filters
}

/** The filters of the table, kept in the address so that Back, reload and a shared link keep them. */
export function useSwapFilters(): [RankingFilters, (change: Partial<RankingFilters>) => void] {
  const [search, setSearch] = useSearchParams()
  const filters = useMemo(() => readFilters(search), [search])
  const change = (next: Partial<RankingFilters>) =>
    setSearch(
      (before) => {
        const after = new URLSearchParams(before)
        const merged = { ...readFilters(before), ...next }
        const put = (name: string, value: string | undefined) =>
          value === undefined ? after.delete(name) : after.set(name, value)
        put('place', merged.placeId)
        put('path', merged.guidance)
        put('coordination', merged.maxCoordination === undefined ? undefined : String(merged.maxCoordination))
        return after
      },
      { replace: true, preventScrollReset: true },
    )
  return [filters, change]
}
