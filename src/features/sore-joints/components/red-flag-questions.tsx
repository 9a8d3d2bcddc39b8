import { Controller, type Control } from 'react-hook-form'
import { RED_FLAGS, type RedFlag } from '#shared/contract/sore-joint'
import { Chip, ChoiceGroup } from '@/components/ui/choice-group'
import type { SoreJointForm } from '../hooks/use-sore-joint-form'
import { StopAdvice } from './stop-advice'

const QUESTIONS: Record<RedFlag, string> = {
  injury: 'Did it start with an injury in the last days, with a pop or a changed shape?',
  nerve: 'Is there numbness or weakness, or have you lost control of bladder or bowel?',
  swollenOrFever: 'Is the joint hot and swollen, or do you have a fever?',
  nightPain: 'Does it hurt at night, and nothing eases it?',
  severePain: 'Is the pain 8 or more out of 10?',
  chestOrBreath: 'Do you have chest pain, or trouble getting your breath?',
}

/** Asked before anything else; none is answered beforehand, because a missing answer is not a “no”. */
export function RedFlagQuestions({ control }: { control: Control<SoreJointForm> }) {
  return (
    <ol className="grid gap-x-8 gap-y-5">
      {RED_FLAGS.map((flag) => (
        <li key={flag} className="border-b border-rule pb-5 last:border-0 last:pb-0">
          <Controller
            control={control}
            name={`redFlags.${flag}`}
            render={({ field, fieldState }) => (
              <ChoiceGroup
                legend={QUESTIONS[flag]}
                error={fieldState.error && field.value === undefined ? 'Answer yes or no.' : undefined}
              >
                {([true, false] as const).map((answer) => (
                  <Chip
                    key={String(answer)}
                    type="radio"
                    name={field.name}
                    ref={answer ? field.ref : undefined}
                    label={answer ? 'Yes' : 'No'}
                    checked={field.value === answer}
                    onChange={() => field.onChange(answer)}
                    onBlur={field.onBlur}
                    className="min-w-20 justify-center"
                  />
                ))}
                {field.value === true && <StopAdvice flags={[flag]} />}
              </ChoiceGroup>
            )}
          />
        </li>
      ))}
    </ol>
  )
}
