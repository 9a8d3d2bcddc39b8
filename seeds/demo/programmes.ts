import type { Intent } from '#shared/contract/session'
import type { TargetGroup } from '#shared/rules/muscle-names'
import type { DemoAthlete } from './people'

/** One planned exercise; its load is worked out from the athlete's strength. */
export interface PlannedExercise {
  slug: string
  sets: number
  /** Repetitions, or seconds of a hold. */
  count: number
  rir: number
  intent: Intent
  target: TargetGroup
}

export interface PlannedDay {
  title: string
  minutes: number
  exercises: PlannedExercise[]
}

/** Seven days, rest days null; the first is the day a programme of phase 0 has today. */
export type Week = ReadonlyArray<PlannedDay | null>

const plan = (
  slug: string,
  sets: number,
  count: number,
  rir: number,
  intent: Intent,
  target: TargetGroup,
): PlannedExercise => ({ slug, sets, count, rir, intent, target })

const BARS: Week = [
  {
    title: 'Pull day',
    minutes: 55,
    exercises: [
      plan('front-lever-tuck', 5, 8, 2, 'skill', 'lats'),
      plan('pull-up-overhand', 4, 6, 2, 'strength', 'lats'),
      plan('chest-supported-row-dumbbells', 3, 10, 2, 'size', 'upperBack'),
      plan('incline-dumbbell-curl', 3, 12, 1, 'size', 'biceps'),
      plan('hanging-leg-raise', 3, 10, 2, 'endurance', 'abdomen'),
    ],
  },
  null,
  {
    title: 'Leg day',
    minutes: 60,
    exercises: [
      plan('barbell-back-squat', 4, 5, 2, 'strength', 'quadriceps'),
      plan('romanian-deadlift', 3, 8, 2, 'size', 'hamstrings'),
      plan('dumbbell-split-squat', 3, 10, 2, 'size', 'quadriceps'),
      plan('single-leg-calf-raise', 3, 15, 1, 'size', 'calves'),
    ],
  },
  {
    title: 'Push day',
    minutes: 55,
    exercises: [
      plan('handstand-hold-wall', 5, 30, 3, 'skill', 'frontShoulder'),
      plan('dip-bars', 4, 6, 2, 'strength', 'chest'),
      plan('pike-push-up', 3, 8, 2, 'strength', 'frontShoulder'),
      plan('push-up', 3, 15, 2, 'size', 'chest'),
    ],
  },
  null,
  {
    title: 'Second pull day',
    minutes: 50,
    exercises: [
      plan('chin-up', 4, 5, 2, 'strength', 'lats'),
      plan('inverted-row-rings', 3, 12, 2, 'size', 'upperBack'),
      plan('barbell-curl', 3, 10, 1, 'size', 'biceps'),
      plan('dead-hang', 3, 30, 2, 'endurance', 'forearms'),
    ],
  },
  null,
]

const BARS_BEGINNER: Week = [
  {
    title: 'Pull and legs',
    minutes: 45,
    exercises: [
      plan('inverted-row-bar', 4, 8, 2, 'strength', 'upperBack'),
      plan('assisted-pull-up-band', 3, 6, 2, 'strength', 'lats'),
      plan('dumbbell-split-squat', 3, 10, 2, 'size', 'quadriceps'),
    ],
  },
  null,
  null,
  {
    title: 'Push and hinge',
    minutes: 45,
    exercises: [
      plan('push-up', 4, 8, 2, 'strength', 'chest'),
      plan('romanian-deadlift', 3, 10, 3, 'size', 'hamstrings'),
      plan('incline-dumbbell-curl', 3, 12, 2, 'size', 'biceps'),
    ],
  },
  null,
  null,
  null,
]

const BARBELL: Week = [
  {
    title: 'Squat day',
    minutes: 65,
    exercises: [
      plan('barbell-back-squat', 4, 6, 2, 'strength', 'quadriceps'),
      plan('leg-press', 3, 10, 2, 'size', 'quadriceps'),
      plan('lying-leg-curl', 3, 12, 1, 'size', 'hamstrings'),
      plan('knee-extension-machine', 3, 12, 1, 'size', 'quadriceps'),
      plan('standing-calf-raise-machine', 3, 15, 1, 'size', 'calves'),
    ],
  },
  null,
  {
    title: 'Bench day',
    minutes: 60,
    exercises: [
      plan('bench-press-barbell', 4, 6, 2, 'strength', 'chest'),
      plan('overhead-press-barbell', 3, 8, 2, 'strength', 'frontShoulder'),
      plan('dumbbell-lateral-raise', 3, 15, 1, 'size', 'sideShoulder'),
      plan('cable-pushdown', 3, 12, 1, 'size', 'triceps'),
    ],
  },
  {
    title: 'Row day',
    minutes: 60,
    exercises: [
      plan('lat-pulldown-overhand', 4, 8, 2, 'size', 'lats'),
      plan('seated-cable-row', 3, 10, 2, 'size', 'upperBack'),
      plan('padded-pullover-machine', 3, 12, 1, 'size', 'lats'),
      plan('preacher-curl', 3, 12, 1, 'size', 'biceps'),
    ],
  },
  null,
  {
    title: 'Deadlift day',
    minutes: 60,
    exercises: [
      plan('barbell-deadlift', 3, 5, 2, 'strength', 'glutes'),
      plan('dumbbell-split-squat', 3, 10, 2, 'size', 'quadriceps'),
      plan('back-extension', 3, 12, 2, 'size', 'lowerBack'),
    ],
  },
  null,
]

const BARBELL_BEGINNER: Week = [
  {
    title: 'Whole body A',
    minutes: 50,
    exercises: [
      plan('leg-press', 3, 10, 3, 'size', 'quadriceps'),
      plan('lat-pulldown-overhand', 3, 10, 2, 'size', 'lats'),
      plan('bench-press-dumbbells', 3, 8, 3, 'strength', 'chest'),
    ],
  },
  null,
  null,
  {
    title: 'Whole body B',
    minutes: 50,
    exercises: [
      plan('romanian-deadlift', 3, 10, 3, 'size', 'hamstrings'),
      plan('seated-cable-row', 3, 10, 2, 'size', 'upperBack'),
      plan('shoulder-press-machine', 3, 8, 3, 'strength', 'frontShoulder'),
    ],
  },
  null,
  null,
  null,
]

const WEEKS: Record<DemoAthlete['programme'], Week> = {
  bars: BARS,
  barsBeginner: BARS_BEGINNER,
  barbell: BARBELL,
  barbellBeginner: BARBELL_BEGINNER,
}

/** What the athlete's programme has `offset` days after the demo's day; null is rest. */
export function plannedDay(
  { programme, phase }: Pick<DemoAthlete, 'programme' | 'phase'>,
  offset: number,
): PlannedDay | null {
  const week = WEEKS[programme]
  const index = (((offset + phase) % week.length) + week.length) % week.length
  return week[index] ?? null
}

/** Every exercise any programme names. */
export const PLANNED_SLUGS = [
  ...new Set(
    Object.values(WEEKS).flatMap((week) => week.flatMap((day) => (day?.exercises ?? []).map(({ slug }) => slug))),
  ),
].toSorted()
