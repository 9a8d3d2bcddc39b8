import { describe, expect, it } from 'vitest'
import type { SegmentRef } from '#shared/mechanics/bodies'
import { cutWrench, wrench } from '#shared/mechanics/equilibrium'
import { SEGMENTS, type Axis, type Sex, type Vector } from '#shared/mechanics/index'
import type { Force } from '#shared/mechanics/loads'
import { solutionOf } from '#tests/seeds/catalogue'

/**
 * Published values. Certainty beside each: F read in the source or its abstract, M from memory (h high, m medium, l low),
 * D derived here. Tolerances are the source's own spread where it gives one.
 */

describe('segments are plausible beside the older tables (never mixed with them)', () => {
  // Dempster/Winter masses (F) as whole limbs, where the tables' different joints matter least; plausibility only.
  it('arms weigh about a twentieth of the body each', () => {
    for (const sex of ['male', 'female'] as const) {
      const { upperArm, forearm, hand } = SEGMENTS[sex]
      const winter = 0.028 + 0.016 + 0.006
      expect(Math.abs(upperArm.mass + forearm.mass + hand.mass - winter) / winter).toBeLessThan(0.12)
    }
  })

  it('head, arms and trunk weigh three fifths to two thirds', () => {
    // Dempster/Winter .678 (F). de Leva counts the buttocks' fold to the thigh, which moves about 4 % of the body down each side.
    const { head, upperTrunk, pelvis, upperArm, forearm, hand } = SEGMENTS.male
    const upper = head.mass + upperTrunk.mass + pelvis.mass + 2 * (upperArm.mass + forearm.mass + hand.mass)
    expect(upper).toBeGreaterThan(0.678 - 0.08)
    expect(upper).toBeLessThan(0.678)
  })

  // Drillis & Contini lengths ÷ stature (M-h).
  it.each([
    ['arm to the wrist', 0.186 + 0.146, (sex: Sex) => SEGMENTS[sex].upperArm.length + SEGMENTS[sex].forearm.length],
    ['leg to the ankle', 0.245 + 0.246, (sex: Sex) => SEGMENTS[sex].thigh.length + SEGMENTS[sex].shank.length],
    ['hip to shoulder', 0.288, (sex: Sex) => SEGMENTS[sex].pelvis.length + SEGMENTS[sex].upperTrunk.length],
  ] as const)('%s is near the older table', (_, older, ours) => {
    for (const sex of ['male', 'female'] as const) expect(Math.abs(ours(sex) - older) / older).toBeLessThan(0.08)
  })
})

describe('body weight on the hands', () => {
  const onHands = (slug: string, sex: Sex, frame: string) =>
    100 *
    solutionOf(slug, sex)
      .frames.find(({ name }) => name === frame)!
      .reactions.filter(({ support }) => support === 'handsPushing')
      .reduce((sum, { a }) => sum + a, 0)

  // Mier 2014, Int J Exerc Sci 7(2) (F): mean ± SD, static; 1.5 SD asked.
  it.each([
    ['push-up', 'male', 'arms straight', 67.0, 3.8],
    ['push-up', 'female', 'arms straight', 65.1, 3.1],
    ['push-up', 'male', 'chest down', 74.6, 3.6],
    ['push-up', 'female', 'chest down', 70.3, 3.1],
    ['knee-push-up', 'male', 'arms straight', 52.5, 3.7],
    ['knee-push-up', 'female', 'arms straight', 51.5, 3.1],
    ['knee-push-up', 'male', 'chest down', 60.1, 4.5],
    ['knee-push-up', 'female', 'chest down', 56.6, 2.7],
  ] as const)('%s, %s, %s: %d ± %d %%', (slug, sex, frame, mean, spread) => {
    expect(Math.abs(onHands(slug, sex, frame) - mean)).toBeLessThanOrEqual(1.5 * spread)
  })

  // Suprak 2011, J Strength Cond Res 25:497 (M-h) and Gouvali & Boudolos 2005, J Strength Cond Res 19:146 (F): no spread
  // at hand, so 5 points, about Mier's 1.5 SD.
  it.each([
    ['push-up', 'arms straight', [69.16, 66.4]],
    ['push-up', 'chest down', [75.04]],
    ['knee-push-up', 'arms straight', [53.56, 52.9]],
    ['knee-push-up', 'chest down', [61.8]],
  ] as const)('%s, %s, lies near two more measurements', (slug, frame, measured) => {
    for (const mean of measured) expect(Math.abs(onHands(slug, 'male', frame) - mean)).toBeLessThan(5)
  })

  it('is more with the chest down than with arms straight, and less on the knees (all four sources)', () => {
    for (const sex of ['male', 'female'] as const) {
      for (const slug of ['push-up', 'knee-push-up']) {
        expect(onHands(slug, sex, 'chest down')).toBeGreaterThan(onHands(slug, sex, 'arms straight'))
      }
      expect(onHands('knee-push-up', sex, 'chest down')).toBeLessThan(onHands('push-up', sex, 'arms straight'))
    }
  })
})

