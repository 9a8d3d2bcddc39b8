import { useNavigate, useSearchParams } from 'react-router-dom'
import { paths } from '@/app/paths'
import { PageHeader } from '@/components/ui/page-header'
import { DemoAccounts } from '@/features/auth/components/demo-accounts'
import { SignInForm } from '@/features/auth/components/sign-in-form'

/** Only a path of this site; `//elsewhere` would leave it, also with the control characters that browsers drop. */
const safe = (next: string | null): string =>
  next !== null && /^\/(?![/\\])[\x21-\x7e]*$/.test(next) ? next : paths.home()

export function Component() {
  const [search] = useSearchParams()
  const navigate = useNavigate()
  return (
    <>
      <PageHeader title="Sign in" crumb="Train the muscle, spare the joint." />
      <SignInForm onSignedIn={() => void navigate(safe(search.get('next')), { replace: true })}>
        {(fill) => <DemoAccounts onChoose={fill} />}
      </SignInForm>
    </>
  )
}
