import { Skeleton } from '@/components/ui/states'

/** The size of what will stand there: facts, filters, rows. */
export function SwapsSkeleton() {
  return (
    <div className="grid gap-4">
      <Skeleton className="h-14 max-w-xl" />
      <Skeleton className="h-28 max-w-[88ch]" />
      <Skeleton className="h-18" />
      <Skeleton className="h-96 rounded-xl" />
    </div>
  )
}
