import { useQuery } from '@tanstack/react-query'
import { Link, NavLink, Outlet, useLoaderData } from 'react-router-dom'
import type { Me } from '#shared/contract/me'
import { Icon } from '@/components/ui/icon'
import { meQuery } from '@/features/me/api'
import { placesQuery } from '@/features/places/api'
import { cx } from '@/lib/cx'
import { PersonProvider } from '@/lib/person'
import { Frame } from './frame'
import { placesFor, splitForPhone, type Place } from './navigation'
import { paths } from './paths'

/** The layout behind the sign-in. Its loader has the person; the query keeps them fresh. */
export function Shell() {
  const loaded = useLoaderData<Me>()
  const person = useQuery(meQuery()).data ?? loaded
  const places = placesFor(person)
  return (
    <PersonProvider value={person}>
      <Frame
        top={<Top person={person} />}
        rail={<Rail places={places} />}
        bar={<BottomBar places={splitForPhone(places).bar} />}
      >
        <Outlet />
      </Frame>
    </PersonProvider>
  )
}

function Top({ person }: { person: Me }) {
  const { data } = useQuery({ ...placesQuery(), enabled: person.defaultPlaceId !== null })
  const place = data?.items.find(({ id }) => id === person.defaultPlaceId)
  const clubs = [...new Set(person.memberships.map(({ clubName }) => clubName))].join(', ')
  return (
    <>
      <p className="min-w-0 flex-1 truncate text-pencil max-md:text-right">
        {place?.name ?? clubs}
        {place !== undefined && (
          <Link to={`${paths.me()}#place`} className="ml-2 link max-md:hidden">
            change <span className="sr-only">place</span>
          </Link>
        )}
      </p>
      <Link to={paths.me()} className="flex min-h-target items-center hover:underline max-md:hidden">
        {person.name}
      </Link>
    </>
  )
}

function Rail({ places }: { places: Place[] }) {
  return (
    <nav aria-label="Pages" className="flex w-36 shrink-0 flex-col gap-1 pt-6 pl-6 max-md:hidden print:hidden">
      {places.map(({ to, label }) => (
        <NavLink
          key={to}
          to={to}
          className={({ isActive }) =>
            cx(
              'flex min-h-target items-center rounded-md px-3 hover:bg-wash hover:text-ink',
              isActive ? 'bg-wash font-semibold text-ink shadow-[inset_3px_0_0_var(--oxide)]' : 'text-pencil',
            )
          }
        >
          {label}
        </NavLink>
      ))}
    </nav>
  )
}

function BottomBar({ places }: { places: Place[] }) {
  return (
    <nav
      aria-label="Pages"
      className="fixed inset-x-0 bottom-0 z-30 flex border-t border-rule bg-card pb-[env(safe-area-inset-bottom)] md:hidden print:hidden"
    >
      {places.map(({ to, label, icon }) => (
        <NavLink
          key={to}
          to={to}
          className={({ isActive }) =>
            cx(
              'flex flex-1 flex-col items-center gap-0.5 pt-2 pb-1.5 leading-tight',
              isActive ? 'font-semibold text-ink shadow-[inset_0_3px_0_var(--oxide)]' : 'text-pencil',
            )
          }
        >
          <Icon of={icon} />
          {label}
        </NavLink>
      ))}
    </nav>
  )
}
