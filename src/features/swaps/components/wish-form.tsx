import { useForm } from 'react-hook-form'
import { LIMITS } from '#shared/contract/limits'
import { INTENTS } from '#shared/contract/session'
import { TARGET_GROUP_NAMES } from '#shared/rules/muscle-names'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Select, TextInput } from '@/components/ui/inputs'
import { INTENT_WORDS, TARGET_WORDS } from '@/lib/words'
import type { RankingWish } from '../api'

interface WishFormProps {
  wish: RankingWish
  onWish: (wish: RankingWish) => void
  submitLabel: string
}

const wholeBetween = (what: string, { min, max }: { min: number; max: number }) => ({
  valueAsNumber: true as const,
  validate: (value: number) =>
    (Number.isInteger(value) && value >= min && value <= max) || `${what}: give a whole number from ${min} to ${max}.`,
})

/** What a swap is wanted for, when no slot of a session says it. */
export function WishForm({ wish, onWish, submitLabel }: WishFormProps) {
  const { register, handleSubmit, formState } = useForm<RankingWish>({ values: wish })
  const { errors } = formState
  return (
    <form
      onSubmit={(event) => void handleSubmit(onWish)(event)}
      noValidate
      className="flex flex-wrap items-end gap-x-4 gap-y-3"
    >
      <Field label="Target" className="w-48">
        <Select {...register('target')}>
          {TARGET_GROUP_NAMES.map((target) => (
            <option key={target} value={target}>
              {TARGET_WORDS[target]}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="For" className="w-40">
        <Select {...register('intent')}>
          {INTENTS.map((intent) => (
            <option key={intent} value={intent}>
              {INTENT_WORDS[intent]}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="Sets" className="w-24" error={errors.sets?.message}>
        <TextInput inputMode="numeric" {...register('sets', wholeBetween('Sets', LIMITS.sets))} />
      </Field>
      <Field label="Repetitions" className="w-28" error={errors.repetitions?.message}>
        <TextInput inputMode="numeric" {...register('repetitions', wholeBetween('Repetitions', LIMITS.repetitions))} />
      </Field>
      <Field label="RIR" className="w-24" error={errors.rir?.message}>
        <TextInput inputMode="numeric" {...register('rir', wholeBetween('RIR', LIMITS.rir))} />
      </Field>
      <Button type="submit">{submitLabel}</Button>
    </form>
  )
}
