import { randomUUID } from 'node:crypto'
import { QueryFailedError, type EntityManager } from 'typeorm'
import type { Received } from '#shared/contract/endpoint'
import type { Ranking, SwapTaken, rankForExercise, rankForSlot, takeSwap } from '#shared/contract/swap'
import type { Dependencies } from '../../dependencies'
import { AppError, notFound } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { recordAudit } from '../audit/record'
import { lockAthlete } from '../people/lock'
import { refuseRedFlag } from './build-ranking'
import { canSwap } from './policy'
import { presentSwap } from './present'
import { findInputsForAthlete, findInputsForSlot, type RankingInputs } from './ranking-inputs'
import type { RankingMemory } from './ranking-memory'
import { findSlotOwner, findSwap, hasStandingSwap } from './repository'

/** What the steps below need beside the request. */
export interface Context {
  dependencies: Dependencies
  memory: RankingMemory
}

async function auditRead({ dependencies }: Context, actor: Actor, inputs: RankingInputs): Promise<void> {
  if (inputs.access.self) return
  await recordAudit(dependencies.dataSource.manager, {
    actor,
    action: 'read.ranking',
    subject: inputs.athlete.id,
    details: { exerciseId: inputs.wanted.exerciseId },
  })
}

/** The ranking for a slot as JSON. For the athlete themself this costs one query. */
export async function rankSlot(
  context: Context,
  actor: Actor,
  { params, query }: Pick<Received<typeof rankForSlot>, 'params' | 'query'>,
): Promise<Buffer> {
  const { dataSource, clock } = context.dependencies
  const inputs = await findInputsForSlot(dataSource.manager, actor, params.slotId, query.placeId)
  await auditRead(context, actor, inputs)
  return context.memory.json(inputs, query, clock.now())
}

export async function rankExercise(
  context: Context,
  actor: Actor,
  { params, query }: Pick<Received<typeof rankForExercise>, 'params' | 'query'>,
): Promise<Buffer> {
  const { dataSource, clock } = context.dependencies
  const { sets, repetitions, rir, intent, target, placeId } = query
  const planned = { sets, repetitions, unit: 'repetitions' as const, rir, load: null, pieces: 1 }
  const wanted = { exerciseId: params.exerciseId, planned, intent, target }
  const inputs = await findInputsForAthlete(dataSource.manager, actor, params.athleteId, placeId, wanted)
  await auditRead(context, actor, inputs)
  return context.memory.json(inputs, query, clock.now())
}

const SWAP_TAKEN = () => new AppError('swap_already_taken', 'A swap already stands in this slot. Undo it first.')

/** The database has the last word on two takes at once. */
const isSecondSwap = (error: unknown) =>
  error instanceof QueryFailedError &&
  (error.driverError as { constraint?: string }).constraint === 'swaps_one_standing'

async function insertSwap(
  manager: EntityManager,
  actor: Actor,
  swap: { slotId: string; item: Ranking['items'][number]; ranking: Ranking; now: Date },
): Promise<string> {
  const { slotId, item, ranking, now } = swap
  const { sets, repetitions, unit, rir, load, pieces } = item.dose
  const id = randomUUID()
  try {
    await manager.query(
      `insert into swaps (id, slot_id, exercise_version_id, sets, repetitions, unit, rir, load, pieces, rank, fingerprint,
                          rule_set_version, ranking, taken_by, taken_at)
       values ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, $13, $14, $15)`,
      [
        id,
        slotId,
        item.exercise.versionId,
        sets,
        repetitions,
        unit,
        rir,
        load,
        pieces,
        item.rank,
        ranking.fingerprint,
        ranking.ruleSetVersion,
        JSON.stringify(ranking),
        actor.userId,
        now,
      ],
    )
  } catch (error) {
    throw isSecondSwap(error) ? SWAP_TAKEN() : error
  }
  return id
}

export async function take(
  context: Context,
  actor: Actor,
  { params, query, body }: Received<typeof takeSwap>,
): Promise<SwapTaken> {
  const { dependencies, memory } = context
  const { dataSource, clock } = dependencies
  // Made once before the transaction, which then finds it in memory: it holds its locks for less time, and never waits
  // for a second connection to read the catalogue with.
  const seen = await findInputsForSlot(dataSource.manager, actor, params.slotId, query.placeId)
  // Even a refusal tells how the athlete is, so this read is in the trail however it ends.
  await auditRead(context, actor, seen)
  await memory.json(seen, query, clock.now())
  return dataSource.transaction(async (manager) => {
    const owner = await findSlotOwner(manager, actor, params.slotId)
    if (owner === null) throw notFound('That slot')
    if (!canSwap(owner)) throw new AppError('forbidden', 'Only the athlete or their coach can change a session.')
    // Waits for a report that is being written, so that nobody takes from a table which just became wrong.
    await lockAthlete(manager, owner.athleteId)
    if (await hasStandingSwap(manager, params.slotId)) throw SWAP_TAKEN()
    const now = clock.now()
    const inputs = await findInputsForSlot(manager, actor, params.slotId, query.placeId)
    const ranking = await memory.ranking(inputs, query, now)
    refuseRedFlag(ranking)
    if (ranking.fingerprint !== body.fingerprint) {
      throw new AppError('ranking_changed', 'The table changed since you read it. Look at it again.')
    }
    const item = ranking.items.find(({ exercise }) => exercise.id === body.exerciseId)
    if (item === undefined) {
      throw new AppError('not_a_swap', 'This exercise is not among the swaps for the slot.', [
        { path: 'exerciseId', message: 'Choose one of the swaps in the table.' },
      ])
    }
    const id = await insertSwap(manager, actor, { slotId: params.slotId, item, ranking, now })
    await recordAudit(manager, {
      actor,
      action: 'take.swap',
      subject: owner.athleteId,
      details: { swapId: id, slotId: params.slotId, exerciseId: item.exercise.id },
    })
    const row = await findSwap(manager, id)
    if (row === null) throw notFound('That swap')
    return presentSwap(row)
  })
}

export async function undo({ dependencies }: Context, actor: Actor, swapId: string): Promise<SwapTaken> {
  const { dataSource, clock } = dependencies
  return dataSource.transaction(async (manager) => {
    const found = await findSwap(manager, swapId)
    if (found === null) throw notFound('That swap')
    const owner = await findSlotOwner(manager, actor, found.slotId)
    if (owner === null) throw notFound('That swap')
    if (!canSwap(owner)) throw new AppError('forbidden', 'Only the athlete or their coach can change a session.')
    const now = clock.now()
    const [, changed]: [unknown, number] = await manager.query(
      'update swaps set undone_at = $2, undone_by = $3 where id = $1 and undone_at is null',
      [swapId, now, actor.userId],
    )
    if (changed === 0) throw new AppError('conflict', 'This swap was undone before.')
    await recordAudit(manager, {
      actor,
      action: 'undo.swap',
      subject: found.athleteId,
      details: { swapId, slotId: found.slotId, exerciseId: found.exerciseId },
    })
    return presentSwap({ ...found, undoneAt: now })
  })
}
