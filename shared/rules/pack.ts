import type { RuleSet } from '../contract/rule-set'
import { SKILL_GRADES } from '../contract/exercise'
import type { Sex } from '../mechanics/sex'
import { ACTION_JOINT, JOINTS } from '../mechanics/vocabulary'
import { averageAdult } from './average-adult'
import { keyOf, PUSH } from './keys'
import { motionOf, stressFactor } from './motion'
import { TARGET_GROUP_NAMES } from './muscle-names'
import { planOf, type Plan } from './plan'
import { gainsOf, groupsByKey, piecesOf, reachOf } from './reach'
import { equipmentAt, settingsOf, type Settings } from './settings'
import { strengthTables } from './strength'
import type { Candidate, Place } from './types'

/** A slope this small never moves a load a gram; smaller ones are set to it, so that every term has one. */
const LEAST_SLOPE = 1e-12

/** Kinds of load by their number in a block. */
export const LOAD_KINDS = ['none', 'added', 'assistance', 'external'] as const

/** Numbers at the head of a block, by their place. */
export const HEAD = {
  rows: 0,
  extras: 1,
  frames: 2,
  /** Index in `LOAD_KINDS`; −1 where the place cannot serve the exercise. */
  kind: 3,
  lightest: 4,
  heaviest: 5,
  first: 6,
  /** Load step, 0 where there is none to set. */
  step: 7,
  last: 8,
  size: 9,
} as const
/** Numbers per row: inverse of the size, shift, motion, and key with training value. */
export const ROW = 4
/** Numbers per extra strain: channel and key, signed size, shift. */
export const EXTRA = 3
/** Numbers per frame of the spine: trunk moment a and b, force along the spine a and b. */
export const SPINE = 4
/** An extra's code is channel × this + key; the channel is the joint's index × 2, + 1 for the end of its range. */
export const CODE = 64

/**
 * A catalogue as numbers, for one segment table, rule set and place, the calmest exercise first; each exercise is one block, so
 * that reading it touches one place in memory: the head, its rows, extras and spine.
 * A row is one signed action in one frame: its demand is gain[key] × (L + m·shift) ÷ inverse. Rows that another of the same
 * action outdoes at every load are left away.
 */
export interface PackedCatalogue {
  count: number
  /** Where each packed exercise stood among the candidates. */
  index: Uint32Array
  /** Packed position by the candidate's id. */
  positions: Map<string, number>
  /** First number of every block, and one past the last. */
  start: Uint32Array
  numbers: Float64Array
  /** The same memory for a row's last number: training value and key. */
  singles: Float32Array
  words: Uint32Array
  coordination: Float64Array
  /** Index of the skill grade, beyond the highest where the place cannot serve the exercise. */
  skill: Uint8Array
  /** Per target group and exercise, the most its target drive could be by the roles of its muscles. */
  potential: Float32Array[]
  /** The same by demands whatever the load, for strengths in the ratio of the average adult's. */
  reach: Float32Array[]
  /** The average adult's gains for a body mass of 1, which `reach` stands on. */
  averageGain: Float64Array
}

/** The slope of a term, never so small that nothing can be divided by it. */
export const slopeOf = (a: number, b: number): number =>
  Math.abs(b) >= LEAST_SLOPE ? b : b < 0 || (b === 0 && a < 0) ? -LEAST_SLOPE : LEAST_SLOPE

const isExtra = (channel: string): boolean => channel === 'leaning' || channel === 'endRange'

/** How a candidate can be loaded at the place, or null. */
function settingsAt({ document }: Candidate, place: Place | null, ruleSet: RuleSet): Settings | null {
  const equipment = equipmentAt(document, place)
  return equipment && settingsOf(document, place, equipment, ruleSet)
}

/** Numbers every candidate needs, in the order they come, and where each one goes: the calmest first. */
function layOut(candidates: Iterable<Candidate>, place: Place | null, ruleSet: RuleSet) {
  const needs: Array<{ size: number; coordination: number }> = []
  for (const candidate of candidates) {
    const { strains, compressions } = planOf(ruleSet)(candidate.solution)
    const rows = rowsOf(candidate, settingsAt(candidate, place, ruleSet), ruleSet).length
    let extras = 0
    for (const joint of JOINTS) for (const { channel } of strains[joint]) if (isExtra(channel)) extras++
    const size = HEAD.size + ROW * rows + EXTRA * extras + SPINE * compressions.length
    needs.push({ size, coordination: candidate.coordination })
  }
  const index = Uint32Array.from(needs.keys()).sort((one, other) => {
    const difference = needs[one]!.coordination - needs[other]!.coordination
    return difference === 0 ? one - other : difference
  })
  const position = new Uint32Array(needs.length)
  const start = new Uint32Array(needs.length + 1)
  index.forEach((from, at) => {
    position[from] = at
    start[at + 1] = start[at]! + needs[from]!.size
  })
  return { index, position, start }
}

/** What a catalogue is packed for. */
export interface PackFor {
  /** Of the segment table the candidates were solved with. */
  sex: Sex
  /** Whose equipment and load steps count; null packs as if everything were at hand. */
  place: Place | null
}

