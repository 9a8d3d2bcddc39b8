import { useQuery } from '@tanstack/react-query'
import { useState, type ReactNode } from 'react'
import type { Exercise } from '#shared/contract/exercise'
import type { Sex } from '#shared/mechanics/index'
import { Loaded, Skeleton } from '@/components/ui/states'
import { EQUIPMENT_WORDS, familyWords } from '@/lib/exercise-words'
import type { Units } from '@/lib/units'
import { GUIDANCE_WORDS, listWords } from '@/lib/words'
import { previewQuery, type PreviewBody } from '../api'
import { useRested } from '../hooks/use-rested'
import { loadBounds } from '../load'
import { ActionTable, JointDemands, MusclesDriven } from './demands'
import { ExerciseStrip } from './exercise-figure'
import { LoadChoice } from './load-choice'

interface ExerciseViewProps {
  exercise: Exercise
  units: Units
  /** Whose body the numbers are for. */
  subject: Pick<PreviewBody, 'athleteId' | 'body'>
  sex?: Sex
  /** Chooses the subject, where there is a choice. */
  subjectChoice?: ReactNode
  subjectNote: string
}

/** A slider asks often; the server is asked when it rests a moment. */
const REST = 120

/** One exercise: how it looks, how it is set up, and what it asks at a load. */
export function ExerciseView({ exercise, units, subject, sex, subjectChoice, subjectNote }: ExerciseViewProps) {
  const bounds = loadBounds(exercise)
  const [load, setLoad] = useState(bounds?.start ?? 0)
  const asked = useRested(load, REST)
  const preview = useQuery(previewQuery({ exerciseId: exercise.id, load: asked, ...subject }))
  return (
    <>
      <p className="mb-4 text-pencil">
        {familyWords(exercise.family)} · {GUIDANCE_WORDS[exercise.mechanics.guidance]} ·{' '}
        {exercise.equipment.length === 0
          ? 'no equipment'
          : listWords(exercise.equipment.map((kind) => EQUIPMENT_WORDS[kind]))}{' '}
        · coordination {Math.round(exercise.coordination)} of 100
      </p>
      <div className="grid items-start gap-x-10 gap-y-6 lg:grid-cols-[3fr_2fr]">
        <ExerciseStrip
          exercise={exercise}
          sex={sex}
          preview={preview.data}
          className="rounded-xl border border-rule bg-card p-4"
        />
        <section aria-label="How to set it up" className="max-w-prose">
          <h2 className="mb-1 text-xl">Set-up</h2>
          <p>{exercise.setup}</p>
          {exercise.cautions.length > 0 && (
            <>
              <h3 className="mt-4 font-semibold text-brass">Take care</h3>
              <ul className="list-disc pl-5">
                {exercise.cautions.map((caution) => (
                  <li key={caution}>{caution}</li>
                ))}
              </ul>
            </>
          )}
        </section>
      </div>
      <div className="mt-8 mb-5 grid gap-4">
        {subjectChoice}
        {bounds !== null && exercise.load.kind !== 'none' && (
          <LoadChoice bounds={bounds} load={load} onChange={setLoad} units={units} kind={exercise.load.kind} />
        )}
        <p className="text-pencil">
          {subjectNote}
          {preview.data?.estimated === true && ' Strength is the average adult’s until bests are logged.'}
        </p>
      </div>
      <Loaded query={preview} what="what it asks" skeleton={<Skeleton className="h-64" />}>
        {(data) => (
          <div aria-busy={preview.isPlaceholderData}>
            <div className="grid items-start gap-x-10 gap-y-8 lg:grid-cols-2">
              <JointDemands preview={data} units={units} />
              <MusclesDriven muscles={data.muscles} />
            </div>
            <ActionTable preview={data} />
          </div>
        )}
      </Loaded>
    </>
  )
}
