import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  MechanicsError,
  SEXES,
  solveExercise,
  type ExerciseMechanics,
  type MechanicsErrorCode,
} from '#shared/mechanics/index'
import { mechanicsArbitrary, trySolve } from '#tests/support/mechanics-arbitrary'
import {
  hang,
  held,
  MECHANICS_CASES,
  oneArmRow,
  pulldown,
  pushUp,
  squat,
  standing,
  wideCableRow,
} from '#tests/support/mechanics-cases'

function refusal(mechanics: ExerciseMechanics): { code: MechanicsErrorCode; field: string } {
  try {
    solveExercise(mechanics, 'male')
  } catch (error) {
    if (error instanceof MechanicsError) {
      expect(error.message).toMatch(/[.]$/)
      return { code: error.code, field: error.field }
    }
    throw error
  }
  throw new Error('The definition was accepted.')
}

const legs = { hip: 0, knee: 0 }

describe('a definition that cannot be is refused with its code and field', () => {
  it('a hand or foot out of reach', () => {
    expect(refusal(standing({ hand: [0.4, 0] }))).toEqual({ code: 'unreachable_endpoint', field: 'frames.0.arms.hand' })
    const [tall, deep] = squat().frames
    expect(refusal(squat({ frames: [tall!, { ...deep!, legs: { ankle: [0, -0.6] } }] }))).toEqual({
      code: 'unreachable_endpoint',
      field: 'frames.1.legs.ankle',
    })
    const row = oneArmRow()
    const frames = row.frames.map((frame) => ({ ...frame, offArm: { hand: [0, 0.001] as [number, number] } }))
    expect(refusal({ ...row, frames })).toEqual({ code: 'unreachable_endpoint', field: 'frames.0.offArm.hand' })
  })

  it('a posture that no lean balances', () => {
    const fallen = held({ trunk: { lean: 0 }, arms: { shoulder: 0, elbow: 0 }, legs: { ankle: [0.4, -0.2] } })
    expect(refusal(squat({ frames: fallen }))).toEqual({ code: 'unbalanceable_posture', field: 'frames.0' })
    expect(refusal(squat({ frames: fallen, balance: undefined }))).toEqual({
      code: 'unbalanceable_posture',
      field: 'frames.0',
    })
  })

  it('two supports at different heights', () => {
    const { balance, ...level } = pushUp()
    expect(balance).toBeDefined()
    expect(refusal({ ...level, rise: 0.3 })).toEqual({ code: 'unbalanceable_posture', field: 'frames.0' })
  })

  it('a support that would have to pull, or that nothing rests on', () => {
    const lifted = pushUp(0, { loads: [{ at: 'shoulders', direction: 'up' }], referenceLoad: 0.9 })
    expect(refusal(lifted)).toEqual({ code: 'unloaded_contact', field: 'frames.0' })
    expect(refusal(hang({ referenceLoad: -1.1 }))).toEqual({ code: 'unloaded_contact', field: 'frames.0' })
    expect(refusal(hang({ referenceLoad: -1 }))).toEqual({ code: 'unloaded_contact', field: 'frames.0' })
    expect(
      refusal(standing({ shoulder: 160, elbow: 0 }, { loads: [{ at: 'hands', direction: 'up' }], referenceLoad: 1.2 }))
        .code,
    ).toBe('unloaded_contact')
  })

  it('too few or too many postures', () => {
    const [frame] = squat().frames
    for (const count of [0, 1, 5]) {
      expect(refusal(squat({ frames: Array(count).fill(frame) }))).toEqual({
        code: 'wrong_frame_count',
        field: 'frames',
      })
    }
  })

  it('a resistance curve of another length', () => {
    const moments: ExerciseMechanics['moments'] = [
      { action: 'kneeExtension', arm: 0.2 },
      { action: 'kneeFlexion', arm: 0.2, curve: [1, 1, 1] },
    ]
    expect(refusal({ ...MECHANICS_CASES.kneeExtension!, moments })).toEqual({
      code: 'wrong_curve_length',
      field: 'moments.1.curve',
    })
  })

  it('no support, three that bear, one twice, or two in one line', () => {
    const supports = (given: ExerciseMechanics['supports']) => refusal({ ...pushUp(), supports: given })
    const wrong = { code: 'unsupported_combination', field: 'supports' }
    expect(supports([])).toEqual(wrong)
    expect(supports(['handsPushing', 'feet', 'knees'])).toEqual(wrong)
    expect(supports(['feet', 'feet'])).toEqual(wrong)
    const [frame] = pushUp().frames
    const upright = held({ ...frame!, trunk: { lean: 0 }, arms: { shoulder: 180, elbow: 0 }, legs })
    const inLine = { ...pushUp(), balance: undefined, armPlane: 'sagittal' as const, frames: upright }
    expect(refusal({ ...inLine, supports: ['handsHanging', 'handsPushing'] })).toEqual(wrong)
  })

  it('something to balance on a seat, or an idle limb beside two working sides', () => {
    expect(refusal(pulldown({ balance: { solve: 'trunk' } }))).toEqual({
      code: 'unsupported_combination',
      field: 'balance',
    })
    const row = oneArmRow()
    expect(refusal({ ...row, sides: 'both' })).toEqual({ code: 'unsupported_combination', field: 'supports.1' })
    expect(refusal({ ...row, sides: 'both', supports: ['feet'] })).toEqual({
      code: 'unsupported_combination',
      field: 'frames.0.offArm',
    })
    expect(refusal(squat({ loads: [{ at: 'offHand', direction: 'down' }] }))).toEqual({
      code: 'unsupported_combination',
      field: 'loads.0.at',
    })
  })

  it('a pulley at the hand', () => {
    const { frames } = wideCableRow()
    const [solved] = solveExercise(
      standing(frames[0]!.arms, { armPlane: 'transverse', balance: undefined, supports: ['seat'] }),
      'male',
    ).frames
    const [grip, shoulder] = [solved!.pose['right.grip'], solved!.pose['right.shoulder']]
    const toward: [number, number] = [grip[0] - shoulder[0], grip[2] - shoulder[2]]
    const loads: ExerciseMechanics['loads'] = [{ at: 'hands', direction: { toward, of: 'shoulder' } }]
    expect(
      refusal(standing(frames[0]!.arms, { armPlane: 'transverse', balance: undefined, supports: ['seat'], loads })),
    ).toEqual({ code: 'bad_number', field: 'loads' })
  })

  it('a search range that leaves the authored angle out or goes round and round', () => {
    for (const range of [
      [10, 40],
      [-40, -5],
      [30, -30],
    ] as [number, number][]) {
      expect(refusal(squat({ balance: { solve: 'trunk', range } }))).toEqual({
        code: 'bad_number',
        field: 'balance.range',
      })
    }
  })
})