/** Packs a catalogue for `rankTop`. Walks over the candidates twice, so that they may be made as they are asked for. */
export function packCatalogue(
  candidates: { [Symbol.iterator](): Iterator<Candidate> },
  { sex, place }: PackFor,
  ruleSet: RuleSet,
): PackedCatalogue {
  const adult = averageAdult(sex, ruleSet)
  const { position, index, start } = layOut(candidates, place, ruleSet)
  const count = index.length
  const numbers = new Float64Array(start[count]!)
  const packed: PackedCatalogue = {
    count,
    index,
    start,
    numbers,
    singles: new Float32Array(numbers.buffer),
    words: new Uint32Array(numbers.buffer),
    positions: new Map(),
    coordination: new Float64Array(count),
    skill: new Uint8Array(count),
    potential: TARGET_GROUP_NAMES.map(() => new Float32Array(count)),
    reach: TARGET_GROUP_NAMES.map(() => new Float32Array(count)),
    averageGain: gainsOf(adult, strengthTables(adult, ruleSet), ruleSet).map((gain) => gain * adult.bodyMass),
  }
  const groups = groupsByKey(ruleSet)
  let from = 0
  for (const candidate of candidates) packOne(packed, position[from++]!, candidate, place, groups, ruleSet)
  return packed
}

function packOne(
  packed: PackedCatalogue,
  at: number,
  candidate: Candidate,
  place: Place | null,
  groups: ReturnType<typeof groupsByKey>,
  ruleSet: RuleSet,
): void {
  const { document, solution, coordination, id } = candidate
  const { numbers, singles, words } = packed
  const settings = settingsAt(candidate, place, ruleSet)
  const rows = rowsOf(candidate, settings, ruleSet)
  const plan = planOf(ruleSet)(solution)
  packed.positions.set(id, at)
  packed.coordination[at] = coordination
  packed.skill[at] = settings === null ? SKILL_GRADES.length : SKILL_GRADES.indexOf(document.skill)
  let next = packed.start[at]! + HEAD.size
  for (const { key, a, b, motion, trains } of rows) {
    const size = slopeOf(a, b)
    numbers.set([1 / size, a / size, motion], next)
    singles[2 * (next + 3)] = upward(trains)
    words[2 * (next + 3) + 1] = key
    next += ROW
    for (const [group, role] of groups[key]!) {
      const potential = packed.potential[group]!
      potential[at] = Math.max(potential[at]!, upward(role * trains))
    }
  }
  const extras = extrasOf(plan, document.mechanics)
  numbers.set(extras, next)
  numbers.set(
    plan.compressions.flatMap(({ moment, axial }) => [...moment, ...axial]),
    next + extras.length,
  )
  const { first, step, last } = settings?.steps ?? { first: 0, step: 0, last: 0 }
  const kind = settings === null ? -1 : LOAD_KINDS.indexOf(settings.kind)
  const bounds = [settings?.lightest ?? 0, settings?.heaviest ?? 0]
  const counts = [rows.length, extras.length / EXTRA, plan.compressions.length]
  numbers.set([...counts, kind, ...bounds, first, step, last], packed.start[at]!)
  if (settings === null) return
  const reach = reachOf(rows, piecesOf(settings), packed.averageGain, groups)
  for (let g = 0; g < reach.length; g++) packed.reach[g]![at] = upward(reach[g]!)
}

/** Strains that are no action's demand, as numbers of a block. */
const extrasOf = ({ strains }: Plan, mechanics: Candidate['document']['mechanics']): number[] =>
  JOINTS.flatMap((joint, j) =>
    strains[joint]
      .filter(({ channel }) => isExtra(channel))
      .flatMap(({ channel, a, b, against }) => {
        const size = slopeOf(a, b)
        const key = against === 'push' ? PUSH : keyOf(against, mechanics)
        return [(2 * j + (channel === 'endRange' ? 1 : 0)) * CODE + key, size, a / size]
      }),
  )

/** Raised by more than single precision can take off. */
const upward = (value: number): number => value * (1 + 1e-6)

/** One signed action in one frame: its demand is gain × (m·a + L·b) where that is positive. */
export interface Row {
  key: number
  a: number
  b: number
  motion: number
  trains: number
}

/**
 * The rows that can matter at the exercise's settings: those never at work, and those that another of the same action outdoes
 * at every load, are left away; the strongest first.
 */
function rowsOf({ document, solution }: Candidate, settings: Settings | null, ruleSet: RuleSet): Row[] {
  if (settings === null) return []
  const motions = motionOf(solution)
  // Which way the load goes: up from nothing, down from it (assistance), or nowhere.
  const way = settings.kind === 'none' ? 0 : settings.kind === 'assistance' ? -1 : 1
  const kept: Row[] = []
  for (const plan of planOf(ruleSet)(solution).terms) {
    const still = plan.positive === null || plan.positive === 'grip'
    const motion = still ? 1 : stressFactor(motions[plan.role][ACTION_JOINT[plan.positive!]], ruleSet)
    for (const sign of [1, -1] as const) {
      const action = sign === 1 ? plan.positive : plan.negative
      if (action === null) continue
      const share = sign / (sign === 1 ? plan.leftPositive : plan.leftNegative)
      const row = {
        key: keyOf(action, document.mechanics),
        a: share * plan.a,
        b: share * plan.b,
        motion,
        trains: plan.trains,
      }
      if (row.a <= 0 && way * row.b <= 0) continue
      if (kept.some((other) => outdoes(other, row, way))) continue
      for (let i = kept.length - 1; i >= 0; i--) if (outdoes(row, kept[i]!, way)) kept.splice(i, 1)
      kept.push(row)
    }
  }
  return kept
}

const outdoes = (one: Row, other: Row, way: number): boolean =>
  one.key === other.key &&
  one.motion === other.motion &&
  one.trains === other.trains &&
  one.a >= other.a &&
  way * one.b >= way * other.b
