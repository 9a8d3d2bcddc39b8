import { ACTION_JOINT, JOINTS, type Joint } from '../mechanics/vocabulary'
import type { RankContext } from './context'
import { intensity } from './dose'
import { GRAVITY } from './efforts'
import { groupRoleIn, rolesIn } from './muscles'
import { MUSCLES } from './muscle-names'
import { KEYS, NOBODY } from './keys'
import { CODE, EXTRA, HEAD, LOAD_KINDS, ROW, slopeOf, SPINE, type PackedCatalogue } from './pack'
import { gainsOf } from './reach'
import { calmOf, keptOf, leanOf, likeness, spareOf } from './score'
import { roundLoad, type Settings } from './settings'
import type { StressChannel } from './types'

/** An athlete's ranking as tables by packed key. */
export interface BoundTables {
  context: RankContext
  mass: number
  gain: Float64Array
  role: Float64Array
  serves: Uint8Array
  /** Largest stress allowed, by joint and extra channel. */
  extraCap: Float64Array
  capsExtras: boolean
  /** Cap on L5/S1 compression as a share of what counts as 1, that share per N, and stature ÷ arm of the back muscles. */
  spineCap: number
  spineGain: number
  spineArm: number
  /** Planned intensity ÷ gain: what strength leaves of a load per unit of size. */
  reach: Float64Array
  /** Cap ÷ gain, Infinity where nothing caps it. */
  capReach: Float64Array
  /** Roles of every muscle, key by key. */
  muscleRoles: Float64Array
  /** Working space: demands by key, loads by muscle, and the share used of the tightest cap. */
  keyMost: Float64Array
  loads: Float64Array
  use: number
}

/** Rounding of the packed numbers against the exact ones is far below this. */
const SLACK = 1e-7
/** What an upper bound is raised by, so that rounding never sinks it below the exact score. */
const RAISED = 1 + 1e-6

/** The strictest cap on a channel, whichever side. */
function limitOf({ caps }: RankContext, joint: Joint, channel: StressChannel): number {
  let limit = Number.POSITIVE_INFINITY
  for (const { byChannel } of caps.get(joint) ?? []) limit = Math.min(limit, byChannel.get(channel)?.limit ?? limit)
  return limit
}

/** Makes the tables of one ranking. */
export function boundTables(context: RankContext): BoundTables {
  const { ruleSet, tables, request } = context
  const { athlete, target } = request
  const { wrist, elbow } = ruleSet.stress.grip.value
  const size = (make: (key: number) => number) => Float64Array.from(KEYS, (_, key) => make(key))
  const gripCap = Math.min(limitOf(context, 'wrist', 'grip') / wrist, limitOf(context, 'elbow', 'gripPull') / elbow)
  const role = size((key) => {
    const { action, grip } = KEYS[key]!
    return action === null ? 0 : groupRoleIn(action, target, grip ?? 'none', ruleSet)
  })
  const gain = gainsOf(athlete, tables, ruleSet)
  const cap = size((key) => {
    const { action } = KEYS[key]!
    if (action === null) return Number.POSITIVE_INFINITY
    return action === 'grip' ? gripCap : limitOf(context, ACTION_JOINT[action], action)
  })
  const extraCap = Float64Array.from(
    JOINTS.flatMap((joint) => [limitOf(context, joint, 'leaning'), limitOf(context, joint, 'endRange')]),
  )
  return {
    context,
    mass: athlete.bodyMass,
    gain,
    reach: gain.map((own) => context.original.intensity / own),
    muscleRoles: Float64Array.from(
      KEYS.flatMap(({ action, grip }) =>
        action === null ? MUSCLES.map(() => 0) : rolesIn(action, grip ?? 'none', ruleSet),
      ),
    ),
    capReach: cap.map((limit, key) => limit / gain[key]!),
    loads: new Float64Array(MUSCLES.length),
    use: 0,
    role,
    serves: Uint8Array.from(role, (share) => (share >= ruleSet.score.servesFrom.value ? 1 : 0)),
    extraCap,
    capsExtras: extraCap.some((limit) => limit !== Number.POSITIVE_INFINITY),
    spineCap: limitOf(context, 'lowerBack', 'leaning'),
    spineGain: GRAVITY / ruleSet.stress.compressionFull.value,
    spineArm: athlete.stature / ruleSet.stress.backMuscleArm.value,
    keyMost: new Float64Array(KEYS.length),
  }
}

