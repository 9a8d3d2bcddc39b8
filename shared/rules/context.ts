import type { RuleSet } from '../contract/rule-set'
import { ACTIONS, ACTION_JOINT, JOINTS, type Joint } from '../mechanics/vocabulary'
import { stopsAll } from './affected'
import { capsFromSoreness, isRedFlagged } from './caps'
import { capTable, stressOf, type CapTable } from './joint-stress'
import { groupDrive, groupRoleIn } from './muscles'
import { planned, prepare, type Planned } from './original'
import { muscleLoads } from './score'
import { strengthTables, type StrengthTables } from './strength'
import type { RankRequest, SoreJointInput } from './types'

/** Joints that every row shows. */
const ALWAYS: readonly Joint[] = ['elbow', 'wrist', 'lowerBack']

/** Everything a ranking works out once, before it looks at the candidates. */
export interface RankContext {
  request: RankRequest
  ruleSet: RuleSet
  tables: StrengthTables
  original: Planned
  /** Target drive of the original done healthy. */
  originalDrive: number
  /** What the original asks of every muscle. */
  originalLoads: readonly number[]
  caps: CapTable
  /** Joints a row shows: elbow, wrist and lower back always, and every capped one. */
  shown: readonly Joint[]
  /** Reports that bind by their cap, and those that stop training of their joint. */
  sore: readonly SoreJointInput[]
  flagged: readonly SoreJointInput[]
  /** The report that forbids any swap at all: the original or the target works across its joint. */
  stop: SoreJointInput | null
  /** Names of exercises by slug, for pointing to an assisted form. */
  names: ReadonlyMap<string, string>
}

/** Joints across which a target group works. */
function targetJoints(request: RankRequest, ruleSet: RuleSet): ReadonlySet<Joint> {
  const grip = request.original.document.mechanics.grip
  return new Set(
    ACTIONS.filter(
      (action) => groupRoleIn(action, request.target, grip, ruleSet) >= ruleSet.score.servesFrom.value,
    ).map((action) => ACTION_JOINT[action]),
  )
}

/** Prepares a ranking: strength, the healthy original, caps and red flags. */
export function contextOf(request: RankRequest, ruleSet: RuleSet): RankContext {
  const { athlete, sore } = request
  const tables = strengthTables(athlete, ruleSet)
  const original = planned(prepare(request.original, athlete, ruleSet, JOINTS, tables), request.planned, ruleSet)
  const limit = original.limiter?.demand ?? 0
  const drive = groupDrive(original.work, request.target, request.original.document.mechanics.grip, ruleSet)
  const flagged = sore.filter((report) => isRedFlagged(report, ruleSet))
  const standing = sore.filter((report) => !isRedFlagged(report, ruleSet))
  const across = targetJoints(request, ruleSet)
  const caps = capTable(capsFromSoreness(standing, ruleSet))
  const stop = flagged.find(
    (report) =>
      stopsAll(report, ruleSet) ||
      across.has(report.joint) ||
      stressOf(report.joint, original.strains, original.load).stress >= ruleSet.caps.loadedFrom.value,
  )
  return {
    request,
    ruleSet,
    tables,
    original,
    originalDrive: limit === 0 ? 0 : drive / limit,
    originalLoads: muscleLoads(original.demands, request.original.document.mechanics.grip, ruleSet),
    caps,
    shown: JOINTS.filter((joint) => ALWAYS.includes(joint) || caps.has(joint)),
    sore: standing,
    flagged,
    stop: stop ?? null,
    names: new Map(request.candidates.map(({ document }) => [document.slug, document.name])),
  }
}
