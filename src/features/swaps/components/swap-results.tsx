import type { ReactNode } from 'react'
import type { SwapRow } from '#shared/contract/swap'
import { Button } from '@/components/ui/button'
import { EmptyState } from '@/components/ui/states'
import type { RankingFilters } from '../api'
import { useWide } from '@/lib/use-wide'
import { LeftOut } from './left-out'
import { SwapCards } from './swap-cards'
import { SwapDetail } from './swap-detail'
import { SwapTable, type SwapRowsProps } from './swap-table'

interface SwapResultsProps extends Omit<SwapRowsProps, 'detail'> {
  figure: (row: SwapRow) => ReactNode
  onFlag?: (row: SwapRow) => void
  filters: RankingFilters
  onFilter: (change: Partial<RankingFilters>) => void
  /** A table for other filters is on its way. */
  stale: boolean
}

/** The ranking as a table or as cards, what is left out of it, and what to do when nothing is left in. */
export function SwapResults({ figure, onFlag, filters, onFilter, stale, ...rows }: SwapResultsProps) {
  const wide = useWide()
  const { ranking, onTake, takingId } = rows
  const detail = (row: SwapRow): ReactNode => (
    <SwapDetail
      row={row}
      figure={figure(row)}
      onTake={onTake === undefined ? undefined : () => onTake(row)}
      taking={takingId === row.exercise.id}
      onFlag={onFlag === undefined ? undefined : () => onFlag(row)}
    />
  )
  const narrowed = filters.guidance !== undefined || filters.maxCoordination !== undefined
  return (
    <div aria-busy={stale} className={stale ? 'opacity-60' : undefined}>
      {ranking.items.length > 0 ? (
        wide ? (
          <SwapTable {...rows} detail={detail} />
        ) : (
          <SwapCards {...rows} detail={detail} />
        )
      ) : ranking.redFlags.length > 0 ? null : (
        <EmptyState
          title="No swap fits."
          action={
            narrowed && (
              <Button onClick={() => onFilter({ guidance: undefined, maxCoordination: undefined })}>
                Clear path and coordination
              </Button>
            )
          }
        >
          {narrowed
            ? 'Nothing at this place passes the filters above and every cap.'
            : 'Nothing at this place trains the target under every cap today. Try another place, or talk to your coach or physio.'}
        </EmptyState>
      )}
      <LeftOut rows={ranking.leftOut} />
    </div>
  )
}

export const countWords = (swaps: number, leftOut: number): string =>
  `${swaps === 1 ? '1 swap' : `${swaps} swaps`}, ${leftOut} left out`
