import type { LucideIcon } from 'lucide-react'

/** A drawing beside words; it never stands alone, so screen readers pass it over. */
export function Icon({ of: Drawing, size = 20, className }: { of: LucideIcon; size?: number; className?: string }) {
  return <Drawing aria-hidden size={size} strokeWidth={1.75} className={className} />
}
