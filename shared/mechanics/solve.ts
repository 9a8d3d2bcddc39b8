import { solveBalance } from './balance'
import { roleOf } from './bodies'
import { checkDefinition, checkNumbers } from './check'
import { heldSegments } from './contacts'
import type { ExerciseMechanics } from './definition'
import { reactions } from './equilibrium'
import { loadForces } from './loads'
import { addDirectMoments } from './direct-moments'
import { jointTerms } from './moments'
import type { Posture } from './posture'
import { SEGMENTS } from './segments'
import type { Sex } from './sex'
import type { ExerciseSolution, LoadLine, Pose, Reaction, SolvedFrame, Vector } from './solution'
import { add } from './vector'

/** How high a hanging athlete's lowest point clears the ground, × stature. */
const CLEARANCE = 0.04

/**
 * Solves an exercise: places the joints of every frame, balances them, and finds each joint's affine coefficients.
 *
 * @param mechanics the authored geometry
 * @param sex whose segment table to use
 * @returns per frame the pose, the anatomical angles, the terms M = m·g·H·a + L·g·H·b, and the support reactions
 * @throws MechanicsError with the offending field when the posture cannot be reached, balanced or held
 */
export function solveExercise(mechanics: ExerciseMechanics, sex: Sex): ExerciseSolution {
  checkDefinition(mechanics)
  const table = SEGMENTS[sex]
  const held = heldSegments(mechanics)
  const frames = mechanics.frames.map((frame, index): SolvedFrame & { anchor: Vector } => {
    const { posture, groups, body, load } = solveBalance(mechanics, frame, table, `frames.${index}`)
    const bodyReactions = reactions(groups, body)
    const loadReactions = reactions(groups, load)
    const sets = {
      body: { weights: body, external: bodyReactions.flat() },
      load: { weights: [], external: [...load, ...loadReactions.flat()] },
    }
    const terms = addDirectMoments(mechanics, index, jointTerms(mechanics, posture, sets, held))
    const supported: Reaction[] = groups.flatMap((group, g) =>
      group.contacts.map((contact, c) => ({
        support: contact.support,
        role: roleOf(contact.segment.limb),
        at: contact.at,
        a: bodyReactions[g]![c]!.force[2],
        b: loadReactions[g]![c]!.force[2],
      })),
    )
    const [arm] = posture.arms
    const [leg] = posture.legs
    const solved = {
      name: frame.name,
      pose: poseOf(posture),
      angles: {
        trunkLean: posture.frame.trunk.lean,
        lumbar: posture.frame.trunk.lumbar ?? 0,
        neck: posture.frame.trunk.neck ?? 0,
        ...arm.angles,
        ...leg.angles,
      },
      terms,
      reactions: supported,
      loadLines: loadForces(mechanics, posture).lines,
      anchor: anchorOf(mechanics, supported, posture),
    }
    checkNumbers(solved, `frames.${index}`, 'This posture or load has no finite solution.')
    return solved
  })
  return { frames: ground(mechanics, frames) }
}

function poseOf(posture: Posture): Pose {
  const [right, left] = posture.arms
  const [rightLeg, leftLeg] = posture.legs
  return {
    pelvis: [0, 0, 0],
    lumbar: posture.lumbar,
    neckBase: posture.neckBase,
    headCentre: posture.headCentre,
    headTop: posture.headTop,
    'right.shoulder': right.shoulder,
    'right.elbow': right.elbow,
    'right.wrist': right.wrist,
    'right.grip': right.grip,
    'right.fingers': right.fingers,
    'right.hip': rightLeg.hip,
    'right.knee': rightLeg.knee,
    'right.ankle': rightLeg.ankle,
    'right.heel': rightLeg.heel,
    'right.toe': rightLeg.toe,
    'left.shoulder': left.shoulder,
    'left.elbow': left.elbow,
    'left.wrist': left.wrist,
    'left.grip': left.grip,
    'left.fingers': left.fingers,
    'left.hip': leftLeg.hip,
    'left.knee': leftLeg.knee,
    'left.ankle': leftLeg.ankle,
    'left.heel': leftLeg.heel,
    'left.toe': leftLeg.toe,
  }
}

/**
 * The point that stays put through the repetition: what bears on the ground or a bar, or else the knee of a held shank, or
 * the pelvis on its seat.
 */
function anchorOf(mechanics: ExerciseMechanics, supported: readonly Reaction[], posture: Posture): Vector {
  const onGround = [...supported].reverse().find((reaction) => reaction.support !== 'handsHanging')
  const bearing = onGround ?? supported[0]
  if (!bearing) {
    const kneels = mechanics.supports.every((support) => support === 'shankPad' || support === 'feet')
    return kneels ? [posture.legs[0].knee[0], 0, posture.legs[0].knee[2]] : [0, 0, 0]
  }
  return [bearing.at[0], 0, bearing.at[2]]
}

/** Moves all frames so that their anchors coincide and nothing lies below z = 0. */
function ground(mechanics: ExerciseMechanics, frames: readonly (SolvedFrame & { anchor: Vector })[]): SolvedFrame[] {
  const lowest = Math.min(
    ...frames.map((frame) => Math.min(...Object.values(frame.pose).map((point) => point[2])) - frame.anchor[2]),
  )
  const standsOnGround = mechanics.supports.some((support) => support === 'feet' || support === 'knees')
  const hangs = mechanics.supports.includes('handsHanging') && !standsOnGround
  const lift = -lowest + (hangs ? CLEARANCE : 0)
  return frames.map(({ anchor, ...frame }) => {
    const shift: Vector = [-anchor[0], 0, lift - anchor[2]]
    const move = (point: Vector): Vector => add(point, shift)
    return {
      ...frame,
      pose: Object.fromEntries(
        Object.entries(frame.pose).map(([name, point]) => [name, move(point)]),
      ) as unknown as Pose,
      reactions: frame.reactions.map((reaction) => ({ ...reaction, at: move(reaction.at) })),
      loadLines: frame.loadLines.map((line): LoadLine => ({
        ...line,
        at: move(line.at),
        ...(line.toward ? { toward: move(line.toward) } : {}),
      })),
    }
  })
}
