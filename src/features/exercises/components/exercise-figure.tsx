import type { Exercise, JointStress, Preview } from '#shared/contract/exercise'
import type { Sex } from '#shared/mechanics/index'
import { Figure } from '@/components/figure/figure'
import { FigureStrip } from '@/components/figure/figure-strip'
import { Skeleton } from '@/components/ui/states'
import { cx } from '@/lib/cx'
import { framesOf } from '../poses'

interface ThumbnailProps {
  /** Undefined while it loads. */
  exercise: Exercise | undefined
  sex?: Sex
  marks?: readonly JointStress[]
  className?: string
}

/** The middle posture, small. */
export function ExerciseThumbnail({ exercise, sex, marks, className = 'h-20 w-16' }: ThumbnailProps) {
  if (exercise === undefined) return <Skeleton className={className} />
  const frames = framesOf(exercise, sex)
  if (frames === null) return <div className={className} />
  return (
    <Figure
      name={exercise.name}
      mechanics={exercise.mechanics}
      frames={frames}
      marks={marks}
      className={cx('block', className)}
    />
  )
}

interface StripProps {
  exercise: Exercise | undefined
  sex?: Sex
  /** Demands per frame; the figure stands without discs until they are there. */
  preview?: Pick<Preview, 'frames'>
  className?: string
}

/** Start, middle and end with a disc at each joint for its demand and a ring for its cap. */
export function ExerciseStrip({ exercise, sex, preview, className }: StripProps) {
  if (exercise === undefined) return <Skeleton className="h-56" />
  const frames = framesOf(exercise, sex)
  if (frames === null) return <p className="text-pencil">There is no drawing of this exercise.</p>
  return (
    <figure className={className}>
      <FigureStrip
        name={exercise.name}
        mechanics={exercise.mechanics}
        frames={frames}
        marks={preview?.frames.map(({ joints }) => joints)}
      />
      <figcaption className="mt-1 text-pencil">
        A disc grows with the share of strength its joint is asked for; a dashed ring is the cap.
      </figcaption>
    </figure>
  )
}
