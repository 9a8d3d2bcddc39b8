import { describe, expect, test } from 'vitest'
import type { ExerciseDocument } from '#shared/contract/exercise'
import { SEXES } from '#shared/mechanics/sex'
import type { Axis } from '#shared/mechanics/solution'
import { asked, documents, hardest, onHands, referenceLoad, solutionOf } from './catalogue'

/** Families of the upper body. */
const UPPER: readonly ExerciseDocument['family'][] = [
  'verticalPull',
  'horizontalPull',
  'straightArmPull',
  'verticalPush',
  'horizontalPush',
  'dip',
  'handstand',
  'lever',
  'elbowFlexion',
  'elbowExtension',
]

const upper = [...documents.values()].filter(({ family }) => UPPER.includes(family))

/**
 * Range of motion, degrees. AAOS, read: shoulder flexion 180, extension 60, elbow 150, wrist flexion 80, extension 70. From memory,
 * high: hip flexion 120, extension 20, knee 135, dorsiflexion 20, plantarflexion 50; middle: lumbar flexion 60, extension 25.
 */
const RANGE = {
  shoulder: [-60, 180],
  elbow: [0, 150],
  wrist: [-70, 80],
  hip: [-20, 120],
  knee: [0, 135],
  ankle: [-20, 50],
  lumbar: [-25, 60],
} as const
type RangedAngle = keyof typeof RANGE
/**
 * A hand flat on the floor bears past the 70° that the wrist extends freely, to a right angle and beyond it when the elbows
 * pass the hands: body weight pushes it there, and a sore wrist is kept from it by the rules (common practice, no source).
 */
const BEYOND: ReadonlyArray<{ slugs: readonly string[]; angle: RangedAngle; to: readonly [number, number] }> = [
  {
    slugs: [
      'push-up',
      'push-up-hands-together',
      'knee-push-up',
      'incline-push-up',
      'decline-push-up',
      'planche-lean',
      'handstand-hold-wall',
      'handstand-push-up-wall',
      'bench-dip',
    ],
    angle: 'wrist',
    to: [-112, 0],
  },
]

describe('postures of the upper body', () => {
  const cases = upper.flatMap(({ slug }) => SEXES.map((sex) => ({ slug, sex })))

  test.each(cases)('$slug keeps the $sex joints within their range of motion', ({ slug, sex }) => {
    const { mechanics } = documents.get(slug)!
    for (const { name, angles } of solutionOf(slug, sex).frames) {
      for (const angle of Object.keys(RANGE) as RangedAngle[]) {
        // An arm in the transverse plane counts its shoulder angle from the side, which is another range.
        if (angle === 'shoulder' && mechanics.armPlane === 'transverse') continue
        const [low, high] = BEYOND.find((each) => each.angle === angle && each.slugs.includes(slug))?.to ?? RANGE[angle]
        expect(angles[angle], `${name}: ${angle}`).toBeGreaterThanOrEqual(low - 0.5)
        expect(angles[angle], `${name}: ${angle}`).toBeLessThanOrEqual(high + 0.5)
      }
    }
  })

  test('says nothing of a range that is kept after all', () => {
    for (const { slugs, angle } of BEYOND) {
      for (const slug of slugs) {
        const [low, high] = RANGE[angle]
        const values = SEXES.flatMap((sex) => solutionOf(slug, sex).frames.map(({ angles }) => angles[angle]))
        expect(
          values.some((value) => value < low - 0.5 || value > high + 0.5),
          slug,
        ).toBe(true)
      }
    }
  })

  const standing = upper.filter(({ mechanics }) => mechanics.supports.join() === 'feet').map(({ slug }) => slug)

  test.each(standing.flatMap((slug) => SEXES.map((sex) => ({ slug, sex }))))(
    '$slug keeps the pressure of the $sex body on the feet',
    ({ slug, sex }) => {
      for (const frame of solutionOf(slug, sex).frames) {
        const upright = frame.reactions.reduce((sum, { a, b }) => sum + a + referenceLoad(slug) * b, 0) / 2
        // Where one foot's force must act for the ankle to be in balance; the foot's own weight is left out (1 % of the foot).
        const pressure = frame.pose['right.ankle'][0] + asked(frame, 'ankle', referenceLoad(slug)) / upright
        const along =
          (pressure - frame.pose['right.heel'][0]) / (frame.pose['right.toe'][0] - frame.pose['right.heel'][0])
        expect(along, frame.name).toBeGreaterThan(0.1)
        expect(along, frame.name).toBeLessThan(0.9)
      }
    },
  )

  const onTwo = upper
    .filter(({ mechanics }) => mechanics.supports.length === 2 && mechanics.balance !== undefined)
    .map(({ slug }) => slug)

  test.each(onTwo.flatMap((slug) => SEXES.map((sex) => ({ slug, sex }))))(
    '$slug leaves the hands of the $sex body in place while the feet stand',
    ({ slug, sex }) => {
      // Rings swing on their straps; a bar, a bench and the floor do not.
      const play = documents.get(slug)!.mechanics.guidance === 'ownBodyOnStraps' ? 0.1 : 0.03
      const hand = documents.get(slug)!.mechanics.supports.includes('offHand') ? 'left.grip' : 'right.grip'
      const places = solutionOf(slug, sex).frames.map(({ pose }) => pose[hand][0])
      expect(Math.max(...places) - Math.min(...places)).toBeLessThan(play)
    },
  )
})

