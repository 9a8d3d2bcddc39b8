import type { UseQueryResult } from '@tanstack/react-query'
import type { ReactNode } from 'react'
import { ApiError } from '@/lib/api-error'
import { cx } from '@/lib/cx'
import { Button } from './button'

/** A grey block the size of what will stand there. */
export function Skeleton({ className }: { className?: string }) {
  return <div aria-hidden className={cx('animate-pulse rounded-md bg-wash', className)} />
}

/** Blocks while something loads, and the words for those who do not see them. */
export function Loading({ what, children }: { what: string; children?: ReactNode }) {
  return (
    <div role="status">
      <span className="sr-only">Loading {what}</span>
      {children ?? (
        <div className="grid gap-3">
          <Skeleton className="h-24" />
          <Skeleton className="h-24" />
          <Skeleton className="h-24" />
        </div>
      )}
    </div>
  )
}

/** Nothing here, in a sentence, and what can be done about it. */
export function EmptyState({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div className="rounded-xl border border-dashed border-edge px-6 py-8 text-center">
      <p className="text-lg font-semibold">{title}</p>
      {children !== undefined && <div className="mx-auto mt-1 max-w-prose text-pencil">{children}</div>}
      {action !== undefined && <div className="mt-4 flex flex-wrap justify-center gap-3">{action}</div>}
    </div>
  )
}

/** What went wrong in a sentence, its code for whoever helps, and a way to try again. */
export function FailureState({
  error,
  retry,
  retrying = false,
}: {
  error: unknown
  retry?: () => void
  retrying?: boolean
}) {
  const known = error instanceof ApiError
  return (
    <div role="alert" className="rounded-xl border border-oxide bg-oxide-wash px-6 py-5">
      <p className="font-semibold">{known ? error.message : 'Something went wrong on this page.'}</p>
      <p className="text-pencil">
        Code <code>{known ? error.code : 'page_error'}</code>
        {known && error.requestId !== null && (
          <>
            , request <code className="break-all">{error.requestId}</code>
          </>
        )}
      </p>
      {retry !== undefined && (
        <Button className="mt-3" onClick={retry} busy={retrying} busyLabel="Trying again">
          Try again
        </Button>
      )}
    </div>
  )
}

interface LoadedProps<T> {
  query: Pick<UseQueryResult<T>, 'data' | 'isError' | 'isRefetchError' | 'error' | 'isFetching'> & {
    refetch: () => unknown
  }
  /** What is loading, in words that follow “Loading”. */
  what: string
  skeleton?: ReactNode
  children: (data: T) => ReactNode
}

/** The states of every query: loading, failed, there. What was there stays in view, and says so, when a later fetch fails. */
export function Loaded<T>({ query, what, skeleton, children }: LoadedProps<T>) {
  const retry = () => void query.refetch()
  if (query.data !== undefined)
    return (
      <>
        {query.isRefetchError && <OlderNotice what={what} retry={retry} retrying={query.isFetching} />}
        {children(query.data)}
      </>
    )
  if (query.isError) return <FailureState error={query.error} retry={retry} retrying={query.isFetching} />
  return <Loading what={what}>{skeleton}</Loading>
}

function OlderNotice({ what, retry, retrying }: { what: string; retry: () => void; retrying: boolean }) {
  return (
    <div
      role="status"
      className="mb-3 flex flex-wrap items-center justify-between gap-x-4 rounded-md border border-brass bg-brass-wash px-4 py-1"
    >
      <p>This is how {what} stood a while ago; it could not be read again.</p>
      <Button kind="quiet" className="-mr-4" onClick={retry} busy={retrying} busyLabel="Trying again">
        Try again
      </Button>
    </div>
  )
}
