import { describe, expect, it } from 'vitest'
import { axisOfAction, solveExercise, type Action, type ExerciseMechanics, type Role } from '#shared/mechanics/index'
import {
  benchPress,
  calfRaise,
  curl,
  dip,
  handstand,
  hang,
  held,
  hipThrust,
  MECHANICS_CASES,
  oneArmRow,
  oneLegSquat,
  plank,
  pulldown,
  pushUp,
  squat,
  standing,
  wideCableRow,
} from '#tests/support/mechanics-cases'

/** What is asked of an action in a frame at a load of `load` × body mass: N·m per m·g·H, positive when that action works. */
function asked(mechanics: ExerciseMechanics, action: Action, load: number, frame = 0, role?: Role): number {
  const { axis, sign } = axisOfAction(action)
  const middle = axis === 'neck' || axis.startsWith('trunk')
  const terms = solveExercise(mechanics, 'male').frames[frame]!.terms
  const term = terms.find((each) => each.axis === axis && each.role === (role ?? (middle ? 'middle' : 'working')))
  return term ? sign * (term.a + load * term.b) : 0
}
const WORK = 1e-3

// Anatomy and common practice, no source.
describe('the muscles that work are those that do', () => {
  it('a curl asks the elbow to bend, whichever way the palm looks', () => {
    for (const grip of ['underhand', 'overhand', 'neutral'] as const) {
      expect(asked(curl(grip), 'elbowFlexion', 0.2)).toBeGreaterThan(WORK)
      expect(asked(curl(grip), 'shoulderFlexion', 0.2)).toBeGreaterThan(WORK)
    }
  })

  it('a dip asks the elbow to straighten and the shoulder to flex, deep more than straight', () => {
    expect(asked(dip(), 'elbowExtension', 0, 1)).toBeGreaterThan(WORK)
    expect(asked(dip(), 'shoulderFlexion', 0, 1)).toBeGreaterThan(WORK)
    expect(asked(dip(), 'elbowExtension', 0, 1)).toBeGreaterThan(Math.abs(asked(dip(), 'elbowExtension', 0, 0)))
    // The body hangs from the girdle between the arms: it would be pushed up to the ears.
    expect(asked(dip(), 'scapularDepression', 0)).toBeGreaterThan(0.3)
  })

  it('a squat asks hips and knees to straighten and the back to hold, the calves to push', () => {
    for (const action of ['hipExtension', 'kneeExtension', 'trunkExtension', 'anklePlantarflexion'] as const) {
      expect(asked(squat(), action, 0.8, 1), action).toBeGreaterThan(WORK)
    }
    expect(asked(squat(), 'kneeExtension', 0.8, 1)).toBeGreaterThan(asked(squat(), 'kneeExtension', 0.8, 0))
  })

  it('a calf raise asks the ankle to point', () => {
    expect(asked(calfRaise(), 'anklePlantarflexion', 0.2, 1)).toBeGreaterThan(0.02)
    expect(asked(calfRaise(), 'anklePlantarflexion', 0.2, 1)).toBeGreaterThan(
      asked(calfRaise(), 'anklePlantarflexion', 0.2, 0),
    )
  })

  it('standing on one leg asks the hip on that side to hold the pelvis level', () => {
    expect(asked(oneLegSquat(), 'hipAbduction', 0)).toBeGreaterThan(0.02)
  })

  it('hanging asks the shoulder blades down and the grip to close', () => {
    expect(asked(hang(), 'scapularDepression', 0)).toBeGreaterThan(0.4)
    expect(asked(hang(), 'grip', 0)).toBeGreaterThan(0.45)
    expect(asked(pulldown(), 'scapularDepression', 1)).toBeGreaterThan(0.4)
  })

  it('a pull-up asks the elbow to bend and the arms down to the side', () => {
    expect(asked(hang(), 'elbowFlexion', 0, 1)).toBeGreaterThan(WORK)
    expect(asked(hang(), 'shoulderAdduction', 0, 1)).toBeGreaterThan(WORK)
    const narrow = hang({ armPlane: 'sagittal', grip: 'underhand' })
    expect(asked(narrow, 'elbowFlexion', 0, 1)).toBeGreaterThan(WORK)
    expect(asked(narrow, 'shoulderExtension', 0, 1)).toBeGreaterThan(WORK)
  })

  it('weights hung from the hands ask the shoulder blades up', () => {
    expect(asked(standing({ shoulder: 0, elbow: 0 }), 'scapularElevation', 0.5)).toBeGreaterThan(0.2)
  })

  it('a bench press asks the arms across the chest, the elbows straight and the shoulder blades forward', () => {
    expect(asked(benchPress(), 'shoulderHorizontalAdduction', 0.8)).toBeGreaterThan(WORK)
    expect(asked(benchPress(), 'elbowExtension', 0.8, 1)).toBeGreaterThan(WORK)
    expect(asked(benchPress(), 'scapularProtraction', 0.8)).toBeGreaterThan(0.3)
    // A push-up is the same turned over.
    expect(asked(pushUp(0.08), 'shoulderHorizontalAdduction', 0, 1)).toBeGreaterThan(WORK)
    expect(asked(pushUp(0.08), 'scapularProtraction', 0)).toBeGreaterThan(0.2)
  })

  it('rows ask the shoulder blades back and the elbow to bend', () => {
    expect(asked(wideCableRow(), 'scapularRetraction', 0.3)).toBeGreaterThan(0.05)
    expect(asked(wideCableRow(), 'shoulderHorizontalAbduction', 0.3)).toBeGreaterThan(WORK)
    expect(asked(oneArmRow(), 'scapularRetraction', 0.3)).toBeGreaterThan(0.1)
    // Propped on a hand, the trunk is a beam between two supports: it would sag, and its front holds it.
    expect(asked(oneArmRow(), 'trunkFlexion', 0.3)).toBeGreaterThan(WORK)
  })

  it('raises ask the arm away from the side, or up in front', () => {
    expect(
      asked(standing({ shoulder: 80, elbow: 5 }, { armPlane: 'frontal' }), 'shoulderAbduction', 0.1),
    ).toBeGreaterThan(WORK)
    expect(asked(standing({ shoulder: 80, elbow: 5 }), 'shoulderFlexion', 0.1)).toBeGreaterThan(WORK)
  })

  it('a press overhead asks elbows straight, arms up and shoulder blades up', () => {
    const press = MECHANICS_CASES.overheadPress!
    for (const action of ['elbowExtension', 'shoulderAbduction', 'scapularElevation'] as const) {
      expect(asked(press, action, 0.5), action).toBeGreaterThan(WORK)
    }
    expect(asked(handstand(), 'scapularElevation', 0)).toBeGreaterThan(0.4)
    expect(asked(handstand(), 'elbowExtension', 0, 1)).toBeGreaterThan(WORK)
  })

  it('a plank asks the front of the trunk, hips and knees, a hip thrust their back', () => {
    expect(asked(plank(), 'trunkFlexion', 0)).toBeGreaterThan(WORK)
    expect(asked(plank(), 'hipFlexion', 0)).toBeGreaterThan(WORK)
    expect(asked(plank(), 'kneeExtension', 0)).toBeGreaterThan(WORK)
    expect(asked(hipThrust(), 'hipExtension', 0.8, 1)).toBeGreaterThan(WORK)
  })

  it('leg machines ask of the knee or hip what their name says', () => {
    expect(asked(MECHANICS_CASES.kneeExtension!, 'kneeExtension', 0.4, 1)).toBeGreaterThan(WORK)
    expect(asked(MECHANICS_CASES.proneLegCurl!, 'kneeFlexion', 0.3)).toBeGreaterThan(WORK)
    for (const action of ['kneeExtension', 'hipExtension', 'anklePlantarflexion'] as const) {
      expect(asked(MECHANICS_CASES.legPress!, action, 1.2), action).toBeGreaterThan(WORK)
    }
    expect(asked(MECHANICS_CASES.backExtension!, 'trunkExtension', 0)).toBeGreaterThan(WORK)
    expect(asked(MECHANICS_CASES.backExtension!, 'hipExtension', 0)).toBeGreaterThan(WORK)
  })

  it('a padded pullover asks the arms down without the elbow', () => {
    expect(asked(MECHANICS_CASES.pullover!, 'shoulderExtension', 0.4)).toBeGreaterThan(WORK)
    expect(
      asked(MECHANICS_CASES.pullover!, 'elbowFlexion', 100) - asked(MECHANICS_CASES.pullover!, 'elbowFlexion', 0),
    ).toBe(0)
  })

  it('a head held out in front asks the back of the neck, one held up from a bench its front', () => {
    const leaning = held({ trunk: { lean: 60 }, arms: { shoulder: 60, elbow: 0 }, legs: { hip: 90, knee: 90 } })
    const prone = standing({ shoulder: 60, elbow: 0 }, { supports: ['seat'], balance: undefined, frames: leaning })
    expect(asked(prone, 'neckExtension', 0)).toBeGreaterThan(WORK)
    const supine = { ...benchPress(), supports: ['seat' as const] }
    expect(asked(supine, 'neckFlexion', 0)).toBeGreaterThan(WORK)
  })

  it('the spine is pressed together under a bar and pulled apart in a hang', () => {
    const axial = (mechanics: ExerciseMechanics, load: number) => {
      const term = solveExercise(mechanics, 'male').frames[0]!.terms.find(({ axis }) => axis === 'lumbarAxial')!
      return term.a + load * term.b
    }
    expect(axial(squat(), 0)).toBeLessThan(-0.3)
    expect(axial(squat(), 1)).toBeLessThan(-1.2)
    expect(axial(hang(), 0)).toBeGreaterThan(0.3)
  })

  it('a machine that loads the turn or lean of the trunk adds to what gravity asks', () => {
    // An odd load makes one side work; the machine asks for the same action, so its share is on top.
    for (const action of ['trunkRotation', 'trunkLateralFlexion'] as const) {
      const plain = oneArmRow({ loads: [{ at: 'hands', direction: 'down' }] })
      const size = (mechanics: ExerciseMechanics) => Math.abs(asked(mechanics, action, 1) - asked(mechanics, action, 0))
      expect(size({ ...plain, moments: [{ action, arm: 0.1 }] })).toBeCloseTo(size(plain) + 0.1, 12)
    }
  })
})
