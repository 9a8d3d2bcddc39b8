import { Field } from '@/components/ui/field'
import { TextInput } from '@/components/ui/inputs'
import { massFrom, massIn, massUnit, type Units } from '@/lib/units'
import type { LoadBounds } from '../load'

interface LoadChoiceProps {
  bounds: LoadBounds
  /** kg */
  load: number
  onChange: (load: number) => void
  units: Units
  kind: 'added' | 'assistance' | 'external'
}

const LABEL = { added: 'Added load', assistance: 'Assistance', external: 'Load' }

/** The load to look at: typed or slid, in the person's unit. Assistance is a negative load, told without its sign. */
export function LoadChoice({ bounds, load, onChange, units, kind }: LoadChoiceProps) {
  const sign = kind === 'assistance' ? -1 : 1
  const [low, high] = sign === 1 ? [bounds.least, bounds.most] : [-bounds.most, -bounds.least]
  const change = (text: string) => {
    const value = Number(text)
    if (text.trim() === '' || !Number.isFinite(value)) return
    onChange(sign * Math.min(high, Math.max(low, massFrom(units, value))))
  }
  return (
    <div className="flex flex-wrap items-end gap-x-5 gap-y-2">
      <Field label={LABEL[kind]} unit={massUnit(units)} className="w-36">
        <TextInput
          key={`${load}`}
          inputMode="decimal"
          defaultValue={massIn(units, sign * load)}
          onBlur={(event) => change(event.target.value)}
          onKeyDown={(event) => event.key === 'Enter' && change(event.currentTarget.value)}
        />
      </Field>
      <input
        type="range"
        aria-label={`${LABEL[kind]}, slider`}
        min={low}
        max={high}
        step={bounds.step}
        value={sign * load}
        aria-valuetext={`${massIn(units, sign * load)} ${massUnit(units)}`}
        onChange={(event) => onChange(sign * Number(event.target.value))}
        className="min-h-target max-w-sm flex-1 basis-48 accent-slate"
      />
    </div>
  )
}
