import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { parse } from 'yaml'
import { z } from 'zod'
import { exerciseDocument, type ExerciseDocument } from '#shared/contract/exercise'
import { solveExercise } from '#shared/mechanics/index'
import { SEXES, type Sex } from '#shared/mechanics/sex'
import type { Axis, ExerciseSolution, PoseAngles, Role, SolvedFrame } from '#shared/mechanics/solution'

const FOLDER = join(import.meta.dirname, '../../seeds/catalogue')
const FILES = [
  'squat',
  'lunge',
  'leg-press',
  'hinge',
  'knee-isolation',
  'hip-isolation',
  'ankle-isolation',
  'trunk',
  'wrist-and-forearm',
  'shoulder-isolation',
]
const documents = new Map<string, ExerciseDocument>(
  FILES.flatMap((file) =>
    z.array(exerciseDocument).parse(parse(readFileSync(join(FOLDER, `${file}.yaml`), 'utf8'))),
  ).map((document) => [document.slug, document]),
)
const everyBody = [...documents.keys()].flatMap((slug) => SEXES.map((sex) => ({ slug, sex })))

const solutions = new Map<string, ExerciseSolution>()
function framesOf(slug: string, sex: Sex = 'male'): SolvedFrame[] {
  const key = `${slug} ${sex}`
  const known = solutions.get(key) ?? solveExercise(documents.get(slug)!.mechanics, sex)
  solutions.set(key, known)
  return known.frames
}
const referenceLoad = (slug: string): number => documents.get(slug)!.mechanics.referenceLoad

/** Moment ÷ (m·g·H), or force ÷ (m·g), at a load given as a share of body mass; 0 where nothing is asked. */
function asked(frame: SolvedFrame, axis: Axis, load: number, role?: Role): number {
  const term = frame.terms.find((each) => each.axis === axis && (role ? each.role === role : each.role !== 'idle'))
  return term ? term.a + load * term.b : 0
}
/** The hardest value of an axis through the repetition, with its sign. */
function peak(
  slug: string,
  axis: Axis,
  { sex = 'male' as Sex, load = referenceLoad(slug), role = undefined as Role | undefined } = {},
): number {
  return framesOf(slug, sex)
    .map((frame) => asked(frame, axis, load, role))
    .reduce((most, each) => (Math.abs(each) > Math.abs(most) ? each : most), 0)
}
const lowest = (slug: string, sex: Sex = 'male'): SolvedFrame =>
  framesOf(slug, sex).reduce((low, frame) => (frame.pose.pelvis[2] < low.pose.pelvis[2] ? frame : low))

type RangedAngle = Exclude<keyof PoseAngles, 'trunkLean' | 'neck'>
/**
 * Range of motion, degrees. AAOS, read: shoulder flexion 180, extension 60, elbow 150, wrist flexion 80, extension 70. From memory,
 * high: hip flexion 120, extension 20, knee 135, dorsiflexion 20, plantarflexion 50; middle: lumbar flexion 60, extension 25.
 */
const RANGE: Readonly<Record<RangedAngle, readonly [number, number]>> = {
  shoulder: [-60, 180],
  elbow: [0, 150],
  wrist: [-70, 80],
  hip: [-20, 120],
  knee: [0, 135],
  ankle: [-20, 50],
  lumbar: [-25, 60],
}

/**
 * Where a posture goes beyond, and why. Ankles are measured hanging free; under body weight with a bent knee they bend to about
 * 40° (weight-bearing lunge test, from memory, middle). Hips are measured with the pelvis held; at the bottom of a deep
 * squat, hinge or press the pelvis gives a few degrees more than our lumbar joint shows. Body weight pushes a flat hand's
 * wrist past what it extends freely.
 */
const BEYOND: ReadonlyArray<{ angle: RangedAngle; to: readonly [number, number]; slugs: readonly string[] }> = [
  {
    angle: 'ankle',
    to: [-40, 50],
    slugs: [
      'barbell-back-squat',
      'low-bar-back-squat',
      'barbell-front-squat',
      'goblet-squat',
      'body-weight-squat',
      'belt-squat',
      'dumbbell-step-up',
      'single-leg-squat-to-box',
      'pistol-squat',
      'leg-press',
      'single-leg-press',
      'standing-calf-raise-machine',
      'single-leg-calf-raise',
      'seated-calf-raise-machine',
    ],
  },
  { angle: 'wrist', to: [-92, 80], slugs: ['straight-arm-plank'] },
  {
    angle: 'hip',
    to: [-20, 134],
    slugs: [
      'low-bar-back-squat',
      'barbell-deadlift',
      'leg-press',
      'leg-press-feet-high',
      'single-leg-press',
      'wrist-curl',
      'reverse-wrist-curl',
    ],
  },
]
const rangeOf = (slug: string, angle: RangedAngle): readonly [number, number] =>
  BEYOND.find((each) => each.angle === angle && each.slugs.includes(slug))?.to ?? RANGE[angle]

