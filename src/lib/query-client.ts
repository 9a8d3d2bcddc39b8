import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query'
import { isApiError } from './api-error'

/** Codes that a second try can mend. */
const passing = (error: unknown) => isApiError(error, 'unreachable', 'unreadable', 'internal', 'unavailable')

/**
 * A write may change what the server computed for anything on screen (a sore joint changes today, the squad and every
 * ranking), so each successful one makes everything stale; only what is on screen is fetched again. A mutation that
 * changes nothing the queries show says so with `meta: { keepsData: true }`.
 */
export function createQueryClient({ onSignedOut }: { onSignedOut: () => void }): QueryClient {
  const signedOut = (error: unknown) => {
    if (isApiError(error, 'not_signed_in', 'session_expired')) onSignedOut()
  }
  const client: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError: signedOut }),
    mutationCache: new MutationCache({
      onError: signedOut,
      onSuccess: (_data, _variables, _result, mutation) => {
        if (mutation.meta?.keepsData !== true) void client.invalidateQueries()
      },
    }),
    defaultOptions: {
      queries: {
        staleTime: 30_000,
        retry: (failures, error) => failures < 2 && passing(error),
      },
    },
  })
  return client
}
