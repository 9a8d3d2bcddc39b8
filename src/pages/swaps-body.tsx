import { useQuery, type UseQueryResult } from '@tanstack/react-query'
import { useCallback, useMemo, type ReactNode } from 'react'
import { Link } from 'react-router-dom'
import type { Ranking, SwapRow } from '#shared/contract/swap'
import { paths } from '@/app/paths'
import { Caution } from '@/components/ui/caution'
import { PageHeader } from '@/components/ui/page-header'
import { Loading } from '@/components/ui/states'
import { ExerciseThumbnail } from '@/features/exercises/components/exercise-figure'
import { PreviewedStrip } from '@/features/exercises/components/previewed-strip'
import { useExercises } from '@/features/exercises/hooks/use-exercises'
import { placesQuery } from '@/features/places/api'
import { StopAdvice } from '@/features/sore-joints/components/stop-advice'
import type { RankingFilters } from '@/features/swaps/api'
import { OriginalAsPlanned } from '@/features/swaps/components/original-as-planned'
import { RankingFailure } from '@/features/swaps/components/ranking-failure'
import { RedFlagNotice } from '@/features/swaps/components/red-flag-notice'
import { SwapFacts } from '@/features/swaps/components/swap-facts'
import { SwapFilters } from '@/features/swaps/components/swap-filters'
import { SwapNotes } from '@/features/swaps/components/swap-notes'
import { countWords, SwapResults } from '@/features/swaps/components/swap-results'
import { SwapsSkeleton } from '@/features/swaps/components/swaps-skeleton'
import { inSentence } from '@/features/swaps/words'
import { hasRole, usePerson } from '@/lib/person'

const NO_IDS: readonly string[] = []
const idsOf = ({ original, items }: Ranking): string[] => [original.id, ...items.map(({ exercise }) => exercise.id)]

interface SwapsBodyProps {
  query: UseQueryResult<Ranking>
  filters: RankingFilters
  onFilter: (change: Partial<RankingFilters>) => void
  back: { to: string; label: string }
  /** Between the caution and the table: a message, or what the swap is wanted for. */
  between?: ReactNode
  onTake?: (ranking: Ranking, row: SwapRow) => void
  takingId?: string
  onFlag?: (row: SwapRow) => void
}

/** What the pages of swaps have in common: heading, facts, caution, table, what was left out. */
export function SwapsBody({ query, filters, onFilter, back, between, onTake, takingId, onFlag }: SwapsBodyProps) {
  const person = usePerson()
  const ranking = query.data
  const places = useQuery(placesQuery())
  const exerciseOf = useExercises(useMemo(() => (ranking === undefined ? NO_IDS : idsOf(ranking)), [ranking]))
  const loadKind = useCallback((id: string) => exerciseOf(id)?.load.kind, [exerciseOf])
  const sex = ranking?.athlete.id === person.id ? person.body?.sex : undefined
  const thumbnailOf = useCallback(
    (id: string, marks: SwapRow['joints'] | undefined) => (
      <ExerciseThumbnail exercise={exerciseOf(id)} sex={sex} marks={marks} className="size-16 shrink-0" />
    ),
    [exerciseOf, sex],
  )
  /** Under a red flag that leaves nothing to offer, only the advice stands. */
  const stopped = ranking !== undefined && ranking.redFlags.length > 0 && ranking.items.length === 0
  const thumbnail = useCallback((row: SwapRow) => thumbnailOf(row.exercise.id, row.joints), [thumbnailOf])

  return (
    <>
      <PageHeader
        title={ranking === undefined ? 'Swaps' : `Instead of the ${inSentence(ranking.original.name)}`}
        crumb={
          <Link to={back.to} className="link">
            {back.label}
          </Link>
        }
      />
      {ranking !== undefined && (
        <SwapFacts ranking={ranking} units={person.units} loadKind={loadKind(ranking.original.id)} />
      )}
      <div className="mb-5">
        <Caution />
      </div>
      {between}
      {ranking === undefined ? (
        query.isError ? (
          <RankingFailure
            error={query.error}
            retry={() => void query.refetch()}
            retrying={query.isFetching}
            profilePath={hasRole(person, 'athlete') ? paths.me() : undefined}
          />
        ) : (
          <Loading what="swaps">
            <SwapsSkeleton />
          </Loading>
        )
      ) : (
        <>
          <RedFlagNotice
            ranking={ranking}
            own={ranking.athlete.id === person.id}
            advice={<StopAdvice flags={ranking.redFlags.flatMap(({ flags }) => flags)} />}
          />
          <SwapNotes estimated={ranking.estimated} minor={ranking.minor} />
          {!stopped && (
            <>
              <OriginalAsPlanned
                ranking={ranking}
                units={person.units}
                loadKind={loadKind(ranking.original.id)}
                thumbnail={thumbnailOf(ranking.original.id, ranking.originalRow?.joints)}
              />
              <SwapFilters
                filters={filters}
                onChange={onFilter}
                places={places.data?.items ?? []}
                placeId={ranking.placeId}
                count={countWords(ranking.items.length, ranking.leftOut.length)}
              />
            </>
          )}
          <SwapResults
            ranking={ranking}
            units={person.units}
            loadKind={loadKind}
            thumbnail={thumbnail}
            figure={(row) => (
              <PreviewedStrip
                exerciseId={row.exercise.id}
                exercise={exerciseOf(row.exercise.id)}
                athleteId={ranking.athlete.id}
                sex={sex}
                load={row.dose.load ?? 0}
              />
            )}
            onTake={onTake === undefined ? undefined : (row) => onTake(ranking, row)}
            takingId={takingId}
            onFlag={onFlag}
            filters={filters}
            onFilter={onFilter}
            stale={query.isPlaceholderData}
          />
        </>
      )}
    </>
  )
}
