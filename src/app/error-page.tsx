import { isRouteErrorResponse, useRevalidator, useRouteError } from 'react-router-dom'
import { LinkButton } from '@/components/ui/button'
import { PageHeader } from '@/components/ui/page-header'
import { EmptyState, FailureState } from '@/components/ui/states'
import { isApiError } from '@/lib/api-error'
import { Frame } from './frame'
import { paths } from './paths'

export function NotFound() {
  return (
    <>
      <PageHeader title="No such page" />
      <EmptyState
        title="Nothing stands at this address."
        action={<LinkButton to={paths.home()}>Go to the first page</LinkButton>}
      >
        It may have moved, or the link was cut short.
      </EmptyState>
    </>
  )
}

/** Inside the frame, when one page fails and the rest still works. */
export function PageError() {
  const error = useRouteError()
  const revalidator = useRevalidator()
  if (isRouteErrorResponse(error) && error.status === 404) return <NotFound />
  // A failed loader can be asked again; a page that broke while drawing, or whose code did not arrive, is fetched anew.
  const retry = isApiError(error) ? () => void revalidator.revalidate() : () => window.location.reload()
  return (
    <>
      <PageHeader title="This page cannot be shown" />
      <FailureState error={error} retry={retry} retrying={revalidator.state === 'loading'} />
    </>
  )
}

/** When not even the person could be loaded. */
export function RootError() {
  return (
    <Frame>
      <PageError />
    </Frame>
  )
}
