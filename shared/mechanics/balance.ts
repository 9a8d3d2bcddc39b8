import { segmentBodies } from './bodies'
import { contactGroups, flatBack, UPRIGHT, type ContactGroup } from './contacts'
import type { Arm, Balance, ExerciseMechanics, Frame, Leg } from './definition'
import { atReference, groupCentre, pressureOffset, reactions, weightCentre } from './equilibrium'
import { MechanicsError } from './errors'
import { gravityForces, loadForces, type Force } from './loads'
import { solvePosture, type Posture } from './posture'
import type { SegmentTable } from './segments'
import { dot, radians } from './vector'

/** How far a bearing may miss its place before the posture is refused, in fractions of stature (1 cm for a tall adult). */
const TOLERANCE = 0.006
/** Two supports that are fixed by the author may miss their heights by this much (two fingers). */
const LEVEL_TOLERANCE = 0.02
const DEFAULT_RANGE: readonly [number, number] = [-60, 60]
/** Degrees between samples when looking for the sign change nearest the authored posture. */
const STEP = 3

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

/** A posture with its support groups and the forces that act on it. */
export interface LoadedPosture {
  posture: Posture
  groups: ContactGroup[]
  body: Force[]
  load: Force[]
}

function loaded(mechanics: ExerciseMechanics, frame: Frame, table: SegmentTable, path: string): LoadedPosture {
  const posture = solvePosture(mechanics, frame, table, path)
  const body = gravityForces(segmentBodies(posture, table))
  const load = loadForces(mechanics, posture).forces
  const weightLine = weightCentre(atReference(mechanics, body, load))[0]
  return { posture, groups: contactGroups(mechanics, posture, weightLine), body, load }
}

/** What must vanish: the pressure centre's offset over one support, or the error in height between two. */
function imbalance(mechanics: ExerciseMechanics, { groups, body, load }: LoadedPosture): number {
  const [first, second] = groups
  if (!first) return 0
  if (second && flatBack(mechanics)) return 0
  if (second) return groupCentre(first)[2] - groupCentre(second)[2] - (mechanics.rise ?? 0)
  return pressureOffset(atReference(mechanics, body, load), groupCentre(first))
}

/**
 * Solves the balanced angle of one frame and checks that the posture can be held at the reference load.
 * @throws MechanicsError unbalanceable_posture, unloaded_contact, and what placing the joints throws
 */
export function solveBalance(
  mechanics: ExerciseMechanics,
  frame: Frame,
  table: SegmentTable,
  path: string,
): LoadedPosture {
  const { balance } = mechanics
  const at = (by: number) => loaded(mechanics, balance ? withBalance(frame, balance.solve, by) : frame, table, path)
  const authored = at(0)
  if (balance && flatBack(mechanics)) {
    throw new MechanicsError(
      'unsupported_combination',
      'balance',
      'A back against a wall or pad is held at any lean: leave the balance out.',
    )
  }
  if (authored.groups.length === 0) {
    if (balance) {
      throw new MechanicsError(
        'unsupported_combination',
        'balance',
        'A body on a seat or pad has nothing to balance: leave it out.',
      )
    }
    return authored
  }
  const solved = balance
    ? at(findRoot((by) => imbalance(mechanics, at(by)), balance.range ?? DEFAULT_RANGE, path))
    : authored
  checkHeld(mechanics, solved, path)
  return solved
}

/** Root nearest 0 of a smooth function within a range of degrees, by stepping outward and then bisecting. */
function findRoot(f: (by: number) => number, [low, high]: readonly [number, number], path: string): number {
  let best = { by: 0, size: Math.abs(f(0)) }
  if (best.size < 1e-14) return 0
  let [below, above] = [0, 0]
  let [fBelow, fAbove] = [f(0), f(0)]
  const note = (by: number, value: number) => {
    if (Math.abs(value) < best.size) best = { by, size: Math.abs(value) }
  }
  while (below > low || above < high) {
    if (above < high) {
      const next = Math.min(high, above + STEP)
      const value = f(next)
      if (fAbove * value <= 0) return bisect(f, above, next, fAbove)
      note(next, value)
      above = next
      fAbove = value
    }
    if (below > low) {
      const next = Math.max(low, below - STEP)
      const value = f(next)
      if (fBelow * value <= 0) return bisect(f, below, next, fBelow)
      note(next, value)
      below = next
      fBelow = value
    }
  }
  throw new MechanicsError(
    'unbalanceable_posture',
    path,
    `No angle in reach balances this posture: at ${best.by.toFixed(0)}° from the authored one it still misses by ${(best.size * 100).toFixed(1)} % of stature. Move the hips, the hands or the load.`,
  )
}

/** Illinois false position: as sure as bisection, a few steps where the function is nearly straight. */
function bisect(f: (by: number) => number, from: number, to: number, fFrom: number): number {
  let [a, b] = [from, to]
  let [fa, fb] = [fFrom, f(to)]
  let side = 0
  for (let i = 0; i < 100 && Math.abs(b - a) > 1e-13; i++) {
    const middle = fa === fb ? (a + b) / 2 : (a * fb - b * fa) / (fb - fa)
    const value = f(middle)
    if (Math.abs(value) < 1e-15) return middle
    if (value * fb > 0) {
      b = middle
      fb = value
      if (side === -1) fa /= 2
      side = -1
    } else {
      a = middle
      fa = value
      if (side === 1) fb /= 2
      side = 1
    }
  }
  return Math.abs(fa) < Math.abs(fb) ? a : b
}

function checkHeld(mechanics: ExerciseMechanics, solved: LoadedPosture, path: string): void {
  const { groups, body, load, posture } = solved
  const [first, second] = groups
  if (!first) return
  const applied = atReference(mechanics, body, load)
  const miss = imbalance(mechanics, solved)
  if (second) {
    if (Math.abs(miss) > LEVEL_TOLERANCE) {
      throw new MechanicsError(
        'unbalanceable_posture',
        path,
        `The two supports miss their heights by ${(Math.abs(miss) * 100).toFixed(1)} % of stature. Bend the limbs so that both bear, or set the rise.`,
      )
    }
    const held = reactions(groups, applied)
    for (const group of groups) {
      const direction = group === first ? group.push : UPRIGHT
      const pushed = held
        .filter((force) => group.contacts.some((contact) => contact.at === force.at))
        .reduce((sum, force) => sum + dot(force.force, direction), 0)
      if (pushed < 0) {
        throw new MechanicsError(
          'unloaded_contact',
          path,
          `The ${group.support} would have to pull to hold this posture.`,
        )
      }
    }
    return
  }
  const feet = first.support === 'feet'
  const leg = posture.legs[0]
  const flat = feet && Math.abs(leg.soleAngle) <= 25
  const pressure = groupCentre(first)[0] + miss
  const [rear, front] = flat
    ? [Math.min(leg.heel[0], leg.toe[0]), Math.max(leg.heel[0], leg.toe[0])]
    : [groupCentre(first)[0], groupCentre(first)[0]]
  if (pressure < rear - TOLERANCE || pressure > front + TOLERANCE) {
    const misses = pressure < rear ? rear - pressure : pressure - front
    throw new MechanicsError(
      'unbalanceable_posture',
      path,
      `The pressure falls ${(misses * 100).toFixed(1)} % of stature ${pressure < rear ? 'behind' : 'in front of'} the ${first.support}. Lean the trunk, or let the engine balance it.`,
    )
  }
}
