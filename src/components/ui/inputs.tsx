import type { ComponentProps } from 'react'
import { cx } from '@/lib/cx'
import { useFieldWiring } from './field'

const box =
  'min-h-target w-full rounded-md border border-edge bg-card px-3 py-2 text-ink placeholder:text-pencil aria-invalid:border-oxide aria-invalid:shadow-[inset_0_0_0_1px_var(--oxide)]'

export function TextInput({ className, ...rest }: ComponentProps<'input'>) {
  const { unit, attributes } = useFieldWiring()
  return (
    <div className="relative">
      <input {...attributes} {...rest} className={cx(box, unit !== undefined && 'pr-12', className)} />
      {unit !== undefined && (
        <span aria-hidden className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-pencil">
          {unit}
        </span>
      )}
    </div>
  )
}

export function TextArea({ className, ...rest }: ComponentProps<'textarea'>) {
  const { attributes } = useFieldWiring()
  return <textarea rows={3} {...attributes} {...rest} className={cx(box, className)} />
}

export function Select({ className, children, ...rest }: ComponentProps<'select'>) {
  const { attributes } = useFieldWiring()
  return (
    <select {...attributes} {...rest} className={cx(box, 'pr-8', className)}>
      {children}
    </select>
  )
}

export function Checkbox({ label, className, ...rest }: ComponentProps<'input'> & { label: string }) {
  return (
    <label className={cx('flex min-h-target items-center gap-3', className)}>
      <input type="checkbox" {...rest} className="size-5 accent-slate" />
      {label}
    </label>
  )
}
