import { isDistal, type CutName, type LimbIndex, type SegmentRef } from './bodies'
import type { ContactGroup } from './contacts'
import type { ExerciseMechanics } from './definition'
import type { Force } from './loads'
import type { Vector } from './solution'
import { add, cross, mean, scale, subtract, ZERO } from './vector'

/** Sum of forces and of their moments about a point. */
export function wrench(forces: readonly Force[], about: Vector): { force: Vector; moment: Vector } {
  // Written out: this is the innermost sum of every cut, and vectors made here would be most of the work.
  let [fx, fy, fz, mx, my, mz] = [0, 0, 0, 0, 0, 0]
  for (const { at, force, couple } of forces) {
    const [x, y, z] = [at[0] - about[0], at[1] - about[1], at[2] - about[2]]
    fx += force[0]
    fy += force[1]
    fz += force[2]
    mx += y * force[2] - z * force[1] + (couple?.[0] ?? 0)
    my += z * force[0] - x * force[2] + (couple?.[1] ?? 0)
    mz += x * force[1] - y * force[0] + (couple?.[2] ?? 0)
  }
  return { force: [fx, fy, fz], moment: [mx, my, mz] }
}

/** A reaction on one group, split evenly over its contacts; `couple` is what one point of bearing cannot take alone. */
function onGroup(group: ContactGroup, total: Vector, couple: Vector): Force[] {
  const share = 1 / group.contacts.length
  return group.contacts.map((contact) => ({
    segment: contact.segment,
    at: contact.at,
    force: scale(total, share),
    couple: scale(couple, share),
  }))
}

/** The middle of a group's contacts. */
export const groupCentre = (group: ContactGroup): Vector => mean(group.contacts.map((contact) => contact.at))

/** Moment of a unit push of the first group about the second's centre, around the lateral axis (stature fractions). */
export const leverOf = (first: ContactGroup, second: ContactGroup): number =>
  cross(subtract(groupCentre(first), groupCentre(second)), first.push)[1]

/**
 * Support reactions that hold the given forces, linear in them.
 *
 * One group takes the whole force and, as a couple, the offset of the pressure centre from its contact. Of two groups
 * the first takes a force of known direction (upright, inward, or square to the trunk), sized so that moments
 * in the sagittal plane balance; everything else goes to the second. No group: the body rests on pads and nothing is solved.
 *
 * @returns for each group its contacts' forces, in their order
 */
export function reactions(groups: readonly ContactGroup[], applied: readonly Force[]): Force[][] {
  const [first, second] = groups
  if (first === undefined) return []
  if (second === undefined) {
    const centre = groupCentre(first)
    const { force, moment } = wrench(applied, centre)
    return [onGroup(first, scale(force, -1), scale(moment, -1))]
  }
  const b = groupCentre(second)
  const about = wrench(applied, b)
  const onFirst = onGroup(first, scale(first.push, -about.moment[1] / leverOf(first, second)), ZERO)
  const rest = wrench([...applied, ...onFirst], b)
  return [onFirst, onGroup(second, scale(rest.force, -1), scale(rest.moment, -1))]
}

/**
 * Net external force and moment on the distal side of a cut, about a point, taken from the side without an unknown pad.
 * Undefined when pads hold both sides: then nothing can be said, and nothing is asked of the joint.
 *
 * Where both limbs do the same (`mirrored`) and pads hold nothing but the two of them, as on a back extension bench, each
 * limb's joint takes half of what the rest of the body asks.
 * @param held segments that pads hold
 */
export function cutWrench(
  all: readonly Force[],
  held: readonly SegmentRef[],
  cut: { name: CutName; limb?: LimbIndex; mirrored?: boolean; at: Vector },
): { force: Vector; moment: Vector } | undefined {
  const distal = (segment: SegmentRef) => isDistal(segment, cut.name, cut.limb)
  const heldDistally = held.some(distal)
  const heldProximally = !held.every(distal)
  if (heldDistally && heldProximally) {
    const ofPair = (segment: SegmentRef) => isDistal(segment, cut.name, 0) || isDistal(segment, cut.name, 1)
    if (!cut.mirrored || !held.every(ofPair)) return undefined
    const rest = wrench(
      all.filter((force) => !ofPair(force.segment)),
      [cut.at[0], 0, cut.at[2]],
    )
    return { force: scale(rest.force, -0.5), moment: scale(rest.moment, -0.5) }
  }
  const side = all.filter((force) => distal(force.segment) !== heldDistally)
  const sum = wrench(side, cut.at)
  return heldDistally ? { force: scale(sum.force, -1), moment: scale(sum.moment, -1) } : sum
}

/** Combined forces at the reference load, in units of body weight. */
export const atReference = (mechanics: ExerciseMechanics, body: readonly Force[], load: readonly Force[]): Force[] => [
  ...body,
  ...load.map((each) => ({
    ...each,
    force: scale(each.force, mechanics.referenceLoad),
    ...(each.couple ? { couple: scale(each.couple, mechanics.referenceLoad) } : {}),
  })),
]

/** Centre of the weights among the given forces. */
export function weightCentre(applied: readonly Force[]): Vector {
  const weight = applied.reduce((sum, { force }) => sum + force[2], 0)
  return scale(
    applied.reduce<Vector>((sum, { at, force }) => add(sum, scale(at, force[2])), ZERO),
    1 / weight,
  )
}

/** How far forward of `target` the pressure centre lies at a horizontal level through it, in stature fractions. */
export function pressureOffset(applied: readonly Force[], target: Vector): number {
  const { force, moment } = wrench(applied, target)
  // The reaction −F at offset d makes the moment d·F_z about the lateral axis, which must undo the applied one.
  return -moment[1] / force[2]
}
