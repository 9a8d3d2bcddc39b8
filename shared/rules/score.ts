import type { RuleSet } from '../contract/rule-set'
import type { SwapRow } from '../contract/swap'
import { ACTIONS, type Action, type Grip } from '../mechanics/vocabulary'
import type { Tightest } from './joint-stress'
import { MUSCLES } from './muscle-names'
import { groupRoleIn, rolesIn } from './muscles'
import { ACTION_NAMES, jointName, percent, TARGET_NAMES } from './names'
import type { RankRequest } from './types'

type Factors = SwapRow['factors']
type Factor = Factors['kept']
type Demands = ReadonlyMap<Action, number>

/** Below this much demand elsewhere the rest of the body is said to have little to do. */
const LITTLE = 0.6

/** From here on the planned intensity counts as reached; the rest is whole repetitions. */
export const AS_PLANNED = 0.95

/** What the score of one swap is made from. */
export interface ScoreInput {
  targetDrive: number
  keptIntensity: number
  /** Repetitions in the swap's own unit. */
  repetitions: number
  unit: 'repetitions' | 'seconds'
  demands: Demands
  coordination: number
  grip: Grip
  tightest: readonly Tightest[]
}

/** Target drive × kept intensity against the original done healthy; more than the original counts as all of it. */
export function keptOf(targetDrive: number, keptIntensity: number, originalDrive: number, ruleSet: RuleSet): number {
  // An original that hardly trains the target sets no standard worth comparing with.
  return Math.min(1, (targetDrive * keptIntensity) / Math.max(originalDrive, ruleSet.score.leastTargetDrive.value))
}

function kept(input: ScoreInput, originalDrive: number, request: RankRequest, ruleSet: RuleSet): Factor {
  const { targetDrive, keptIntensity, repetitions, unit } = input
  const { name } = TARGET_NAMES[request.target]
  const { planned } = request
  const changed = planned.unit !== unit || planned.repetitions !== repetitions
  const length = unit === 'seconds' ? `${repetitions} s` : `${repetitions} repetitions`
  const before = planned.unit === 'seconds' ? `${planned.repetitions} s` : `${planned.repetitions}`
  const effort =
    keptIntensity < AS_PLANNED
      ? `${percent(keptIntensity)} of the planned intensity`
      : changed
        ? `planned intensity reached with ${length} instead of ${before}`
        : 'planned intensity'
  return {
    value: keptOf(targetDrive, keptIntensity, originalDrive, ruleSet),
    note: `${name} ${percent(targetDrive)} against ${percent(originalDrive)} in the original, ${effort}`,
  }
}

/** The side whose cap is used most; the first of equals. */
export function mostUsed(tightest: readonly Tightest[]): Tightest | null {
  let most: Tightest | null = null
  for (const one of tightest) if (one.cap !== null && (most === null || useOf(one) > useOf(most))) most = one
  return most
}

const useOf = ({ stress, cap }: Tightest): number => (cap === null || cap === 0 ? 0 : stress / cap)

/** What is left of `spare` when this share of the tightest cap is used. */
export const spareOf = (use: number, ruleSet: RuleSet): number => 1 - ruleSet.score.spare.value * use * use

function spare(tightest: readonly Tightest[], ruleSet: RuleSet): Factor {
  const most = mostUsed(tightest)
  if (most === null || most.cap === null) return { value: 1, note: 'no sore joint to spare' }
  const points = Math.round((most.cap - most.stress) * 100)
  const name = jointName(most.joint, most.side)
  return {
    value: spareOf(useOf(most), ruleSet),
    note:
      points <= 0 ? `at the ${name}’s cap` : `${points} ${points === 1 ? 'point' : 'points'} below the ${name}’s cap`,
  }
}

/** Calm work scores for every intent but skill, where coordination is what is wanted. */
export const calmOf = (coordination: number, intent: RankRequest['intent'], ruleSet: RuleSet): number =>
  1 - (ruleSet.score.calm.value * (intent === 'skill' ? 100 - coordination : coordination)) / 100

function calm(coordination: number, intent: RankRequest['intent'], ruleSet: RuleSet): Factor {
  const wanted = intent === 'skill' ? ', which a skill slot wants' : ''
  return {
    value: calmOf(coordination, intent, ruleSet),
    note: `coordination ${Math.round(coordination)} of 100${wanted}`,
  }
}

/** What is left of `lean` for the sum of demands that do not serve the target. */
export const leanOf = (rest: number, ruleSet: RuleSet): number => 1 / (1 + ruleSet.score.lean.value * rest)

function lean({ demands, grip }: ScoreInput, target: RankRequest['target'], ruleSet: RuleSet): Factor {
  let rest = 0
  let most: { action: Action; demand: number } | null = null
  for (const action of ACTIONS) {
    const demand = demands.get(action) ?? 0
    if (demand === 0 || groupRoleIn(action, target, grip, ruleSet) >= ruleSet.score.servesFrom.value) continue
    rest += demand
    if (most === null || demand > most.demand) most = { action, demand }
  }
  const note =
    most === null || rest < LITTLE
      ? 'little asked of the rest of the body'
      : `also asks ${percent(most.demand)} of the ${ACTION_NAMES[most.action]}`
  return { value: leanOf(rest, ruleSet), note }
}

/** What action demands ask of every muscle: Σ role × demand, in the order of the muscles' list. */
export function muscleLoads(demands: Demands, grip: Grip, ruleSet: RuleSet): number[] {
  const loads = MUSCLES.map(() => 0)
  for (const action of ACTIONS) {
    const demand = demands.get(action)
    if (demand === undefined) continue
    const roles = rolesIn(action, grip, ruleSet)
    for (let i = 0; i < roles.length; i++) loads[i]! += roles[i]! * demand
  }
  return loads
}

/**
 * Cosine of two movements' action demands, 0–1; 0 when either does no work. Taken over what the actions ask of the muscles, so
 * that pulling down in the sagittal and in the frontal plane count as kin and not as strangers.
 */
export function likeness(one: ArrayLike<number>, other: ArrayLike<number>): number {
  let dot = 0
  let first = 0
  let second = 0
  for (let i = 0; i < one.length; i++) {
    const u = one[i] ?? 0
    const v = other[i] ?? 0
    dot += u * v
    first += u * u
    second += v * v
  }
  return first === 0 || second === 0 ? 0 : Math.min(1, dot / Math.sqrt(first * second))
}

function carryOver({ demands, grip }: ScoreInput, originalLoads: readonly number[], ruleSet: RuleSet): Factor {
  const alike = likeness(muscleLoads(demands, grip, ruleSet), originalLoads)
  return {
    value: 1 - ruleSet.score.carryOver.value * (1 - alike),
    note: `works the body ${percent(alike)} like the original`,
  }
}

/** The named factors of a swap's score, each 0–1 with the words for its number. */
export function factorsOf(
  input: ScoreInput,
  original: { drive: number; muscleLoads: readonly number[] },
  request: RankRequest,
  ruleSet: RuleSet,
): Factors {
  return {
    kept: kept(input, original.drive, request, ruleSet),
    spare: spare(input.tightest, ruleSet),
    calm: calm(input.coordination, request.intent, ruleSet),
    lean: lean(input, request.target, ruleSet),
    carryOver: carryOver(input, original.muscleLoads, ruleSet),
  }
}

/** Score 0–100: the product of the factors, always multiplied in the same order. */
export const scoreOf = ({ kept, spare, calm, lean, carryOver }: Factors): number =>
  100 * kept.value * spare.value * calm.value * lean.value * carryOver.value
