import { useForm } from 'react-hook-form'
import { FLAG_REASONS } from '#shared/contract/flag'
import { LIMITS } from '#shared/contract/limits'
import { Button } from '@/components/ui/button'
import { Chip, ChoiceGroup } from '@/components/ui/choice-group'
import { Dialog } from '@/components/ui/dialog'
import { Field } from '@/components/ui/field'
import { TextArea } from '@/components/ui/inputs'
import { FailureState } from '@/components/ui/states'
import { FLAG_REASON_WORDS } from '@/lib/words'
import { useRaiseFlag } from '../api'

interface FlagDialogProps {
  slotId: string
  exercise: { id: string; name: string }
  onClose: () => void
  onRaised: () => void
}
interface Answers {
  reason?: (typeof FLAG_REASONS)[number]
  note: string
}

/** An objection to a swap, with its reason; an admin reviews it. Mount it to open it. */
export function FlagDialog({ slotId, exercise, onClose, onRaised }: FlagDialogProps) {
  const { register, handleSubmit, formState } = useForm<Answers>({ defaultValues: { note: '' } })
  const raise = useRaiseFlag()
  const send = handleSubmit(({ reason, note }) => {
    if (reason !== undefined) raise.mutate({ slotId, exerciseId: exercise.id, reason, note }, { onSuccess: onRaised })
  })
  return (
    <Dialog
      open
      onClose={onClose}
      title={`Flag ${exercise.name}`}
      description="An admin reads it and may change how this exercise is ranked."
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button kind="primary" onClick={() => void send()} busy={raise.isPending} busyLabel="Sending">
            Send the flag
          </Button>
        </>
      }
    >
      <form onSubmit={(event) => void send(event)} className="grid gap-5">
        {raise.isError && <FailureState error={raise.error} />}
        <ChoiceGroup legend="What is wrong with it" error={formState.errors.reason?.message}>
          {FLAG_REASONS.map((reason) => (
            <Chip
              key={reason}
              type="radio"
              value={reason}
              label={FLAG_REASON_WORDS[reason]}
              {...register('reason', { required: 'Choose what is wrong with it.' })}
            />
          ))}
        </ChoiceGroup>
        <Field
          label="Note, if it helps"
          hint="Where you felt it, or what you would do instead."
          error={formState.errors.note?.message}
        >
          <TextArea
            {...register('note', {
              maxLength: { value: LIMITS.note.max, message: `Keep it to ${LIMITS.note.max} characters.` },
            })}
          />
        </Field>
      </form>
    </Dialog>
  )
}
