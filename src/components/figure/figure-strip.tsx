import { useMemo } from 'react'
import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { SolvedFrame } from '#shared/mechanics/solution'
import { cx } from '@/lib/cx'
import { describeFigure } from './describe'
import { drawExercise } from './draw'
import { DrawnFigure, type Tone } from './figure'
import type { Mark } from './marks'

interface FigureStripProps {
  name: string
  mechanics: ExerciseMechanics
  frames: readonly SolvedFrame[]
  /** Per frame, in the order of `frames`. */
  marks?: ReadonlyArray<readonly Mark[]>
  tone?: Tone
  className?: string
}

/** Start, middle and end, without repeats when there are fewer. */
export const shownFrames = (count: number): number[] =>
  [...new Set([0, Math.round((count - 1) / 2), count - 1])].filter((index) => index >= 0)

/** The postures of an exercise side by side, to one scale and on one floor. */
export function FigureStrip({ name, mechanics, frames, marks = [], tone, className }: FigureStripProps) {
  const drawing = useMemo(() => drawExercise(mechanics, frames), [mechanics, frames])
  return (
    <ol className={cx('flex items-start gap-2', className)}>
      {shownFrames(drawing.frames.length).map((index) => {
        const frame = drawing.frames[index]!
        return (
          <li key={index} className="min-w-0 flex-1">
            <DrawnFigure
              drawing={drawing}
              frame={frame}
              label={describeFigure(name, [frame.name], marks[index] ?? [])}
              marks={marks[index]}
              tone={tone}
              className="block h-auto max-h-64 w-full"
            />
            <p className="text-center text-pencil">{frame.name}</p>
          </li>
        )
      })}
    </ol>
  )
}
