import type { Dose } from '../contract/session'
import type { LeftOutRow, SwapRow } from '../contract/swap'
import { SKILL_GRADES } from '../contract/exercise'
import type { RankContext } from './context'
import { inUnit, intensity, setAt } from './dose'
import { askedAt, effortsOf, type Asked, type Effort } from './efforts'
import { asJointStress, capRange, isOver, stressOf, tightestBySide, type Tightest } from './joint-stress'
import { strengthRange } from './load-range'
import { groupDrive } from './muscles'
import { equipmentName, jointName } from './names'
import { beyondStrengthReason, notTrainedReason, overCapReason, swapReason, tooLittleReason } from './reasons'
import { factorsOf, mostUsed, scoreOf } from './score'
import { equipmentAt, lacking, roundLoad, settingsOf, type Settings } from './settings'
import { strainsOf, type Strain } from './stress'
import type { Candidate, SoreJointInput } from './types'

/** A candidate's outcome: a row still without its rank, or why it is left out. */
export type Rated = { row: Omit<SwapRow, 'rank'> } | { leftOut: LeftOutRow }

/** Stands in where an exercise has no load that any place could set. */
const ANY: Settings = { kind: 'none', lightest: 0, heaviest: 0, steps: null }

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
export const shownJoints = (strains: readonly Strain[], { shown, caps }: RankContext, load: number): Tightest[] =>
  shown.flatMap((joint) => tightestBySide(joint, strains, caps, load))

/** The most negative load still worth calling assistance, as whole kilograms of it; null when it would carry all. */
function assistanceFor(candidate: Candidate, load: number, bodyMass: number): number | null {
  const { kind } = candidate.document.load
  if ((kind !== 'added' && kind !== 'assistance') || load >= 0 || -load > bodyMass) return null
  return Math.ceil(-load - 1e-9)
}

/** Where the limiter is at the planned intensity with sound joints, or the lightest there is (kg). */
function healthyLoad(efforts: readonly Effort[], { lightest, heaviest }: Settings, { original }: RankContext): number {
  const range = strengthRange(efforts, original.intensity)
  return Math.max(lightest, Math.min(range.least <= range.most ? range.most : Number.NEGATIVE_INFINITY, heaviest))
}

/** Why the exercise cannot be given here to this athlete at all, whatever the load. */
function notHere(
  candidate: Candidate,
  settings: Settings | null,
  { request: { place, athlete } }: RankContext,
): Rated | null {
  const { document } = candidate
  if (settings === null) {
    const missing = place ? lacking(document, place).map(equipmentName) : []
    const reason =
      missing.length > 0 ? `Needs ${missing.join(' and ')}, not found at this place.` : 'No load at this place fits it.'
    return leave(candidate, 'noEquipment', reason)
  }
  if (SKILL_GRADES.indexOf(document.skill) > SKILL_GRADES.indexOf(athlete.skill)) {
    return leave(candidate, 'beyondSkill', `Graded ${document.skill}; the profile says ${athlete.skill}.`)
  }
  return null
}

/** The flagged joint that a candidate would load. */
function acrossFlag(
  candidate: Candidate,
  load: number,
  { flagged, ruleSet, request, tables }: RankContext,
): Rated | null {
  if (flagged.length === 0) return null
  const movement = { mechanics: candidate.document.mechanics, solution: candidate.solution }
  const strains = strainsOf(
    movement,
    request.athlete,
    ruleSet,
    flagged.map(({ joint }) => joint),
    tables,
  )
  const crossed = flagged.find(({ joint }) => stressOf(joint, strains, load).stress >= ruleSet.caps.loadedFrom.value)
  return crossed ? leave(candidate, 'redFlag', redFlagReason(crossed)) : null
}

