import { readFileSync } from 'node:fs'
import { parse } from 'yaml'
import { exerciseDocument, type ExerciseDocument } from '#shared/contract/exercise'
import { ruleSet as ruleSetSchema } from '#shared/contract/rule-set'
import { solveExercise, type Sex } from '#shared/mechanics/index'
import { MOVEMENTS } from './geometry'
import {
  coordinationDemand,
  type Athlete,
  type Candidate,
  type Movement,
  type RankRequest,
  type SoreJointInput,
} from '#shared/rules/index'

/** Rule set 1, parsed by the contract from its seed. */
export const ruleSet = ruleSetSchema.parse(
  parse(readFileSync(new URL('../../../seeds/rules/rule-set-1.yaml', import.meta.url), 'utf8')),
)

export const man: Athlete = { sex: 'male', bodyMass: 73, stature: 1.741, factors: {}, skill: 'advanced', minor: false }
export const woman: Athlete = { ...man, sex: 'female', bodyMass: 61.9, stature: 1.735 }

/** A published candidate of one of the small movements, with anything changed that a test wants changed. */
export function candidateOf(slug: string, change: Partial<ExerciseDocument> = {}, sex: Sex = 'male'): Candidate {
  const entry = MOVEMENTS[slug]
  if (!entry) throw new Error(`No movement ${slug}`)
  const document = exerciseDocument.parse({
    slug,
    name: slug,
    family: 'verticalPull',
    kind: 'compound',
    setup: 'Set up.',
    mechanics: entry.mechanics,
    ...entry.rest,
    ...change,
  })
  const solution = solveExercise(document.mechanics, sex)
  const coordination = coordinationDemand(document, solution, ruleSet)
  const uuid = (kind: number) => `0000000${kind}-0000-4000-8000-${String(SLUGS.indexOf(slug)).padStart(12, '0')}`
  return { id: uuid(1), versionId: uuid(2), document, solution, coordination }
}

export const SLUGS = Object.keys(MOVEMENTS)

/** All small movements as candidates of one sex. */
export const candidatesFor = (sex: Sex): Candidate[] => SLUGS.map((slug) => candidateOf(slug, {}, sex))

/** What previews take, from a candidate. */
export const movementOf = ({ document: { mechanics }, solution, coordination }: Candidate): Movement => ({
  mechanics,
  solution,
  coordination,
})

/** A sore joint with everything but what the test is about filled in. */
export const soreJoint = (change: Partial<SoreJointInput> = {}): SoreJointInput => ({
  soreJointId: '00000003-0000-4000-8000-000000000000',
  joint: 'elbow',
  side: 'right',
  rating: 4,
  provocations: ['bending'],
  redFlags: [],
  ...change,
})

/** A ranking request with everything but what the test is about filled in: pull-ups for the lats, four sets of six. */
export function requestOf(change: Partial<RankRequest> & { originalSlug?: string } = {}): RankRequest {
  const { originalSlug = 'pull-up', ...rest } = change
  const candidates = rest.candidates ?? candidatesFor(rest.athlete?.sex ?? 'male')
  return {
    athlete: man,
    original: candidates.find(({ document }) => document.slug === originalSlug) ?? candidateOf(originalSlug),
    planned: { sets: 4, repetitions: 6, unit: 'repetitions', rir: 2, load: null, pieces: 1 },
    intent: 'size',
    target: 'lats',
    candidates,
    sore: [soreJoint()],
    place: null,
    ...rest,
  }
}
