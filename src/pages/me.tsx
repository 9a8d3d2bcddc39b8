import type { ReactNode } from 'react'
import { Link, useNavigate } from 'react-router-dom'
import { placesFor, splitForPhone } from '@/app/navigation'
import { paths } from '@/app/paths'
import { Button } from '@/components/ui/button'
import { Card } from '@/components/ui/card'
import { PageHeader } from '@/components/ui/page-header'
import { ThemeChoice } from '@/components/ui/theme-choice'
import { useToast } from '@/components/ui/toast'
import { CareTeam } from '@/features/athletes/components/care-team'
import { useSignOut } from '@/features/auth/api'
import { useUpdateMe } from '@/features/me/api'
import { BodyForm } from '@/features/me/components/body-form'
import { NameForm } from '@/features/me/components/name-form'
import { UnitsChoice } from '@/features/me/components/units-choice'
import { PlaceSelect } from '@/features/places/components/place-select'
import { messageOf } from '@/lib/api-error'
import { hasRole, usePerson } from '@/lib/person'
import { ROLE_WORDS } from '@/lib/words'

export function Component() {
  const person = usePerson()
  const athlete = hasRole(person, 'athlete')
  return (
    <div className="max-w-2xl">
      <PageHeader title={person.name} crumb={person.email} actions={<SignOut />} />
      <div className="grid gap-4">
        <MorePages />
        <Section title="You">
          <NameForm />
          <Memberships />
        </Section>
        {athlete && (
          <Section
            title="Body"
            hint="Every number is computed from these. Only you and the care team you let in see them."
          >
            <BodyForm />
          </Section>
        )}
        {athlete && (
          <Section title="Place" id="place">
            <UsualPlace />
          </Section>
        )}
        {athlete && (
          <Section title="Care team">
            <CareTeam />
          </Section>
        )}
        <Section title="Display">
          <UnitsChoice />
          <ThemeChoice />
        </Section>
        {!hasRole(person, 'admin') && (
          <Link to={paths.flags()} className="inline-flex min-h-target items-center justify-self-start link">
            Flags you raised
          </Link>
        )}
      </div>
    </div>
  )
}

function Section({ title, hint, id, children }: { title: string; hint?: string; id?: string; children: ReactNode }) {
  return (
    <Card id={id} className="grid scroll-mt-4 gap-4 p-4 sm:p-5">
      <div>
        <h2 className="text-xl">{title}</h2>
        {hint !== undefined && <p className="text-pencil">{hint}</p>}
      </div>
      <div className="grid gap-5">{children}</div>
    </Card>
  )
}

/** What does not fit in the bottom bar. */
function MorePages() {
  const { rest } = splitForPhone(placesFor(usePerson()))
  if (rest.length === 0) return null
  return (
    <nav aria-label="More pages" className="flex flex-wrap gap-x-6 md:hidden">
      {rest.map(({ to, label }) => (
        <Link key={to} to={to} className="inline-flex min-h-target items-center link">
          {label}
        </Link>
      ))}
    </nav>
  )
}

function Memberships() {
  const { memberships } = usePerson()
  return (
    <ul className="text-pencil">
      {memberships.map(({ clubId, clubName, role }) => (
        <li key={`${clubId}-${role}`}>
          {ROLE_WORDS[role]} at {clubName}
        </li>
      ))}
    </ul>
  )
}

function UsualPlace() {
  const { defaultPlaceId } = usePerson()
  const { mutate, isPending, variables } = useUpdateMe()
  const toast = useToast()
  return (
    <PlaceSelect
      chosen={isPending ? (variables.defaultPlaceId ?? defaultPlaceId) : defaultPlaceId}
      busy={isPending}
      onChoose={(placeId) =>
        mutate(
          { defaultPlaceId: placeId },
          {
            onSuccess: () => toast({ text: 'Your usual place is saved.' }),
            onError: (error) => toast({ text: messageOf(error, 'The place could not be saved. Try again.') }),
          },
        )
      }
    />
  )
}

function SignOut() {
  const { mutate, isPending } = useSignOut()
  const navigate = useNavigate()
  const toast = useToast()
  return (
    <Button
      busy={isPending}
      busyLabel="Signing out"
      onClick={() =>
        mutate(undefined, {
          onSuccess: () => void navigate(paths.signIn(), { replace: true }),
          onError: (error) => toast({ text: messageOf(error, 'Signing out failed. Try again.') }),
        })
      }
    >
      Sign out
    </Button>
  )
}
