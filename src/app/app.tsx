import { QueryClientProvider } from '@tanstack/react-query'
import { RouterProvider } from 'react-router-dom'
import { ToastProvider } from '@/components/ui/toast'
import { createQueryClient } from '@/lib/query-client'
import { paths } from './paths'
import { createRouter } from './router'

/** A session that could not be renewed: sign in, then come back to where it ended. The first load redirects by itself. */
function toSignIn(): void {
  if (!router.state.initialized) return
  const { pathname, search } = router.state.location
  if (pathname !== '/sign-in') void router.navigate(paths.signIn(pathname + search))
}
const client = createQueryClient({ onSignedOut: () => toSignIn() })
const router = createRouter(client)

export function App() {
  return (
    <QueryClientProvider client={client}>
      <ToastProvider>
        <RouterProvider router={router} />
      </ToastProvider>
    </QueryClientProvider>
  )
}
