import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { requestPasswordReset } from '#shared/contract/auth'
import { paths } from '@/app/paths'
import { Button, LinkButton } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { FormError } from '@/components/ui/form-error'
import { TextInput } from '@/components/ui/inputs'
import { bodySchema } from '@/lib/form'
import { useRequestPasswordReset } from '../api'

export function ForgotPasswordForm() {
  const form = useForm<{ email: string }>({
    resolver: zodResolver(bodySchema(requestPasswordReset)),
    defaultValues: { email: '' },
  })
  const { mutate, isPending, isSuccess, error, variables } = useRequestPasswordReset()
  if (isSuccess)
    return (
      <div role="status" className="max-w-prose">
        <p className="mb-2">
          If <b>{variables.email}</b> belongs to an account, a link to set a new password is on its way. It works once
          and only for a short while.
        </p>
        <p className="mb-4 text-pencil">
          Nothing after a few minutes? Look in the spam folder, then ask your coach which address you signed up with.
        </p>
        <LinkButton to={paths.signIn()}>Back to sign in</LinkButton>
      </div>
    )
  return (
    <form
      noValidate
      onSubmit={(event) => void form.handleSubmit((body) => mutate(body))(event)}
      className="grid max-w-sm gap-4 rounded-xl border border-rule bg-card p-5"
    >
      <Field
        label="E-mail"
        hint="The link to set a new password goes there."
        error={form.formState.errors.email?.message}
      >
        <TextInput type="email" autoComplete="username" autoCapitalize="none" {...form.register('email')} />
      </Field>
      <FormError error={error} />
      <div className="flex flex-wrap gap-3">
        <Button type="submit" kind="primary" busy={isPending} busyLabel="Sending">
          Send the link
        </Button>
        <LinkButton kind="quiet" to={paths.signIn()}>
          Back to sign in
        </LinkButton>
      </div>
    </form>
  )
}
