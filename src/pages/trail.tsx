import { PageHeader } from '@/components/ui/page-header'
import { Trail } from '@/features/audit/components/trail'

export function Component() {
  return (
    <>
      <PageHeader title="Trail" crumb="Who read or changed what, newest first" />
      <Trail />
    </>
  )
}
