import type { Arm, ExerciseMechanics, Frame, Leg } from './definition'
import { relaxedArm, solveArm, type SolvedArm } from './arm'
import { solveLeg, type SolvedLeg } from './leg'
import type { SegmentTable } from './segments'
import type { Vector } from './solution'
import { trunkAxes, type TrunkAxes } from './trunk-axes'
import { add, scale } from './vector'

/** One posture with every joint placed; the mid-hip point is the origin. The working side is the right one. */
export interface Posture {
  frame: Frame
  lumbar: Vector
  neckBase: Vector
  headCentre: Vector
  headTop: Vector
  pelvisAxes: TrunkAxes
  trunkAxes: TrunkAxes
  headUp: Vector
  /** [working (right), idle (left)]; equal up to the mirror when both sides work. */
  arms: [SolvedArm, SolvedArm]
  legs: [SolvedLeg, SolvedLeg]
}

const RIGHT: Vector = [0, -1, 0]
const LEFT: Vector = [0, 1, 0]

/**
 * Places every joint of one frame.
 * @param path dotted path of the frame in the definition, for errors
 * @throws MechanicsError unreachable_endpoint, unsupported_combination
 */
export function solvePosture(mechanics: ExerciseMechanics, frame: Frame, table: SegmentTable, path: string): Posture {
  const lumbarLean = frame.trunk.lean + (frame.trunk.lumbar ?? 0)
  const pelvis = trunkAxes(frame.trunk.lean, RIGHT)
  const upper = trunkAxes(lumbarLean, RIGHT)
  const headUp = trunkAxes(lumbarLean + (frame.trunk.neck ?? 0), RIGHT).up
  const lumbar = scale(pelvis.up, table.pelvis.length)
  const neckBase = add(lumbar, scale(upper.up, table.upperTrunk.length))

  const arm = (form: Arm, lateral: Vector, field: string, plane = mechanics.armPlane) =>
    solveArm(
      form,
      add(neckBase, scale(lateral, table.shoulderHalfWidth)),
      { ...upper, lateral },
      { plane, grip: mechanics.grip, table, field: `${path}.${field}` },
    )
  const leg = (form: Leg, lateral: Vector, field: string) =>
    solveLeg(form, scale(lateral, table.hipHalfWidth), { ...pelvis, lateral }, table, `${path}.${field}`)

  const oneSided = mechanics.sides === 'oneAtATime'
  const idleArm = frame.offArm
    ? arm(frame.offArm, LEFT, 'offArm')
    : oneSided
      ? arm(relaxedArm(frame.trunk), LEFT, 'offArm', 'sagittal')
      : arm(frame.arms, LEFT, 'arms')
  const idleLeg = frame.offLeg ? leg(frame.offLeg, LEFT, 'offLeg') : leg(frame.legs, LEFT, 'legs')
  return {
    frame,
    lumbar,
    neckBase,
    headCentre: add(neckBase, scale(headUp, table.head.centre)),
    headTop: add(neckBase, scale(headUp, table.head.length)),
    pelvisAxes: pelvis,
    trunkAxes: upper,
    headUp,
    arms: [arm(frame.arms, RIGHT, 'arms'), idleArm],
    legs: [leg(frame.legs, RIGHT, 'legs'), idleLeg],
  }
}
