import { zodResolver } from '@hookform/resolvers/zod'
import { useRef, type ReactNode } from 'react'
import { useForm, type UseFormReturn } from 'react-hook-form'
import { Link } from 'react-router-dom'
import { signIn } from '#shared/contract/auth'
import { paths } from '@/app/paths'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { FormError } from '@/components/ui/form-error'
import { TextInput } from '@/components/ui/inputs'
import { isApiError } from '@/lib/api-error'
import { bodySchema, showServerErrors } from '@/lib/form'
import { useSignIn } from '../api'

interface Credentials {
  email: string
  password: string
}

interface SignInFormProps {
  onSignedIn: () => void
  /** Beside the form, with a way to fill it in. */
  children?: (fill: (credentials: Credentials) => void) => ReactNode
}

export function SignInForm({ onSignedIn, children }: SignInFormProps) {
  const form = useForm<Credentials>({
    resolver: zodResolver(bodySchema(signIn)),
    defaultValues: { email: '', password: '' },
  })
  const { mutate, isPending, error } = useSignIn()
  const submit = form.handleSubmit((credentials) =>
    mutate(credentials, {
      onSuccess: onSignedIn,
      onError: (cause) => showServerErrors(cause, form.setError, ['email', 'password']),
    }),
  )
  const button = useRef<HTMLButtonElement>(null)
  const fill = ({ email, password }: Credentials) => {
    form.reset({ email, password })
    button.current?.focus()
  }
  return (
    <div className="grid items-start gap-8 md:grid-cols-[minmax(18rem,24rem)_1fr]">
      <form
        noValidate
        onSubmit={(event) => void submit(event)}
        className="grid gap-4 rounded-xl border border-rule bg-card p-5"
      >
        <Inputs form={form} />
        <FormError error={isApiError(error, 'invalid_request') ? null : error} />
        <Button ref={button} type="submit" kind="primary" wide busy={isPending} busyLabel="Signing in">
          Sign in
        </Button>
        <Link to={paths.forgotPassword()} className="inline-flex min-h-target items-center justify-self-start link">
          I forgot my password
        </Link>
      </form>
      {children?.(fill)}
    </div>
  )
}

function Inputs({ form }: { form: UseFormReturn<Credentials> }) {
  const { errors } = form.formState
  return (
    <>
      <Field label="E-mail" error={errors.email?.message}>
        <TextInput type="email" autoComplete="username" autoCapitalize="none" {...form.register('email')} />
      </Field>
      <Field label="Password" error={errors.password?.message}>
        <TextInput type="password" autoComplete="current-password" {...form.register('password')} />
      </Field>
    </>
  )
}
