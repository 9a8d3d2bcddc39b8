import { median, type BenchResult } from './result'
import { packCatalogue, rankTop, type Candidate } from '#shared/rules/index'
import { candidateOf, man, requestOf, ruleSet, soreJoint } from '#tests/shared/rules/movements'
import { syntheticCandidate } from '#tests/shared/rules/synthetic'

const EXERCISES = 100_000
const ACTIONS = 12
const ROWS = 50
const ROUNDS = 15

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

/** Times work several times, after warming it up, and takes the middle, ms. */
function timed(work: () => unknown): number {
  for (let i = 0; i < 5; i++) work()
  return median(
    Array.from({ length: ROUNDS }, () => {
      const start = performance.now()
      work()
      return performance.now() - start
    }),
  )
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
    { name: 'sore elbow, lats, size', target: 'lats', intent: 'size', sore: [soreJoint()] },
    { name: 'no sore joint, chest, strength', target: 'chest', intent: 'strength', sore: [] },
    {
      name: 'sore lower back, quadriceps, size',
      target: 'quadriceps',
      intent: 'size',
      sore: [soreJoint({ joint: 'lowerBack', side: null })],
    },
  ] as const
  const sum = timed(() => sumOnce(table))
  process.stdout.write(`summing ${2 * table.a.length} coefficients: ${sum.toFixed(2)} ms\n`)
  return cases.map(({ name, ...rest }) => {
    const request = requestOf({ ...rest, athlete: man, candidates: [], original: candidateOf('pull-up') })
    const time = timed(() => rankTop({ request, packed, candidateAt, count: ROWS }, ruleSet))
    const { items } = rankTop({ request, packed, candidateAt, count: ROWS }, ruleSet)
    process.stdout.write(`${name}: ${time.toFixed(2)} ms for ${items.length} rows, ${known.size} looked at so far\n`)
    return { name: `rank 100 000, ${name}`, ratio: time / sum, atMost: 2 }
  })
}
