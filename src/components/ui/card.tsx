import type { ComponentProps } from 'react'
import { cx } from '@/lib/cx'

/** A sheet of paper on the page; `hit` marks it as touched by a sore joint. */
export function Card({ hit = false, className, ...rest }: ComponentProps<'div'> & { hit?: boolean }) {
  return (
    <div
      {...rest}
      className={cx(
        'rounded-xl border bg-card',
        hit ? 'border-oxide shadow-[inset_4px_0_0_var(--oxide)]' : 'border-rule',
        className,
      )}
    />
  )
}
