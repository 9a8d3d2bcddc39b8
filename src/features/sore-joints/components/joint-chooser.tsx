import { useState } from 'react'
import { JOINTS, MIDLINE_JOINTS, type Joint, type Side } from '#shared/mechanics/vocabulary'
import { Button } from '@/components/ui/button'
import { Field, FieldError } from '@/components/ui/field'
import { Select } from '@/components/ui/inputs'
import { capitalise, jointWords } from '@/lib/words'
import { BodyChart, type JointChoice } from './body-chart'

const CHOICES: JointChoice[] = JOINTS.flatMap((joint): JointChoice[] =>
  MIDLINE_JOINTS.includes(joint)
    ? [{ joint, side: null }]
    : [
        { joint, side: 'right' },
        { joint, side: 'left' },
      ],
)
const keyOf = ({ joint, side }: JointChoice) => (side === null ? joint : `${joint}.${side}`)
const fromKey = (key: string): JointChoice => {
  const [joint, side] = key.split('.')
  return { joint: joint as Joint, side: (side as Side | undefined) ?? null }
}

interface JointChooserProps {
  chosen: JointChoice | null
  onChoose: (choice: JointChoice) => void
  error?: string
}

/** On the body chart, or from a list for whom that is easier. */
export function JointChooser({ chosen, onChoose, error }: JointChooserProps) {
  const [listed, setListed] = useState(false)
  return (
    <section aria-labelledby="joint-chooser-title">
      <div className="flex flex-wrap items-center justify-between gap-x-4">
        <h3 id="joint-chooser-title" className="text-lg">
          Where
          <span aria-live="polite" className="text-oxide">
            {chosen !== null && `: ${jointWords(chosen.joint, chosen.side)}`}
          </span>
        </h3>
        <Button kind="quiet" className="-mr-4" onClick={() => setListed(!listed)}>
          {listed ? 'choose on the body instead' : 'choose from a list instead'}
        </Button>
      </div>
      <FieldError error={error} />
      {listed ? (
        <Field label="Joint" labelHidden className="mt-2">
          <Select
            value={chosen === null ? '' : keyOf(chosen)}
            onChange={(event) => onChoose(fromKey(event.target.value))}
          >
            <option value="" disabled>
              Choose a joint
            </option>
            {CHOICES.map((choice) => (
              <option key={keyOf(choice)} value={keyOf(choice)}>
                {capitalise(jointWords(choice.joint, choice.side))}
              </option>
            ))}
          </Select>
        </Field>
      ) : (
        <BodyChart chosen={chosen} onChoose={onChoose} />
      )}
    </section>
  )
}
