import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { PageHeader } from '@/components/ui/page-header'
import { useToast } from '@/components/ui/toast'
import { ClosedJoints } from '@/features/sore-joints/components/closed-joints'
import { SoreJointDialog } from '@/features/sore-joints/components/sore-joint-dialog'
import { StandingJoints } from '@/features/sore-joints/components/standing-joints'
import { usePerson } from '@/lib/person'
import { useToday } from '@/lib/use-today'
import { capitalise, jointWords } from '@/lib/words'

export function Component() {
  const person = usePerson()
  const day = useToday()
  const toast = useToast()
  const [reporting, setReporting] = useState(false)
  return (
    <div className="max-w-2xl">
      <PageHeader
        title="Joints"
        actions={
          <Button kind="primary" onClick={() => setReporting(true)}>
            A joint is sore
          </Button>
        }
      />
      <StandingJoints
        athleteId={person.id}
        own
        empty="When one starts to trouble you, mark it: today’s session then says what to swap."
      />
      <h2 className="mt-8 mb-3 text-xl">Earlier</h2>
      <ClosedJoints athleteId={person.id} />
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
