import { useEffect, useState } from 'react'
import type { Place } from '#shared/contract/place'
import { GUIDANCES, type Guidance } from '#shared/mechanics/vocabulary'
import { Field } from '@/components/ui/field'
import { Select } from '@/components/ui/inputs'
import { useWide } from '@/lib/use-wide'
import { GUIDANCE_WORDS } from '@/lib/words'
import type { RankingFilters } from '../api'

const ALL = 100
/** A slider reports every step it passes; the table waits until it rests. */
const REST = 250

interface SwapFiltersProps {
  filters: RankingFilters
  onChange: (change: Partial<RankingFilters>) => void
  places: readonly Place[]
  /** The place the table was made for, when none was chosen. */
  placeId: string | null
  count: string
}

/** Beside each other above a table; folded away above cards, where the first card matters more. */
export function SwapFilters(props: SwapFiltersProps) {
  const wide = useWide()
  const { filters, places, placeId, count } = props
  if (wide)
    return (
      <div className="mb-3 flex flex-wrap items-end gap-x-6 gap-y-3">
        <Fields {...props} />
        <p role="status" className="ml-auto text-pencil">
          {count}
        </p>
      </div>
    )
  const place = places.find(({ id }) => id === (filters.placeId ?? placeId))
  const chosen = [
    place?.name,
    filters.guidance !== undefined && GUIDANCE_WORDS[filters.guidance],
    filters.maxCoordination !== undefined && `coordination ${filters.maxCoordination} at most`,
  ].filter(Boolean)
  return (
    <>
      <details className="mb-2 rounded-xl border border-rule bg-card px-3">
        <summary className="cursor-pointer py-2.5">
          <b>Filters</b> <span className="text-pencil">{chosen.join(', ')}</span>
        </summary>
        <div className="grid gap-3 pb-3 sm:grid-cols-2">
          <Fields {...props} />
        </div>
      </details>
      <p role="status" className="mb-2 text-right text-pencil">
        {count}
      </p>
    </>
  )
}

function Fields({ filters, onChange, places, placeId }: SwapFiltersProps) {
  return (
    <>
      <Field label="Place" className="min-w-0 lg:min-w-44">
        <Select
          value={filters.placeId ?? placeId ?? ''}
          onChange={(event) => onChange({ placeId: event.target.value || undefined })}
        >
          {(filters.placeId ?? placeId) === null && <option value="">any equipment</option>}
          {places.map(({ id, name }) => (
            <option key={id} value={id}>
              {name}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="Path" className="min-w-0 lg:min-w-40">
        <Select
          value={filters.guidance ?? ''}
          onChange={(event) =>
            onChange({ guidance: event.target.value === '' ? undefined : (event.target.value as Guidance) })
          }
        >
          <option value="">any</option>
          {GUIDANCES.map((guidance) => (
            <option key={guidance} value={guidance}>
              {GUIDANCE_WORDS[guidance]}
            </option>
          ))}
        </Select>
      </Field>
      <CoordinationSlider most={filters.maxCoordination} onRest={(maxCoordination) => onChange({ maxCoordination })} />
    </>
  )
}

function CoordinationSlider({
  most,
  onRest,
}: {
  most: number | undefined
  onRest: (most: number | undefined) => void
}) {
  const [value, setValue] = useState(most ?? ALL)
  const [moved, setMoved] = useState(false)
  useEffect(() => {
    if (!moved) return
    const timer = setTimeout(() => {
      setMoved(false)
      onRest(value >= ALL ? undefined : value)
    }, REST)
    return () => clearTimeout(timer)
  }, [moved, value, onRest])
  return (
    <div className="flex flex-col gap-1">
      <label htmlFor="coordination" className="font-semibold">
        Coordination at most <span className="font-normal text-pencil">{value >= ALL ? 'any' : `${value} of 100`}</span>
      </label>
      <input
        id="coordination"
        type="range"
        min={0}
        max={ALL}
        step={5}
        value={value}
        aria-valuetext={value >= ALL ? 'any' : `${value} of 100`}
        onChange={(event) => {
          setValue(Number(event.target.value))
          setMoved(true)
        }}
        className="min-h-target w-full accent-slate lg:w-48"
      />
    </div>
  )
}