/** Every number in a value with its dotted path. */
function numbers(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return [path]
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([key, inner]) => numbers(inner, path === '' ? key : `${path}.${key}`))
}

function replaced<T>(value: T, path: string, by: number): T {
  // Not structuredClone: it keeps two frames that are one object one object.
  const copy = JSON.parse(JSON.stringify(value)) as T
  const keys = path.split('.')
  const last = keys.pop()!
  const parent = keys.reduce<Record<string, unknown>>(
    (inner, key) => inner[key] as Record<string, unknown>,
    copy as Record<string, unknown>,
  )
  parent[last] = by
  return copy
}

describe('numbers', () => {
  it.each(Object.entries(MECHANICS_CASES))(
    'that are not finite are named wherever they stand in %s',
    (_, mechanics) => {
      for (const path of numbers(mechanics)) {
        for (const bad of [NaN, Infinity, -Infinity]) {
          expect(refusal(replaced(mechanics, path, bad))).toEqual({ code: 'bad_number', field: path })
        }
      }
    },
  )

  it('however large never come out as anything but finite', () => {
    for (const mechanics of [hang(), squat(), oneArmRow(), wideCableRow(), MECHANICS_CASES.kneeExtension!, pushUp()]) {
      for (const path of numbers(mechanics)) {
        for (const huge of [1e9, -1.7e308, 5e-324]) {
          const solution = trySolve(replaced(mechanics, path, huge), 'male')
          if (!(solution instanceof MechanicsError)) expectFinite(solution)
        }
      }
    }
  })

  it('of any definition within the format come out finite, or the definition is refused', () => {
    fc.assert(
      fc.property(mechanicsArbitrary, fc.constantFrom(...SEXES), (mechanics, sex) => {
        const solution = trySolve(mechanics, sex)
        if (!(solution instanceof MechanicsError)) expectFinite(solution)
      }),
      { seed: 11, numRuns: 200 },
    )
  })
})

function expectFinite(value: unknown): void {
  const copy = JSON.stringify(value, (_, inner) =>
    typeof inner === 'number' && !Number.isFinite(inner) ? 'not finite' : inner,
  )
  expect(copy).not.toContain('not finite')
}
