import fc from 'fast-check'
import type { Arm, DirectMoment, ExerciseMechanics, Frame, Leg, LoadPath } from '#shared/mechanics/definition'
import { MechanicsError, solveExercise, type ExerciseSolution, type Sex } from '#shared/mechanics/index'
import { ACTIONS, ARM_PLANES, GRIPS, type ArmPlane } from '#shared/mechanics/vocabulary'

/** Definitions of every shape the format allows, most of which can be solved; `solvable` keeps those that can. */

/** Numbers as an author writes them, to a thousandth. */
const number = (min: number, max: number) =>
  fc.integer({ min: Math.round(min * 1000), max: Math.round(max * 1000) }).map((thousandths) => thousandths / 1000)
const radians = (angle: number) => (angle * Math.PI) / 180

/** A place within reach of any arm (or leg), as [along, across]. */
const place = (near: number, far: number, from = 0, to = 360) =>
  fc
    .record({ reach: number(near, far), angle: number(from, to) })
    .map(({ reach, angle }): [number, number] => [reach * Math.cos(radians(angle)), reach * Math.sin(radians(angle))])

const extras = fc.record(
  { elbowSide: fc.constantFrom('flexed' as const, 'reversed' as const), wrist: number(-40, 40) },
  { requiredKeys: [] },
)

function arm(plane: ArmPlane): fc.Arbitrary<Arm> {
  const angles = fc.record({
    shoulder: plane === 'transverse' ? number(-20, 90) : number(-50, 170),
    elbow: number(0, 120),
  })
  // Arms in the transverse plane reach out or forward; the others may point anywhere.
  const [from, to] = plane === 'transverse' ? [-20, 110] : [0, 360]
  const off = fc
    .tuple(place(0.06, 0.24, from, to), number(-0.1, 0.1))
    .map(([[u, v], x]): [number, number, number] => [u, v, x])
  const hand = fc.record({ hand: place(0.06, 0.3, from, to) })
  const world = fc.record({ hand: place(0.06, 0.3), from: fc.constant('world' as const) })
  const ahead = fc.record({ hand: off, from: fc.constant('world' as const) })
  const worldAngles = angles.map((given) => ({ ...given, from: 'world' as const }))
  const forms: fc.Arbitrary<Arm>[] = [angles, hand, fc.record({ hand: off }), world]
  forms.push(plane === 'sagittal' ? worldAngles : ahead)
  return fc.tuple(fc.oneof(...forms), extras).map(([form, more]) => ({ ...form, ...more }))
}

const leg: fc.Arbitrary<Leg> = fc.oneof(
  fc.record({ ankle: place(0.12, 0.44, 240, 350) }),
  fc.record({ ankle: place(0.12, 0.44, 240, 350), from: fc.constant('trunk' as const) }),
  fc.record({ thigh: number(-20, 100), shank: number(-80, 40), foot: number(-20, 60) }),
  fc.record({ hip: number(-20, 120), knee: number(0, 130), ankle: number(-20, 40) }),
)

const direction: fc.Arbitrary<LoadPath['direction']> = fc.oneof(
  fc.constantFrom('down' as const, 'up' as const),
  fc.record({ angle: number(0, 360) }),
  fc.record({ square: fc.constantFrom('flexing' as const, 'extending' as const) }),
  fc.record(
    {
      toward: fc.tuple(number(0.5, 1), number(-0.6, 1)),
      of: fc.constantFrom('hip' as const, 'shoulder' as const, 'ankle' as const),
      lateral: number(-0.3, 0.5),
    },
    { requiredKeys: ['toward', 'of'] },
  ),
)

const load: fc.Arbitrary<LoadPath> = fc.record(
  {
    at: fc.constantFrom('hands', 'shoulders', 'hips', 'feet', 'head', 'upperArm', 'forearm', 'thigh', 'shank'),
    direction,
    share: fc.constantFrom('total' as const, 'each' as const),
    ratio: number(0.2, 2),
    along: number(0, 1),
    offset: fc.tuple(number(-0.1, 0.1), number(-0.1, 0.1)),
  },
  { requiredKeys: ['at', 'direction'] },
)

const hangingLoad = load.map((each): LoadPath => ({ ...each, direction: 'down' }))

function moment(frames: number): fc.Arbitrary<DirectMoment> {
  return fc.record(
    {
      action: fc.constantFrom(...ACTIONS.filter((action) => !action.startsWith('wrist'))),
      arm: number(0.02, 0.3),
      ratio: number(0.3, 2),
      curve: fc.array(number(0.3, 2), { minLength: frames, maxLength: frames }),
      share: fc.constantFrom('total' as const, 'each' as const),
    },
    { requiredKeys: ['action', 'arm'] },
  )
}

