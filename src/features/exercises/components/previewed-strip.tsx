import { useQuery } from '@tanstack/react-query'
import type { Exercise } from '#shared/contract/exercise'
import type { Sex } from '#shared/mechanics/index'
import { previewQuery } from '../api'
import { ExerciseStrip } from './exercise-figure'

interface PreviewedStripProps {
  exerciseId: string
  exercise: Exercise | undefined
  athleteId: string
  sex?: Sex
  /** kg */
  load: number
}

/** The postures of an exercise with what they ask of an athlete at a load. */
export function PreviewedStrip({ exerciseId, exercise, athleteId, sex, load }: PreviewedStripProps) {
  const preview = useQuery(previewQuery({ exerciseId, athleteId, load }))
  return (
    <>
      <ExerciseStrip exercise={exercise} sex={sex} preview={preview.data} />
      {preview.isError && (
        <p className="text-pencil">The demands at each joint could not be loaded; the postures stand without them.</p>
      )}
    </>
  )
}
