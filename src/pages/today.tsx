import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { paths } from '@/app/paths'
import { Button } from '@/components/ui/button'
import { PageHeader } from '@/components/ui/page-header'
import { Loaded } from '@/components/ui/states'
import { useToast } from '@/components/ui/toast'
import { todayQuery, useUndoSwap } from '@/features/sessions/api'
import { RestDay } from '@/features/sessions/components/rest-day'
import { SessionSlots } from '@/features/sessions/components/session-slots'
import { SlotsSkeleton } from '@/features/sessions/components/slots-skeleton'
import { standingQuery } from '@/features/sore-joints/api'
import { SoreJointDialog } from '@/features/sore-joints/components/sore-joint-dialog'
import { SoreSummary } from '@/features/sore-joints/components/sore-summary'
import { ApiError } from '@/lib/api-error'
import { formatDay } from '@/lib/format'
import { usePerson } from '@/lib/person'
import { useToday } from '@/lib/use-today'
import { capitalise, jointWords } from '@/lib/words'

export function Component() {
  const person = usePerson()
  const day = useToday()
  const toast = useToast()
  const [reporting, setReporting] = useState(false)
  const today = useQuery(todayQuery(person.id, day))
  const standing = useQuery(standingQuery(person.id))
  const undo = useUndoSwap(person.id, day)
  const session = today.data?.session
  return (
    <div className="max-w-2xl">
      <PageHeader
        title="Today"
        crumb={
          <>
            {formatDay(day)}
            {session && ` · ${session.title}, ${session.minutes} min`}
            {session?.placeName && ` · ${session.placeName}`}
          </>
        }
      />
      <div className="grid gap-4">
        {standing.data !== undefined && <SoreSummary reports={standing.data.items} to={paths.joints()} />}
        <Loaded query={today} what="today’s session" skeleton={<SlotsSkeleton />}>
          {(data) =>
            data.session === null ? (
              <RestDay today={data} />
            ) : (
              <SessionSlots
                session={data.session}
                units={person.units}
                loadKind={() => undefined}
                onUndo={(swapId) =>
                  undo.mutate(swapId, {
                    onSuccess: (swap) => toast({ text: `${swap.exercise.name} is taken out again.` }),
                    onError: (error) =>
                      toast({
                        text: error instanceof ApiError ? error.message : 'The swap could not be undone. Try again.',
                      }),
                  })
                }
              />
            )
          }
        </Loaded>
        <Button wide onClick={() => setReporting(true)} className="min-h-12">
          A joint is sore
        </Button>
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