/**
 * How far the athlete's strengths can lift a target drive above what `reach` says for the average adult's: the largest ratio
 * between a key that serves the target and any other.
 */
export function spreadOf({ gain, role, mass }: BoundTables, { averageGain }: PackedCatalogue): number {
  let most = 0
  let least = Number.POSITIVE_INFINITY
  for (let key = 0; key < NOBODY; key++) {
    const ratio = (gain[key]! * mass) / averageGain[key]!
    if (role[key]! > 0 && ratio > most) most = ratio
    if (ratio < least) least = ratio
  }
  return (most / least) * RAISED
}

/** Loads that strength and caps leave, kg. */
interface Ends {
  strongLeast: number
  strongMost: number
  allowedLeast: number
  allowedMost: number
}

function endsOf({ numbers, words }: PackedCatalogue, block: number, tables: BoundTables, ends: Ends): void {
  const { reach, capReach, mass } = tables
  let strongLeast = Number.NEGATIVE_INFINITY
  let strongMost = Number.POSITIVE_INFINITY
  let allowedLeast = Number.NEGATIVE_INFINITY
  let allowedMost = Number.POSITIVE_INFINITY
  const end = block + HEAD.size + ROW * numbers[block]!
  for (let r = block + HEAD.size; r < end; r += ROW) {
    const key = words[2 * r + 7]!
    const inverse = numbers[r]!
    const moved = mass * numbers[r + 1]!
    const edge = reach[key]! * inverse - moved
    if (inverse > 0) {
      if (edge < strongMost) strongMost = edge
    } else if (edge > strongLeast) strongLeast = edge
    const capped = capReach[key]!
    if (capped !== Number.POSITIVE_INFINITY) {
      const limit = (capped / numbers[r + 2]!) * inverse - moved
      if (inverse > 0) {
        if (limit < allowedMost) allowedMost = limit
      } else if (limit > allowedLeast) allowedLeast = limit
    }
  }
  ends.strongLeast = strongLeast
  ends.strongMost = strongMost
  ends.allowedLeast = allowedLeast
  ends.allowedMost = allowedMost
  if (tables.capsExtras) {
    const last = end + EXTRA * numbers[block + HEAD.extras]!
    for (let e = end; e < last; e += EXTRA) {
      const limit = tables.extraCap[Math.floor(numbers[e]! / CODE)]!
      if (limit === Number.POSITIVE_INFINITY) continue
      cutEnds(ends, numbers[e + 1]! * tables.gain[numbers[e]! % CODE]!, mass * numbers[e + 2]!, limit)
    }
  }
  if (tables.spineCap === Number.POSITIVE_INFINITY) return
  const spine = end + EXTRA * numbers[block + HEAD.extras]!
  for (let f = 0; f < numbers[block + HEAD.frames]!; f++) {
    cutSpine(numbers, spine + SPINE * f, tables.spineArm, tables, ends)
    cutSpine(numbers, spine + SPINE * f, -tables.spineArm, tables, ends)
  }
}

/** Cuts by one of the two forms of L5/S1 compression in a frame. */
function cutSpine(
  numbers: Float64Array,
  at: number,
  arm: number,
  { mass, spineGain, spineCap }: BoundTables,
  ends: Ends,
) {
  const a = arm * numbers[at]! - numbers[at + 2]!
  const b = arm * numbers[at + 1]! - numbers[at + 3]!
  const slope = slopeOf(a, b)
  cutEnds(ends, spineGain * slope, (mass * a) / slope, spineCap)
}

function cutEnds(ends: Ends, slope: number, moved: number, limit: number): void {
  const edge = limit / slope - moved
  if (slope > 0) {
    if (edge < ends.allowedMost) ends.allowedMost = edge
  } else if (edge > ends.allowedLeast) ends.allowedLeast = edge
}