describe('worked statics', () => {
  const radians = (angle: number) => (angle * Math.PI) / 180
  const down = (segment: SegmentRef['name'], at: Vector, newtons: number): Force => ({
    segment: { name: segment, limb: segment === 'upperTrunk' ? undefined : 0 },
    at,
    force: [0, 0, -newtons],
  })

  // Open college physics text (M-h, recomputed): forearm 2.50 kg at 16 cm, book 4.00 kg at 38 cm, biceps at 4.0 cm; g = 9.80.
  it('a book in the hand: biceps 470 N, elbow 407 N', () => {
    const g = 9.8
    const forces = [down('forearm', [0.16, 0, 0], 2.5 * g), down('hand', [0.38, 0, 0], 4 * g)]
    const upperArm: SegmentRef = { name: 'upperArm', limb: 0 }
    const elbow = cutWrench(forces, [upperArm], { name: 'elbow', limb: 0, at: [0, 0, 0] })!
    const biceps = elbow.moment[1] / 0.04
    expect(biceps).toBeCloseTo(470, -1)
    expect(Math.round(biceps)).toBe(470)
    expect(Math.round(biceps + elbow.force[2])).toBe(407)
  })

  /** Force of a muscle that meets the spine at two thirds of its length under 12°, in N. */
  const spine = (lean: number, middle: number, end: number) => {
    const along: Vector = [Math.sin(radians(lean)), 0, Math.cos(radians(lean))]
    const at = (share: number): Vector => [along[0] * share, 0, along[2] * share]
    const { moment } = wrench([down('upperTrunk', at(0.5), middle), down('upperTrunk', at(1), end)], [0, 0, 0])
    return moment[1] / ((2 / 3) * Math.sin(radians(12)))
  }

  // Davidovits, Physics in Biology and Medicine §1.8 (F).
  it('a trunk at 60° from the vertical, 320 N at the middle, 160 N at the end: muscle 2000 N', () => {
    expect(Math.round(spine(60, 320, 160) / 10) * 10).toBe(2000)
  })

  // The same model for a level spine (F).
  it('a level spine, 350 N at the middle, 200 N at the end: muscle 2.71 kN, 2.65 kN of it along the spine', () => {
    const muscle = spine(90, 350, 200)
    expect((muscle / 1000).toFixed(2)).toBe('2.71')
    expect(((muscle * Math.cos(radians(12))) / 1000).toFixed(2)).toBe('2.65')
  })

  // Upper body 55 kg at 35 cm, box 30 kg at 50 cm, back muscle arm 8 cm (M-h, recomputed); g = 9.80.
  it('a box lifted with the back: 4.20 kN in its muscles', () => {
    const g = 9.8
    const { moment } = wrench(
      [down('upperTrunk', [0.35, 0, 0], 55 * g), down('upperTrunk', [0.5, 0, 0], 30 * g)],
      [0, 0, 0],
    )
    expect((moment[1] / 0.08 / 1000).toFixed(2)).toBe('4.20')
  })
})

