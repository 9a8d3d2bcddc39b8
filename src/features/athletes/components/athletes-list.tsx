import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { MoreButton } from '@/components/ui/more-button'
import { EmptyState, Loaded, Skeleton } from '@/components/ui/states'
import { itemsOf } from '@/lib/paged'
import { useToday } from '@/lib/use-today'
import { athletesQuery } from '../api'
import { AthletesTable } from './athletes-table'

/** Everyone who let the reader in: who is sore today comes first. */
export function AthletesList({ caption }: { caption: string }) {
  const query = useInfiniteQuery(athletesQuery(useToday()))
  const { data } = query
  const rows = useMemo(() => (data === undefined ? [] : itemsOf(data)), [data])
  return (
    <Loaded query={query} what={caption.toLowerCase()} skeleton={<Skeleton className="h-96 rounded-xl" />}>
      {() =>
        rows.length === 0 ? (
          <EmptyState title="Nobody has let you in yet.">
            An athlete lets you in on their own page, under “care team”. Ask them; you cannot do it for them.
          </EmptyState>
        ) : (
          <>
            <Summary
              sore={rows.filter(({ sore }) => sore.length > 0).length}
              all={rows.length}
              more={query.hasNextPage}
            />
            <AthletesTable caption={caption} rows={rows} />
            <MoreButton query={query} />
          </>
        )
      }
    </Loaded>
  )
}

const Summary = ({ sore, all, more }: { sore: number; all: number; more: boolean }) => (
  <p className="mb-3">
    <b>{sore}</b> of {more ? 'the first ' : ''}
    {all} {sore === 1 ? 'has' : 'have'} a sore joint today.
  </p>
)
