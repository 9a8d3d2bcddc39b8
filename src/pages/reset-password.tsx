import { useNavigate, useLocation } from 'react-router-dom'
import { paths } from '@/app/paths'
import { PageHeader } from '@/components/ui/page-header'
import { useToast } from '@/components/ui/toast'
import { ResetPasswordForm } from '@/features/auth/components/reset-password-form'

export function Component() {
  const navigate = useNavigate()
  const toast = useToast()
  const token = new URLSearchParams(useLocation().hash.slice(1)).get('token') ?? ''
  return (
    <>
      <PageHeader title="Set a new password" />
      <ResetPasswordForm
        token={token}
        onDone={() => {
          toast({ text: 'The new password is set. Sign in with it.' })
          void navigate(paths.signIn(), { replace: true })
        }}
      />
    </>
  )
}
