import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { SEXES, SEGMENTS, solveExercise, type ExerciseMechanics } from '#shared/mechanics/index'
import { documents } from '#tests/seeds/catalogue'
import { solvable } from '#tests/support/mechanics-arbitrary'
import { curl, MECHANICS_CASES } from '#tests/support/mechanics-cases'
import { rig } from '#tests/support/mujoco'
import { agreement, type Trial } from '#tests/support/mujoco-agreement'
import { linkedBody } from '#tests/support/mujoco-body'

/**
 * Source of truth: MuJoCo 3.14 (@mujoco/mujoco), a general-purpose physics engine. It is given the segments, the joint angles, the
 * weights and the support forces, and says by inverse dynamics which torque each hinge needs to stay still.
 */

/** The same athletes and loads on every run: one for each sex, drawn anew for each exercise. */
function trials(seed: string): Trial[] {
  const drawn = fc.sample(
    fc.record({
      mass: fc.integer({ min: 42, max: 140 }),
      stature: fc.integer({ min: 145, max: 205 }),
      load: fc.integer({ min: -20, max: 180 }),
    }),
    {
      seed: [...seed].reduce((sum, letter) => (sum * 31 + letter.charCodeAt(0)) % 2147483647, 7),
      numRuns: SEXES.length,
    },
  )
  return SEXES.map((sex, index) => ({ sex, ...drawn[index]!, stature: drawn[index]!.stature / 100 }))
}

function expectAgreement(name: string, mechanics: ExerciseMechanics): Set<string> {
  const untold = new Set<string>()
  for (const trial of trials(name)) {
    const found = agreement(mechanics, solveExercise(mechanics, trial.sex), trial)
    expect(found.misses, `${name}, ${JSON.stringify(trial)}`).toEqual([])
    // Every frame compares its joint places, and every joint that statics can tell.
    expect(found.compared).toBeGreaterThan(30 * mechanics.frames.length)
    found.untold.forEach((each) => untold.add(each))
  }
  return untold
}

describe('MuJoCo itself', () => {
  const mechanics = curl()
  const solved = solveExercise(mechanics, 'male').frames[0]!
  const parts = linkedBody(mechanics, mechanics.frames[0]!, solved, SEGMENTS.male, { mass: 80, stature: 1.8 })
  const lean = (solved.angles.trunkLean * Math.PI) / 180

  it('weighs the whole body, and needs just that to hold it', () => {
    const body = rig(parts, { lean, gravity: 10, stature: 1.8 })
    expect(body.hold([]).missing.force[2]).toBeCloseTo(800, 9)
    body.close()
  })

  it('bends an elbow against a weight in the hand by weight × lever', () => {
    const body = rig(parts, { lean, gravity: 10, stature: 1.8 })
    const grip = solved.pose['right.grip']
    const elbow = solved.pose['right.elbow']
    const at = grip.map((value, i) => value - solved.pose.pelvis[i]!) as [number, number, number]
    const weight = { part: 'right.hand', at, force: [0, 0, -100] as const }
    const more = body.hold([weight]).torque('right.elbow') - body.hold([]).torque('right.elbow')
    expect(more).toBeCloseTo(100 * (grip[0] - elbow[0]) * 1.8, 9)
    body.close()
  })

  it('notices a moment that is off by a thousandth, a shifted joint and a lighter support', () => {
    const [trial] = trials('off')
    const solution = solveExercise(mechanics, trial!.sex)
    const [frame, ...others] = solution.frames
    const changed = (change: Partial<typeof frame>) =>
      agreement(mechanics, { frames: [{ ...frame!, ...change }, ...others] }, trial!).misses
    expect(changed({})).toEqual([])
    const terms = frame!.terms.map((term) => (term.axis === 'elbow' ? { ...term, b: term.b * 1.001 } : term))
    expect(changed({ terms })).toHaveLength(1)
    expect(changed({ terms: frame!.terms.filter((term) => term.axis !== 'hipFlexion') })).toHaveLength(1)
    const pose = { ...frame!.pose, 'right.knee': [9, 9, 9] as const }
    expect(changed({ pose }).length).toBeGreaterThan(0)
    const reactions = frame!.reactions.map((reaction) => ({ ...reaction, a: reaction.a * 1.001 }))
    expect(changed({ reactions })).toHaveLength(1)
  })
})

describe('joint moments agree with MuJoCo for plain postures', () => {
  it.each(Object.entries(MECHANICS_CASES))('%s', (name, mechanics) => {
    expectAgreement(name, mechanics)
  })

  it('says nothing of exactly the joints that pads hold from both sides', () => {
    const trunk = ['middle trunkFlexion', 'middle trunkLateral', 'middle trunkRotation', 'middle lumbarAxial']
    const hips = ['working hipFlexion', 'working hipAbduction']
    const untold = (name: string) => [...expectAgreement(name, MECHANICS_CASES[name]!)].sort()
    expect(untold('kneeExtension')).toEqual([...trunk, 'middle neck', ...hips].sort())
    expect(untold('benchPress')).toEqual([...trunk, 'middle neck', ...hips, 'working knee', 'working ankle'].sort())
    expect(untold('pulldown')).toEqual([...hips].sort())
    expect(untold('proneLegCurl')).toEqual([...trunk, ...hips].sort())
    expect(untold('backExtension')).toEqual(['working knee'])
    expect(untold('legPress')).toEqual([...trunk, 'middle neck'].sort())
    for (const held of ['squat', 'pullUp', 'pushUp', 'hipThrust', 'oneArmRow', 'wideCableRow'])
      expect(untold(held)).toEqual([])
  })
})

describe('joint moments agree with MuJoCo for any definition that can be held', () => {
  it.each(SEXES)('%s', (sex) => {
    const trial = fc.record({
      mass: fc.integer({ min: 40, max: 150 }),
      stature: fc.integer({ min: 140, max: 210 }).map((centimetres) => centimetres / 100),
      load: fc.integer({ min: -60, max: 200 }),
    })
    fc.assert(
      fc.property(solvable(sex), trial, ({ mechanics, solution }, drawn) => {
        expect(agreement(mechanics, solution, { sex, ...drawn }, 'sizes').misses).toEqual([])
      }),
      { seed: 20240611, numRuns: 40 },
    )
  })
})

describe('joint moments agree with MuJoCo for the catalogue', () => {
  it('has exercises', () => {
    expect(documents.size).toBeGreaterThan(0)
  })

  it.each([...documents.values()].map(({ slug, mechanics }) => [slug, mechanics] as const))('%s', (slug, mechanics) => {
    expectAgreement(slug, mechanics)
  })
})
