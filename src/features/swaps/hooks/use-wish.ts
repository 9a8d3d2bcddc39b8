import { useMemo } from 'react'
import { useSearchParams } from 'react-router-dom'
import { LIMITS } from '#shared/contract/limits'
import { INTENTS } from '#shared/contract/session'
import { TARGET_GROUP_NAMES } from '#shared/rules/muscle-names'
import type { RankingWish } from '../api'

const among = <T extends string>(values: readonly T[], text: string | null, otherwise: T): T =>
  values.find((value) => value === text) ?? otherwise
const within = (text: string | null, { min, max }: { min: number; max: number }, otherwise: number): number => {
  const value = text === null || text.trim() === '' ? Number.NaN : Number(text)
  return Number.isFinite(value) && value >= min && value <= max ? value : otherwise
}

/** What the swap is wanted for, as the address has it. */
export function readWish(search: URLSearchParams): RankingWish {
  return {
    target: among(TARGET_GROUP_NAMES, search.get('target'), 'lats'),
    intent: among(INTENTS, search.get('intent'), 'size'),
    sets: Math.round(within(search.get('sets'), LIMITS.sets, 3)),
    repetitions: Math.round(within(search.get('repetitions'), LIMITS.repetitions, 8)),
    rir: within(search.get('rir'), LIMITS.rir, 2),
  }
}

export function useWish(): [RankingWish, (wish: RankingWish) => void] {
  const [search, setSearch] = useSearchParams()
  const wish = useMemo(() => readWish(search), [search])
  const change = (next: RankingWish) =>
    setSearch(
      (before) => {
        const after = new URLSearchParams(before)
        for (const [name, value] of Object.entries(next)) after.set(name, String(value))
        return after
      },
      { replace: true, preventScrollReset: true },
    )
  return [wish, change]
}
