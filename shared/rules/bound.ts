import { ACTION_JOINT, FORCE_ACTIONS, JOINTS, type Action, type Joint } from '../mechanics/vocabulary'
import type { RankContext } from './context'
import { intensity } from './dose'
import { GRAVITY } from './efforts'
import { groupRoleIn, rolesIn } from './muscles'
import { MUSCLES } from './muscle-names'
import { KEYS, NOBODY, PUSH, slopeOf, STRIDE, type PackedCatalogue } from './pack'
import { calmOf, keptOf, leanOf, likeness, spareOf } from './score'
import { roundLoad, type Settings } from './settings'
import { pushReference } from './stress'
import type { StressChannel } from './types'

/** An athlete's ranking as tables by packed key. */
export interface BoundTables {
  context: RankContext
  mass: number
  gain: Float64Array
  role: Float64Array
  serves: Uint8Array
  /** Largest stress allowed at a key, Infinity where nothing caps it. */
  cap: Float64Array
  /** The same by joint and extra channel. */
  extraCap: Float64Array
  capsSpine: boolean
  /** Whether any key is capped. */
  capsTerms: boolean
  /** Planned intensity ÷ gain: what strength leaves of a load per unit of size. */
  reach: Float64Array
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
  const strengthAt = (action: Action, carried: boolean) => (carried ? tables.carried : tables.working)[action]
  const gripCap = Math.min(limitOf(context, 'wrist', 'grip') / wrist, limitOf(context, 'elbow', 'gripPull') / elbow)
  const role = size((key) => {
    const { action, grip } = KEYS[key]!
    return action === null ? 0 : groupRoleIn(action, target, grip ?? 'none', ruleSet)
  })
  const gain = size((key) => {
    const { action, carried } = KEYS[key]!
    if (key === PUSH) return GRAVITY / pushReference(athlete, ruleSet)
    if (action === null) return 0
    const arm = FORCE_ACTIONS.includes(action) ? 1 : athlete.stature
    return (GRAVITY * arm) / strengthAt(action, carried)
  })
  const cap = size((key) => {
    const { action } = KEYS[key]!
    if (action === null) return Number.POSITIVE_INFINITY
    return action === 'grip' ? gripCap : limitOf(context, ACTION_JOINT[action], action)
  })
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
    capsTerms: cap.some((limit) => limit !== Number.POSITIVE_INFINITY),
    loads: new Float64Array(MUSCLES.length),
    use: 0,
    role,
    serves: Uint8Array.from(role, (share) => (share >= ruleSet.score.servesFrom.value ? 1 : 0)),
    cap,
    extraCap: Float64Array.from(
      JOINTS.flatMap((joint) => [limitOf(context, joint, 'leaning'), limitOf(context, joint, 'endRange')]),
    ),
    capsSpine: limitOf(context, 'lowerBack', 'leaning') !== Number.POSITIVE_INFINITY,
    keyMost: new Float64Array(KEYS.length),
  }
}

/** Loads that strength and caps leave, kg. */
interface Ends {
  strongLeast: number
  strongMost: number
  allowedLeast: number
  allowedMost: number
}

function endsOf(packed: PackedCatalogue, at: number, tables: BoundTables, ends: Ends): void {
  const { highKey, lowKey, terms, motion } = packed
  const { reach, cap, mass, capsTerms } = tables
  let strongLeast = Number.NEGATIVE_INFINITY
  let strongMost = Number.POSITIVE_INFINITY
  const first = packed.termStart[at]!
  const end = packed.termStart[at + 1]!
  for (let t = first, r = STRIDE * first; t < end; t++, r += STRIDE) {
    const moved = mass * terms[r + 2]!
    const most = reach[highKey[t]!]! * terms[r]! - moved
    const least = -reach[lowKey[t]!]! * terms[r + 1]! - moved
    if (most < strongMost) strongMost = most
    if (least > strongLeast) strongLeast = least
  }
  ends.strongLeast = strongLeast
  ends.strongMost = strongMost
  ends.allowedLeast = Number.NEGATIVE_INFINITY
  ends.allowedMost = Number.POSITIVE_INFINITY
  if (capsTerms) {
    const share = tables.context.original.intensity
    for (let t = first, r = STRIDE * first; t < end; t++, r += STRIDE) {
      const above = highKey[t]!
      const below = lowKey[t]!
      if (cap[above]! === Number.POSITIVE_INFINITY && cap[below]! === Number.POSITIVE_INFINITY) continue
      const moved = mass * terms[r + 2]!
      const scale = 1 / (share * motion[t]!)
      const most = cap[above]! * scale * reach[above]! * terms[r]! - moved
      const least = -cap[below]! * scale * reach[below]! * terms[r + 1]! - moved
      if (most < ends.allowedMost) ends.allowedMost = most
      if (least > ends.allowedLeast) ends.allowedLeast = least
    }
  }
  const last = packed.extraStart[at + 1]!
  for (let e = packed.extraStart[at]!; e < last; e++) {
    const limit = tables.extraCap[packed.extraChannel[e]!]!
    if (limit === Number.POSITIVE_INFINITY) continue
    cutEnds(ends, packed.extraSize[e]! * tables.gain[packed.extraKey[e]!]!, mass * packed.extraShift[e]!, limit)
  }
  if (tables.capsSpine) eachSpine(packed, at, tables, (slope, moved, limit) => cutEnds(ends, slope, moved, limit))
}

