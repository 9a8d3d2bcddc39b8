import { useQuery } from '@tanstack/react-query'
import { Link, useParams } from 'react-router-dom'
import type { Me } from '#shared/contract/me'
import type { Session, Today } from '#shared/contract/session'
import { homeFor, placesFor } from '@/app/navigation'
import { paths } from '@/app/paths'
import { LinkButton } from '@/components/ui/button'
import { PageHeader } from '@/components/ui/page-header'
import { EmptyState, Loaded } from '@/components/ui/states'
import { ExerciseThumbnail } from '@/features/exercises/components/exercise-figure'
import { useExercises } from '@/features/exercises/hooks/use-exercises'
import { todayQuery } from '@/features/sessions/api'
import { RestDay } from '@/features/sessions/components/rest-day'
import { SessionSlots } from '@/features/sessions/components/session-slots'
import { SlotsSkeleton } from '@/features/sessions/components/slots-skeleton'
import { exerciseIdsOf } from '@/features/sessions/exercise-ids'
import { ClosedJoints } from '@/features/sore-joints/components/closed-joints'
import { StandingJoints } from '@/features/sore-joints/components/standing-joints'
import { isApiError } from '@/lib/api-error'
import { formatDay } from '@/lib/format'
import { usePerson } from '@/lib/person'
import { useToday } from '@/lib/use-today'

/** Where this reader has their list of athletes. */
const listFor = (person: Me) => placesFor(person).find(({ to }) => to === paths.squad() || to === paths.clients())

/** One athlete as their care team sees them: today and the joints, to read. */
export function Component() {
  const { athleteId = '' } = useParams()
  const person = usePerson()
  const query = useQuery(todayQuery(athleteId, useToday()))
  if (isApiError(query.error, 'not_found', 'forbidden'))
    return (
      <>
        <PageHeader title="No such athlete" />
        <EmptyState
          title="This athlete has not let you in."
          action={<LinkButton to={homeFor(person)}>Back</LinkButton>}
        >
          Or the address is wrong. Only the athlete can let you in.
        </EmptyState>
      </>
    )
  return (
    <>
      {query.data === undefined && <PageHeader title="Athlete" />}
      <Loaded query={query} what="the athlete’s day" skeleton={<SlotsSkeleton />}>
        {(today) => (
          <>
            <PageHeader title={today.athlete.name} crumb={<Crumb today={today} />} />
            <div className="grid items-start gap-8 lg:grid-cols-[3fr_2fr]">
              <section aria-label="Today">
                <h2 className="mb-3 text-xl">Today</h2>
                {today.session === null ? (
                  <RestDay today={today} whose={today.athlete.name} />
                ) : (
                  <ReadSession session={today.session} />
                )}
              </section>
              <section aria-label="Joints">
                <h2 className="mb-3 text-xl">Joints</h2>
                <StandingJoints athleteId={athleteId} own={false} empty="What the athlete reports stands here." />
                <h3 className="mt-6 mb-2 text-lg">Earlier</h3>
                <ClosedJoints athleteId={athleteId} />
              </section>
            </div>
          </>
        )}
      </Loaded>
    </>
  )
}

function ReadSession({ session }: { session: Session }) {
  const { units } = usePerson()
  const exerciseOf = useExercises(exerciseIdsOf(session))
  return (
    <SessionSlots
      session={session}
      units={units}
      heading="h3"
      loadKind={(id) => exerciseOf(id)?.load.kind}
      figure={(id, affected) => (
        <ExerciseThumbnail exercise={exerciseOf(id)} marks={affected} className="h-full w-full" />
      )}
    />
  )
}

/** The way back to the list, and the day. */
function Crumb({ today: { day, session } }: { today: Today }) {
  const list = listFor(usePerson())
  const rest = [formatDay(day), session && `${session.title}, ${session.minutes} min`, session?.placeName]
  return (
    <>
      {list && (
        <>
          <Link to={list.to} className="link">
            {list.label}
          </Link>
          {' · '}
        </>
      )}
      {rest.filter(Boolean).join(' · ')}
    </>
  )
}
