import { useQuery } from '@tanstack/react-query'
import { useState, type ReactNode } from 'react'
import type { SoreJoint } from '#shared/contract/sore-joint'
import { Button } from '@/components/ui/button'
import { EmptyState, Loaded } from '@/components/ui/states'
import { useToast } from '@/components/ui/toast'
import { messageOf } from '@/lib/api-error'
import { capitalise, jointWords } from '@/lib/words'
import { standingQuery, useCloseSoreJoint } from '../api'
import { ClearanceDialog } from './clearance-dialog'
import { SoreJointCard } from './sore-joint-card'
import { StopAdvice } from './stop-advice'

interface StandingJointsProps {
  athleteId: string
  /** The reader is the athlete: words and advice are for them. */
  own: boolean
  empty: ReactNode
}

/** Open reports and red flags, with what the reader can do about each. */
export function StandingJoints({ athleteId, own, empty }: StandingJointsProps) {
  const query = useQuery(standingQuery(athleteId))
  const closure = useCloseSoreJoint(athleteId)
  const toast = useToast()
  const [clearing, setClearing] = useState<SoreJoint | null>(null)
  const close = (report: SoreJoint) =>
    closure.mutate(report.id, {
      onSuccess: () => toast({ text: `${capitalise(jointWords(report.joint, report.side))} closed.` }),
      onError: (error) => toast({ text: messageOf(error, 'The report could not be closed. Try again.') }),
    })
  return (
    <>
      <Loaded query={query} what="sore joints">
        {({ items }) =>
          items.length === 0 ? (
            <EmptyState title="No joint is marked as sore.">{empty}</EmptyState>
          ) : (
            <ul className="grid gap-3">
              {items.map((report) => (
                <li key={report.id}>
                  <SoreJointCard report={report} heading={own ? 'h2' : 'h3'}>
                    {report.state === 'redFlag' && own && (
                      <div className="mt-3">
                        <StopAdvice flags={report.redFlags} />
                      </div>
                    )}
                    {(report.can.close || report.can.clear) && (
                      <div className="mt-3 flex flex-wrap gap-3">
                        {report.can.close && (
                          <Button onClick={() => close(report)}>
                            {own ? 'It no longer troubles me' : 'Close the report'}
                          </Button>
                        )}
                        {report.can.clear && <Button onClick={() => setClearing(report)}>Clear the red flag</Button>}
                      </div>
                    )}
                  </SoreJointCard>
                </li>
              ))}
            </ul>
          )
        }
      </Loaded>
      {clearing !== null && (
        <ClearanceDialog athleteId={athleteId} report={clearing} onClose={() => setClearing(null)} />
      )}
    </>
  )
}