/** Sample man of the segment table (de Leva, M-h): 73.0 kg, 1.741 m. */
const MAN = { mass: 73, stature: 1.741, g: 9.80665 }

/** N·m at an axis per frame of a catalogue exercise, for the sample man and a load in kg. */
const moments = (slug: string, axis: Axis, load: number): number[] =>
  solutionOf(slug).frames.map(({ terms }) => {
    const term = terms.find((each) => each.axis === axis && each.role !== 'idle')
    return term ? MAN.g * MAN.stature * (MAN.mass * term.a + load * term.b) : 0
  })

/** Largest compression at L5/S1 in N: the back muscles' pull by the 5 cm convention (F), and what presses along the spine. */
const compression = (slug: string, load: number): number =>
  Math.max(
    ...solutionOf(slug).frames.map(({ terms }, index) => {
      const axial = terms.find(({ axis }) => axis === 'lumbarAxial')!
      const muscles = Math.abs(moments(slug, 'trunkFlexion', load)[index]!) / 0.05
      return muscles - MAN.g * (MAN.mass * axial.a + load * axial.b)
    }),
  )
const largest = (values: readonly number[]) => Math.max(...values.map(Math.abs))

describe('which loads what more', () => {
  // Donkers 1993 (F): elbow moment per arm 10.0 N·m with hands apart, 23.0 N·m together.
  it('push-ups: hands together ask more of the elbow than hands apart, at every depth', () => {
    const [apart, together] = [moments('push-up', 'elbow', 0), moments('push-up-hands-together', 'elbow', 0)]
    together.forEach((moment, index) => expect(-moment).toBeGreaterThan(-apart[index]! + 5))
  })

  // Fenwick 2009 (F).
  it('rows: bent over loads the lumbar spine more than inverted under a bar', () => {
    for (const load of [0, 40])
      expect(compression('bent-over-row-barbell', load)).toBeGreaterThan(compression('inverted-row-bar', 0))
  })

  // PMC3878967 (F): deadlift at 25 and 50 % of body weight, hip and L4/5.
  it('deadlifts: half of body weight loads hip and back more than a quarter', () => {
    for (const axis of ['hipFlexion', 'trunkFlexion'] as const) {
      const at = (share: number) => moments('barbell-deadlift', axis, share * MAN.mass)
      expect(largest(at(0.5))).toBeGreaterThan(largest(at(0.25)))
    }
  })

  // Wretenberg 1996 (F).
  it('squats: a low bar asks more of the hip and less of the knee than a high one', () => {
    const deepest = (slug: string, axis: Axis) => largest(moments(slug, axis, 80))
    expect(deepest('low-bar-back-squat', 'hipFlexion')).toBeGreaterThan(deepest('barbell-back-squat', 'hipFlexion'))
    expect(deepest('low-bar-back-squat', 'knee')).toBeLessThan(deepest('barbell-back-squat', 'knee'))
  })

  // Cappozzo 1985 (F): trunk lean dominates lumbar compression.
  it('squats: lumbar compression rises with the trunk’s lean, not with the knee’s bend', () => {
    const squats = ['barbell-front-squat', 'barbell-back-squat', 'low-bar-back-squat'].map((slug) => {
      const { angles } = solutionOf(slug).frames.at(-1)!
      return { lean: angles.trunkLean, knee: angles.knee, compression: compression(slug, 80) }
    })
    const byLean = [...squats].sort((one, other) => one.lean - other.lean)
    byLean.slice(1).forEach((each, index) => expect(each.compression).toBeGreaterThan(byLean[index]!.compression))
    const byKnee = [...squats].sort((one, other) => one.knee - other.knee)
    expect(byKnee[0]!.compression).toBeGreaterThan(byKnee.at(-1)!.compression)
  })
})
