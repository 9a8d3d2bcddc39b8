import { ACTION_JOINT, JOINTS, type Joint } from '../mechanics/vocabulary'
import type { RankContext } from './context'
import { intensity } from './dose'
import { GRAVITY } from './efforts'
import { groupRoleIn, rolesIn } from './muscles'
import { KEYS, NOBODY } from './keys'
import {
  CODE,
  EXTRA,
  HEAD,
  keysSize,
  LOAD_KINDS,
  ROW,
  slopeOf,
  SPINE,
  type PackedBlocks,
  type PackedCatalogue,
} from './pack'
import { gainsOf } from './reach'
import { calmOf, keptOf, leanOf, spareOf } from './score'
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
  /** Indices of the joints that have caps. */
  cappedJoints: number[]
  /** Cap on L5/S1 compression as a share of what counts as 1, that share per N, and stature ÷ arm of the back muscles. */
  spineCap: number
  spineGain: number
  spineArm: number
  /** Planned intensity ÷ gain: what strength leaves of a load per unit of size. */
  reach: Float64Array
  /** Cap ÷ gain, Infinity where nothing caps it. */
  capReach: Float64Array
  /** Gain × role in the target, and gain ÷ cap. */
  served: Float64Array
  capGain: Float64Array
  /** Product of every key's muscle roles with what the original asks of the muscles, its length 1, and with every other key's. */
  alike: Float64Array
  products: Float64Array
  /** Working space: demands by key, the keys at work, and the share used of the tightest cap. */
  keyMost: Float64Array
  working: Uint8Array
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