/**
 * Twins pull or push along one hand path, so that at equal force on the hands their moments agree. `within` is a difference in
 * lever arm, × stature: 0.01 is 2 cm of a tall adult.
 */
const TWINS: ReadonlyArray<{ one: string; other: string; axes: readonly Axis[]; within: number }> = [
  { one: 'ring-pull-up', other: 'pull-up-neutral', axes: ['elbow', 'shoulderFlexion'], within: 1e-9 },
  { one: 'ring-dip', other: 'dip-bars', axes: ['elbow', 'shoulderFlexion'], within: 1e-9 },
  { one: 'assisted-pull-up-machine', other: 'pull-up-overhand', axes: ['elbow', 'shoulderAbduction'], within: 0.006 },
  { one: 'assisted-pull-up-band', other: 'pull-up-overhand', axes: ['elbow', 'shoulderAbduction'], within: 0.006 },
  { one: 'lat-pulldown-overhand', other: 'pull-up-overhand', axes: ['elbow', 'shoulderAbduction'], within: 0.006 },
  { one: 'lat-pulldown-neutral', other: 'pull-up-neutral', axes: ['elbow', 'shoulderFlexion'], within: 0.02 },
  { one: 'lat-pulldown-underhand', other: 'chin-up', axes: ['elbow', 'shoulderFlexion'], within: 0.02 },
  { one: 'assisted-dip', other: 'dip-bars', axes: ['elbow', 'shoulderFlexion'], within: 0.03 },
  // A bar lies a palm beyond the wrist, and the weight of the arms adds to it where the floor takes it off.
  { one: 'bench-press-barbell', other: 'push-up', axes: ['elbow', 'shoulderHorizontal'], within: 0.032 },
  // The trunk of the hung row turns under an upright pull, the cable stays nearly level.
  { one: 'seated-cable-row-wide', other: 'inverted-row-bar', axes: ['elbow', 'shoulderHorizontal'], within: 0.02 },
]

describe('twins', () => {
  test.each(TWINS.flatMap((twins) => SEXES.map((sex) => ({ ...twins, sex }))))(
    '$one and $other ask the same of the $sex arm per newton on the hand',
    ({ one, other, axes, within, sex }) => {
      const right = solutionOf(other, sex).frames
      expect(documents.get(other)!.mechanics.referenceLoad).toBe(0)
      solutionOf(one, sex).frames.forEach((frame, index) => {
        const twin = right[index]!
        // Equal force on the hands: a body on its hands without help, or a cable or bar that pulls as hard as the twin's hands bear.
        const load = onHands(one, frame) > 0 ? 0 : onHands(other, twin)
        for (const axis of axes) {
          const arms = [asked(frame, axis, load), asked(twin, axis, 0)].map(
            (moment) => (2 * moment) / onHands(other, twin),
          )
          expect(Math.abs(arms[0]! - arms[1]!), `${frame.name}: ${axis} ${arms.join(' against ')}`).toBeLessThan(within)
        }
      })
    },
  )

  test('share their number of postures', () => {
    for (const { one, other } of TWINS) {
      expect(solutionOf(one).frames.length, one).toBe(solutionOf(other).frames.length)
    }
  })
})

