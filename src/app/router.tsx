import type { QueryClient } from '@tanstack/react-query'
import { createBrowserRouter, Outlet, redirect, type LoaderFunctionArgs } from 'react-router-dom'
import type { Me } from '#shared/contract/me'
import { Loading } from '@/components/ui/states'
import { meQuery } from '@/features/me/api'
import { isApiError } from '@/lib/api-error'
import { NotFound, PageError, RootError } from './error-page'
import { Frame } from './frame'
import { homeFor } from './navigation'
import { paths } from './paths'
import { Shell } from './shell'

function Opening() {
  return (
    <Frame>
      <Loading what="the page" />
    </Frame>
  )
}

/** Page modules export `Component`; each is its own chunk, fetched when first needed. */
export function createRouter(client: QueryClient) {
  /** The signed-in person, or off to the sign-in and back here afterwards. */
  const person = async (request: Request): Promise<Me> => {
    try {
      return await client.ensureQueryData(meQuery())
    } catch (error) {
      if (!isApiError(error, 'not_signed_in', 'session_expired')) throw error
      const { pathname, search } = new URL(request.url)
      throw redirect(paths.signIn(pathname + search))
    }
  }
  return createBrowserRouter([
    {
      HydrateFallback: Opening,
      ErrorBoundary: RootError,
      children: [
        {
          element: (
            <Frame>
              <Outlet />
            </Frame>
          ),
          children: [
            { path: '/sign-in', lazy: () => import('@/pages/sign-in') },
            { path: '/forgot-password', lazy: () => import('@/pages/forgot-password') },
            { path: '/reset-password', lazy: () => import('@/pages/reset-password') },
          ],
        },
        {
          Component: Shell,
          loader: ({ request }: LoaderFunctionArgs) => person(request),
          children: [
            {
              ErrorBoundary: PageError,
              children: [
                { index: true, loader: async ({ request }) => redirect(homeFor(await person(request))) },
                { path: '/today', lazy: () => import('@/pages/today') },
                { path: '/joints', lazy: () => import('@/pages/joints') },
                { path: '/me', lazy: () => import('@/pages/me') },
                { path: '/squad', lazy: () => import('@/pages/squad') },
                { path: '/clients', lazy: () => import('@/pages/clients') },
                { path: '/athletes/:athleteId', lazy: () => import('@/pages/athlete') },
                { path: '/slots/:slotId/swaps', lazy: () => import('@/pages/swaps') },
                {
                  path: '/athletes/:athleteId/exercises/:exerciseId/swaps',
                  lazy: () => import('@/pages/exercise-swaps'),
                },
                { path: '/catalogue', lazy: () => import('@/pages/catalogue') },
                { path: '/catalogue/:slug', lazy: () => import('@/pages/exercise') },
                { path: '/flags', lazy: () => import('@/pages/flags') },
                { path: '/trail', lazy: () => import('@/pages/trail') },
                { path: '*', Component: NotFound },
              ],
            },
          ],
        },
      ],
    },
  ])
}
