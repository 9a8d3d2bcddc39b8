import type { ComponentProps } from 'react'
import { Link, type LinkProps } from 'react-router-dom'
import { cx } from '@/lib/cx'

export type ButtonKind = 'primary' | 'plain' | 'quiet' | 'danger'

const LOOK: Record<ButtonKind, string> = {
  primary: 'border-slate bg-slate text-paper hover:brightness-110',
  plain: 'border-slate bg-card text-slate hover:bg-wash',
  quiet: 'border-transparent bg-transparent text-slate underline underline-offset-3 hover:decoration-2',
  danger: 'border-oxide bg-card text-oxide hover:bg-oxide-wash',
}
const buttonClass = (kind: ButtonKind, wide: boolean, className?: string) =>
  cx(
    'inline-flex min-h-target items-center justify-center gap-2 rounded-md border px-4 py-2 text-center font-semibold',
    'disabled:cursor-progress disabled:opacity-60',
    LOOK[kind],
    wide && 'w-full',
    className,
  )

interface ButtonProps extends ComponentProps<'button'> {
  kind?: ButtonKind
  wide?: boolean
  /** True while the work it started is under way; it then says `busyLabel` and cannot be pressed again. */
  busy?: boolean
  busyLabel?: string
}

export function Button({
  kind = 'plain',
  wide = false,
  busy = false,
  busyLabel,
  className,
  children,
  disabled,
  ...rest
}: ButtonProps) {
  return (
    <button
      type="button"
      {...rest}
      disabled={disabled || busy}
      aria-busy={busy || undefined}
      className={buttonClass(kind, wide, className)}
    >
      {busy && busyLabel !== undefined ? busyLabel : children}
    </button>
  )
}

/** A link that looks like a button, for going somewhere. */
export function LinkButton({
  kind = 'plain',
  wide = false,
  className,
  ...rest
}: LinkProps & { kind?: ButtonKind; wide?: boolean }) {
  return <Link {...rest} className={buttonClass(kind, wide, className)} />
}
