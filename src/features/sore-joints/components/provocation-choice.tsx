import { PROVOCATIONS, type Provocation } from '#shared/contract/sore-joint'
import type { Joint } from '#shared/mechanics/vocabulary'
import { Chip, ChoiceGroup } from '@/components/ui/choice-group'
import { capitalise, PROVOCATION_WORDS } from '@/lib/words'

/** Some provocations make no sense at some joints. */
const NOT_ASKED: Partial<Record<Joint, readonly Provocation[]>> = {
  neck: ['gripping', 'leaning'],
  lowerBack: ['gripping', 'leaning'],
  hip: ['gripping', 'leaning'],
  knee: ['gripping'],
  ankle: ['gripping'],
}
export const provocationsFor = (joint: Joint | undefined): Provocation[] =>
  PROVOCATIONS.filter((provocation) => joint === undefined || !NOT_ASKED[joint]?.includes(provocation))

interface ProvocationChoiceProps {
  joint: Joint | undefined
  value: readonly Provocation[]
  onChange: (value: Provocation[]) => void
  error?: string
}

/** Any number of them; “I don’t know” stands alone. */
export function ProvocationChoice({ joint, value, onChange, error }: ProvocationChoiceProps) {
  const toggle = (provocation: Provocation) => {
    if (value.includes(provocation)) onChange(value.filter((other) => other !== provocation))
    else if (provocation === 'unknown') onChange(['unknown'])
    else onChange([...value.filter((other) => other !== 'unknown'), provocation])
  }
  return (
    <ChoiceGroup legend={<span className="text-lg">When it speaks up</span>} hint="All that apply." error={error}>
      {provocationsFor(joint).map((provocation) => (
        <Chip
          key={provocation}
          type="checkbox"
          label={capitalise(PROVOCATION_WORDS[provocation])}
          checked={value.includes(provocation)}
          onChange={() => toggle(provocation)}
        />
      ))}
    </ChoiceGroup>
  )
}
