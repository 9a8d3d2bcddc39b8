import { Chip, ChoiceGroup } from '@/components/ui/choice-group'
import { useToast } from '@/components/ui/toast'
import { messageOf } from '@/lib/api-error'
import { usePerson } from '@/lib/person'
import type { Units } from '@/lib/units'
import { useUpdateMe } from '../api'

const LABELS: Record<Units, string> = { metric: 'kg and cm', imperial: 'lb, ft and in' }

/** Saved as soon as it is chosen; the chip shows what is being saved. */
export function UnitsChoice() {
  const { units } = usePerson()
  const { mutate, isPending, variables } = useUpdateMe()
  const toast = useToast()
  const shown = isPending ? (variables.units ?? units) : units
  return (
    <ChoiceGroup legend="Units" className="[&_legend]:font-semibold">
      {(Object.keys(LABELS) as Units[]).map((choice) => (
        <Chip
          key={choice}
          type="radio"
          name="units"
          label={LABELS[choice]}
          checked={shown === choice}
          onChange={() =>
            mutate(
              { units: choice },
              {
                onSuccess: () => toast({ text: `Numbers are shown in ${LABELS[choice]}.` }),
                onError: (error) =>
                  toast({
                    text: messageOf(error, 'The units could not be saved. Try again.'),
                  }),
              },
            )
          }
        />
      ))}
    </ChoiceGroup>
  )
}
