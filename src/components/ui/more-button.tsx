import type { UseInfiniteQueryResult } from '@tanstack/react-query'
import { FailureState } from './states'
import { Button } from './button'

type Paged = Pick<UseInfiniteQueryResult, 'hasNextPage' | 'isFetchingNextPage' | 'isFetchNextPageError' | 'error'> & {
  fetchNextPage: () => unknown
}

/** The next page of a list, when there is one. */
export function MoreButton({ query }: { query: Paged }) {
  const fetch = () => void query.fetchNextPage()
  if (query.isFetchNextPageError)
    return (
      <div className="mt-3">
        <FailureState error={query.error} retry={fetch} retrying={query.isFetchingNextPage} />
      </div>
    )
  if (!query.hasNextPage) return null
  return (
    <div className="mt-3 text-center">
      <Button onClick={fetch} busy={query.isFetchingNextPage} busyLabel="Loading more">
        Show more
      </Button>
    </div>
  )
}
