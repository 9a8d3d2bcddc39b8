import type { Dose } from '../contract/session'
import type { LeftOutRow, SwapRow } from '../contract/swap'
import { SKILL_GRADES } from '../contract/exercise'
import { JOINTS, type Joint } from '../mechanics/vocabulary'
import type { RankContext } from './context'
import { inUnit, intensity, setAt } from './dose'
import { demandsAt, limiterAt, workAt } from './efforts'
import { asJointStress, capRange, isOver, tightestBySide, type Tightest } from './joint-stress'
import { loadRange, strengthBounds } from './load-range'
import { groupDrive } from './muscles'
import { capital, equipmentName, jointName, percent, TARGET_NAMES } from './names'
import { prepare, type Prepared } from './original'
import { beyondStrengthReason, overCapReason, swapReason } from './reasons'
import { factorsOf, mostUsed, scoreOf } from './score'
import { equipmentAt, lacking, settingsOf } from './settings'
import type { Candidate, SoreJointInput } from './types'

/** A candidate's outcome: a row still without its rank, or why it is left out. */
export type Rated = { row: Omit<SwapRow, 'rank'> } | { leftOut: LeftOutRow }

/** Joints that every row shows. */
const ALWAYS: readonly Joint[] = ['elbow', 'wrist', 'lowerBack']

const nameOf = ({ id, document }: Candidate) => ({ id, slug: document.slug, name: document.name })

const leave = (candidate: Candidate, why: LeftOutRow['why'], reason: string): Rated => ({
  leftOut: { exercise: nameOf(candidate), why, reason },
})

/** Why nothing is offered across a red-flagged joint. */
export function redFlagReason(report: SoreJointInput): string {
  if (report.redFlags.includes('chestOrBreath'))
    return 'Chest pain or breathlessness was reported: no training until a clinician has seen it.'
  return `A red flag stands for the ${jointName(report.joint, report.side)}: nothing that loads it until a clinician has seen it.`
}

/** Loads for the pieces a dose is written in: 2 for a pair of dumbbells. */
function piecesOf({ document: { load, mechanics } }: Candidate): 1 | 2 {
  const pair = mechanics.sides === 'both' && mechanics.loads.some(({ at, share }) => at === 'hands' && share === 'each')
  return load.from === 'dumbbells' && pair ? 2 : 1
}

/** The dose as written down: body weight alone has no load. */
export function doseOf(
  candidate: Candidate,
  load: number,
  repetitions: number,
  { sets, rir }: Pick<Dose, 'sets' | 'rir'>,
): Dose {
  const { kind } = candidate.document.load
  const bodyAlone = kind === 'none' || (kind === 'added' && load === 0)
  return {
    sets,
    repetitions,
    unit: candidate.document.unit,
    rir,
    load: bodyAlone ? null : load,
    pieces: piecesOf(candidate),
  }
}

/** Stress of every joint a row shows, with the sides and caps that bind. */
export function shownJoints({ strains }: Prepared, context: RankContext, load: number): Tightest[] {
  const capped = new Set(context.caps.map((cap) => cap.joint))
  return JOINTS.filter((joint) => ALWAYS.includes(joint) || capped.has(joint)).flatMap((joint) =>
    tightestBySide(joint, strains, context.caps, load),
  )
}

/** The most negative load still worth calling assistance, as whole kilograms of it; null when it would carry all. */
function assistanceFor(candidate: Candidate, load: number, bodyMass: number): number | null {
  const { kind } = candidate.document.load
  if ((kind !== 'added' && kind !== 'assistance') || load >= 0 || -load > bodyMass) return null
  return Math.ceil(-load - 1e-9)
}

