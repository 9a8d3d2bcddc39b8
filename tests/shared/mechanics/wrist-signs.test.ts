import { describe, expect, it } from 'vitest'
import type { Arm, ExerciseMechanics, Grip } from '#shared/mechanics/index'
import { axisOfAction, solveExercise, type Action } from '#shared/mechanics/index'
import { handstand, standing } from '#tests/support/mechanics-cases'

/** What the wrist must do to keep a weight from turning the hand, with the weight hung from a hand that points along `arms`. */
function wristAction(armPlane: ExerciseMechanics['armPlane'], grip: Grip, arms: Arm): Action | undefined {
  const [frame] = solveExercise(standing(arms, { armPlane, grip }), 'male').frames
  const term = frame!.terms.find(({ axis, role }) => axis.startsWith('wrist') && role === 'working')
  return (['wristFlexion', 'wristExtension', 'wristRadialDeviation', 'wristUlnarDeviation'] as const).find((action) => {
    const { axis, sign } = axisOfAction(action)
    return term?.axis === axis && Math.sign(term.b) === sign
  })
}

// Common practice and anatomy, no source: overhand thumbs point at each other, underhand thumbs away, neutral palms at each other.
describe('which way a weight bends the wrist', () => {
  const forward: Arm = { shoulder: 0, elbow: 90 }
  it.each([
    ['underhand', 'wristFlexion'],
    ['overhand', 'wristExtension'],
    ['neutral', 'wristRadialDeviation'],
  ] as const)('a forearm held out in front, %s, asks %s', (grip, action) => {
    expect(wristAction('sagittal', grip, forward)).toBe(action)
  })

  // The hand hangs from the elbow, a little out to the side: the weight would pull it back down to the hip.
  const low: Arm = { shoulder: 40, elbow: 0 }
  it.each([
    ['neutral', 'wristExtension'],
    ['overhand', 'wristUlnarDeviation'],
    ['underhand', 'wristRadialDeviation'],
  ] as const)('an arm low at the side, %s, asks %s', (grip, action) => {
    expect(wristAction('frontal', grip, low)).toBe(action)
  })

  // The same wide arm overhead: the weight would pull the hand out and down, away from the head, where the little finger points.
  const overhead: Arm = { shoulder: 150, elbow: 0 }
  it.each([
    ['neutral', 'wristFlexion'],
    ['overhand', 'wristRadialDeviation'],
    ['underhand', 'wristUlnarDeviation'],
  ] as const)('wide arms overhead, %s, ask %s', (grip, action) => {
    // Sideways over the head a weight turns the hand outward: away from the thumb of an overhand grip.
    expect(wristAction('frontal', grip, overhead)).toBe(action)
  })

  it('a raise that ends just above the shoulder keeps the palm it began with', () => {
    for (const shoulder of [60, 89, 100]) {
      expect(wristAction('frontal', 'neutral', { shoulder, elbow: 0 })).toBe('wristExtension')
    }
  })

  it('a bent wrist turns to the same anatomical side wherever the hand is placed', () => {
    const bent = (wrist: number) =>
      solveExercise(standing({ hand: [0.08, 0.25], from: 'world', wrist }, { armPlane: 'frontal' }), 'male').frames[0]!
    for (const wrist of [-20, 20]) {
      const { pose, angles } = bent(wrist)
      const line = (from: keyof typeof pose, to: keyof typeof pose) => pose[to][1] - pose[from][1]
      const forearm =
        line('right.elbow', 'right.wrist') /
        Math.hypot(...pose['right.wrist'].map((v, i) => v - pose['right.elbow'][i]!))
      const hand =
        line('right.wrist', 'right.fingers') /
        Math.hypot(...pose['right.fingers'].map((v, i) => v - pose['right.wrist'][i]!))
      // Overhand overhead, the thumb points inward (+y for the right hand): radial deviation tilts the hand there.
      expect(Math.sign(hand - forearm)).toBe(Math.sign(wrist))
      expect(angles.wrist).toBe(wrist)
    }
  })
})

describe('frontal arms placed in world axes', () => {
  it('are overhead upside down as well: a handstand counts its shoulders near 180 degrees', () => {
    const upsideDown = solveExercise(handstand(), 'male').frames[0]!
    expect(upsideDown.angles.shoulder).toBeGreaterThan(150)
  })

  it('ask the same of the shoulder as the same arms given in the trunk', () => {
    // Hung upside down by the seat, so that nothing has to balance.
    const shoulder = (arms: Arm) => {
      const change = { supports: ['seat' as const], balance: undefined, loads: [], armPlane: 'frontal' as const }
      const frame = { trunk: { lean: 180 }, arms, legs: { hip: 0, knee: 0 } }
      const frames = [
        { name: 'first', ...frame },
        { name: 'second', ...frame },
      ]
      const [solved] = solveExercise(handstand({ ...change, frames }), 'male').frames
      return { angle: solved!.angles.shoulder, a: solved!.terms.find(({ axis }) => axis === 'shoulderAbduction')!.a }
    }
    const world = shoulder({ hand: [0.1, -0.2], from: 'world' })
    const trunk = shoulder({ hand: [-0.2, 0.1], from: 'trunk' })
    expect(world.angle).toBeCloseTo(trunk.angle, 9)
    expect(world.a).toBeCloseTo(trunk.a, 9)
    expect(Math.abs(world.a)).toBeGreaterThan(1e-4)
  })
})