/** How the body is held, with the trunk's lean that suits it and whether it has to be balanced. */
const holdings = fc.constantFrom<{
  supports: ExerciseMechanics['supports']
  lean: [number, number]
  balance?: ExerciseMechanics['balance']
}>(
  { supports: ['seat'], lean: [-40, 60] },
  { supports: ['seat', 'backPad'], lean: [-90, 0] },
  { supports: ['chestPad'], lean: [20, 100] },
  { supports: ['backPad', 'feet'], lean: [-90, -40] },
  { supports: ['thighPad', 'shankPad'], lean: [20, 130] },
  { supports: ['feet'], lean: [-20, 70], balance: { solve: 'trunk', range: [-80, 80] } },
  { supports: ['feet'], lean: [0, 40], balance: { solve: 'legs' } },
  { supports: ['feet'], lean: [0, 40], balance: { solve: 'trunk', footPoint: 0.4 } },
  { supports: ['handsHanging'], lean: [-80, 80], balance: { solve: 'arms', range: [-90, 90] } },
  { supports: ['handsHanging'], lean: [-40, 40], balance: { solve: 'trunk', range: [-90, 90] } },
  { supports: ['handsPushing'], lean: [-10, 60], balance: { solve: 'trunk', range: [-90, 90] } },
  { supports: ['knees'], lean: [-10, 40], balance: { solve: 'trunk' } },
  { supports: ['handsPushing', 'feet'], lean: [50, 110], balance: { solve: 'trunk', range: [-90, 90] } },
  { supports: ['handsPushing', 'knees'], lean: [50, 110], balance: { solve: 'legs' } },
  { supports: ['forearms', 'feet'], lean: [50, 110], balance: { solve: 'trunk', range: [-90, 90] } },
  { supports: ['upperBack', 'feet'], lean: [-100, -30], balance: { solve: 'trunk', range: [-90, 90] } },
  { supports: ['feet', 'offHand'], lean: [30, 90], balance: { solve: 'trunk', range: [-90, 90] } },
)

/** A definition within the format, that may or may not be held. */
export const mechanicsArbitrary: fc.Arbitrary<ExerciseMechanics> = fc
  .record({
    holding: holdings,
    armPlane: fc.constantFrom(...ARM_PLANES),
    grip: fc.constantFrom(...GRIPS),
    sides: fc.constantFrom('both' as const, 'both' as const, 'oneAtATime' as const),
    count: fc.integer({ min: 2, max: 4 }),
    referenceLoad: fc.constantFrom(0, 0.2, 0.6, -0.2),
    gripFree: fc.boolean(),
  })
  .chain(({ holding, armPlane, grip, sides, count, referenceLoad, gripFree }) => {
    const oneSided = sides === 'oneAtATime' || holding.supports.includes('offHand')
    const frame: fc.Arbitrary<Frame> = fc.record(
      {
        name: fc.constant('posture'),
        trunk: fc.record(
          { lean: number(...holding.lean), lumbar: number(-15, 40), neck: number(-30, 30) },
          { requiredKeys: ['lean'] },
        ),
        arms: arm(armPlane),
        legs: leg,
        ...(oneSided ? { offArm: arm(armPlane), offLeg: leg } : {}),
      },
      { requiredKeys: ['name', 'trunk', 'arms', 'legs'] },
    ) as fc.Arbitrary<Frame>
    // A sideways pull can only be balanced by luck; away from pads most loads hang.
    const loads = fc.array(holding.balance ? fc.oneof(load, hangingLoad, hangingLoad) : load, { maxLength: 2 })
    return fc.record({
      guidance: fc.constant('freeWeight' as const),
      sides: fc.constant(oneSided ? ('oneAtATime' as const) : ('both' as const)),
      grip: fc.constant(grip),
      gripWidth: fc.constant('shoulder' as const),
      armPlane: fc.constant(armPlane),
      supports: fc.constant(holding.supports),
      frames: fc.array(frame, { minLength: count, maxLength: count }),
      loads,
      moments: fc.array(moment(count), { maxLength: 2 }),
      referenceLoad: fc.constant(referenceLoad),
      gripFree: fc.constant(gripFree),
      ...(holding.balance ? { balance: fc.constant(holding.balance) } : {}),
    }) as fc.Arbitrary<ExerciseMechanics>
  })

/**
 * Whether every arm plane placed in world axes lies clearly to one side of the trunk's own: square to it, which of its two senses
 * counts as nearer is a matter of rounding.
 */
export function planesAreClear(mechanics: ExerciseMechanics, solution: ExerciseSolution): boolean {
  return mechanics.frames.every((frame, index) => {
    const { angles } = solution.frames[index]!
    const lean = radians(angles.trunkLean + angles.lumbar)
    return [frame.arms, frame.offArm].every((form) => {
      if (!form || !('hand' in form)) return true
      const [, v, x = 0] = form.hand
      if (form.from !== 'world') return x === 0 || Math.abs(v) > 1e-3
      if (mechanics.armPlane === 'sagittal') return true
      const [ahead, up] = x === 0 ? [0, 1] : [x / Math.hypot(x, v), v / Math.hypot(x, v)]
      const along =
        mechanics.armPlane === 'frontal' ? [-Math.sin(lean), -Math.cos(lean)] : [Math.cos(lean), -Math.sin(lean)]
      return Math.abs(ahead * along[0]! + up * along[1]!) > 0.02
    })
  })
}

/** The solution, or the typed refusal; anything else that is thrown is a defect and goes through. */
export function trySolve(mechanics: ExerciseMechanics, sex: Sex): ExerciseSolution | MechanicsError {
  try {
    return solveExercise(mechanics, sex)
  } catch (error) {
    if (error instanceof MechanicsError) return error
    throw error
  }
}

/** Definitions that can be solved, each with its solution. */
export const solvable = (sex: Sex): fc.Arbitrary<{ mechanics: ExerciseMechanics; solution: ExerciseSolution }> =>
  mechanicsArbitrary
    .map((mechanics) => ({ mechanics, solution: trySolve(mechanics, sex) }))
    .filter(
      (each): each is { mechanics: ExerciseMechanics; solution: ExerciseSolution } => !(each.solution instanceof Error),
    )
