import { useState } from 'react'
import { RED_FLAGS, type SoreJoint } from '#shared/contract/sore-joint'
import { Button } from '@/components/ui/button'
import { ConfirmDialog } from '@/components/ui/confirm-dialog'
import { Dialog } from '@/components/ui/dialog'
import { capitalise, jointWords } from '@/lib/words'
import { useReportSoreJoint } from '../api'
import { useSoreJointForm } from '../hooks/use-sore-joint-form'
import { RedFlagQuestions } from './red-flag-questions'
import { SoreJointDetails } from './sore-joint-details'
import { StopAdvice } from './stop-advice'

interface SoreJointDialogProps {
  athleteId: string
  day: string
  onClose: () => void
  /** Called after a report without a red flag; one with a red flag keeps the dialog open on its advice. */
  onReported: (report: SoreJoint) => void
}

type Step = 'questions' | 'details' | 'advice'

/** Red flags first, then where and how; mount it to open it. */
export function SoreJointDialog({ athleteId, day, onClose, onReported }: SoreJointDialogProps) {
  const { form, raised } = useSoreJointForm(day)
  const [step, setStep] = useState<Step>('questions')
  const [leaving, setLeaving] = useState(false)
  const report = useReportSoreJoint(athleteId)

  // Read while rendering: the form only keeps track of what a render asked for.
  const { isDirty } = form.formState
  const close = () => (step !== 'advice' && isDirty ? setLeaving(true) : onClose())
  const next = async () => {
    const names = RED_FLAGS.map((flag) => `redFlags.${flag}` as const)
    if (await form.trigger(names, { shouldFocus: true })) setStep('details')
  }
  const save = form.handleSubmit((body) =>
    report.mutate(body, {
      onSuccess: (saved) => {
        if (saved.state === 'redFlag') setStep('advice')
        else onReported(saved)
      },
    }),
  )

  const footer = {
    questions: (
      <Button kind="primary" onClick={() => void next()} className="max-sm:w-full">
        Continue
      </Button>
    ),
    details: (
      <>
        <Button onClick={() => setStep('questions')}>Back</Button>
        <Button
          kind="primary"
          onClick={() => void save()}
          busy={report.isPending}
          busyLabel="Saving"
          className="max-sm:flex-1"
        >
          Save the report
        </Button>
      </>
    ),
    advice: (
      <Button kind="primary" onClick={onClose} className="max-sm:w-full">
        I understand
      </Button>
    ),
  }[step]

  return (
    <>
      <Dialog
        open
        onClose={close}
        step={step}
        title="A joint is sore"
        description={
          { questions: 'First, six questions', details: 'Where, and how it feels', advice: 'The report is saved' }[step]
        }
        footer={footer}
      >
        {step === 'questions' && <RedFlagQuestions control={form.control} />}
        {step === 'details' && <SoreJointDetails form={form} raised={raised} failure={report.error} />}
        {step === 'advice' && report.data !== undefined && (
          <div role="status" className="grid gap-3">
            <p className="text-lg font-semibold">{capitalise(jointWords(report.data.joint, report.data.side))}</p>
            <StopAdvice flags={report.data.redFlags} />
            <p>The coach and physio you have let in can see this report.</p>
          </div>
        )}
      </Dialog>
      <ConfirmDialog
        open={leaving}
        title="Leave without saving?"
        confirmLabel="Leave"
        cancelLabel="Keep answering"
        onConfirm={onClose}
        onCancel={() => setLeaving(false)}
      >
        Your answers are not saved yet.
      </ConfirmDialog>
    </>
  )
}