describe('postures of the lower body, trunk, wrist and shoulder', () => {
  test.each(everyBody)('$slug keeps the $sex joints within their range of motion', ({ slug, sex }) => {
    for (const { name, angles } of framesOf(slug, sex)) {
      for (const angle of Object.keys(RANGE) as RangedAngle[]) {
        // An arm in the transverse plane counts its shoulder angle from the side, which is another range.
        if (angle === 'shoulder' && documents.get(slug)!.mechanics.armPlane === 'transverse') continue
        const [low, high] = rangeOf(slug, angle)
        expect(angles[angle], `${name}: ${angle}`).toBeGreaterThanOrEqual(low - 0.5)
        expect(angles[angle], `${name}: ${angle}`).toBeLessThanOrEqual(high + 0.5)
      }
    }
  })

  test('goes beyond a range only where it says so', () => {
    for (const { angle, slugs } of BEYOND) {
      for (const slug of slugs) {
        const [low, high] = RANGE[angle]
        const values = SEXES.flatMap((sex) => framesOf(slug, sex).map(({ angles }) => angles[angle]))
        expect(
          values.some((value) => value < low - 0.5 || value > high + 0.5),
          `${slug} ${angle}`,
        ).toBe(true)
      }
    }
  })

  test.each(everyBody.filter(({ slug }) => documents.get(slug)!.mechanics.supports.join() === 'feet'))(
    '$slug keeps the pressure of the $sex body on the feet',
    ({ slug, sex }) => {
      for (const frame of framesOf(slug, sex)) {
        const bearing = frame.reactions.filter(({ support }) => support === 'feet')
        const upright = bearing.reduce((sum, { a, b }) => sum + a + referenceLoad(slug) * b, 0) / bearing.length
        // Where one foot's force must act for the ankle to be in balance; the foot's own weight is left out (1 % of the foot).
        const pressure = frame.pose['right.ankle'][0] + asked(frame, 'ankle', referenceLoad(slug)) / upright
        const along =
          (pressure - frame.pose['right.heel'][0]) / (frame.pose['right.toe'][0] - frame.pose['right.heel'][0])
        expect(along, frame.name).toBeGreaterThan(0.1)
        expect(along, frame.name).toBeLessThan(0.9)
      }
    },
  )

  test.each(everyBody)('$slug keeps the $sex body above the floor and its bearing feet in place', ({ slug, sex }) => {
    const frames = framesOf(slug, sex)
    for (const { pose, name } of frames) {
      for (const [joint, place] of Object.entries(pose)) expect(place[2], `${name}: ${joint}`).toBeGreaterThan(-1e-9)
    }
    const { supports } = documents.get(slug)!.mechanics
    const held = supports.some((support) => support === 'seat' || support === 'backPad')
    if (!supports.includes('feet') || held) return
    const [first, ...rest] = frames.map(({ pose }) => pose['right.toe'][0])
    // Heels that rise carry the toes a little; a foot never slides.
    for (const place of rest) expect(Math.abs(place - first!)).toBeLessThan(0.04)
  })

  test('feet and bench of the hip thrust and the bridge stay apart as they were', () => {
    for (const slug of [
      'barbell-hip-thrust',
      'glute-bridge',
      'single-leg-glute-bridge',
      'rear-foot-elevated-split-squat',
      'dumbbell-split-squat',
    ]) {
      for (const sex of SEXES) {
        const gaps = framesOf(slug, sex).map(({ reactions }) => {
          const places = [...new Set(reactions.map(({ support }) => support))].map(
            (support) => reactions.find((each) => each.support === support)!.at[0],
          )
          return places[0]! - places[1]!
        })
        expect(Math.max(...gaps) - Math.min(...gaps), `${slug} ${sex}`).toBeLessThan(0.03)
      }
    }
  })
})

