import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { resetPassword } from '#shared/contract/auth'
import { LIMITS } from '#shared/contract/limits'
import { paths } from '@/app/paths'
import { Button, LinkButton } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { FormError } from '@/components/ui/form-error'
import { TextInput } from '@/components/ui/inputs'
import { EmptyState } from '@/components/ui/states'
import { isApiError } from '@/lib/api-error'
import { bodySchema, showServerErrors } from '@/lib/form'
import { useResetPassword } from '../api'

const AskAgain = () => (
  <EmptyState
    title="This link cannot be used any more."
    action={
      <LinkButton kind="primary" to={paths.forgotPassword()}>
        Ask for a new link
      </LinkButton>
    }
  >
    A link works once and only for a short while.
  </EmptyState>
)

/** `token` comes from the link’s fragment, which browsers never send to a server or write in its logs. */
export function ResetPasswordForm({ token, onDone }: { token: string; onDone: () => void }) {
  const form = useForm<{ token: string; password: string }>({
    resolver: zodResolver(bodySchema(resetPassword)),
    defaultValues: { token, password: '' },
  })
  const { mutate, isPending, error } = useResetPassword()
  const { errors } = form.formState
  if (errors.token !== undefined || isApiError(error, 'reset_link_invalid') || token === '') return <AskAgain />
  const submit = form.handleSubmit((body) =>
    mutate(body, {
      onSuccess: onDone,
      onError: (cause) => showServerErrors(cause, form.setError, ['token', 'password']),
    }),
  )
  return (
    <form
      noValidate
      onSubmit={(event) => void submit(event)}
      className="grid max-w-sm gap-4 rounded-xl border border-rule bg-card p-5"
    >
      <Field
        label="New password"
        hint={`At least ${LIMITS.password.min} characters. A few unrelated words are easier to keep than symbols.`}
        error={errors.password?.message}
      >
        <TextInput type="password" autoComplete="new-password" {...form.register('password')} />
      </Field>
      <FormError error={isApiError(error, 'invalid_request') ? null : error} />
      <Button type="submit" kind="primary" busy={isPending} busyLabel="Saving">
        Set the new password
      </Button>
      <p className="text-pencil">Everywhere you are signed in, you will be signed out.</p>
    </form>
  )
}
