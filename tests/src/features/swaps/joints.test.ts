import { describe, expect, it } from 'vitest'
import { jointColumns, stressAt } from '@/features/swaps/joints'
import { inSentence, wantedWords } from '@/features/swaps/words'
import { aRanking, aSwapRow } from '../../support/swap-samples'

describe('jointColumns', () => {
  it('puts sore joints first and keeps the order of the others', () => {
    const ranking = aRanking({
      items: [
        aSwapRow('Row', {
          joints: [
            { joint: 'wrist', side: null, stress: 0.1, cap: null },
            { joint: 'lowerBack', side: null, stress: 0.2, cap: null },
            { joint: 'elbow', side: 'right', stress: 0.3, cap: 0.5 },
          ],
        }),
      ],
      originalRow: null,
    })
    expect(jointColumns(ranking).map(({ title, sore }) => [title, sore])).toEqual([
      ['Elbow, right', true],
      ['Wrist', false],
      ['Lower back', false],
    ])
  })

  it('makes one column of a joint and side, however many rows have it, and finds each row’s stress in it', () => {
    const items = [
      aSwapRow('Row'),
      aSwapRow('Press', { joints: [{ joint: 'knee', side: 'left', stress: 0.2, cap: null }] }),
    ]
    const columns = jointColumns(aRanking({ items }))
    expect(columns.map(({ key }) => key)).toEqual(['elbow.right', 'wrist.both', 'lowerBack.both', 'knee.left'])
    expect(stressAt(items[1]!.joints, columns[0]!)).toBeUndefined()
    expect(stressAt(items[1]!.joints, columns[3]!)?.stress).toBe(0.2)
  })
})

describe('words of the swap page', () => {
  it('lowers a name in the middle of a sentence, but not letters and proper names', () => {
    expect(inSentence('Pull-up, overhand')).toBe('pull-up, overhand')
    expect(inSentence('L-sit')).toBe('L-sit')
    expect(inSentence('Nordic curl')).toBe('Nordic curl')
    expect(inSentence('Romanian deadlift')).toBe('Romanian deadlift')
  })

  it('says what was wanted', () => {
    expect(wantedWords({ target: 'lats', intent: 'strength' })).toBe('lats, for strength')
  })
})
