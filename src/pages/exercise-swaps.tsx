import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { paths } from '@/app/paths'
import { exerciseRankingQuery } from '@/features/swaps/api'
import { WishForm } from '@/features/swaps/components/wish-form'
import { useSwapFilters } from '@/features/swaps/hooks/use-swap-filters'
import { useWish } from '@/features/swaps/hooks/use-wish'
import { SwapsBody } from './swaps-body'

/** Swaps for any exercise of the catalogue, to look at; they are taken from a session's slot. */
export function Component() {
  const { athleteId = '', exerciseId = '' } = useParams()
  const [filters, setFilters] = useSwapFilters()
  const [wish, setWish] = useWish()
  const query = useQuery(exerciseRankingQuery(athleteId, exerciseId, wish, filters))
  const original = query.data?.original
  return (
    <SwapsBody
      query={query}
      filters={filters}
      onFilter={setFilters}
      back={
        original === undefined
          ? { to: paths.catalogue(), label: 'Catalogue' }
          : { to: paths.exercise(original.slug), label: original.name }
      }
      between={
        <div className="mb-5">
          <WishForm wish={wish} onWish={setWish} submitLabel="Rank again" />
        </div>
      }
    />
  )
}
