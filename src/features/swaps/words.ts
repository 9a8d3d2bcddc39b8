import type { Ranking } from '#shared/contract/swap'
import { INTENT_WORDS, TARGET_WORDS, PROVOCATION_WORDS } from '@/lib/words'
import type { Provocation } from '#shared/contract/sore-joint'

/** Names that keep their capital in the middle of a sentence. */
const PROPER = /^(Bulgarian|Copenhagen|Nordic|Romanian|Russian|Roman|Spanish|Zercher|Turkish)\b/

/** “Pull-up, overhand” → “pull-up, overhand”; “L-sit” and “Nordic curl” stay as they are. */
export const inSentence = (name: string): string =>
  PROPER.test(name) || !/^.[a-z]/.test(name) ? name : name.charAt(0).toLowerCase() + name.slice(1)

export const wantedWords = ({ target, intent }: Pick<Ranking, 'target' | 'intent'>): string =>
  `${TARGET_WORDS[target]}, for ${INTENT_WORDS[intent]}`

export const provocationWords = (provocation: string): string =>
  provocation === 'unknown' ? 'anything' : (PROVOCATION_WORDS[provocation as Provocation] ?? provocation)

export const FACTOR_WORDS = {
  kept: 'kept',
  spare: 'spare',
  calm: 'calm',
  lean: 'lean',
  carryOver: 'carry-over',
} as const
export type FactorName = keyof typeof FACTOR_WORDS
export const FACTORS = Object.keys(FACTOR_WORDS) as FactorName[]
