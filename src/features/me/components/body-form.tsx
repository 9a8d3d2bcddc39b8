import { useForm, type Resolver } from 'react-hook-form'
import type { BodyProfile } from '#shared/contract/me'
import { Button } from '@/components/ui/button'
import { Chip, ChoiceGroup } from '@/components/ui/choice-group'
import { Field } from '@/components/ui/field'
import { FormError } from '@/components/ui/form-error'
import { TextInput } from '@/components/ui/inputs'
import { useToast } from '@/components/ui/toast'
import { localDay } from '@/lib/format'
import { usePerson } from '@/lib/person'
import { massUnit, type Units } from '@/lib/units'
import { useUpdateMe } from '../api'
import { checkBody, toValues, type BodyFormValues } from '../hooks/body-form-values'

const SEX_WORDS: Record<BodyProfile['sex'], string> = { female: 'Female', male: 'Male', unspecified: 'Rather not say' }

const resolverFor =
  (units: Units, before: BodyProfile | null): Resolver<BodyFormValues, unknown, BodyProfile> =>
  (values) =>
    checkBody(values, units, before, localDay())

/** What the numbers are computed from; in the person’s own units. */
export function BodyForm() {
  const { body, units } = usePerson()
  const form = useForm<BodyFormValues, unknown, BodyProfile>({
    resolver: resolverFor(units, body),
    values: toValues(body, units),
    resetOptions: { keepDirtyValues: true },
  })
  const update = useUpdateMe()
  const toast = useToast()
  const { errors } = form.formState
  const save = form.handleSubmit((profile) =>
    update.mutate(
      { body: profile },
      {
        onSuccess: (me) => {
          form.reset(toValues(me.body, me.units))
          toast({ text: 'Your body profile is saved.' })
        },
      },
    ),
  )
  return (
    <form noValidate onSubmit={(event) => void save(event)} className="grid gap-4">
      <ChoiceGroup
        legend="Sex"
        hint="Chooses the segment and strength tables. “Rather not say” uses their mean."
        error={errors.sex?.message}
        className="[&_legend]:font-semibold"
      >
        {(Object.keys(SEX_WORDS) as Array<BodyProfile['sex']>).map((sex) => (
          <Chip key={sex} type="radio" value={sex} label={SEX_WORDS[sex]} {...form.register('sex')} />
        ))}
      </ChoiceGroup>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Body mass" unit={massUnit(units)} error={errors.mass?.message}>
          <TextInput inputMode="decimal" autoComplete="off" {...form.register('mass')} />
        </Field>
        {units === 'metric' ? (
          <Field label="Height" unit="cm" error={errors.centimetres?.message}>
            <TextInput inputMode="decimal" autoComplete="off" {...form.register('centimetres')} />
          </Field>
        ) : (
          <div className="grid grid-cols-2 items-end gap-2">
            <Field label="Height" unit="ft" error={errors.feet?.message}>
              <TextInput inputMode="numeric" autoComplete="off" {...form.register('feet')} />
            </Field>
            <Field label="and inches" labelHidden unit="in">
              <TextInput inputMode="decimal" autoComplete="off" {...form.register('inches')} />
            </Field>
          </div>
        )}
        <Field label="Date of birth" error={errors.birthDate?.message}>
          <TextInput type="date" autoComplete="bday" max={localDay()} {...form.register('birthDate')} />
        </Field>
      </div>
      <FormError error={update.error} />
      <Button type="submit" className="justify-self-start" busy={update.isPending} busyLabel="Saving">
        Save the profile
      </Button>
    </form>
  )
}