function cutEnds(ends: Ends, slope: number, moved: number, limit: number): void {
  const edge = limit / slope - moved
  if (slope > 0) {
    if (edge < ends.allowedMost) ends.allowedMost = edge
  } else if (edge > ends.allowedLeast) ends.allowedLeast = edge
}

/** L5/S1 compression of every frame as two one-sided forms slope × (L + moved), a share of what counts as 1. */
function eachSpine(
  packed: PackedCatalogue,
  at: number,
  { context, mass }: BoundTables,
  visit: (slope: number, moved: number, limit: number) => void,
): void {
  const { backMuscleArm, compressionFull } = context.ruleSet.stress
  const limit = limitOf(context, 'lowerBack', 'leaning')
  const arms = context.request.athlete.stature / backMuscleArm.value
  for (let f = packed.frameStart[at]!; f < packed.frameStart[at + 1]!; f++) {
    for (const arm of [arms, -arms]) {
      const a = arm * packed.spine[4 * f]! - packed.spine[4 * f + 2]!
      const b = arm * packed.spine[4 * f + 1]! - packed.spine[4 * f + 3]!
      const slope = slopeOf(a, b)
      visit((GRAVITY * slope) / compressionFull.value, (mass * a) / slope, limit)
    }
  }
}

/** The working load, or null where rounding could tip it to another setting. */
function loadOf({ strongLeast, strongMost, allowedLeast, allowedMost }: Ends, settings: Settings): number | null {
  const { kind, lightest, heaviest } = settings
  if (kind === 'none') return 0
  if (close(strongLeast, strongMost) || close(allowedLeast, allowedMost)) return null
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

/** The target's drive at a load: the terms that serve it alone. */
function driveAt(packed: PackedCatalogue, at: number, load: number, { gain, role, mass }: BoundTables): number {
  const { highKey, lowKey, terms, trains } = packed
  let drive = 0
  const end = packed.termStart[at + 1]!
  for (let t = packed.termStart[at]!; t < end; t++) {
    if (role[highKey[t]!]! === 0 && role[lowKey[t]!]! === 0) continue
    const r = STRIDE * t
    const y = load + mass * terms[r + 2]!
    const key = y >= 0 ? highKey[t]! : lowKey[t]!
    const value = (y >= 0 ? (y * gain[key]!) / terms[r]! : (-y * gain[key]!) / terms[r + 1]!) * trains[t]! * role[key]!
    if (value > drive) drive = value
  }
  return drive
}

/**
 * The largest demand at a load, stopped as soon as it passes `enough`; leaves every key's largest demand in the tables and the
 * largest share of a cap used in `tables.use`.
 */
function demandAt(packed: PackedCatalogue, at: number, load: number, tables: BoundTables, enough: number): number {
  const { highKey, lowKey, terms, motion } = packed
  const { gain, cap, mass, keyMost } = tables
  keyMost.fill(0)
  let demand = 0
  let use = 0
  const first = packed.termStart[at]!
  const end = packed.termStart[at + 1]!
  for (let t = first, r = STRIDE * first; t < end; t++, r += STRIDE) {
    const y = load + mass * terms[r + 2]!
    const key = y >= 0 ? highKey[t]! : lowKey[t]!
    const value = y >= 0 ? (y * gain[key]!) / terms[r]! : (-y * gain[key]!) / terms[r + 1]!
    if (value > keyMost[key]!) keyMost[key] = value
    if (value > demand) {
      demand = value
      if (demand > enough) return demand
    }
    if (cap[key]! !== Number.POSITIVE_INFINITY) {
      const used = (value * motion[t]!) / cap[key]!
      if (used > use) use = used
    }
  }
  const last = packed.extraStart[at + 1]!
  for (let e = packed.extraStart[at]!; e < last; e++) {
    const limit = tables.extraCap[packed.extraChannel[e]!]!
    if (limit === Number.POSITIVE_INFINITY) continue
    const size = packed.extraSize[e]! * gain[packed.extraKey[e]!]!
    const used = (size * (load + mass * packed.extraShift[e]!)) / limit
    if (used > use) use = used
  }
  if (tables.capsSpine) {
    eachSpine(packed, at, tables, (slope, moved, limit) => {
      const used = (slope * (load + moved)) / limit
      if (used > use) use = used
    })
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
  const settings = packed.settings[at]
  if (!settings) return -1
  endsOf(packed, at, tables, ENDS)
  const load = loadOf(ENDS, settings)
  if (load === null) return whole
  const drive = driveAt(packed, at, load, tables)
  const calm = calmOf(packed.coordination[at]!, request.intent, ruleSet)
  // The least target drive that still lets the exercise in, and into the wanted rows.
  const standard = Math.max(context.originalDrive, leastTargetDrive.value)
  const needed = Math.max(leastTargetDrive.value, (standard * wanted) / (100 * calm)) - SLACK
  const demand = demandAt(packed, at, load, tables, drive / needed)
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
