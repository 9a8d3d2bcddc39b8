import { roleOf } from './bodies'
import type { ExerciseMechanics } from './definition'
import type { ForceSet } from './loads'
import type { Posture } from './posture'
import type { Term, Vector } from './solution'
import { add, dot, length, scale, subtract, unit } from './vector'

/** A smaller share of body weight on the hand is rounding and has no direction. */
const ROUNDING = 1e-12

/**
 * Grip: the force on the hand along its own line at the reference load, in full when it pulls the hand away from the
 * forearm, half when square to it, none when it presses into the palm: (1 + cos)/2. Our rule; no source.
 */
export function gripTerms(
  mechanics: ExerciseMechanics,
  posture: Posture,
  sets: { body: ForceSet; load: ForceSet },
): Term[] {
  if (mechanics.grip === 'none' || mechanics.gripFree) return []
  const terms: Term[] = []
  for (const limb of [0, 1] as const) {
    if (limb === 1 && mechanics.sides === 'both') continue
    const arm = posture.arms[limb]
    const frame = posture.frame
    if ((limb === 1 ? (frame.offArm ?? frame.arms) : frame.arms).flat !== undefined) continue
    const onHand = (set: ForceSet) =>
      set.external
        .filter(({ segment }) => segment.name === 'hand' && segment.limb === limb)
        .reduce<Vector>((sum, force) => add(sum, force.force), [0, 0, 0])
    const body = onHand(sets.body)
    const load = onHand(sets.load)
    const reference = mechanics.referenceLoad === 0 ? 1 : mechanics.referenceLoad
    const total = add(body, scale(load, reference))
    if (length(total) < ROUNDING) continue
    const line = unit(total)
    const openness = (1 + dot(line, unit(subtract(arm.wrist, arm.elbow)))) / 2
    terms.push({ axis: 'grip', role: roleOf(limb), a: openness * dot(body, line), b: openness * dot(load, line) })
  }
  return terms
}
