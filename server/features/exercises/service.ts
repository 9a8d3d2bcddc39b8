import { z } from 'zod'
import type { Exercise, Preview, listExercises, previewExercise } from '#shared/contract/exercise'
import type { Received, ResponseOf } from '#shared/contract/endpoint'
import { solveExercise } from '#shared/mechanics/index'
import {
  capsFromSoreness,
  coordinationDemand,
  previewOf,
  type Athlete,
  type Movement,
  type SoreJointInput,
} from '#shared/rules/index'
import { decodeCursor, toPage } from '../../database/cursor'
import type { Dependencies } from '../../dependencies'
import { AppError, notFound } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { profileJson, toAthlete, type ProfileJson } from '../athletes/engine-athlete'
import { recordAudit } from '../audit/record'
import { requireAthlete } from '../people/access'
import { standingSoreJson } from '../sore-joints/repository'
import type { CatalogueEdition } from './catalogue-edition'
import { presentExercise } from './present'
import { findExerciseBySlug, findExercises } from './repository'

const cursorKey = z.tuple([z.string(), z.uuid()])

export async function list(
  { dataSource, catalogue }: Dependencies,
  query: Received<typeof listExercises>['query'],
): Promise<ResponseOf<typeof listExercises>> {
  const after = decodeCursor(query.cursor, cursorKey)
  const found = await findExercises(dataSource.manager, { ...query, after })
  const edition = await catalogue.latest(['unspecified'])
  const { rows, nextCursor } = toPage(found, query.limit, (row) => [row.document.name, row.id])
  return { items: rows.map((row) => presentExercise(row, edition.musclesOf(row.id))), nextCursor }
}

export async function get({ dataSource, catalogue }: Dependencies, slug: string): Promise<Exercise> {
  const row = await findExerciseBySlug(dataSource.manager, slug)
  if (row === null) throw notFound('That exercise')
  return presentExercise(row, (await catalogue.latest(['unspecified'])).musclesOf(row.id))
}

interface Subject {
  athlete: Athlete
  sore: SoreJointInput[]
}

async function findSubject(
  { dataSource, clock }: Dependencies,
  actor: Actor,
  { athleteId, body }: Received<typeof previewExercise>['body'],
): Promise<Subject> {
  if (body !== undefined) return { athlete: { factors: {}, skill: 'advanced', minor: false, ...body }, sore: [] }
  if (athleteId === undefined) throw new Error('the contract lets no preview through without a body or an athlete')
  const { manager } = dataSource
  const access = await requireAthlete(manager, actor, athleteId)
  const [row]: Array<{ profile: ProfileJson | null; sore: SoreJointInput[] }> = await manager.query(
    `select ${profileJson('$1')} as profile, ${standingSoreJson('$1')} as sore`,
    [athleteId],
  )
  if (row === undefined || row.profile === null) {
    throw new AppError('profile_incomplete', 'Body mass, stature, sex and date of birth are needed first.')
  }
  if (!access.self) await recordAudit(manager, { actor, action: 'read.preview', subject: athleteId })
  return { athlete: toAthlete(row.profile, clock.now()), sore: row.sore }
}

function findMovement(
  { exerciseId, mechanics }: Received<typeof previewExercise>['body'],
  athlete: Athlete,
  edition: CatalogueEdition,
): Movement {
  if (mechanics === undefined) {
    const candidate = exerciseId === undefined ? null : edition.find(athlete.sex, exerciseId)
    if (candidate === null) throw notFound('That exercise')
    const { document, solution, coordination } = candidate
    return { mechanics: document.mechanics, solution, coordination }
  }
  const solution = solveExercise(mechanics, athlete.sex)
  const structure = { mechanics, skill: 'beginner', speed: 'controlled' } as const
  return { mechanics, solution, coordination: coordinationDemand(structure, solution, edition.ruleSet) }
}

export async function preview(
  dependencies: Dependencies,
  actor: Actor,
  body: Received<typeof previewExercise>['body'],
): Promise<Preview> {
  const { athlete, sore } = await findSubject(dependencies, actor, body)
  const edition = await dependencies.catalogue.latest([athlete.sex])
  const movement = findMovement(body, athlete, edition)
  return previewOf(movement, athlete, body.load, capsFromSoreness(sore, edition.ruleSet), edition.ruleSet)
}
