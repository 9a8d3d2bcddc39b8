import { useId, type ComponentProps, type ReactNode } from 'react'
import { cx } from '@/lib/cx'
import { FieldError } from './field'

interface ChoiceGroupProps {
  legend: ReactNode
  hint?: ReactNode
  error?: string
  className?: string
  children: ReactNode
}

/** A question with its possible answers, as a group for screen readers. */
export function ChoiceGroup({ legend, hint, error, className, children }: ChoiceGroupProps) {
  const id = useId()
  return (
    <fieldset
      className={cx('min-w-0', className)}
      aria-describedby={
        [hint !== undefined && `${id}-hint`, error !== undefined && `${id}-error`].filter(Boolean).join(' ') ||
        undefined
      }
    >
      <legend className="mb-2">{legend}</legend>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="mb-2 text-pencil">
          {hint}
        </p>
      )}
      <div className="flex flex-wrap gap-2">{children}</div>
      <FieldError id={`${id}-error`} error={error} />
    </fieldset>
  )
}

/** One answer as a chip: a radio button or a checkbox with a large target. Being chosen shows by border and weight. */
export function Chip({
  label,
  className,
  ...rest
}: ComponentProps<'input'> & { type: 'radio' | 'checkbox'; label: ReactNode }) {
  return (
    <label
      className={cx(
        'relative inline-flex min-h-target items-center rounded-full border border-edge bg-card px-4 py-2 hover:bg-wash',
        'has-checked:border-slate has-checked:font-semibold has-checked:shadow-[inset_0_0_0_2px_var(--slate)]',
        'has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-slate',
        className,
      )}
    >
      <input
        {...rest}
        className="absolute inset-0 cursor-pointer appearance-none rounded-full focus-visible:outline-none"
      />
      {label}
    </label>
  )
}
