import { LinkButton } from '@/components/ui/button'
import { EmptyState, FailureState } from '@/components/ui/states'
import { isApiError } from '@/lib/api-error'

interface RankingFailureProps {
  error: unknown
  retry: () => void
  retrying: boolean
  /** Where the body profile is filled in; absent for people who look at somebody else's. */
  profilePath?: string
}

/** Why there is no table, and the way on. */
export function RankingFailure({ error, retry, retrying, profilePath }: RankingFailureProps) {
  if (isApiError(error, 'profile_incomplete'))
    return (
      <EmptyState
        title="Body mass, stature, sex and date of birth are missing."
        action={profilePath !== undefined && <LinkButton to={profilePath}>Fill them in</LinkButton>}
      >
        Without them no load can be worked out.
      </EmptyState>
    )
  return <FailureState error={error} retry={retry} retrying={retrying} />
}
