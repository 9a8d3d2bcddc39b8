import { describe, expect, it } from 'vitest'
import type { Ranking } from '#shared/contract/swap'
import { serializeRanking } from '#server/features/swaps/serialize-ranking'

/** A table of this many rows; what is in them does not matter here. */
const table = (rows: number) =>
  ({
    fingerprint: 'a “quoted” one\n',
    items: Array.from({ length: rows }, (_, index) => ({ rank: index + 1, reason: `×${index}°` })),
    leftOut: Array.from({ length: rows * 2 }, (_, index) => ({ why: 'overCap', reason: `"${index}"` })),
    sore: [],
  }) as unknown as Ranking

describe('a ranking as JSON', () => {
  it.each([0, 1, 99, 100, 101, 250])('says what the ranking says with %i rows', (rows) => {
    expect(JSON.parse(serializeRanking(table(rows)).toString('utf8'))).toEqual(table(rows))
  })
})
