import type { RuleSet } from '../contract/rule-set'
import { SKILL_GRADES } from '../contract/exercise'
import { ACTION_JOINT, ACTIONS, GRIPS, JOINTS, type Action, type Grip } from '../mechanics/vocabulary'
import { motionOf, stressFactor } from './motion'
import { TARGET_GROUP_NAMES } from './muscle-names'
import { groupRoleIn } from './muscles'
import { planOf } from './plan'
import { equipmentAt, settingsOf, type Settings } from './settings'
import type { Candidate, Place } from './types'

/**
 * Keys of the packed format: what an effort is measured against. Every action has one; elbow flexion has one per grip, because
 * the grip turns its muscles' roles, and the wrist's actions have a second one for a hand that is carried.
 */
export const CARRIED: readonly Action[] = [
  'wristFlexion',
  'wristExtension',
  'wristRadialDeviation',
  'wristUlnarDeviation',
]
export const KEYS: ReadonlyArray<{ action: Action | null; grip: Grip | null; carried: boolean }> = [
  ...ACTIONS.map((action) => ({ action, grip: null, carried: false })),
  ...GRIPS.map((grip) => ({ action: 'elbowFlexion' as const, grip, carried: false })),
  ...CARRIED.map((action) => ({ action, grip: null, carried: true })),
  { action: null, grip: null, carried: false },
  { action: null, grip: null, carried: false },
]
/** The side of an axis that no muscle answers. */
export const NOBODY = KEYS.length - 2
/** The push on a hand that counts as 1. */
export const PUSH = KEYS.length - 1

const FIRST_GRIP = ACTIONS.length
const FIRST_CARRIED = FIRST_GRIP + GRIPS.length

function keyOf(action: Action | null, { grip, gripFree }: Candidate['document']['mechanics']): number {
  if (action === null) return NOBODY
  if (action === 'elbowFlexion') return FIRST_GRIP + GRIPS.indexOf(grip)
  const carried = gripFree ? CARRIED.indexOf(action) : -1
  return carried >= 0 ? FIRST_CARRIED + carried : ACTIONS.indexOf(action)
}

/** A slope this small never moves a load a gram; smaller ones are set to it, so that every term has one. */
const LEAST_SLOPE = 1e-12

/** Numbers per term: what turns a share of strength into a load on either side, and the shift of the load. */
export const STRIDE = 3

/**
 * A catalogue as typed arrays, for one segment table, rule set and place, the calmest exercise first.
 * A term's value is gain[key] × size × |L + m·shift|, its size the inverse of `terms[0]` with the high key where L + m·shift is
 * positive, and the inverse of `terms[1]` with the low key where it is negative; the shift is `terms[2]`.
 */
export interface PackedCatalogue {
  count: number
  /** Where each packed exercise stood among the candidates. */
  index: Uint32Array
  /** First row of every exercise, and one past the last. */
  termStart: Uint32Array
  extraStart: Uint32Array
  frameStart: Uint32Array
  terms: Float64Array
  highKey: Uint8Array
  lowKey: Uint8Array
  /** Stress counts by this much of the demand; training by that much. */
  motion: Float64Array
  trains: Float64Array
  /** Strains that are no action's demand: one-sided, `extraSize` is signed. Index of joint × 2, + 1 for the end of range. */
  extraChannel: Uint8Array
  extraKey: Uint8Array
  extraSize: Float64Array
  extraShift: Float64Array
  /** Trunk moment a, b and force along the spine a, b of every frame. */
  spine: Float64Array
  coordination: Float64Array
  /** Index of the skill grade, beyond the highest where the place cannot serve the exercise. */
  skill: Uint8Array
  settings: Array<Settings | null>
  ids: string[]
  /** Per target group and exercise, the most its target drive could be. */
  potential: Float64Array[]
}

/** The slope of a term, never so small that nothing can be divided by it. */
export const slopeOf = (a: number, b: number): number =>
  Math.abs(b) >= LEAST_SLOPE ? b : b < 0 || (b === 0 && a < 0) ? -LEAST_SLOPE : LEAST_SLOPE

const isExtra = (channel: string): boolean => channel === 'leaning' || channel === 'endRange'

/** Rows every candidate needs, in the order they come, and where each one goes: the calmest first. */
function layOut(candidates: Iterable<Candidate>, ruleSet: RuleSet) {
  const rows: Array<{ terms: number; extras: number; frames: number; coordination: number }> = []
  for (const { solution, coordination } of candidates) {
    const plan = planOf(ruleSet)(solution)
    let extras = 0
    for (const joint of JOINTS) for (const { channel } of plan.strains[joint]) if (isExtra(channel)) extras++
    rows.push({ terms: plan.terms.length, extras, frames: plan.compressions.length, coordination })
  }
  const index = Uint32Array.from(rows.keys()).sort((one, other) => {
    const difference = rows[one]!.coordination - rows[other]!.coordination
    return difference === 0 ? one - other : difference
  })
  const place = new Uint32Array(rows.length)
  const starts = (of: 'terms' | 'extras' | 'frames') => {
    const start = new Uint32Array(rows.length + 1)
    index.forEach((from, at) => {
      start[at + 1] = start[at]! + rows[from]![of]
    })
    return start
  }
  index.forEach((from, at) => {
    place[from] = at
  })
  return { index, place, termStart: starts('terms'), extraStart: starts('extras'), frameStart: starts('frames') }
}

