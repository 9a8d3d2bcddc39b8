import { median, type BenchResult } from './result'
import { packCatalogue, rankTop, type Athlete, type Candidate } from '#shared/rules/index'
import { candidateOf, man, requestOf, ruleSet, soreJoint } from '#tests/shared/rules/movements'
import { syntheticCandidate } from '#tests/shared/rules/synthetic'

const EXERCISES = 100_000
const ACTIONS = 12
const ROWS = 50
const WARM_UP = 10
const ROUNDS = 25
/** Not the adult of the norms, and with some strengths of their own. */
const ATHLETE: Athlete = {
  ...man,
  bodyMass: 81,
  stature: 1.83,
  factors: { elbowFlexion: 1.25, shoulderAdduction: 1.3, shoulderExtension: 1.2, grip: 1.1, kneeExtension: 1.15 },
}

/** Made-up exercises one after the other, so that not all of them have to be kept. */
const catalogue = {
  *[Symbol.iterator](): Iterator<Candidate> {
    for (let index = 0; index < EXERCISES; index++) yield syntheticCandidate(index, ACTIONS)
  },
}

/** Every a and b of the catalogue in two arrays, exercise by exercise, as a table of coefficients would hold them. */
function coefficients(): { a: Float64Array; b: Float64Array } {
  const a = new Float64Array(EXERCISES * 3 * ACTIONS)
  const b = new Float64Array(EXERCISES * 3 * ACTIONS)
  let at = 0
  for (const { solution } of catalogue) {
    for (const { terms } of solution.frames) {
      for (const term of terms) {
        a[at] = term.a
        b[at++] = term.b
      }
    }
  }
  return { a, b }
}

function sumOnce({ a, b }: { a: Float64Array; b: Float64Array }): number {
  let sum = 0
  for (let i = 0; i < a.length; i++) sum += a[i]!
  for (let i = 0; i < b.length; i++) sum += b[i]!
  return sum
}

const timed = (work: () => unknown): number => {
  const start = performance.now()
  work()
  return performance.now() - start
}

/**
 * Ranking 100 000 made-up exercises (three frames, twelve actions) for one athlete with a sore elbow against summing the same
 * coefficients once, in this process. Packing happens once per published catalogue and place and is not counted; closer looks at
 * single exercises are, with the exercise at hand as it would be.
 */
export function benchRanking(): BenchResult[] {
  const packed = packCatalogue(catalogue, { sex: 'male', place: null }, ruleSet)
  const table = coefficients()
  const known = new Map<number, Candidate>()
  const candidateAt = (index: number): Candidate => {
    const candidate = known.get(index) ?? syntheticCandidate(index, ACTIONS)
    known.set(index, candidate)
    return candidate
  }
  const cases = [
    { name: 'sore elbow, lats, size', from: 'pull-up', target: 'lats', intent: 'size', sore: [soreJoint()] },
    { name: 'no sore joint, chest, strength', from: 'push-up', target: 'chest', intent: 'strength', sore: [] },
    {
      name: 'sore lower back, quadriceps, size',
      from: 'barbell-squat',
      target: 'quadriceps',
      intent: 'size',
      sore: [soreJoint({ joint: 'lowerBack', side: null })],
    },
  ] as const
  return cases.map(({ name, from, ...rest }) => {
    const request = requestOf({ ...rest, athlete: ATHLETE, candidates: [], original: candidateOf(from) })
    const work = () => rankTop({ request, packed, candidateAt, count: ROWS }, ruleSet)
    for (let i = 0; i < WARM_UP; i++) timed(work)
    // Turn about, so that whatever else the machine does falls on both.
    const rounds = Array.from({ length: ROUNDS }, () => ({ sum: timed(() => sumOnce(table)), rank: timed(work) }))
    const sum = median(rounds.map((round) => round.sum))
    const rank = median(rounds.map((round) => round.rank))
    process.stdout.write(
      `${name}: sum ${sum.toFixed(2)} ms, rank ${rank.toFixed(2)} ms for ${work().items.length} rows\n`,
    )
    return { name: `rank 100 000, ${name}`, ratio: median(rounds.map((round) => round.rank / round.sum)), atMost: 2 }
  })
}
