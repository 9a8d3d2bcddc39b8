import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { clearRedFlag, type SoreJoint } from '#shared/contract/sore-joint'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Field } from '@/components/ui/field'
import { FormError } from '@/components/ui/form-error'
import { TextArea } from '@/components/ui/inputs'
import { useToast } from '@/components/ui/toast'
import { bodySchema } from '@/lib/form'
import { capitalise, jointWords, listWords, RED_FLAG_WORDS } from '@/lib/words'
import { useClearRedFlag } from '../api'

/** A physio’s word that training may go on, with what was examined. */
export function ClearanceDialog({
  athleteId,
  report,
  onClose,
}: {
  athleteId: string
  report: SoreJoint
  onClose: () => void
}) {
  const form = useForm<{ note: string }>({
    resolver: zodResolver(bodySchema(clearRedFlag)),
    defaultValues: { note: '' },
  })
  const clearance = useClearRedFlag(athleteId)
  const toast = useToast()
  const name = jointWords(report.joint, report.side)
  const save = form.handleSubmit(({ note }) =>
    clearance.mutate(
      { soreJointId: report.id, note },
      {
        onSuccess: () => {
          toast({ text: `The red flag on the ${name} is cleared.` })
          onClose()
        },
      },
    ),
  )
  return (
    <Dialog
      open
      onClose={onClose}
      title={`Clear the red flag on the ${name}`}
      description={`Said yes to ${listWords(report.redFlags.map((flag) => RED_FLAG_WORDS[flag]))}. Rated ${report.rating} of 10.`}
      footer={
        <>
          <Button onClick={onClose}>Leave it standing</Button>
          <Button kind="primary" onClick={() => void save()} busy={clearance.isPending} busyLabel="Saving">
            Clear the red flag
          </Button>
        </>
      }
    >
      <form noValidate onSubmit={(event) => void save(event)} className="grid gap-4">
        <p>
          {capitalise(name)} opens again with its rating and its caps, and swaps are shown for it. Your name stays in
          the report, and the note is kept with it.
        </p>
        <Field label="What you examined, and why training may go on" error={form.formState.errors.note?.message}>
          <TextArea rows={5} {...form.register('note')} />
        </Field>
        <FormError error={clearance.error} />
      </form>
    </Dialog>
  )
}
