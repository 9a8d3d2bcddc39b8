import { useInfiniteQuery, useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Link, useNavigate, useParams } from 'react-router-dom'
import { paths } from '@/app/paths'
import { Field } from '@/components/ui/field'
import { Select } from '@/components/ui/inputs'
import { PageHeader } from '@/components/ui/page-header'
import { EmptyState, Loaded, Skeleton } from '@/components/ui/states'
import { LinkButton } from '@/components/ui/button'
import { athletesQuery } from '@/features/athletes/api'
import { exerciseQuery } from '@/features/exercises/api'
import { ExerciseView } from '@/features/exercises/components/exercise-view'
import { WishForm } from '@/features/swaps/components/wish-form'
import { readWish } from '@/features/swaps/hooks/use-wish'
import { isApiError } from '@/lib/api-error'
import { itemsOf } from '@/lib/paged'
import { hasRole, usePerson } from '@/lib/person'
import { useToday } from '@/lib/use-today'

/** The mean of the two samples the segment table was measured on (de Leva 1996), when nobody in particular is meant. */
const AVERAGE = { sex: 'unspecified', bodyMass: 67.5, stature: 1.738 } as const

/** One exercise of the catalogue, and the way to swaps for it. */
export function Component() {
  const { slug = '' } = useParams()
  const person = usePerson()
  const navigate = useNavigate()
  const query = useQuery(exerciseQuery(slug))
  const carer = hasRole(person, 'coach', 'physio')
  const athletes = useInfiniteQuery({ ...athletesQuery(useToday()), enabled: carer })
  const own = hasRole(person, 'athlete') && person.body !== null
  const [chosen, setChosen] = useState(own ? person.id : '')

  if (isApiError(query.error, 'not_found', 'invalid_request'))
    return (
      <>
        <PageHeader title="No such exercise" />
        <EmptyState
          title="The catalogue has no exercise at this address."
          action={<LinkButton to={paths.catalogue()}>To the catalogue</LinkButton>}
        />
      </>
    )
  const others = athletes.data === undefined ? [] : itemsOf(athletes.data).filter(({ id }) => id !== person.id)
  const subjectName =
    chosen === person.id ? 'you' : (others.find(({ id }) => id === chosen)?.name ?? 'an average adult')
  return (
    <>
      <PageHeader
        title={query.data?.name ?? 'Exercise'}
        crumb={
          <Link to={paths.catalogue()} className="link">
            Catalogue
          </Link>
        }
      />
      <Loaded query={query} what="the exercise" skeleton={<Skeleton className="h-96 rounded-xl" />}>
        {(exercise) => (
          <>
            <ExerciseView
              key={exercise.id}
              exercise={exercise}
              units={person.units}
              subject={chosen === '' ? { body: AVERAGE } : { athleteId: chosen }}
              sex={chosen === person.id ? person.body?.sex : undefined}
              subjectNote={`Numbers are for ${subjectName}.`}
              subjectChoice={
                (others.length > 0 || own) &&
                carer && (
                  <Field label="For" className="w-64">
                    <Select value={chosen} onChange={(event) => setChosen(event.target.value)}>
                      <option value="">an average adult</option>
                      {own && <option value={person.id}>myself</option>}
                      {others.map(({ id, name }) => (
                        <option key={id} value={id}>
                          {name}
                        </option>
                      ))}
                    </Select>
                  </Field>
                )
              }
            />
            <section aria-labelledby="find-swaps" className="mt-10">
              <h2 id="find-swaps" className="mb-2 text-xl">
                Swaps for it
              </h2>
              {chosen === '' ? (
                <p className="max-w-prose text-pencil">
                  {carer
                    ? 'Choose an athlete above to see swaps that fit their joints.'
                    : 'Fill in your body profile to see swaps that fit your joints.'}
                </p>
              ) : (
                <WishForm
                  wish={readWish(new URLSearchParams())}
                  submitLabel="See swaps"
                  onWish={(wish) => {
                    const search = new URLSearchParams(
                      Object.entries(wish).map(([name, value]) => [name, String(value)]),
                    )
                    void navigate(`${paths.exerciseSwaps(chosen, exercise.id)}?${search.toString()}`)
                  }}
                />
              )}
            </section>
          </>
        )}
      </Loaded>
    </>
  )
}
