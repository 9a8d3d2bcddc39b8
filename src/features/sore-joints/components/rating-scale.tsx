import { LIMITS } from '#shared/contract/limits'
import { FieldError } from '@/components/ui/field'
import { cx } from '@/lib/cx'

const STEPS = Array.from({ length: LIMITS.rating.max - LIMITS.rating.min + 1 }, (_, index) => LIMITS.rating.min + index)

/** 0 to 10 with both ends named. */
export function RatingScale({
  value,
  onChange,
  error,
}: {
  value: number | undefined
  onChange: (rating: number) => void
  error?: string
}) {
  return (
    <fieldset>
      <legend className="mb-1 text-lg">How sore, when you train it</legend>
      <div className="flex">
        {STEPS.map((step) => (
          <label
            key={step}
            className={cx(
              'relative -ml-px flex min-h-12 flex-1 items-center justify-center border border-edge bg-card first:ml-0 first:rounded-l-md last:rounded-r-md hover:bg-wash',
              'has-checked:z-1 has-checked:border-oxide has-checked:bg-oxide has-checked:font-bold has-checked:text-paper',
              'has-focus-visible:z-2 has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-slate',
            )}
          >
            <input
              type="radio"
              name="rating"
              className="absolute inset-0 cursor-pointer appearance-none focus-visible:outline-none"
              checked={value === step}
              onChange={() => onChange(step)}
            />
            {step}
          </label>
        ))}
      </div>
      <p aria-hidden className="flex justify-between text-pencil">
        <span>not at all</span>
        <span>worst imaginable</span>
      </p>
      <FieldError error={error} />
    </fieldset>
  )
}
