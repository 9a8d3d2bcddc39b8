import { flatBack, STEEP, UPRIGHT, type ContactGroup } from './contacts'
import type { ExerciseMechanics } from './definition'
import { atReference, groupCentre, leverOf, pressureOffset, reactions, wrench } from './equilibrium'
import { MechanicsError } from './errors'
import type { Force } from './loads'
import type { Posture } from './posture'
import { dot } from './vector'

/** How far a bearing may miss its place before the posture is refused, in fractions of stature (1 cm for a tall adult). */
const TOLERANCE = 0.006
/** Two supports that are fixed by the author may miss their heights by this much (two fingers). */
const LEVEL_TOLERANCE = 0.02
/** Two supports nearer in line than this cannot share weight: what each takes would hang on the drawing's last millimetre. */
const SHORTEST_LEVER = 0.01

/** A posture with its support groups and the forces that act on it. */
export interface LoadedPosture {
  posture: Posture
  groups: ContactGroup[]
  /** In units of body weight. */
  body: Force[]
  /** In units of L·g. */
  load: Force[]
}

/** What must vanish: the pressure centre's offset over one support, or the error in height between two (stature fractions). */
export function imbalance(mechanics: ExerciseMechanics, { groups, body, load }: LoadedPosture): number {
  const [first, second] = groups
  if (!first) return 0
  if (second && flatBack(mechanics)) return 0
  if (second) return groupCentre(first)[2] - groupCentre(second)[2] - (mechanics.rise ?? 0)
  return pressureOffset(atReference(mechanics, body, load), groupCentre(first))
}

/**
 * Checks that the supports can hold the posture at the reference load.
 * @param path dotted path of the frame in the definition, for errors
 * @throws MechanicsError unbalanceable_posture, unloaded_contact, unsupported_combination
 */
export function checkHeld(mechanics: ExerciseMechanics, solved: LoadedPosture, path: string): void {
  const [first, second] = solved.groups
  if (first && second) checkTwo(mechanics, solved, [first, second], path)
  else if (first) checkOne(mechanics, solved, first, path)
}

function checkTwo(
  mechanics: ExerciseMechanics,
  solved: LoadedPosture,
  groups: [ContactGroup, ContactGroup],
  path: string,
): void {
  if (Math.abs(leverOf(...groups)) < SHORTEST_LEVER) {
    throw new MechanicsError(
      'unsupported_combination',
      'supports',
      'The two supports bear in one line, so that statics cannot share the weight between them. Move them apart.',
    )
  }
  const miss = Math.abs(imbalance(mechanics, solved))
  if (miss > LEVEL_TOLERANCE) {
    throw new MechanicsError(
      'unbalanceable_posture',
      path,
      `The two supports miss their heights by ${(miss * 100).toFixed(1)} % of stature. Bend the limbs so that both bear, or set the rise.`,
    )
  }
  const held = reactions(groups, atReference(mechanics, solved.body, solved.load))
  groups.forEach((group, index) => {
    const push = index === 0 ? group.push : UPRIGHT
    if (held[index]!.reduce((sum, { force }) => sum + dot(force, push), 0) < 0) {
      throw new MechanicsError(
        'unloaded_contact',
        path,
        `The ${group.support} would have to pull to hold this posture.`,
      )
    }
  })
}

/** Refuses a body that the reference load lifts off its only support. */
export function checkBears(mechanics: ExerciseMechanics, solved: LoadedPosture, path: string): void {
  const [first, second] = solved.groups
  if (!first || second) return
  const { force } = wrench(atReference(mechanics, solved.body, solved.load), groupCentre(first))
  // Written so that what is not a number is refused as well.
  if (!(force[2] < 0)) {
    throw new MechanicsError(
      'unloaded_contact',
      path,
      `At the reference load nothing rests on the ${first.support}. Lower the reference load, or say what holds the body down.`,
    )
  }
}

function checkOne(mechanics: ExerciseMechanics, solved: LoadedPosture, first: ContactGroup, path: string): void {
  checkBears(mechanics, solved, path)
  const leg = solved.posture.legs[0]
  const middle = groupCentre(first)[0]
  const flat = first.support === 'feet' && Math.abs(leg.soleAngle) <= STEEP
  const [rear, front] = flat ? [Math.min(leg.heel[0], leg.toe[0]), Math.max(leg.heel[0], leg.toe[0])] : [middle, middle]
  const pressure = middle + imbalance(mechanics, solved)
  if (pressure < rear - TOLERANCE || pressure > front + TOLERANCE) {
    const misses = pressure < rear ? rear - pressure : pressure - front
    throw new MechanicsError(
      'unbalanceable_posture',
      path,
      `The pressure falls ${(misses * 100).toFixed(1)} % of stature ${pressure < rear ? 'behind' : 'in front of'} the ${first.support}. Lean the trunk, or let the engine balance it.`,
    )
  }
}
