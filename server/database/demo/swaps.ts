import type { EntityManager } from 'typeorm'
import type { Ranking } from '#shared/contract/swap'
import { affectedBy, type SoreJointInput } from '#shared/rules/index'
import { demoId, type Random } from '../../../seeds/demo/random'
import type { DemoSession, DemoSlot } from '../../../seeds/demo/sessions'
import type { DemoSoreJoint } from '../../../seeds/demo/soreness'
import { chooseRank, flagText, isUndone } from '../../../seeds/demo/swaps'
import type { CatalogueEdition } from '../../features/exercises/catalogue-edition'
import { buildRanking } from '../../features/swaps/build-ranking'
import type { RankingInputs } from '../../features/swaps/ranking-inputs'
import { strengthFactors, toEngineAthlete } from './strength'
import { birthDate, insertRows } from './rows'

const HOUR = 60 * 60 * 1000
const DAY = 24 * HOUR
/** Flags older than this were looked at by the admin. */
const SETTLED_AFTER = 21 * DAY

export interface DemoTraining {
  sessions: DemoSession[]
  soreJoints: DemoSoreJoint[]
  edition: CatalogueEdition
  now: Date
  random: Random
}

/** What stood on the morning of a session. */
function soreOn(session: DemoSession, soreJoints: DemoSoreJoint[]): SoreJointInput[] {
  const morning = new Date(`${session.day}T06:00:00.000Z`)
  return soreJoints
    .filter(
      ({ athlete, reportedAt, closedAt }) =>
        athlete.id === session.athlete.id && reportedAt < morning && (closedAt === null || closedAt > morning),
    )
    .map(({ id, joint, side, rating, provocations, redFlags, clearedAt }) => ({
      soreJointId: id,
      joint,
      side,
      rating,
      provocations,
      redFlags: clearedAt !== null && clearedAt < morning ? [] : redFlags,
    }))
}

function inputsFor(
  { athlete }: DemoSession,
  slot: DemoSlot,
  sore: SoreJointInput[],
  exerciseId: string,
  { edition, now }: Pick<DemoTraining, 'edition' | 'now'>,
): RankingInputs {
  const { planned, intent, target } = slot
  return {
    revision: edition.revision,
    ruleSetVersion: edition.ruleSet.version,
    athlete: { id: athlete.id, name: athlete.name },
    access: { self: true, coach: false, physio: false },
    profile: {
      sex: athlete.sex,
      bodyMass: athlete.bodyMass,
      stature: athlete.stature,
      birthDate: birthDate(athlete.age, now),
      skill: athlete.skill,
      factors: strengthFactors(athlete),
    },
    sore,
    place: { id: athlete.place.id, equipment: athlete.place.equipment },
    wanted: { exerciseId, planned, intent, target },
  }
}

/** A swap that was taken during the demo's weeks, from the table the engine made for it. */
interface TakenSwap {
  session: DemoSession
  slot: DemoSlot
  exerciseId: string
  item: Ranking['items'][number]
  ranking: Ranking
  takenAt: Date
  undoneAt: Date | null
}

function takenSwaps(training: DemoTraining): TakenSwap[] {
  const { sessions, soreJoints, edition, random } = training
  const taken: TakenSwap[] = []
  for (const session of sessions) {
    if (session.offset >= 0) continue
    const sore = soreOn(session, soreJoints)
    if (sore.length === 0) continue
    const athlete = toEngineAthlete(session.athlete)
    const candidates = edition.candidates(athlete.sex)
    for (const slot of session.slots) {
      const original = candidates.find(({ document }) => document.slug === slot.slug)
      if (original === undefined) continue
      if (affectedBy(original, slot.planned, athlete, sore, edition.ruleSet).length === 0) continue
      const takenAt = new Date(Date.parse(`${session.day}T06:30:00.000Z`) + slot.position * 60_000)
      const ranking = buildRanking(inputsFor(session, slot, sore, original.id, training), {}, edition, takenAt)
      const rank = chooseRank(random, ranking.items.length)
      const item = ranking.items.find((row) => row.rank === rank)
      if (item === undefined) continue
      const undoneAt = isUndone(random) ? new Date(takenAt.getTime() + HOUR) : null
      taken.push({ session, slot, exerciseId: original.id, item, ranking, takenAt, undoneAt })
    }
  }
  return taken
}

const number = 'double precision'

async function insertFlags(manager: EntityManager, taken: TakenSwap[], { now, random }: DemoTraining): Promise<void> {
  const flags = taken.flatMap(({ session, slot, exerciseId, item, ranking, takenAt }) => {
    const text = flagText(random)
    if (text === null) return []
    return {
      id: demoId('flag', slot.id),
      club_id: session.athlete.place.clubId,
      raised_by: session.athlete.id,
      slot_id: slot.id,
      original_id: exerciseId,
      exercise_id: item.exercise.id,
      ...text,
      rule_set_version: ranking.ruleSetVersion,
      raised_at: new Date(takenAt.getTime() + 2 * HOUR),
      state: now.getTime() - takenAt.getTime() > SETTLED_AFTER ? 'settled' : 'open',
    }
  })
  await insertRows(
    manager,
    'flags',
    [
      'id uuid',
      'club_id uuid',
      'raised_by uuid',
      'slot_id uuid',
      'original_id uuid',
      'exercise_id uuid',
      'reason text',
      'note text',
      'rule_set_version integer',
      'raised_at timestamptz',
      'state text',
    ],
    flags,
  )
}

/** Takes swaps the way athletes did on sore days, and writes what they objected to. Resolves to how many were taken. */
export async function insertSwapsAndFlags(manager: EntityManager, training: DemoTraining): Promise<number> {
  const taken = takenSwaps(training)
  await insertRows(
    manager,
    'swaps',
    [
      'id uuid',
      'slot_id uuid',
      'exercise_version_id uuid',
      'sets integer',
      'repetitions integer',
      'unit text',
      `rir ${number}`,
      `load ${number}`,
      'pieces integer',
      'rank integer',
      'fingerprint text',
      'rule_set_version integer',
      'ranking jsonb',
      'taken_by uuid',
      'taken_at timestamptz',
      'undone_by uuid',
      'undone_at timestamptz',
    ],
    taken.map(({ session, slot, item, ranking, takenAt, undoneAt }) => ({
      id: demoId('swap', slot.id),
      slot_id: slot.id,
      exercise_version_id: item.exercise.versionId,
      ...item.dose,
      rank: item.rank,
      fingerprint: ranking.fingerprint,
      rule_set_version: ranking.ruleSetVersion,
      ranking,
      taken_by: session.athlete.id,
      taken_at: takenAt,
      undone_by: undoneAt === null ? null : session.athlete.id,
      undone_at: undoneAt,
    })),
  )
  await insertFlags(manager, taken, training)
  return taken.length
}