describe('what lower body exercises ask', () => {
  test('a low bar raises the hip moment and lowers the knee moment against a high bar, at equal load', () => {
    // Wretenberg 1996, read.
    for (const sex of SEXES) {
      const load = 1
      const high = lowest('barbell-back-squat', sex)
      const low = lowest('low-bar-back-squat', sex)
      expect(-asked(low, 'hipFlexion', load)).toBeGreaterThan(-1.1 * asked(high, 'hipFlexion', load))
      expect(-asked(low, 'knee', load)).toBeLessThan(-0.9 * asked(high, 'knee', load))
    }
  })

  test('the more the trunk leans in a squat, the more the back extensors must hold', () => {
    // Cappozzo 1985, read: trunk lean dominates lumbar compression, of which the back extensors make the most.
    for (const sex of SEXES) {
      const slugs = ['barbell-front-squat', 'barbell-back-squat', 'low-bar-back-squat']
      const leans = slugs.map((slug) => {
        const { angles } = lowest(slug, sex)
        return angles.trunkLean + angles.lumbar
      })
      const moments = slugs.map((slug) => -asked(lowest(slug, sex), 'trunkFlexion', 1))
      expect(leans).toEqual([...leans].sort((one, other) => one - other))
      expect(moments).toEqual([...moments].sort((one, other) => one - other))
      for (const slug of slugs) {
        const [standing] = framesOf(slug, sex)
        expect(Math.abs(asked(standing!, 'trunkFlexion', 1)), slug).toBeLessThan(
          0.3 * Math.abs(asked(lowest(slug, sex), 'trunkFlexion', 1)),
        )
      }
    }
  })

  test('a heavier deadlift asks more of hip and lower back', () => {
    // PMC3878967, read: 50 % of body weight against 25 %.
    for (const axis of ['hipFlexion', 'trunkFlexion'] as const) {
      expect(Math.abs(peak('barbell-deadlift', axis, { load: 0.5 }))).toBeGreaterThan(
        Math.abs(peak('barbell-deadlift', axis, { load: 0.25 })),
      )
    }
  })

  test('the trunk works in squats and hinges, and not at all on a leg press, a hack squat or a knee extension', () => {
    // Common practice, no source.
    for (const slug of [
      'leg-press',
      'single-leg-press',
      'hack-squat-machine',
      'wall-sit',
      'knee-extension-machine',
      'seated-leg-curl',
    ]) {
      expect(peak(slug, 'trunkFlexion'), slug).toBe(0)
    }
    expect(peak('barbell-back-squat', 'trunkFlexion')).toBeLessThan(-0.1)
    // Weight hung from the hips leaves the lower back with the trunk alone.
    for (const sex of SEXES) {
      expect(Math.abs(peak('belt-squat', 'trunkFlexion', { sex, load: 0.8 }))).toBeLessThan(
        0.6 * Math.abs(peak('barbell-back-squat', 'trunkFlexion', { sex, load: 0.8 })),
      )
    }
  })

  test('knee machines load the knee alone', () => {
    // Common practice, no source.
    for (const slug of [
      'knee-extension-machine',
      'single-leg-knee-extension-machine',
      'seated-leg-curl',
      'lying-leg-curl',
    ]) {
      for (const axis of ['hipFlexion', 'ankle', 'grip', 'trunkFlexion'] as const) {
        expect(Math.abs(peak(slug, axis)), `${slug} ${axis}`).toBeLessThan(0.05 * Math.abs(peak(slug, 'knee')))
      }
    }
  })

  test.each([
    // Which way each works its joint at its hardest (trade, no source).
    { slug: 'barbell-back-squat', axis: 'knee', sign: -1 },
    { slug: 'barbell-back-squat', axis: 'hipFlexion', sign: -1 },
    { slug: 'barbell-deadlift', axis: 'hipFlexion', sign: -1 },
    { slug: 'romanian-deadlift', axis: 'hipFlexion', sign: -1 },
    { slug: 'barbell-good-morning', axis: 'trunkFlexion', sign: -1 },
    { slug: 'barbell-hip-thrust', axis: 'hipFlexion', sign: -1 },
    { slug: 'back-extension', axis: 'hipFlexion', sign: -1 },
    { slug: 'back-extension', axis: 'trunkFlexion', sign: -1 },
    { slug: 'cable-hip-extension', axis: 'hipFlexion', sign: -1 },
    { slug: 'leg-press', axis: 'knee', sign: -1 },
    { slug: 'leg-press', axis: 'hipFlexion', sign: -1 },
    { slug: 'hack-squat-machine', axis: 'knee', sign: -1 },
    { slug: 'knee-extension-machine', axis: 'knee', sign: -1 },
    { slug: 'kneeling-lean-back', axis: 'knee', sign: -1 },
    { slug: 'seated-leg-curl', axis: 'knee', sign: 1 },
    { slug: 'lying-leg-curl', axis: 'knee', sign: 1 },
    { slug: 'nordic-curl', axis: 'knee', sign: 1 },
    { slug: 'hip-abduction-machine', axis: 'hipAbduction', sign: 1 },
    { slug: 'hip-adduction-machine', axis: 'hipAbduction', sign: -1 },
    { slug: 'standing-calf-raise-machine', axis: 'ankle', sign: 1 },
    { slug: 'seated-calf-raise-machine', axis: 'ankle', sign: 1 },
    { slug: 'forearm-plank', axis: 'trunkFlexion', sign: 1 },
    { slug: 'lying-leg-raise', axis: 'trunkFlexion', sign: 1 },
    { slug: 'hanging-leg-raise', axis: 'hipFlexion', sign: 1 },
    { slug: 'hanging-leg-raise', axis: 'trunkFlexion', sign: 1 },
    { slug: 'abdominal-machine', axis: 'trunkFlexion', sign: 1 },
    { slug: 'wrist-curl', axis: 'wristFlexion', sign: 1 },
    { slug: 'reverse-wrist-curl', axis: 'wristFlexion', sign: -1 },
    { slug: 'dumbbell-lateral-raise', axis: 'shoulderAbduction', sign: 1 },
    { slug: 'cable-lateral-raise', axis: 'shoulderAbduction', sign: 1 },
    { slug: 'lateral-raise-machine', axis: 'shoulderAbduction', sign: 1 },
    { slug: 'chest-supported-rear-delt-fly', axis: 'shoulderHorizontal', sign: -1 },
    { slug: 'cable-external-rotation', axis: 'shoulderRotation', sign: -1 },
    { slug: 'barbell-shrug', axis: 'scapulaVertical', sign: 1 },
  ] as const)('$slug works $axis the right way', ({ slug, axis, sign }) => {
    for (const sex of SEXES) expect(Math.sign(peak(slug, axis, { sex })), sex).toBe(sign)
  })

  test('two knees share a load that one takes alone', () => {
    expect(peak('single-leg-knee-extension-machine', 'knee', { load: 0.3 })).toBeCloseTo(
      peak('knee-extension-machine', 'knee', { load: 0.6 }),
      12,
    )
    expect(peak('single-leg-press', 'knee', { load: 0.7 })).toBeCloseTo(peak('leg-press', 'knee', { load: 1.4 }), 12)
  })

  test('feet high on the plate move the press from the knees to the hips', () => {
    // Common practice, no source.
    for (const sex of SEXES) {
      const [usual, high] = ['leg-press', 'leg-press-feet-high'] as const
      expect(Math.abs(peak(high, 'hipFlexion', { sex }))).toBeGreaterThan(
        1.2 * Math.abs(peak(usual, 'hipFlexion', { sex })),
      )
      expect(Math.abs(peak(high, 'knee', { sex }))).toBeLessThan(0.8 * Math.abs(peak(usual, 'knee', { sex })))
    }
  })

  test('lifting the rear foot puts more of the weight on the front one', () => {
    // Common practice, no source.
    const front = (slug: string) => {
      const { reactions } = lowest(slug)
      const share = (support: string) =>
        reactions
          .filter((each) => each.support === support)
          .reduce((sum, { a, b }) => sum + a + referenceLoad(slug) * b, 0)
      return share('feet') / (share('feet') + share('offFoot'))
    }
    expect(front('dumbbell-split-squat')).toBeGreaterThan(0.6)
    expect(front('rear-foot-elevated-split-squat')).toBeGreaterThan(front('dumbbell-split-squat') + 0.08)
    expect(front('rear-foot-elevated-split-squat')).toBeLessThan(0.9)
  })

  test('a band takes part of the Nordic curl, and straight legs weigh more than bent ones on the bar', () => {
    for (const sex of SEXES) {
      expect(peak('band-assisted-nordic-curl', 'knee', { sex })).toBeLessThan(
        0.75 * peak('nordic-curl', 'knee', { sex }),
      )
      expect(peak('band-assisted-nordic-curl', 'knee', { sex, load: 0 })).toBeCloseTo(
        peak('nordic-curl', 'knee', { sex }),
        12,
      )
      expect(peak('hanging-leg-raise', 'hipFlexion', { sex })).toBeGreaterThan(
        peak('hanging-knee-raise', 'hipFlexion', { sex }),
      )
    }
  })

  test('a raise with the palm down asks no bending of the elbow', () => {
    for (const slug of ['dumbbell-lateral-raise', 'cable-lateral-raise', 'lateral-raise-machine']) {
      expect(Math.abs(peak(slug, 'elbow')), slug).toBeLessThan(0.06 * peak(slug, 'shoulderAbduction'))
    }
  })
})
