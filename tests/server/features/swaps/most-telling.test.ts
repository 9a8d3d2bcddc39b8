import { describe, expect, it } from 'vitest'
import type { LeftOutRow } from '#shared/contract/swap'
import { mostTelling } from '#server/features/swaps/build-ranking'

const row = (name: string, why: LeftOutRow['why']): LeftOutRow => ({
  exercise: { id: name, slug: name, name },
  why,
  reason: why,
})
const rows = [
  row('a', 'targetNotTrained'),
  row('b', 'overCap'),
  row('c', 'targetNotTrained'),
  row('d', 'noEquipment'),
  row('e', 'targetNotTrained'),
  row('f', 'overCap'),
]
const names = (most: number) => mostTelling(rows, most).map(({ exercise }) => exercise.name)

describe('what is left out of a long ranking', () => {
  it('is all there, in its order, while there is room', () => {
    expect(mostTelling(rows, 6)).toEqual(rows)
  })

  it('loses what does not train the target first, and keeps its order', () => {
    expect(names(5)).toEqual(['a', 'b', 'c', 'd', 'f'])
    expect(names(3)).toEqual(['b', 'd', 'f'])
    expect(names(2)).toEqual(['b', 'd'])
  })
})