describe('what the upper body exercises ask', () => {
  test.each([
    // Mier 2014, Int J Exerc Sci 7(2), read: mean and standard deviation of the body weight on the hands, in %.
    { slug: 'push-up', sex: 'male', frame: 0, mean: 67.0, deviation: 3.8 },
    { slug: 'push-up', sex: 'female', frame: 0, mean: 65.1, deviation: 3.1 },
    { slug: 'push-up', sex: 'male', frame: 2, mean: 74.6, deviation: 3.6 },
    { slug: 'push-up', sex: 'female', frame: 2, mean: 70.3, deviation: 3.1 },
    { slug: 'knee-push-up', sex: 'male', frame: 0, mean: 52.5, deviation: 3.7 },
    { slug: 'knee-push-up', sex: 'female', frame: 0, mean: 51.5, deviation: 3.1 },
    { slug: 'knee-push-up', sex: 'male', frame: 2, mean: 60.1, deviation: 4.5 },
    { slug: 'knee-push-up', sex: 'female', frame: 2, mean: 56.6, deviation: 2.7 },
  ] as const)('$slug puts $mean % of the $sex body on the hands, within 1.5 SD (frame $frame)', (published) => {
    const share = 100 * onHands(published.slug, solutionOf(published.slug, published.sex).frames[published.frame]!)
    expect(Math.abs(share - published.mean)).toBeLessThanOrEqual(1.5 * published.deviation)
  })

  test('hands grow heavier from knees to incline to floor to decline, arms straight', () => {
    // Common practice, no source.
    const order = ['knee-push-up', 'incline-push-up', 'push-up', 'decline-push-up']
    const shares = order.map((slug) => onHands(slug, solutionOf(slug).frames[0]!))
    expect([...shares].sort((a, b) => a - b)).toEqual(shares)
  })

  test('hands together ask more of the elbow than hands apart', () => {
    // Donkers 1993, read: 23.0 against 10.0 N·m per arm.
    expect(hardest('push-up-hands-together', 'elbow')).toBeGreaterThan(1.5 * hardest('push-up', 'elbow'))
  })

  test('the hinged row asks more of the lower back than the hung row, the propped rows nothing', () => {
    // Fenwick 2009, read, for the order of the first two; pads, common practice, no source.
    expect(hardest('bent-over-row-barbell', 'trunkFlexion')).toBeGreaterThan(
      2 * hardest('inverted-row-bar', 'trunkFlexion'),
    )
    expect(hardest('chest-supported-row-dumbbells', 'trunkFlexion')).toBe(0)
    expect(hardest('chest-supported-row-machine', 'trunkFlexion')).toBe(0)
  })

  test('the straight-arm pulldown bends no elbow under load, and the pads leave the elbow out', () => {
    // Common practice, no source.
    for (const sex of SEXES) {
      for (const frame of solutionOf('straight-arm-pulldown', sex).frames) {
        expect(asked(frame, 'elbow', referenceLoad('straight-arm-pulldown')), frame.name).toBeLessThanOrEqual(0)
      }
      expect(hardest('padded-pullover-machine', 'elbow', sex)).toBeLessThan(
        0.07 * hardest('padded-pullover-machine', 'shoulderFlexion', sex),
      )
      expect(hardest('padded-fly-machine', 'elbow', sex)).toBeLessThan(
        0.07 * hardest('padded-fly-machine', 'shoulderHorizontal', sex),
      )
      expect(hardest('padded-pullover-machine', 'grip', sex)).toBe(0)
    }
  })

  test.each([
    // Which way each exercise works the elbow and shoulder at its hardest (trade, no source).
    { slug: 'pull-up-overhand', elbow: 1, axis: 'shoulderAbduction', shoulder: -1 },
    { slug: 'chin-up', elbow: 1, axis: 'shoulderFlexion', shoulder: -1 },
    { slug: 'inverted-row-rings', elbow: 1, axis: 'shoulderFlexion', shoulder: -1 },
    { slug: 'inverted-row-bar', elbow: 1, axis: 'shoulderHorizontal', shoulder: -1 },
    { slug: 'seated-cable-row', elbow: 1, axis: 'shoulderFlexion', shoulder: -1 },
    { slug: 'dip-bars', elbow: -1, axis: 'shoulderFlexion', shoulder: 1 },
    { slug: 'push-up', elbow: -1, axis: 'shoulderHorizontal', shoulder: 1 },
    { slug: 'bench-press-dumbbells', elbow: -1, axis: 'shoulderHorizontal', shoulder: 1 },
    { slug: 'overhead-press-barbell', elbow: -1, axis: 'shoulderFlexion', shoulder: 1 },
    { slug: 'handstand-push-up-wall', elbow: -1, axis: 'shoulderFlexion', shoulder: 1 },
    { slug: 'shoulder-press-dumbbells', elbow: -1, axis: 'shoulderAbduction', shoulder: 1 },
    { slug: 'front-lever-tuck', elbow: -1, axis: 'shoulderFlexion', shoulder: -1 },
    { slug: 'tuck-planche-parallettes', elbow: 1, axis: 'shoulderFlexion', shoulder: 1 },
    { slug: 'barbell-curl', elbow: 1, axis: 'shoulderFlexion', shoulder: 1 },
    { slug: 'cable-pushdown', elbow: -1, axis: 'shoulderFlexion', shoulder: -1 },
    { slug: 'lying-triceps-extension', elbow: -1, axis: 'shoulderFlexion', shoulder: -1 },
  ] as const)('$slug works the elbow and the shoulder the right way', ({ slug, elbow, axis, shoulder }) => {
    const { frames } = solutionOf(slug)
    const peak = (of: Axis) =>
      frames
        .map((frame) => asked(frame, of, referenceLoad(slug)))
        .reduce((most, each) => (Math.abs(each) > Math.abs(most) ? each : most))
    expect(Math.sign(peak('elbow'))).toBe(elbow)
    expect(Math.sign(peak(axis))).toBe(shoulder)
  })
})