/** A block's settings, one object for all blocks. */
const SETTINGS: Settings = { kind: 'none', lightest: 0, heaviest: 0, steps: null }
const STEPS = { first: 0, step: 0, last: 0 }

function readSettings(numbers: Float64Array, block: number): Settings {
  SETTINGS.kind = LOAD_KINDS[numbers[block + HEAD.kind]!] ?? 'none'
  SETTINGS.lightest = numbers[block + HEAD.lightest]!
  SETTINGS.heaviest = numbers[block + HEAD.heaviest]!
  STEPS.first = numbers[block + HEAD.first]!
  STEPS.step = numbers[block + HEAD.step]!
  STEPS.last = numbers[block + HEAD.last]!
  SETTINGS.steps = STEPS.step > 0 ? STEPS : null
  return SETTINGS
}

/** The working load, or null where rounding could tip it to another setting. */
function loadOf({ strongLeast, strongMost, allowedLeast, allowedMost }: Ends, settings: Settings): number | null {
  const { kind, lightest, heaviest } = settings
  if (kind === 'none') return 0
  if (close(strongLeast, strongMost) || close(allowedLeast, allowedMost)) return null
  // Rows never at work are left away, and with them ends of assistance beyond none; they could matter only here.
  if (kind === 'assistance' && Math.max(strongLeast, allowedLeast) > -SLACK) return null
  const strong = strongLeast <= strongMost ? strongMost : Number.NEGATIVE_INFINITY
  const allowed = allowedLeast <= allowedMost ? allowedMost : Number.NEGATIVE_INFINITY
  const most = Math.min(strong, allowed)
  if (close(most, lightest) || close(most, heaviest)) return null
  if (most < lightest) return lightest
  if (most > heaviest) return roundLoad(settings, heaviest) ?? lightest
  const slack = SLACK * (1 + Math.abs(most))
  const load = roundLoad(settings, most - slack) ?? lightest
  return load === (roundLoad(settings, most + slack) ?? lightest) ? load : null
}

const close = (one: number, other: number): boolean => Math.abs(one - other) < SLACK * (1 + Math.abs(other))

/** The most of the planned intensity that a set can keep with whole or part repetitions; null when not one is possible. */
function keptAtMost(demand: number, { original, request, ruleSet }: RankContext): number | null {
  const { epley, mostRepetitions, leastIntensity } = ruleSet.dose
  const { rir } = request.planned
  const possible = epley.value * (1 / demand - 1) - rir
  if (possible < 1 - SLACK) return null
  if (possible < original.repetitions) return 1
  const raises = request.intent === 'size' || request.intent === 'endurance'
  const most =
    raises && demand >= leastIntensity.value - SLACK
      ? Math.max(original.repetitions, mostRepetitions.value)
      : original.repetitions
  return Math.min(1, demand / intensity(Math.min(possible, most), rir, ruleSet))
}

const ENDS: Ends = { strongLeast: 0, strongMost: 0, allowedLeast: 0, allowedMost: 0 }

/** The target's drive at a load: the rows that serve it alone. */
function driveAt(
  { numbers, singles, words }: PackedCatalogue,
  block: number,
  load: number,
  { gain, role, mass }: BoundTables,
): number {
  let drive = 0
  const end = block + HEAD.size + ROW * numbers[block]!
  for (let r = block + HEAD.size; r < end; r += ROW) {
    const key = words[2 * r + 7]!
    if (role[key] === 0) continue
    const value = ((load + mass * numbers[r + 1]!) / numbers[r]!) * gain[key]! * singles[2 * r + 6]! * role[key]!
    if (value > drive) drive = value
  }
  return drive
}

/**
 * The largest demand at a load, stopped as soon as it passes `enough`; leaves every key's largest demand in the tables and the
 * largest share of a cap used in `tables.use`.
 */
