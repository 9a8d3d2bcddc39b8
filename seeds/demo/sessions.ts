import type { Dose } from '#shared/contract/session'
import type { DemoAthlete } from './people'
import { plannedDay, type PlannedExercise } from './programmes'
import { demoId } from './random'

const DAY = 24 * 60 * 60 * 1000
export const PAST_DAYS = 84
/** So that nobody who leaves the demo running for two weeks finds an empty calendar. */
export const COMING_DAYS = 14

/** The calendar day `offset` days after the day of `now` (UTC). */
export const dayAt = (now: Date, offset: number): string =>
  new Date(now.getTime() + offset * DAY).toISOString().slice(0, 10)

export interface DemoSlot {
  id: string
  position: number
  slug: string
  planned: Dose
  intent: PlannedExercise['intent']
  target: PlannedExercise['target']
}

export interface DemoSession {
  id: string
  athlete: DemoAthlete
  offset: number
  day: string
  title: string
  minutes: number
  slots: DemoSlot[]
}

/** What the demo needs to know of an exercise and of an athlete's strength in it. */
export interface Strength {
  unit(slug: string): Dose['unit']
  /**
   * kg that leaves `rir` repetitions in reserve after `count`, for somebody who has a share of the athlete's strength,
   * as the place can set it; null is body weight alone.
   */
  workingLoad(athlete: DemoAthlete, planned: PlannedExercise, share: number): number | null
  pieces(slug: string): number
}

/** Weeks build up to the present; every fourth one before it was lighter. */
function weekShare(offset: number): { load: number; lighter: boolean } {
  const weeksAgo = Math.max(0, Math.floor(-offset / 7))
  return { load: 1 - 0.012 * weeksAgo, lighter: weeksAgo % 4 === 3 }
}

function toSlot(
  athlete: DemoAthlete,
  sessionId: string,
  index: number,
  planned: PlannedExercise,
  offset: number,
  strength: Strength,
): DemoSlot {
  const { load: share, lighter } = weekShare(offset)
  const load = athlete.loads[planned.slug] ?? strength.workingLoad(athlete, planned, share)
  return {
    id: demoId('slot', sessionId, String(index)),
    position: index + 1,
    slug: planned.slug,
    planned: {
      sets: lighter ? Math.max(2, planned.sets - 1) : planned.sets,
      repetitions: planned.count,
      unit: strength.unit(planned.slug),
      rir: lighter ? planned.rir + 1 : planned.rir,
      load,
      pieces: strength.pieces(planned.slug),
    },
    intent: planned.intent,
    target: planned.target,
  }
}

/** The athlete's sessions around `now`, oldest first, `from` so many days after it. */
export function sessionsOf(athlete: DemoAthlete, now: Date, strength: Strength, from = -PAST_DAYS): DemoSession[] {
  const offsets = Array.from({ length: COMING_DAYS - from + 1 }, (_, index) => from + index)
  return offsets.flatMap((offset) => {
    const planned = plannedDay(athlete, offset)
    if (planned === null) return []
    const day = dayAt(now, offset)
    const id = demoId('session', athlete.name, day, planned.title)
    const slots = planned.exercises.map((exercise, index) => toSlot(athlete, id, index, exercise, offset, strength))
    return [{ id, athlete, offset, day, title: planned.title, minutes: planned.minutes, slots }]
  })
}
