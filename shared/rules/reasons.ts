import type { RuleSet } from '../contract/rule-set'
import type { ExerciseSolution } from '../mechanics/solution'
import type { Action } from '../mechanics/vocabulary'
import type { Tightest } from './joint-stress'
import { excursion } from './motion'
import { groupRoleIn } from './muscles'
import { ACTION_NAMES, capital, jointName, kilograms, percent, percentOver, TARGET_NAMES } from './names'
import { AS_PLANNED } from './score'
import type { Candidate, RankRequest } from './types'

/** A joint that moves less than this through a repetition is held still, degrees. */
const STILL = 15
/** A hinge joint bent no more than this is nearly straight, degrees. */
const STRAIGHT = 25
/** Role from which the limiter is the target itself. */
const OWN = 0.7

/** How a capped joint fares, as the verb after its name. */
function bearing(solution: ExerciseSolution, { joint, channel }: Tightest): string {
  if (channel === 'gripPull' || channel === 'grip') return 'is asked most by the grip'
  if (channel === 'leaning') return joint === 'lowerBack' ? 'is pressed together' : 'is leaned on'
  if (channel === 'endRange') return 'works at the end of its range'
  const moved = Math.round(excursion(solution, joint, 'working'))
  const hinge = joint === 'elbow' || joint === 'knee' ? joint : null
  if (moved < STILL) {
    const straight = hinge !== null && solution.frames.every(({ angles }) => Math.abs(angles[hinge]) <= STRAIGHT)
    return straight ? 'stays nearly straight' : 'is held still'
  }
  return hinge === null ? `moves through ${moved}°` : `bends through ${moved}°`
}

/** What a stress is a share of. */
function ofWhat({ joint, channel }: Tightest): string {
  if (channel !== 'leaning') return 'its strength'
  return joint === 'lowerBack' ? 'the most a back at work should bear' : 'a handstand’s weight'
}

/** Why a swap stands where it stands, from its own numbers. */
export function swapReason(
  row: { targetDrive: number; keptIntensity: number; limiter: Action; tightest: Tightest | null },
  candidate: Candidate,
  request: RankRequest,
  ruleSet: RuleSet,
): string {
  const { name, plural } = TARGET_NAMES[request.target]
  const grip = candidate.document.mechanics.grip
  const own = groupRoleIn(row.limiter, request.target, grip, ruleSet) >= OWN
  const last = own
    ? `, and nothing else gives out before ${plural ? 'them' : 'it'}.`
    : `; the ${ACTION_NAMES[row.limiter]} gives out first.`
  const sentences = [
    `The ${name} ${plural ? 'end' : 'ends'} the set at ${percent(row.targetDrive)} of what ${plural ? 'they' : 'it'} can give${last}`,
  ]
  if (row.tightest !== null && row.tightest.cap !== null) {
    const { joint, side, stress, cap } = row.tightest
    sentences.push(
      `Your ${jointName(joint, side)} ${bearing(candidate.solution, row.tightest)}, at ${percent(stress)} of ${ofWhat(row.tightest)}; the cap is ${percent(cap)}.`,
    )
  }
  if (row.keptIntensity < AS_PLANNED) sentences.push(`It keeps ${percent(row.keptIntensity)} of the planned intensity.`)
  return sentences.join(' ')
}

/** How light the lightest possible form is, after "even with". */
function lightestWords(candidate: Candidate, load: number): string {
  const { kind } = candidate.document.load
  if (kind === 'assistance') return `even with ${kilograms(-load)} of assistance`
  if (load === 0) return kind === 'none' ? 'with body weight' : 'even with body weight alone'
  return `even with the lightest load, ${kilograms(load)}`
}

/** Why an exercise is over a cap, and what assistance would bring it under, if that is known (kg). */
export function overCapReason(
  candidate: Candidate,
  tightest: Tightest,
  load: number,
  assistance: number | null,
): string {
  const where = capital(jointName(tightest.joint, tightest.side))
  const first = `${where} at ${percentOver(tightest.stress)} ${lightestWords(candidate, load)}; the cap is ${percent(tightest.cap ?? 1)}.`
  return assistance === null ? first : `${first} With ${kilograms(assistance)} of assistance it would fit.`
}

/** Why an exercise is too hard, and what assistance would make one repetition possible, if that is known (kg). */
export function beyondStrengthReason(
  candidate: Candidate,
  limiter: { action: Action; demand: number },
  load: number,
  rir: number,
  assistance: number | null,
  assistedName: string | null,
): string {
  const asked =
    limiter.demand > 1
      ? `Beyond current strength: the ${ACTION_NAMES[limiter.action]} would need ${percentOver(limiter.demand)} of what it can give ${lightestWords(candidate, load)}.`
      : `Not one repetition would leave ${rir} in reserve: the ${ACTION_NAMES[limiter.action]} works at ${percent(limiter.demand)} ${lightestWords(candidate, load)}.`
  if (assistance === null) return asked
  const form = assistedName === null ? '' : ` (${assistedName})`
  return `${asked} With ${kilograms(assistance)} of assistance${form} it would become possible.`
}

/** Why an exercise is no swap for the target. */
export function notTrainedReason(target: RankRequest['target'], drive: number): string {
  const { name, plural } = TARGET_NAMES[target]
  return `The ${name} ${plural ? 'reach' : 'reaches'} only ${percent(drive)} of what ${plural ? 'they' : 'it'} can give when the set ends.`
}

/** Why an exercise that trains the target keeps too little of the plan. */
export const tooLittleReason = (target: RankRequest['target'], kept: number): string =>
  `The ${TARGET_NAMES[target].name} would keep only ${percent(kept)} of the planned work.`
