import type { RuleSet } from '../contract/rule-set'
import { SKILL_GRADES } from '../contract/exercise'
import type { Sex } from '../mechanics/sex'
import { ACTION_JOINT, JOINTS } from '../mechanics/vocabulary'
import { averageAdult } from './average-adult'
import { keyOf, PUSH } from './keys'
import { memo } from './memo'
import { motionOf, stressFactor } from './motion'
import { TARGET_GROUP_NAMES } from './muscle-names'
import { planOf, type Plan } from './plan'
import { gainsOf, groupsByKey, piecesOf, reachOf } from './reach'
import { calmOf } from './score'
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
  /** Eight bytes: up to which extra each joint's go, in the joints' order. */
  ends: 9,
  size: 10,
} as const
/** Numbers per row: inverse of the size, shift, and two singles in one: motion and training value. */
export const ROW = 3
/** Numbers that the keys of this many rows take, a byte each, between head and rows. */
export const keysSize = (rows: number): number => (rows + 7) >> 3
/** Numbers per extra strain: channel and key, signed size, shift. */
export const EXTRA = 3
/** Numbers per frame of the spine: trunk moment a and b, force along the spine a and b. */
export const SPINE = 4
/** An extra's code is channel × this + key; the channel is the joint's index × 2, + 1 for the end of its range. */
export const CODE = 64

/**
 * A catalogue as numbers, for one segment table, rule set and place; each exercise is one block, so that reading it touches
 * one place in memory: the head, the rows’ keys, the rows, extras and spine.
 * A row is one signed action in one frame: its demand is gain[key] × (L + m·shift) ÷ inverse. Rows that another of the same
 * action outdoes at every load are left away.
 */
export interface PackedBlocks {
  count: number
  /** Where each packed exercise stood among the candidates. */
  index: Uint32Array
  /** First number of every block, and one past the last. */
  start: Uint32Array
  numbers: Float64Array
  /** The same memory for a row's last number and for the keys. */
  singles: Float32Array
  bytes: Uint8Array
  coordination: Float64Array
  /** Index of the skill grade, beyond the highest where the place cannot serve the exercise. */
  skill: Uint8Array
}

/** A packed catalogue in the order of its candidates. */
export interface PackedCatalogue extends PackedBlocks {
  /** Index among the candidates by id. */
  positions: Map<string, number>
  /** Per target group and exercise, the most its target drive could be by the roles of its muscles. */
  potential: Float32Array[]
  /** The same by demands whatever the load, for strengths in the ratio of the average adult's. */
  reach: Float32Array[]
  /** The average adult's gains for a body mass of 1, which `reach` stands on. */
  averageGain: Float64Array
}

