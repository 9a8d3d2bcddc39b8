import type { ExerciseDocument } from '../contract/exercise'
import type { RuleSet } from '../contract/rule-set'
import type { ExerciseSolution } from '../mechanics/solution'
import { JOINTS } from '../mechanics/vocabulary'
import { excursion } from './motion'
import { clamp } from './numbers'

type Structure = Pick<ExerciseDocument, 'mechanics' | 'skill' | 'speed'>

/** Trunk lean from which hands below the trunk count as upside down, degrees. */
const INVERTED_FROM = 120

/** Supports that carry a free body; beside a seat or pad they only steady it. */
const FREE = ['handsHanging', 'handsPushing', 'forearms', 'feet', 'knees', 'offHand', 'offFoot']

/** How demanding the base is, 0–1: the steadiest support, more on a single contact, more upside down. */
function baseShare({ mechanics }: Structure, solution: ExerciseSolution, ruleSet: RuleSet): number {
  const { base, oneContact, inverted } = ruleSet.coordination
  let steadiest = 1
  for (const support of mechanics.supports) steadiest = Math.min(steadiest, base.value[support])
  if (!mechanics.supports.every((support) => FREE.includes(support))) return steadiest
  const single = solution.frames.every((frame) => frame.reactions.length === 1)
  const onHands = mechanics.supports.every((support) => support === 'handsPushing' || support === 'forearms')
  const upsideDown = onHands && solution.frames.some((frame) => Math.abs(frame.angles.trunkLean) >= INVERTED_FROM)
  return clamp(steadiest + (single ? oneContact.value : 0) + (upsideDown ? inverted.value : 0), 0, 1)
}

/** How high load and pelvis stand over the ground, 0–1; nothing for a body that hangs. */
function massAboveShare({ mechanics }: Structure, solution: ExerciseSolution, ruleSet: RuleSet): number {
  if (mechanics.supports.includes('handsHanging')) return 0
  let highest = 0
  for (const { pose, loadLines } of solution.frames) {
    highest = Math.max(highest, pose.pelvis[2])
    for (const line of loadLines) if (line.kind === 'gravity') highest = Math.max(highest, line.at[2])
  }
  return clamp(highest / ruleSet.coordination.massAboveFull.value, 0, 1)
}

/**
 * Coordination demand 0–100 from structure alone: how free the path is, how small the base, how many joints move at once, one
 * side at a time, mass above the base, speed, and the skill grade. Each ingredient only ever adds: freeing the path or
 * shrinking the base never lowers it. Points and shares stand in the rule set (our estimate).
 */
export function coordinationDemand(document: Structure, solution: ExerciseSolution, ruleSet: RuleSet): number {
  const rules = ruleSet.coordination
  const points = rules.points.value
  const { movingFrom, most } = rules.joints.value
  const moving = JOINTS.filter((joint) => excursion(solution, joint, 'working') >= movingFrom).length
  const base = baseShare(document, solution, ruleSet)
  return (
    points.path * rules.path.value[document.mechanics.guidance] +
    points.base * base +
    points.joints * clamp(moving / most, 0, 1) +
    points.oneSide * (document.mechanics.sides === 'oneAtATime' ? 1 : 0) +
    points.massAbove * base * massAboveShare(document, solution, ruleSet) +
    points.speed * (document.speed === 'fast' ? 1 : 0) +
    points.skill * rules.skill.value[document.skill]
  )
}
