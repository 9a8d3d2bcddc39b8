import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import type { Session } from '#shared/contract/session'
import { paths } from '@/app/paths'
import { Button } from '@/components/ui/button'
import { PageHeader } from '@/components/ui/page-header'
import { Loaded } from '@/components/ui/states'
import { useToast } from '@/components/ui/toast'
import { ExerciseThumbnail } from '@/features/exercises/components/exercise-figure'
import { useExercises } from '@/features/exercises/hooks/use-exercises'
import { todayQuery } from '@/features/sessions/api'
import { RestDay } from '@/features/sessions/components/rest-day'
import { SessionSlots } from '@/features/sessions/components/session-slots'
import { SlotsSkeleton } from '@/features/sessions/components/slots-skeleton'
import { exerciseIdsOf } from '@/features/sessions/exercise-ids'
import { standingQuery } from '@/features/sore-joints/api'
import { SoreJointDialog } from '@/features/sore-joints/components/sore-joint-dialog'
import { SoreSummary } from '@/features/sore-joints/components/sore-summary'
import { useUndoTaken } from '@/features/swaps/api'
import { isApiError, messageOf } from '@/lib/api-error'
import { formatDay } from '@/lib/format'
import { usePerson } from '@/lib/person'
import { useToday } from '@/lib/use-today'
import { capitalise, jointWords } from '@/lib/words'

/** The athlete’s own day. */
export function Component() {
  const person = usePerson()
  const day = useToday()
  const toast = useToast()
  const [reporting, setReporting] = useState(false)
  const today = useQuery(todayQuery(person.id, day))
  const standing = useQuery(standingQuery(person.id))
  const session = today.data?.session
  return (
    <div className="max-w-2xl">
      <PageHeader
        title="Today"
        crumb={[formatDay(day), session && `${session.title}, ${session.minutes} min`].filter(Boolean).join(' · ')}
      />
      <div className="grid grid-cols-1 gap-4">
        {standing.data !== undefined && <SoreSummary reports={standing.data.items} to={paths.joints()} />}
        <Loaded query={today} what="today’s session" skeleton={<SlotsSkeleton />}>
          {(data) => (data.session === null ? <RestDay today={data} /> : <OwnSession session={data.session} />)}
        </Loaded>
        <div className="sticky bottom-21 z-20 md:static">
          <Button wide onClick={() => setReporting(true)} className="min-h-12 max-md:shadow-lg">
            A joint is sore
          </Button>
        </div>
      </div>
      {reporting && (
        <SoreJointDialog
          athleteId={person.id}
          day={day}
          onClose={() => setReporting(false)}
          onReported={({ joint, side }) => {
            setReporting(false)
            toast({ text: `${capitalise(jointWords(joint, side))} is marked as sore.` })
          }}
        />
      )}
    </div>
  )
}

function OwnSession({ session }: { session: Session }) {
  const { units, body } = usePerson()
  const toast = useToast()
  const undo = useUndoTaken()
  const exerciseOf = useExercises(exerciseIdsOf(session))
  return (
    <SessionSlots
      session={session}
      units={units}
      loadKind={(id) => exerciseOf(id)?.load.kind}
      figure={(id, affected) => (
        <ExerciseThumbnail exercise={exerciseOf(id)} sex={body?.sex} marks={affected} className="h-full w-full" />
      )}
      undoing={undo.isPending ? undo.variables : undefined}
      onUndo={(swapId) =>
        undo.mutate(swapId, {
          onSuccess: ({ exercise }) =>
            toast({ text: `${exercise.name} is taken out again; the planned exercise is back.` }),
          // A second tap, or another tab, found it undone already: that is what was wanted.
          onError: (error) => {
            if (isApiError(error, 'conflict')) return
            toast({ text: messageOf(error, 'The swap could not be undone. Try again.') })
          },
        })
      }
    />
  )
}
