import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { parse } from 'yaml'
import { z } from 'zod'
import { exerciseDocument, type ExerciseDocument } from '#shared/contract/exercise'
import { solveExercise } from '#shared/mechanics/index'
import type { Sex } from '#shared/mechanics/sex'
import type { Axis, ExerciseSolution, SolvedFrame } from '#shared/mechanics/solution'

const FOLDER = join(import.meta.dirname, '../../seeds/catalogue')
export const FILES = readdirSync(FOLDER).filter((file) => file.endsWith('.yaml'))

/** Every entry as written, so that one that does not parse can be named. */
export const entries = FILES.flatMap((file) =>
  z
    .array(z.looseObject({ slug: z.string() }))
    .parse(parse(readFileSync(join(FOLDER, file), 'utf8')))
    .map((content) => ({ file, slug: content.slug, content })),
)

/** The entries that parse, by slug. */
export const documents = new Map<string, ExerciseDocument>()
for (const { slug, content } of entries) {
  const parsed = exerciseDocument.safeParse(content)
  if (parsed.success) documents.set(slug, parsed.data)
}

const solutions = new Map<string, ExerciseSolution>()
/** The solution of one exercise for one sex, solved once. */
export function solutionOf(slug: string, sex: Sex = 'male'): ExerciseSolution {
  const key = `${slug} ${sex}`
  const known = solutions.get(key)
  if (known) return known
  const document = documents.get(slug)
  if (!document) throw new Error(`No exercise ${slug}`)
  const solution = solveExercise(document.mechanics, sex)
  solutions.set(key, solution)
  return solution
}
export const referenceLoad = (slug: string): number => documents.get(slug)!.mechanics.referenceLoad

/** Moment ÷ (m·g·H), or force ÷ (m·g), at a load given as a share of body mass; 0 where nothing is asked. */
export function asked(frame: SolvedFrame, axis: Axis, load: number): number {
  const term = frame.terms.find((each) => each.axis === axis && each.role !== 'idle')
  return term ? term.a + load * term.b : 0
}
/** The largest amount asked of an axis through the repetition, at the reference load. */
export const hardest = (slug: string, axis: Axis, sex: Sex = 'male'): number =>
  Math.max(...solutionOf(slug, sex).frames.map((frame) => Math.abs(asked(frame, axis, referenceLoad(slug)))))

/** Upright force on both hands ÷ body weight, at the reference load. */
export const onHands = (slug: string, frame: SolvedFrame): number =>
  frame.reactions
    .filter(({ support }) => support === 'handsHanging' || support === 'handsPushing')
    .reduce((sum, { a, b }) => sum + a + referenceLoad(slug) * b, 0)
