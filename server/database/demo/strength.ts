import { previewOf, roundToSteps, type Athlete, type Candidate } from '#shared/rules/index'
import type { Dose } from '#shared/contract/session'
import type { DemoAthlete } from '../../../seeds/demo/people'
import type { PlannedExercise } from '../../../seeds/demo/programmes'
import { randomFrom } from '../../../seeds/demo/random'
import type { Strength } from '../../../seeds/demo/sessions'
import { ACTION_JOINT, ACTIONS, type Action, type Joint } from '#shared/mechanics/vocabulary'
import type { CatalogueEdition } from '../../features/exercises/catalogue-edition'

const LEGS: readonly Joint[] = ['hip', 'knee', 'ankle']

/** A real body is not equally strong everywhere: every action lies within 6 % of the athlete's own level. */
export function strengthFactors({ name, strength, legs, trained }: DemoAthlete): Athlete['factors'] {
  const random = randomFrom('strength', name)
  const level = (action: Action) => strength * (LEGS.includes(ACTION_JOINT[action]) ? legs : 1) * (trained[action] ?? 1)
  return Object.fromEntries(
    ACTIONS.map((action) => [action, Math.round(level(action) * (0.94 + 0.12 * random.share()) * 100) / 100]),
  )
}

export const toEngineAthlete = (athlete: DemoAthlete): Athlete => ({
  sex: athlete.sex,
  bodyMass: athlete.bodyMass,
  stature: athlete.stature,
  factors: strengthFactors(athlete),
  skill: athlete.skill,
  minor: athlete.age < 18,
})

/** Halvings of the load range: fine enough for any plate. */
const HALVINGS = 14

function heaviestAtDemand(candidate: Candidate, athlete: Athlete, demand: number, edition: CatalogueEdition): number {
  const { document, solution, coordination } = candidate
  const movement = { mechanics: document.mechanics, solution, coordination }
  const hardest = (load: number) =>
    Math.max(
      ...previewOf(movement, athlete, load, [], edition.ruleSet).frames.map(({ actions }) => actions[0]?.demand ?? 0),
    )
  const { kind, least = 0, most = 100 } = document.load
  let [low, high] = kind === 'assistance' ? [-most, -least] : [least, most]
  for (let halving = 0; halving < HALVINGS; halving += 1) {
    const middle = (low + high) / 2
    if (hardest(middle) <= demand) low = middle
    else high = middle
  }
  return low
}

/** The demo's plans are dosed by the same engine that later ranks swaps for them. */
export function demoStrength(edition: CatalogueEdition): Strength {
  const find = (sex: DemoAthlete['sex'], slug: string): Candidate => {
    const found = edition.candidates(sex).find(({ document }) => document.slug === slug)
    if (found === undefined) throw new Error(`The demo plans ${slug}, which the catalogue does not have.`)
    return found
  }
  const known = new Map<string, number>()
  const workingLoadOf = (athlete: DemoAthlete, candidate: Candidate, { slug, count, rir }: PlannedExercise): number => {
    const key = [athlete.name, slug, count, rir].join(' ')
    const { epley, secondsPerRepetition } = edition.ruleSet.dose
    const repetitions = candidate.document.unit === 'seconds' ? count / secondsPerRepetition.value : count
    const intensity = 1 / (1 + (repetitions + rir) / epley.value)
    const load = known.get(key) ?? heaviestAtDemand(candidate, toEngineAthlete(athlete), intensity, edition)
    known.set(key, load)
    return load
  }
  return {
    unit: (slug): Dose['unit'] => find('male', slug).document.unit,
    // A load that each side carries by itself is a pair of implements.
    pieces: (slug) => (find('male', slug).document.mechanics.loads.some(({ share }) => share === 'each') ? 2 : 1),
    workingLoad(athlete, planned, share) {
      const candidate = find(athlete.sex, planned.slug)
      const { kind, from } = candidate.document.load
      if (kind === 'none') return null
      const heaviest = workingLoadOf(athlete, candidate, planned)
      // What is lifted beside an external load is the body, and it takes its part of the strength.
      const body = kind === 'external' ? 0 : athlete.bodyMass
      const load = (body + heaviest) * share - body
      const steps = athlete.place.equipment.find((item) => item.kind === from)?.steps
      if (steps === undefined || steps === null) return kind === 'added' ? null : Math.round(load)
      const rounded = roundToSteps(load, steps, kind === 'assistance' ? 'assistance' : 'load')
      return rounded === 0 ? null : (rounded ?? (kind === 'external' ? steps.first : null))
    },
  }
}
