import { useQuery } from '@tanstack/react-query'
import { Field } from '@/components/ui/field'
import { Select } from '@/components/ui/inputs'
import { Loaded, Skeleton } from '@/components/ui/states'
import { placesQuery } from '../api'

interface PlaceSelectProps {
  chosen: string | null
  busy: boolean
  onChoose: (placeId: string) => void
}

/** Where the athlete usually trains; swaps use what stands there. */
export function PlaceSelect({ chosen, busy, onChoose }: PlaceSelectProps) {
  const query = useQuery(placesQuery())
  return (
    <Loaded query={query} what="places" skeleton={<Skeleton className="h-20" />}>
      {({ items }) =>
        items.length === 0 ? (
          <p className="text-pencil">Your clubs have no places yet.</p>
        ) : (
          <Field label="Usual place" hint={busy ? 'Saving' : 'Swaps use the equipment that stands there.'}>
            <Select value={chosen ?? ''} aria-busy={busy} onChange={(event) => onChoose(event.target.value)}>
              {chosen === null && (
                <option value="" disabled>
                  Choose a place
                </option>
              )}
              {items.map((place) => (
                <option key={place.id} value={place.id}>
                  {place.name}
                </option>
              ))}
            </Select>
          </Field>
        )
      }
    </Loaded>
  )
}