function demandAt(
  { numbers, words }: PackedCatalogue,
  block: number,
  load: number,
  tables: BoundTables,
  enough: number,
): number {
  const { gain, capReach, mass, keyMost } = tables
  keyMost.fill(0)
  let demand = 0
  let use = 0
  const end = block + HEAD.size + ROW * numbers[block]!
  for (let r = block + HEAD.size; r < end; r += ROW) {
    const pull = (load + mass * numbers[r + 1]!) / numbers[r]!
    if (pull <= 0) continue
    const key = words[2 * r + 7]!
    const value = pull * gain[key]!
    if (value > keyMost[key]!) keyMost[key] = value
    if (value > demand) {
      demand = value
      if (demand > enough) return demand
    }
    const used = (pull * numbers[r + 2]!) / capReach[key]!
    if (used > use) use = used
  }
  if (tables.capsExtras) {
    const last = end + EXTRA * numbers[block + HEAD.extras]!
    for (let e = end; e < last; e += EXTRA) {
      const limit = tables.extraCap[Math.floor(numbers[e]! / CODE)]!
      if (limit === Number.POSITIVE_INFINITY) continue
      const size = numbers[e + 1]! * gain[numbers[e]! % CODE]!
      const used = (size * (load + mass * numbers[e + 2]!)) / limit
      if (used > use) use = used
    }
  }
  if (tables.spineCap !== Number.POSITIVE_INFINITY) {
    const spine = end + EXTRA * numbers[block + HEAD.extras]!
    for (let f = spine; f < spine + SPINE * numbers[block + HEAD.frames]!; f += SPINE) {
      const moment = numbers[f]! * mass + numbers[f + 1]! * load
      const axial = numbers[f + 2]! * mass + numbers[f + 3]! * load
      const used = (tables.spineGain * (tables.spineArm * Math.abs(moment) - axial)) / tables.spineCap
      if (used > use) use = used
    }
  }
  tables.use = use
  return demand
}

/**
 * An upper bound of an exercise's score, carry-over counted in full; −1 when it is certainly left out or below `wanted`.
 * `whole` is returned where rounding could decide otherwise. Leaves every key's largest demand in `tables.keyMost`.
 */
export function scoreBound(
  packed: PackedCatalogue,
  at: number,
  tables: BoundTables,
  whole: number,
  wanted: number,
): number {
  const { keyMost, context } = tables
  const { ruleSet, request } = context
  const { leastTargetDrive, leastKept } = ruleSet.score
  const block = packed.start[at]!
  endsOf(packed, block, tables, ENDS)
  const load = loadOf(ENDS, readSettings(packed.numbers, block))
  if (load === null) return whole
  const drive = driveAt(packed, block, load, tables)
  const calm = calmOf(packed.coordination[at]!, request.intent, ruleSet)
  // The least target drive that still lets the exercise in, and into the wanted rows.
  const standard = Math.max(context.originalDrive, leastTargetDrive.value)
  const needed = Math.max(leastTargetDrive.value, (standard * wanted) / (100 * calm)) - SLACK
  const demand = demandAt(packed, block, load, tables, drive / needed)
  if (demand === 0 || demand * needed > drive) return -1
  const { use } = tables
  if (Math.abs(demand - context.original.intensity) < SLACK || Math.abs(use - 1) < SLACK) return whole
  const keptIntensity = keptAtMost(demand, context)
  if (use > 1 || keptIntensity === null) return -1
  const kept = keptOf(drive / demand, keptIntensity, context.originalDrive, ruleSet)
  if (kept < leastKept.value - SLACK) return -1
  let rest = 0
  for (let key = 0; key < NOBODY; key++) if (tables.serves[key] === 0) rest += keyMost[key]!
  const spare = context.caps.size === 0 ? 1 : spareOf(Math.min(use, 1), ruleSet)
  return 100 * kept * spare * calm * leanOf(rest, ruleSet) * RAISED
}

/** Carry-over of what `scoreBound` left in the tables. */
export function carryOverBound({ keyMost, muscleRoles, loads, context }: BoundTables): number {
  const { ruleSet, originalLoads } = context
  loads.fill(0)
  const muscles = loads.length
  for (let key = 0; key < NOBODY; key++) {
    const demand = keyMost[key]!
    if (demand === 0) continue
    for (let i = 0; i < muscles; i++) loads[i]! += muscleRoles[key * muscles + i]! * demand
  }
  return 1 - ruleSet.score.carryOver.value * (1 - likeness(loads, originalLoads))
}
