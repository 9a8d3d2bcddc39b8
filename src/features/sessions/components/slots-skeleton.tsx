import { Skeleton } from '@/components/ui/states'

/** Four cards the size of slots. */
export const SlotsSkeleton = () => (
  <div className="grid gap-3">
    {[0, 1, 2, 3].map((index) => (
      <Skeleton key={index} className="h-32 rounded-xl" />
    ))}
  </div>
)
