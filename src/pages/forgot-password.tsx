import { PageHeader } from '@/components/ui/page-header'
import { ForgotPasswordForm } from '@/features/auth/components/forgot-password-form'

export function Component() {
  return (
    <>
      <PageHeader title="Forgot your password" />
      <ForgotPasswordForm />
    </>
  )
}