/** Rates one candidate in a ranking. */
export function rate(candidate: Candidate, context: RankContext): Rated {
  const { request, ruleSet, original, caps } = context
  const { athlete, place, planned, target, intent } = request
  const { document } = candidate
  const grip = document.mechanics.grip
  const prepared = prepare(candidate, athlete, ruleSet, context.strength)
  const { efforts, strains } = prepared
  const drive = (at: number) => groupDrive(workAt(efforts, at), target, grip, ruleSet)
  const { name, plural } = TARGET_NAMES[target]

  const equipment = equipmentAt(document, place)
  const settings = settingsOf(document, equipment === null ? null : place, equipment ?? document.equipment, ruleSet)
  const healthy = loadRange(strengthBounds(efforts, original.intensity))
  const possible = healthy.least <= healthy.most
  const healthyLoad = Math.max(
    settings?.lightest ?? 0,
    Math.min(possible ? healthy.most : Number.NEGATIVE_INFINITY, settings?.heaviest ?? 0),
  )
  const healthyLimiter = limiterAt(efforts, healthyLoad)
  const healthyDrive = healthyLimiter ? drive(healthyLoad) / healthyLimiter.demand : 0
  const notTrained = (share: number) =>
    leave(
      candidate,
      'targetNotTrained',
      `The ${name} ${plural ? 'reach' : 'reaches'} only ${percent(share)} of what ${plural ? 'they' : 'it'} can give when the set ends.`,
    )
  if (healthyLimiter === null || healthyDrive < ruleSet.score.leastTargetDrive.value) return notTrained(healthyDrive)
  if (equipment === null || settings === null) {
    const missing = place ? lacking(document, place).map(equipmentName) : []
    return leave(
      candidate,
      'noEquipment',
      missing.length > 0
        ? `Needs ${missing.join(' and ')}, not found at this place.`
        : 'No load at this place fits it.',
    )
  }
  if (SKILL_GRADES.indexOf(document.skill) > SKILL_GRADES.indexOf(athlete.skill)) {
    return leave(candidate, 'beyondSkill', `Graded ${document.skill}; the profile says ${athlete.skill}.`)
  }

  const allowed = capRange(strains, caps)
  const ceiling = Math.min(healthyLoad, allowed.least <= allowed.most ? allowed.most : Number.NEGATIVE_INFINITY)
  const load = settings.round(ceiling) ?? settings.lightest
  for (const report of context.flagged) {
    const stress = tightestBySide(report.joint, strains, [], load)[0]?.stress ?? 0
    if (stress >= ruleSet.caps.loadedFrom.value) return leave(candidate, 'redFlag', redFlagReason(report))
  }
  const limiter = limiterAt(efforts, load)
  if (limiter === null) return notTrained(0)
  const set = setAt(limiter.demand, { repetitions: original.repetitions, rir: planned.rir }, intent, ruleSet)
  if (set === null) {
    const range = loadRange(strengthBounds(efforts, limiter.demand > 1 ? 1 : intensity(1, planned.rir, ruleSet)))
    const assistance = assistanceFor(candidate, range.most, athlete.bodyMass)
    const form = document.assistedForm === undefined ? null : (context.names.get(document.assistedForm) ?? null)
    return leave(
      candidate,
      'beyondStrength',
      beyondStrengthReason(candidate, limiter, load, planned.rir, assistance, form),
    )
  }
  const shown = shownJoints(prepared, context, load)
  const over = mostUsed(shown.filter(isOver))
  if (over !== null) {
    return leave(
      candidate,
      'overCap',
      overCapReason(candidate, over, load, assistanceFor(candidate, allowed.most, athlete.bodyMass)),
    )
  }

  const demands = demandsAt(efforts, load)
  const targetDrive = drive(load) / limiter.demand
  if (targetDrive < ruleSet.score.leastTargetDrive.value) return notTrained(targetDrive)
  const repetitions = inUnit(set.repetitions, document.unit, ruleSet)
  const factors = factorsOf(
    {
      targetDrive,
      keptIntensity: set.kept,
      repetitions,
      unit: document.unit,
      demands,
      coordination: candidate.coordination,
      grip,
      tightest: shown,
    },
    { drive: context.originalDrive, muscleLoads: context.originalLoads },
    request,
    ruleSet,
  )
  if (factors.kept.value < ruleSet.score.leastKept.value) {
    return leave(
      candidate,
      'targetNotTrained',
      `${capital(name)} would keep only ${percent(factors.kept.value)} of the planned work.`,
    )
  }
  return {
    row: {
      exercise: {
        ...nameOf(candidate),
        versionId: candidate.versionId,
        guidance: document.mechanics.guidance,
        supports: [...document.mechanics.supports],
      },
      score: scoreOf(factors),
      targetDrive,
      limiter: limiter.action,
      joints: shown.map(asJointStress),
      coordination: candidate.coordination,
      dose: doseOf(candidate, load, repetitions, planned),
      factors,
      reason: swapReason(
        { targetDrive, keptIntensity: set.kept, limiter: limiter.action, tightest: mostUsed(shown) },
        candidate,
        request,
        ruleSet,
      ),
    },
  }
}