/** Why not one repetition is possible, with the assistance that would help. */
function tooHard(
  candidate: Candidate,
  efforts: readonly Effort[],
  load: number,
  limiter: NonNullable<Asked['limiter']>,
  context: RankContext,
): Rated {
  const { athlete, planned } = context.request
  const { assistedForm } = candidate.document
  const share = limiter.demand > 1 ? 1 : intensity(1, planned.rir, context.ruleSet)
  const assistance = assistanceFor(candidate, strengthRange(efforts, share).most, athlete.bodyMass)
  const form = assistedForm === undefined ? null : (context.names.get(assistedForm) ?? null)
  const reason = beyondStrengthReason(candidate, limiter, load, planned.rir, assistance, form)
  return leave(candidate, 'beyondStrength', reason)
}

/** Rates one candidate in a ranking. */
export function rate(candidate: Candidate, context: RankContext): Rated {
  const { request, ruleSet, original } = context
  const { athlete, place, planned, target, intent } = request
  const { document } = candidate
  const grip = document.mechanics.grip
  const driveOf = ({ work, limiter }: Asked) =>
    limiter === null ? 0 : groupDrive(work, target, grip, ruleSet) / limiter.demand
  const notTrained = (share: number) => leave(candidate, 'targetNotTrained', notTrainedReason(target, share))

  const movement = { mechanics: document.mechanics, solution: candidate.solution }
  const efforts = effortsOf(movement, athlete, ruleSet, context.tables)
  const equipment = equipmentAt(document, place)
  const settings = equipment && settingsOf(document, place, equipment, ruleSet)
  const somewhere = settings ?? settingsOf(document, null, document.equipment, ruleSet) ?? ANY
  const healthy = healthyLoad(efforts, somewhere, context)
  const healthyDrive = driveOf(askedAt(efforts, healthy))
  if (healthyDrive < ruleSet.score.leastTargetDrive.value) return notTrained(healthyDrive)
  const absent = notHere(candidate, settings, context)
  if (absent !== null || settings === null) return absent ?? notTrained(healthyDrive)

  const strains = strainsOf(movement, athlete, ruleSet, context.shown, context.tables)
  const range = capRange(strains, context.caps)
  const allowed = range.least <= range.most ? range.most : Number.NEGATIVE_INFINITY
  const load = roundLoad(settings, Math.min(healthy, allowed)) ?? settings.lightest
  const flagged = acrossFlag(candidate, load, context)
  if (flagged !== null) return flagged
  const asked = askedAt(efforts, load)
  const { limiter, demands } = asked
  if (limiter === null) return notTrained(0)
  const set = setAt(limiter.demand, { repetitions: original.repetitions, rir: planned.rir }, intent, ruleSet)
  if (set === null) return tooHard(candidate, efforts, load, limiter, context)
  const shown = shownJoints(strains, context, load)
  const tightest = mostUsed(shown)
  if (tightest !== null && isOver(tightest)) {
    const assistance = assistanceFor(candidate, allowed, athlete.bodyMass)
    return leave(candidate, 'overCap', overCapReason(candidate, tightest, load, assistance))
  }
  const targetDrive = driveOf(asked)
  if (targetDrive < ruleSet.score.leastTargetDrive.value) return notTrained(targetDrive)

  const repetitions = inUnit(set.repetitions, document.unit, ruleSet)
  const { coordination } = candidate
  const keptIntensity = set.kept
  const factors = factorsOf(
    { targetDrive, keptIntensity, repetitions, unit: document.unit, demands, coordination, grip, tightest: shown },
    { drive: context.originalDrive, muscleLoads: context.originalLoads },
    request,
    ruleSet,
  )
  if (factors.kept.value < ruleSet.score.leastKept.value) {
    return leave(candidate, 'targetNotTrained', tooLittleReason(target, factors.kept.value))
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
      coordination,
      dose: doseOf(candidate, load, repetitions, planned),
      factors,
      reason: swapReason(
        { targetDrive, keptIntensity, limiter: limiter.action, tightest },
        candidate,
        request,
        ruleSet,
      ),
    },
  }
}
