import { Controller, type UseFormReturn } from 'react-hook-form'
import type { RedFlag, SoreJointReport } from '#shared/contract/sore-joint'
import { Field } from '@/components/ui/field'
import { FormError } from '@/components/ui/form-error'
import { TextArea } from '@/components/ui/inputs'
import type { SoreJointForm } from '../hooks/use-sore-joint-form'
import type { JointChoice } from './body-chart'
import { JointChooser } from './joint-chooser'
import { ProvocationChoice, provocationsFor } from './provocation-choice'
import { RatingScale } from './rating-scale'
import { StopAdvice } from './stop-advice'

interface SoreJointDetailsProps {
  form: UseFormReturn<SoreJointForm, unknown, SoreJointReport>
  /** Red flags raised so far; the advice then stands above everything else. */
  raised: readonly RedFlag[]
  failure: unknown
}

export function SoreJointDetails({ form, raised, failure }: SoreJointDetailsProps) {
  const [joint, side, rating, provocations] = form.watch(['joint', 'side', 'rating', 'provocations'])
  const { errors, isSubmitted } = form.formState
  const mark = { shouldDirty: true, shouldValidate: isSubmitted }
  const choose = (choice: JointChoice) => {
    form.setValue('side', choice.side, { shouldDirty: true })
    form.setValue('joint', choice.joint, mark)
    const possible = provocationsFor(choice.joint)
    form.setValue(
      'provocations',
      provocations.filter((provocation) => possible.includes(provocation)),
    )
  }
  return (
    <div className="grid gap-6">
      {raised.length > 0 && <StopAdvice flags={raised} />}
      <JointChooser
        chosen={joint === undefined || side === undefined ? null : { joint, side }}
        onChoose={choose}
        error={(errors.joint || errors.side) && joint === undefined ? 'Choose a joint.' : undefined}
      />
      <RatingScale
        value={rating}
        onChange={(value) => form.setValue('rating', value, mark)}
        error={errors.rating && rating === undefined ? 'Choose a number from 0 to 10.' : undefined}
      />
      <Controller
        control={form.control}
        name="provocations"
        render={({ field }) => (
          <ProvocationChoice
            joint={joint}
            value={field.value}
            onChange={field.onChange}
            error={field.value.length === 0 ? errors.provocations?.message : undefined}
          />
        )}
      />
      <Field label="Anything else (optional)" error={errors.note?.message}>
        <TextArea {...form.register('note')} />
      </Field>
      <FormError error={failure} />
    </div>
  )
}
