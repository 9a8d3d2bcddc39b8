import { PageHeader } from '@/components/ui/page-header'
import { AthletesList } from '@/features/athletes/components/athletes-list'
import { formatDay } from '@/lib/format'
import { useToday } from '@/lib/use-today'

export function Component() {
  return (
    <>
      <PageHeader title="Clients" crumb={formatDay(useToday())} />
      <AthletesList caption="Clients" />
    </>
  )
}
