import type { FLAG_REASONS } from '#shared/contract/flag'
import type { Random } from './random'

/** Which row of the table somebody takes: mostly the first, and now and then none. */
export function chooseRank(random: Random, rows: number): number | null {
  if (rows === 0 || random.share() < 0.2) return null
  const wanted = random.share() < 0.65 ? 1 : random.share() < 0.6 ? 2 : 3
  return Math.min(wanted, rows)
}

/** One taken swap in ten was not to the athlete's liking. */
export const isUndone = (random: Random): boolean => random.share() < 0.1

export interface DemoFlagText {
  reason: (typeof FLAG_REASONS)[number]
  note: string
}

const FLAG_TEXTS: DemoFlagText[] = [
  { reason: 'loadOff', note: 'Far too light, I could have done twice the repetitions.' },
  { reason: 'wrongMuscle', note: 'Felt it in the front of the shoulder more than where it should be.' },
  { reason: 'notPossibleHere', note: 'Both cables were taken all evening.' },
  { reason: 'hurts', note: 'Same spot as before from the third set on.' },
  { reason: 'other', note: 'The set-up took longer than the sets.' },
]

/** What somebody wrote about a swap, for about one in seven; null for the rest. */
export const flagText = (random: Random): DemoFlagText | null =>
  random.share() < 0.15 ? random.pick(FLAG_TEXTS) : null