const product = (one: readonly number[], other: readonly number[]): number =>
  one.reduce((sum, value, i) => sum + value * (other[i] ?? 0), 0)

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
  const muscles = KEYS.slice(0, NOBODY).map(({ action, grip }) =>
    action === null ? [] : rolesIn(action, grip ?? 'none', ruleSet),
  )
  const length = Math.sqrt(product(context.originalLoads, context.originalLoads))
  const extraCap = Float64Array.from(
    JOINTS.flatMap((joint) => [limitOf(context, joint, 'leaning'), limitOf(context, joint, 'endRange')]),
  )
  return {
    context,
    mass: athlete.bodyMass,
    gain,
    reach: gain.map((own) => context.original.intensity / own),
    served: gain.map((own, key) => own * role[key]!),
    capGain: gain.map((own, key) => own / cap[key]!),
    alike: Float64Array.from(muscles, (roles) => (length === 0 ? 0 : product(roles, context.originalLoads) / length)),
    products: Float64Array.from(muscles.flatMap((one) => muscles.map((other) => product(one, other)))),
    working: new Uint8Array(NOBODY),
    capReach: cap.map((limit, key) => limit / gain[key]!),
    use: 0,
    role,
    serves: Uint8Array.from(role, (share) => (share >= ruleSet.score.servesFrom.value ? 1 : 0)),
    extraCap,
    cappedJoints: JOINTS.flatMap((joint, index) => (context.caps.has(joint) ? [index] : [])),
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
export function spreadOf(
  { gain, role, mass }: BoundTables,
  { averageGain }: Pick<PackedCatalogue, 'averageGain'>,
): number {
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

function endsOf({ numbers, singles, bytes }: PackedBlocks, block: number, tables: BoundTables, ends: Ends): void {
  const { reach, capReach, mass } = tables
  let strongLeast = Number.NEGATIVE_INFINITY
  let strongMost = Number.POSITIVE_INFINITY
  let allowedLeast = Number.NEGATIVE_INFINITY
  let allowedMost = Number.POSITIVE_INFINITY
  const count = numbers[block]!
  const keys = 8 * (block + HEAD.size)
  let r = block + HEAD.size + keysSize(count)
  for (let i = 0; i < count; i++, r += ROW) {
    const key = bytes[keys + i]!
    const inverse = numbers[r]!
    const moved = mass * numbers[r + 1]!
    const edge = reach[key]! * inverse - moved
    if (inverse > 0) {
      if (edge < strongMost) strongMost = edge
    } else if (edge > strongLeast) strongLeast = edge
    const capped = capReach[key]!
    if (capped !== Number.POSITIVE_INFINITY) {
      const limit = (capped / singles[2 * r + 4]!) * inverse - moved
      if (inverse > 0) {
        if (limit < allowedMost) allowedMost = limit
      } else if (limit > allowedLeast) allowedLeast = limit
    }
  }
  const end = r
  ends.strongLeast = strongLeast
  ends.strongMost = strongMost
  ends.allowedLeast = allowedLeast
  ends.allowedMost = allowedMost
  for (const joint of tables.cappedJoints) {
    const last = end + EXTRA * extrasUpTo(bytes, block, joint)
    for (let e = end + EXTRA * extrasUpTo(bytes, block, joint - 1); e < last; e += EXTRA) {
      const limit = tables.extraCap[Math.floor(numbers[e]! / CODE)]!
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

/** Extras of the joints up to one, in a block. */
const extrasUpTo = (bytes: Uint8Array, block: number, joint: number): number =>
  joint < 0 ? 0 : bytes[8 * (block + HEAD.ends) + joint]!

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
  const { kind, lightest, heaviest, steps } = settings
  if (kind === 'none') return 0
  if (close(strongLeast, strongMost) || close(allowedLeast, allowedMost)) return null
  const strong = strongLeast <= strongMost ? strongMost : Number.NEGATIVE_INFINITY
  const allowed = allowedLeast <= allowedMost ? allowedMost : Number.NEGATIVE_INFINITY
  const most = Math.min(strong, allowed)
  if (close(most, lightest) || close(most, heaviest)) return null
  if (most < lightest) return lightest
  if (most > heaviest) return roundLoad(settings, heaviest) ?? lightest
  // Between two settings, and not so near one that rounding could decide.
  const at = steps === null ? 0.5 : (Math.abs(most) - steps.first) / steps.step
  if (Math.abs(at - Math.round(at)) < SLACK * (1 + Math.abs(at))) return null
  return roundLoad(settings, most) ?? lightest
}

const close = (one: number, other: number): boolean => Math.abs(one - other) < SLACK * (1 + Math.abs(other))

/** The most of the planned intensity that a set can keep; null when not one repetition is possible. As `setAt`, rounded up. */
function keptAtMost(demand: number, { original, request, ruleSet }: RankContext): number | null {
  const { epley, mostRepetitions, leastIntensity } = ruleSet.dose
  const { rir } = request.planned
  const possible = Math.floor(epley.value * (1 / demand - 1) - rir + SLACK)
  if (possible < 1) return null
  if (possible < original.repetitions) return Math.min(1, demand / intensity(possible, rir, ruleSet))
  const raises = request.intent === 'size' || request.intent === 'endurance'
  const most =
    raises && demand >= leastIntensity.value - SLACK
      ? Math.max(original.repetitions, mostRepetitions.value)
      : original.repetitions
  return Math.min(1, demand / intensity(Math.max(original.repetitions, Math.min(possible, most)), rir, ruleSet))
}

const ENDS: Ends = { strongLeast: 0, strongMost: 0, allowedLeast: 0, allowedMost: 0 }

/** The target's drive at a load: the rows that serve it alone. */
function driveAt(
  { numbers, singles, bytes }: PackedBlocks,
  block: number,
  load: number,
  { served, mass }: BoundTables,
): number {
  let drive = 0
  const count = numbers[block]!
  const keys = 8 * (block + HEAD.size)
  const rows = block + HEAD.size + keysSize(count)
  for (let i = 0; i < count; i++) {
    const share = served[bytes[keys + i]!]!
    if (share === 0) continue
    const r = rows + ROW * i
    const value = ((load + mass * numbers[r + 1]!) / numbers[r]!) * share * singles[2 * r + 5]!
    if (value > drive) drive = value
  }
  return drive
}

/**
 * The largest demand at a load, stopped as soon as it passes `enough`; leaves every key's largest demand in the tables and the
 * largest share of a cap used in `tables.use`.
 */
function demandAt(
  { numbers, singles, bytes }: PackedBlocks,
  block: number,
  load: number,
  tables: BoundTables,
  enough: number,
): number {
  const { gain, capGain, mass, keyMost } = tables
  keyMost.fill(0)
  let demand = 0
  let use = 0
  const count = numbers[block]!
  const keys = 8 * (block + HEAD.size)
  let r = block + HEAD.size + keysSize(count)
  for (let i = 0; i < count; i++, r += ROW) {
    const pull = (load + mass * numbers[r + 1]!) / numbers[r]!
    if (pull <= 0) continue
    const key = bytes[keys + i]!
    const value = pull * gain[key]!
    if (value > keyMost[key]!) keyMost[key] = value
    if (value > demand) {
      demand = value
      if (demand > enough) return demand
    }
    const used = pull * singles[2 * r + 4]! * capGain[key]!
    if (used > use) use = used
  }
  const end = r
  for (const joint of tables.cappedJoints) {
    const last = end + EXTRA * extrasUpTo(bytes, block, joint)
    for (let e = end + EXTRA * extrasUpTo(bytes, block, joint - 1); e < last; e += EXTRA) {
      const size = numbers[e + 1]! * gain[numbers[e]! % CODE]!
      const used = (size * (load + mass * numbers[e + 2]!)) / tables.extraCap[Math.floor(numbers[e]! / CODE)]!
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
  packed: PackedBlocks,
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

/** Carry-over of what `scoreBound` left in the tables: the cosine by way of the keys' own products. */
export function carryOverBound({ keyMost, working, alike, products, context }: BoundTables): number {
  let count = 0
  for (let key = 0; key < NOBODY; key++) if (keyMost[key]! > 0) working[count++] = key
  let dot = 0
  let square = 0
  for (let i = 0; i < count; i++) {
    const key = working[i]!
    const demand = keyMost[key]!
    const row = key * NOBODY
    dot += demand * alike[key]!
    let crossed = 0.5 * demand * products[row + key]!
    for (let j = 0; j < i; j++) crossed += keyMost[working[j]!]! * products[row + working[j]!]!
    square += 2 * demand * crossed
  }
  const cosine = square > 0 ? Math.min(1, dot / Math.sqrt(square)) : 0
  return (1 - context.ruleSet.score.carryOver.value * (1 - cosine)) * RAISED
}
