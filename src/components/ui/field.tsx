import { createContext, useContext, useId, type ReactNode } from 'react'
import { cx } from '@/lib/cx'

interface FieldWiring {
  id: string
  describedBy: string | undefined
  invalid: boolean
  unit: string | undefined
}
const FieldContext = createContext<FieldWiring | null>(null)

/** Ids and state of the Field around a control, so that label, hint and error are tied to it. */
export function useFieldWiring() {
  const field = useContext(FieldContext)
  return {
    unit: field?.unit,
    attributes: {
      id: field?.id,
      'aria-describedby': field?.describedBy,
      'aria-invalid': field?.invalid ? (true as const) : undefined,
    },
  }
}

interface FieldProps {
  label: string
  /** Stands inside the control, at its end. */
  unit?: string
  hint?: ReactNode
  /** Says what to do. */
  error?: string
  /** Hides the label from sight, not from screen readers. */
  labelHidden?: boolean
  className?: string
  children: ReactNode
}

/** Label above, control, hint, and the error beside it. */
export function Field({ label, unit, hint, error, labelHidden = false, className, children }: FieldProps) {
  const id = useId()
  const hintId = `${id}-hint`
  const errorId = `${id}-error`
  const describedBy =
    [hint !== undefined && hintId, error !== undefined && errorId].filter(Boolean).join(' ') || undefined
  return (
    <FieldContext value={{ id, describedBy, invalid: error !== undefined, unit }}>
      <div className={cx('flex flex-col gap-1', className)}>
        <label htmlFor={id} className={labelHidden ? 'sr-only' : 'font-semibold'}>
          {label} {unit !== undefined && <span className="sr-only">in {unit}</span>}
        </label>
        {children}
        {hint !== undefined && (
          <p id={hintId} className="text-pencil">
            {hint}
          </p>
        )}
        <FieldError id={errorId} error={error} />
      </div>
    </FieldContext>
  )
}

/** Announced when it appears. */
export function FieldError({ id, error }: { id?: string; error?: string }) {
  return (
    <p id={id} role="alert" className="font-semibold text-oxide empty:hidden">
      {error}
    </p>
  )
}
