import { segmentBodies } from './bodies'
import { contactGroups, flatBack } from './contacts'
import type { Arm, Balance, ExerciseMechanics, Frame, Leg } from './definition'
import { atReference, weightCentre } from './equilibrium'
import { MechanicsError } from './errors'
import { checkBears, checkHeld, imbalance, type LoadedPosture } from './held'
import { gravityForces, loadForces } from './loads'
import { solvePosture } from './posture'
import { findRoot } from './root'
import type { SegmentTable } from './segments'
import { radians } from './vector'

const DEFAULT_RANGE: readonly [number, number] = [-60, 60]

function turnArm(arm: Arm, by: number): Arm {
  if ('hand' in arm && arm.hand !== undefined) {
    const [u, v, ...ahead] = arm.hand
    const c = Math.cos(radians(by))
    const s = Math.sin(radians(by))
    // One turn serves every form of a place: [along p, along q] as well as [outward or forward, up].
    return { ...arm, hand: [u * c - v * s, u * s + v * c, ...ahead] as typeof arm.hand }
  }
  return { ...arm, shoulder: (arm as { shoulder: number }).shoulder + by }
}

function turnLeg(leg: Leg, by: number): Leg {
  if ('thigh' in leg && leg.thigh !== undefined) return { ...leg, thigh: leg.thigh + by, shank: leg.shank + by }
  if ('hip' in leg && leg.hip !== undefined) return { ...leg, hip: leg.hip + by }
  const place = leg as { ankle: [number, number]; from?: 'world' | 'trunk'; foot?: number }
  const [x, z] = place.ankle
  const c = Math.cos(radians(by))
  const s = Math.sin(radians(by))
  return { ...place, ankle: [x * c - z * s, x * s + z * c] }
}

/** The frame with the balanced angle changed by `by` degrees. */
export function withBalance(frame: Frame, solve: Balance['solve'], by: number): Frame {
  switch (solve) {
    case 'trunk':
      return { ...frame, trunk: { ...frame.trunk, lean: frame.trunk.lean + by } }
    case 'arms':
      return { ...frame, arms: turnArm(frame.arms, by), ...(frame.offArm ? { offArm: turnArm(frame.offArm, by) } : {}) }
    case 'legs':
      return { ...frame, legs: turnLeg(frame.legs, by), ...(frame.offLeg ? { offLeg: turnLeg(frame.offLeg, by) } : {}) }
  }
}

function loaded(mechanics: ExerciseMechanics, frame: Frame, table: SegmentTable, path: string): LoadedPosture {
  const posture = solvePosture(mechanics, frame, table, path)
  const body = gravityForces(segmentBodies(posture, table))
  const load = loadForces(mechanics, posture).forces
  const weightLine = weightCentre(atReference(mechanics, body, load))[0]
  return { posture, groups: contactGroups(mechanics, posture, weightLine), body, load }
}

function checkBalance(mechanics: ExerciseMechanics, authored: LoadedPosture): void {
  if (mechanics.balance === undefined) return
  const held = flatBack(mechanics)
    ? 'A back against a wall or pad is held at any lean: leave the balance out.'
    : authored.groups.length === 0
      ? 'A body on a seat or pad has nothing to balance: leave it out.'
      : undefined
  if (held !== undefined) throw new MechanicsError('unsupported_combination', 'balance', held)
}

/**
 * Solves the balanced angle of one frame and checks that the posture can be held at the reference load.
 * @param path dotted path of the frame in the definition, for errors
 * @throws MechanicsError unbalanceable_posture, unloaded_contact, unsupported_combination, and what placing the joints throws
 */
export function solveBalance(
  mechanics: ExerciseMechanics,
  frame: Frame,
  table: SegmentTable,
  path: string,
): LoadedPosture {
  const { balance } = mechanics
  const authored = loaded(mechanics, frame, table, path)
  checkBalance(mechanics, authored)
  if (balance === undefined) {
    checkHeld(mechanics, authored, path)
    return authored
  }
  checkBears(mechanics, authored, path)
  const at = (by: number) => loaded(mechanics, withBalance(frame, balance.solve, by), table, path)
  const search = findRoot(
    (by) => imbalance(mechanics, at(by)),
    balance.range ?? DEFAULT_RANGE,
    imbalance(mechanics, authored),
  )
  if (!('root' in search)) {
    throw new MechanicsError(
      'unbalanceable_posture',
      path,
      `No angle in reach balances this posture: at ${search.best.toFixed(0)}° from the authored one it still misses by ${(search.miss * 100).toFixed(1)} % of stature. Move the hips, the hands or the load.`,
    )
  }
  const solved = at(search.root)
  checkHeld(mechanics, solved, path)
  return solved
}
