import { describe, expect, it } from 'vitest'
import { aDose } from '#tests/src/support/samples'
import { formatDay, formatDose, formatLoad, formatOverCap, formatPercent } from '@/lib/format'

/** Numbers and units are tied by a no-break space; the tests read it as a plain one. */
const plain = (text: string) => text.replaceAll('\u00a0', ' ')

describe('a dose reads as a coach would write it', () => {
  it.each([
    ['added load', aDose({ load: 5 }), 'added', '4 × 6 at RIR 2, + 5 kg'],
    ['body weight alone', aDose(), 'added', '4 × 6 at RIR 2'],
    ['nothing added yet', aDose({ load: 0 }), 'added', '4 × 6 at RIR 2'],
    ['a hold', aDose({ sets: 5, repetitions: 8, unit: 'seconds' }), 'none', '5 × 8 s'],
    ['a pair', aDose({ sets: 3, repetitions: 10, load: 18, pieces: 2 }), 'external', '3 × 10 at RIR 2, 2 × 18 kg'],
    ['assistance', aDose({ load: -20 }), 'assistance', '4 × 6 at RIR 2, 20 kg of assistance'],
    ['an outside load', aDose({ load: 52.5 }), 'external', '4 × 6 at RIR 2, 52.5 kg'],
    ['half a repetition in reserve', aDose({ rir: 1.5 }), 'none', '4 × 6 at RIR 1.5'],
  ] as const)('%s', (_, dose, kind, words) => expect(plain(formatDose(dose, 'metric', kind))).toBe(words))

  it('is told in pounds to those who lift in pounds', () => {
    expect(plain(formatDose(aDose({ load: 20 }), 'imperial', 'external'))).toBe('4 × 6 at RIR 2, 44 lb')
  })
})

describe('numbers carry their unit', () => {
  it('keeps quarter kilograms and half pounds', () => {
    expect(plain(formatLoad(1.25, 'metric'))).toBe('1.25 kg')
    expect(plain(formatLoad(1.25, 'imperial'))).toBe('3 lb')
    expect(plain(formatLoad(2.5, 'imperial'))).toBe('5.5 lb')
  })

  it('rounds shares to whole percent', () => expect(plain(formatPercent(0.714))).toBe('71 %'))

  it('says what a joint would reach and its cap', () => {
    const hit = { joint: 'elbow', side: 'right', stress: 0.71, cap: 0.5 } as const
    expect(plain(formatOverCap(hit))).toBe('Right elbow would reach 71 %, cap 50 %.')
    expect(plain(formatOverCap({ ...hit, joint: 'lowerBack', side: null, cap: null }))).toBe(
      'Lower back would reach 71 %.',
    )
  })

  it('does not say that 60 % is too much for a cap of 60 %', () => {
    const hit = { joint: 'elbow', side: 'right', stress: 0.603, cap: 0.6 } as const
    expect(plain(formatOverCap(hit))).toBe('Right elbow would just pass its cap of 60 %.')
  })

  it('names a calendar day without shifting it between time zones', () =>
    expect(formatDay('2026-12-01')).toBe('Tuesday 1 December'))
})
