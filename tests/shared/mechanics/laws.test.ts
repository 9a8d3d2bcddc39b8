import fc from 'fast-check'
import { describe, expect, it, vi } from 'vitest'
import { solveBalance } from '#shared/mechanics/balance'
import { ALL_SEGMENTS, isDistal, type CutName } from '#shared/mechanics/bodies'
import { cutWrench, reactions, wrench } from '#shared/mechanics/equilibrium'
import {
  SEGMENTS,
  solveExercise,
  type ExerciseMechanics,
  type ExerciseSolution,
  type Frame,
  type Term,
  type Vector,
} from '#shared/mechanics/index'
import { solvable, trySolve } from '#tests/support/mechanics-arbitrary'
import { hang, pulldown } from '#tests/support/mechanics-cases'

// Most drawn definitions cannot be held, and are thrown away after solving them.
vi.setConfig({ testTimeout: 60_000 })
const RUNS = { seed: 4711, numRuns: 40 }
const solved = solvable('male')

/** Terms by axis and role, of all frames. */
function terms(solution: ExerciseSolution): Map<string, Term> {
  return new Map(
    solution.frames.flatMap((frame, index) =>
      frame.terms.map((term) => [`${index} ${term.axis} ${term.role}`, term] as const),
    ),
  )
}

function expectTerms(actual: ExerciseSolution, wanted: ExerciseSolution, a: number, b: number): void {
  const [mine, theirs] = [terms(actual), terms(wanted)]
  for (const key of new Set([...mine.keys(), ...theirs.keys()])) {
    expect(mine.get(key)?.a ?? 0, `${key}: a`).toBeCloseTo(a * (theirs.get(key)?.a ?? 0), 9)
    expect(mine.get(key)?.b ?? 0, `${key}: b`).toBeCloseTo(b * (theirs.get(key)?.b ?? 0), 9)
  }
}

describe('loads', () => {
  it('act in proportion: twice the ratio asks twice of every joint and leaves gravity as it is', () => {
    fc.assert(
      fc.property(solved, fc.constantFrom(0.5, 2, 3), ({ mechanics, solution }, factor) => {
        // Grip is left out: how far a hand is opened is judged once, at the reference load.
        const scaled: ExerciseMechanics = {
          ...mechanics,
          loads: mechanics.loads.map((load) => ({ ...load, ratio: (load.ratio ?? 1) * factor })),
          moments: mechanics.moments?.map((moment) => ({ ...moment, ratio: (moment.ratio ?? 1) * factor })) ?? [],
          referenceLoad: mechanics.referenceLoad / factor,
          gripFree: true,
        }
        expectTerms(solveExercise(scaled, 'male'), solveExercise({ ...mechanics, gripFree: true }, 'male'), 1, factor)
        expect(solution.frames).toHaveLength(mechanics.frames.length)
      }),
      RUNS,
    )
  })

  it('add up: two loads ask of every joint what each asks alone', () => {
    // A load on the feet lifts the thighs off the seat, so that its presence changes what the seat holds.
    const pads = solved.filter(
      ({ mechanics }) =>
        mechanics.balance === undefined &&
        mechanics.loads.length === 2 &&
        mechanics.loads.every(({ at }) => at !== 'feet'),
    )
    fc.assert(
      fc.property(pads, ({ mechanics }) => {
        const only = (loads: ExerciseMechanics['loads']) =>
          terms(solveExercise({ ...mechanics, loads, moments: [], gripFree: true }, 'male'))
        const [both, first, second] = [
          only(mechanics.loads),
          only(mechanics.loads.slice(0, 1)),
          only(mechanics.loads.slice(1)),
        ]
        for (const key of both.keys()) {
          expect(both.get(key)!.b).toBeCloseTo((first.get(key)?.b ?? 0) + (second.get(key)?.b ?? 0), 9)
          expect(both.get(key)!.a).toBeCloseTo(first.get(key)?.a ?? 0, 9)
        }
      }),
      { ...RUNS, numRuns: 25 },
    )
  })
})

