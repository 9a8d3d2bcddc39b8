import { readdirSync, readFileSync } from 'node:fs'
import { parse } from 'yaml'
import { exerciseDocument, type ExerciseDocument } from '#shared/contract/exercise'
import { solveExercise, type Sex } from '#shared/mechanics/index'
import { coordinationDemand, type Candidate } from '#shared/rules/index'
import { ruleSet } from './movements'

const folder = new URL('../../../seeds/catalogue/', import.meta.url)

/** Every document of the true catalogue. */
export const documents: ExerciseDocument[] = readdirSync(folder)
  .filter((file) => file.endsWith('.yaml'))
  .sort()
  .flatMap((file) =>
    (parse(readFileSync(new URL(file, folder), 'utf8')) as unknown[]).map((entry) => exerciseDocument.parse(entry)),
  )

/** One document as a published candidate for one sex; its id is its slug. */
export function publish(document: ExerciseDocument, sex: Sex): Candidate {
  const solution = solveExercise(document.mechanics, sex)
  const coordination = coordinationDemand(document, solution, ruleSet)
  return { id: document.slug, versionId: `${document.slug}-1`, document, solution, coordination }
}

/** The whole catalogue as published candidates. */
export const catalogueFor = (sex: Sex): Candidate[] => documents.map((document) => publish(document, sex))
