import { PageHeader } from '@/components/ui/page-header'
import { FlagsList } from '@/features/flags/components/flags-list'
import { hasRole, usePerson } from '@/lib/person'

export function Component() {
  const own = !hasRole(usePerson(), 'admin')
  return (
    <>
      <PageHeader title={own ? 'Flags you raised' : 'Flags'} />
      <FlagsList own={own} />
    </>
  )
}