describe('supports', () => {
  const standing = solved.filter(({ solution }) => solution.frames[0]!.reactions.length > 0)

  it('carry the whole weight, and of the load what it presses down', () => {
    fc.assert(
      fc.property(standing, ({ mechanics, solution }) => {
        for (const [index, frame] of solution.frames.entries()) {
          const { load } = solveBalance(mechanics, mechanics.frames[index]!, SEGMENTS.male, '')
          const down = -wrench(load, [0, 0, 0]).force[2]
          expect(frame.reactions.reduce((sum, { a }) => sum + a, 0)).toBeCloseTo(1, 12)
          expect(frame.reactions.reduce((sum, { b }) => sum + b, 0)).toBeCloseTo(down, 9)
        }
      }),
      RUNS,
    )
  })

  it('leave every joint the same from either side of its cut', () => {
    const cuts: { name: CutName; limb?: 0 | 1 }[] = [
      { name: 'lumbar' },
      { name: 'neck' },
      ...(['wrist', 'elbow', 'shoulder', 'hip', 'knee', 'ankle'] as const).flatMap((name) =>
        ([0, 1] as const).map((limb) => ({ name, limb })),
      ),
    ]
    fc.assert(
      fc.property(standing, ({ mechanics }) => {
        for (const frame of mechanics.frames) {
          const { groups, body, load } = solveBalance(mechanics, frame, SEGMENTS.male, '')
          for (const applied of [body, load]) {
            const whole = [...applied, ...reactions(groups, applied).flat()]
            for (const cut of cuts) {
              const at: Vector = [0.1, 0.2, 0.3]
              const beyond = ALL_SEGMENTS.filter((segment) => isDistal(segment, cut.name, cut.limb))
              const near = cutWrench(whole, [], { ...cut, at })!
              // As if a pad held the far side: the joint is then asked from the near one.
              const far = cutWrench(whole, beyond, { ...cut, at })!
              near.force.forEach((value, i) => expect(value).toBeCloseTo(far.force[i]!, 9))
              near.moment.forEach((value, i) => expect(value).toBeCloseTo(far.moment[i]!, 9))
            }
          }
        }
      }),
      RUNS,
    )
  })
})

describe('left and right', () => {
  const name = { left: 'right', right: 'left' } as const

  it('are mirror images when both sides work', () => {
    const both = solved.filter(({ mechanics }) => mechanics.sides === 'both')
    fc.assert(
      fc.property(both, ({ solution }) => {
        for (const { pose } of solution.frames) {
          for (const [point, [x, y, z]] of Object.entries(pose)) {
            const [side, joint] = point.split('.') as ['left' | 'right', string]
            const twin = joint === undefined ? point : `${name[side]}.${joint}`
            const [tx, ty, tz] = pose[twin as keyof typeof pose]
            expect([x, y, z]).toEqual([tx, expect.closeTo(-ty, 12), tz])
          }
        }
      }),
      RUNS,
    )
  })

  it('are asked the same when the idle side does what the working side does', () => {
    // Pads hold the trunk, so that the two sides meet only there; the load is held in both hands.
    const twoHanded = solved.filter(
      ({ mechanics }) => mechanics.supports.includes('seat') || mechanics.supports.includes('chestPad'),
    )
    fc.assert(
      fc.property(twoHanded, fc.constantFrom('flexed', 'reversed', 'across'), ({ mechanics }, elbowSide) => {
        const frames = mechanics.frames.map((frame): Frame => {
          const arms = { ...frame.arms, elbowSide: elbowSide as 'flexed' }
          return { ...frame, arms, offArm: arms, offLeg: frame.legs }
        })
        const held = (at: 'hands' | 'offHand') => ({ at, direction: { angle: 250 } })
        const solution = trySolve(
          {
            ...mechanics,
            sides: 'oneAtATime',
            frames,
            loads: [held('hands'), held('offHand')],
            moments: [],
            balance: undefined,
          },
          'male',
        )
        fc.pre('frames' in solution)
        for (const frame of solution.frames) {
          const of = (role: Term['role']) => frame.terms.filter((term) => term.role === role)
          expect(of('working').length).toBeGreaterThan(4)
          expect(of('idle').map(({ axis }) => axis)).toEqual(of('working').map(({ axis }) => axis))
          of('idle').forEach((term, i) => {
            expect(term.a, term.axis).toBeCloseTo(of('working')[i]!.a, 12)
            expect(term.b, term.axis).toBeCloseTo(of('working')[i]!.b, 12)
          })
        }
      }),
      RUNS,
    )
  })
})

describe('twins', () => {
  // A pulldown at body weight is the pull-up seen from the bar: same hand force, same arms, same lean.
  it('the arms of a pull-up and of a pulldown at the same hand force are asked the same', () => {
    const pullUp = solveExercise(hang(), 'male')
    const frames = pulldown().frames.map((frame, index) => ({
      ...frame,
      trunk: { lean: pullUp.frames[index]!.angles.trunkLean },
    }))
    const seated = solveExercise(pulldown({ frames }), 'male')
    pullUp.frames.forEach((frame, index) => {
      const arm = frame.terms.filter(
        ({ axis, role }) => role === 'working' && /^(grip|wrist|elbow|shoulder|scapula|hand)/.test(axis),
      )
      expect(arm.length).toBeGreaterThanOrEqual(6)
      for (const term of arm) {
        const twin = seated.frames[index]!.terms.find(({ axis, role }) => axis === term.axis && role === 'working')!
        // The pulldown's load is the body's mass.
        expect(twin.a + twin.b, term.axis).toBeCloseTo(term.a, 9)
      }
    })
  })
})