/** The part of a catalogue that could train one target group, what could score highest first. */
export interface TargetPack extends PackedBlocks {
  potential: Float32Array
  reach: Float32Array
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

/** Where every candidate's block begins. */
function layOut(candidates: Iterable<Candidate>, place: Place | null, ruleSet: RuleSet): Uint32Array {
  const start = [0]
  for (const candidate of candidates) {
    const { strains, compressions } = planOf(ruleSet)(candidate.solution)
    const rows = rowsOf(candidate, settingsAt(candidate, place, ruleSet), ruleSet).length
    let extras = 0
    for (const joint of JOINTS) for (const { channel } of strains[joint]) if (isExtra(channel)) extras++
    const size = HEAD.size + keysSize(rows) + ROW * rows + EXTRA * extras + SPINE * compressions.length
    start.push(start[start.length - 1]! + size)
  }
  return Uint32Array.from(start)
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
  const start = layOut(candidates, place, ruleSet)
  const count = start.length - 1
  const numbers = new Float64Array(start[count]!)
  const packed: PackedCatalogue = {
    count,
    index: Uint32Array.from({ length: count }, (_, at) => at),
    start,
    numbers,
    singles: new Float32Array(numbers.buffer),
    bytes: new Uint8Array(numbers.buffer),
    positions: new Map(),
    coordination: new Float64Array(count),
    skill: new Uint8Array(count),
    potential: TARGET_GROUP_NAMES.map(() => new Float32Array(count)),
    reach: TARGET_GROUP_NAMES.map(() => new Float32Array(count)),
    averageGain: gainsOf(adult, strengthTables(adult, ruleSet), ruleSet).map((gain) => gain * adult.bodyMass),
  }
  const groups = groupsByKey(ruleSet)
  let at = 0
  for (const candidate of candidates) packOne(packed, at++, candidate, place, groups, ruleSet)
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
  const { numbers, singles, bytes } = packed
  const settings = settingsAt(candidate, place, ruleSet)
  const rows = rowsOf(candidate, settings, ruleSet)
  const plan = planOf(ruleSet)(solution)
  packed.positions.set(id, at)
  packed.coordination[at] = coordination
  packed.skill[at] = settings === null ? SKILL_GRADES.length : SKILL_GRADES.indexOf(document.skill)
  const keys = packed.start[at]! + HEAD.size
  let next = keys + keysSize(rows.length)
  for (const [i, { key, a, b, motion, trains }] of rows.entries()) {
    const size = slopeOf(a, b)
    bytes[8 * keys + i] = key
    numbers.set([1 / size, a / size], next)
    singles.set([motion, trains], 2 * (next + 2))
    next += ROW
    for (const [group, role] of groups[key]!) {
      const potential = packed.potential[group]!
      potential[at] = Math.max(potential[at]!, upward(role * trains))
    }
  }
  const extras = extrasOf(plan, document.mechanics)
  let ends = 0
  for (const [j, joint] of JOINTS.entries()) {
    ends += plan.strains[joint].filter(({ channel }) => isExtra(channel)).length
    if (ends > 255) throw new RangeError('An exercise has more strains than a block can count.')
    bytes[8 * (packed.start[at]! + HEAD.ends) + j] = ends
  }
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
 * at every load from nothing up, are left away. With assistance all are kept, because there any may set an end.
 */
function rowsOf({ document, solution }: Candidate, settings: Settings | null, ruleSet: RuleSet): Row[] {
  if (settings === null) return []
  const motions = motionOf(solution)
  const prunes = settings.kind !== 'assistance'
  const way = settings.kind === 'none' ? 0 : 1
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
      if (prunes) {
        if (row.a <= 0 && way * row.b <= 0) continue
        if (kept.some((other) => outdoes(other, row, way))) continue
        for (let i = kept.length - 1; i >= 0; i--) if (outdoes(row, kept[i]!, way)) kept.splice(i, 1)
      }
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

/**
 * The blocks that could train a target group, in the order of what they could score at most for a calm slot and average
 * strengths, so that a ranking reads memory from its beginning. Made once per packed catalogue, rule set and group.
 */
export const targetPack = memo((packed: PackedCatalogue) =>
  memo((ruleSet: RuleSet) => {
    const made = new Map<number, TargetPack>()
    return (group: number): TargetPack => {
      const known = made.get(group) ?? makeTargetPack(packed, group, ruleSet)
      made.set(group, known)
      return known
    }
  }),
)

function makeTargetPack(packed: PackedCatalogue, group: number, ruleSet: RuleSet): TargetPack {
  const potential = packed.potential[group]!
  const reach = packed.reach[group]!
  const least = ruleSet.score.leastTargetDrive.value - 1e-6
  const first = (at: number) =>
    calmOf(packed.coordination[at]!, 'size', ruleSet) * Math.min(1, potential[at]!, reach[at]!)
  const order = packed.index.filter((at) => potential[at]! >= least)
  const keys = Float64Array.from(order, first)
  const sorted = Uint32Array.from(order.keys()).sort((one, other) => keys[other]! - keys[one]! || one - other)
  const index = sorted.map((place) => order[place]!)
  const start = new Uint32Array(index.length + 1)
  index.forEach((from, at) => {
    start[at + 1] = start[at]! + packed.start[from + 1]! - packed.start[from]!
  })
  const numbers = new Float64Array(start[index.length]!)
  index.forEach((from, at) => {
    numbers.set(packed.numbers.subarray(packed.start[from], packed.start[from + 1]), start[at]!)
  })
  return {
    count: index.length,
    index,
    start,
    numbers,
    singles: new Float32Array(numbers.buffer),
    bytes: new Uint8Array(numbers.buffer),
    coordination: Float64Array.from(index, (from) => packed.coordination[from]!),
    skill: Uint8Array.from(index, (from) => packed.skill[from]!),
    potential: Float32Array.from(index, (from) => potential[from]!),
    reach: Float32Array.from(index, (from) => reach[from]!),
  }
}
