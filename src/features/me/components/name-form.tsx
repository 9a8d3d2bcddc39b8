import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { z } from 'zod'
import { LIMITS } from '#shared/contract/limits'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { FormError } from '@/components/ui/form-error'
import { TextInput } from '@/components/ui/inputs'
import { useToast } from '@/components/ui/toast'
import { showServerErrors } from '@/lib/form'
import { usePerson } from '@/lib/person'
import { useUpdateMe } from '../api'

const schema = z.object({
  name: z
    .string()
    .trim()
    .min(LIMITS.name.min, 'Enter your name.')
    .max(LIMITS.name.max, `Use at most ${LIMITS.name.max} characters.`),
})

export function NameForm() {
  const { name } = usePerson()
  const form = useForm({ resolver: zodResolver(schema), values: { name } })
  const update = useUpdateMe()
  const toast = useToast()
  const save = form.handleSubmit((change) =>
    update.mutate(change, {
      onSuccess: () => toast({ text: 'Your name is saved.' }),
      onError: (error) => showServerErrors(error, form.setError, ['name']),
    }),
  )
  return (
    <form noValidate onSubmit={(event) => void save(event)} className="grid gap-3">
      <Field label="Name" error={form.formState.errors.name?.message}>
        <TextInput autoComplete="name" {...form.register('name')} />
      </Field>
      <FormError error={update.error} />
      <Button type="submit" className="justify-self-start" busy={update.isPending} busyLabel="Saving">
        Save the name
      </Button>
    </form>
  )
}
