import { QueryClientProvider } from '@tanstack/react-query'
import { configure, render } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { createElement, type ReactElement } from 'react'
import { createMemoryRouter, RouterProvider } from 'react-router-dom'
import type { Me } from '#shared/contract/me'
import { ToastProvider } from '@/components/ui/toast'
import { PersonProvider } from '@/lib/person'
import { createQueryClient } from '@/lib/query-client'

// A busy machine draws slowly; a law that does not hold fails all the same.
configure({ asyncUtilTimeout: 5_000 })

// jsdom has no pointer capture; the toast’s swipe asks for it.
Element.prototype.hasPointerCapture ??= () => false

interface Options {
  person?: Me | null
  path?: string
  /** Pattern of the route the element stands at, for its parameters. */
  route?: string
}

/** Renders inside what every page has around it; returns the user, the router and the query client. */
export function renderPage(element: ReactElement, { person = null, path = '/', route = '*' }: Options = {}) {
  const client = createQueryClient({ onSignedOut: () => undefined })
  client.setDefaultOptions({ queries: { ...client.getDefaultOptions().queries, retry: false } })
  const elsewhere = { path: '*', element: null }
  const router = createMemoryRouter([{ path: route, element }, ...(route === '*' ? [] : [elsewhere])], {
    initialEntries: [path],
  })
  const page = createElement(PersonProvider, { value: person }, createElement(RouterProvider, { router }))
  const view = render(createElement(QueryClientProvider, { client }, createElement(ToastProvider, null, page)))
  return { ...view, user: userEvent.setup(), router, client }
}