/**
 * Packs a catalogue for `rankTop`. Walks over the candidates twice, so that they may be made as they are asked for.
 * @param place whose equipment and load steps count; null packs as if everything were at hand
 */
export function packCatalogue(
  candidates: { [Symbol.iterator](): Iterator<Candidate> },
  place: Place | null,
  ruleSet: RuleSet,
): PackedCatalogue {
  const { place: placeOf, ...layout } = layOut(candidates, ruleSet)
  const count = layout.index.length
  const terms = layout.termStart[count]!
  const extras = layout.extraStart[count]!
  const packed: PackedCatalogue = {
    ...layout,
    count,
    terms: new Float64Array(STRIDE * terms),
    highKey: new Uint8Array(terms),
    lowKey: new Uint8Array(terms),
    motion: new Float64Array(terms),
    trains: new Float64Array(terms),
    extraChannel: new Uint8Array(extras),
    extraKey: new Uint8Array(extras),
    extraSize: new Float64Array(extras),
    extraShift: new Float64Array(extras),
    spine: new Float64Array(4 * layout.frameStart[count]!),
    coordination: new Float64Array(count),
    skill: new Uint8Array(count),
    settings: new Array<Settings | null>(count).fill(null),
    ids: new Array<string>(count).fill(''),
    potential: TARGET_GROUP_NAMES.map(() => new Float64Array(count)),
  }
  let from = 0
  for (const candidate of candidates) packOne(packed, placeOf[from++]!, candidate, place, ruleSet)
  return packed
}

function packOne(
  packed: PackedCatalogue,
  at: number,
  candidate: Candidate,
  place: Place | null,
  ruleSet: RuleSet,
): void {
  const { document, solution, coordination, id } = candidate
  const plan = planOf(ruleSet)(solution)
  const motion = motionOf(solution)
  let term = packed.termStart[at]!
  for (const { a, b, role, positive, negative, leftPositive, leftNegative, trains } of plan.terms) {
    const slope = slopeOf(a, b)
    const [high, low] = slope > 0 ? [positive, negative] : [negative, positive]
    const [leftHigh, leftLow] = slope > 0 ? [leftPositive, leftNegative] : [leftNegative, leftPositive]
    packed.highKey[term] = keyOf(high, document.mechanics)
    packed.lowKey[term] = keyOf(low, document.mechanics)
    packed.terms.set([leftHigh / Math.abs(slope), leftLow / Math.abs(slope), a / slope], STRIDE * term)
    packed.trains[term] = trains
    // The grip's weights stand in its caps.
    packed.motion[term] =
      positive === null || positive === 'grip' ? 1 : stressFactor(motion[role][ACTION_JOINT[positive]], ruleSet)
    for (const [g, group] of TARGET_GROUP_NAMES.entries()) {
      const potential = packed.potential[g]!
      for (const action of [positive, negative]) {
        if (action === null) continue
        const share = trains * groupRoleIn(action, group, document.mechanics.grip, ruleSet)
        if (share > potential[at]!) potential[at] = share
      }
    }
    term++
  }
  packExtras(packed, at, candidate, ruleSet)
  packed.spine.set(
    plan.compressions.flatMap(({ moment, axial }) => [...moment, ...axial]),
    4 * packed.frameStart[at]!,
  )
  const equipment = equipmentAt(document, place)
  const settings = equipment && settingsOf(document, place, equipment, ruleSet)
  packed.settings[at] = settings
  packed.ids[at] = id
  packed.coordination[at] = coordination
  packed.skill[at] = settings === null ? SKILL_GRADES.length : SKILL_GRADES.indexOf(document.skill)
}

function packExtras(packed: PackedCatalogue, at: number, { document, solution }: Candidate, ruleSet: RuleSet): void {
  const plan = planOf(ruleSet)(solution)
  let extra = packed.extraStart[at]!
  for (const [j, joint] of JOINTS.entries()) {
    for (const { channel, a, b, against } of plan.strains[joint]) {
      if (!isExtra(channel)) continue
      const slope = slopeOf(a, b)
      packed.extraChannel[extra] = 2 * j + (channel === 'endRange' ? 1 : 0)
      packed.extraKey[extra] = against === 'push' ? PUSH : keyOf(against, document.mechanics)
      packed.extraSize[extra] = slope
      packed.extraShift[extra] = a / slope
      extra++
    }
  }
}
