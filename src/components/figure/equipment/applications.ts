import type { ExerciseMechanics, LoadPath } from '#shared/mechanics/definition'
import type { LoadLine, SolvedFrame } from '#shared/mechanics/solution'
import type { Side } from '#shared/mechanics/vocabulary'
import { IDLE, WORKING } from './places'

/** One place where the external load acts in a frame: its authored path, its limb (null on the midline), its line. */
export interface Application {
  load: LoadPath
  side: Side | null
  line: LoadLine
}

const MIDLINE: ReadonlyArray<LoadPath['at']> = ['shoulders', 'hips', 'head']

/** Mechanics lists load lines path by path, working limb first; this pairs them up again. */
export function applicationsOf(mechanics: ExerciseMechanics, frame: SolvedFrame): Application[] {
  const lines = [...frame.loadLines]
  return mechanics.loads.flatMap((load): Application[] => {
    const sides: Array<Side | null> =
      load.at === 'offHand'
        ? [IDLE]
        : MIDLINE.includes(load.at)
          ? [null]
          : mechanics.sides === 'oneAtATime'
            ? [WORKING]
            : [WORKING, IDLE]
    return sides.flatMap((side) => {
      const line = lines.shift()
      return line === undefined ? [] : [{ load, side, line }]
    })
  })
}
