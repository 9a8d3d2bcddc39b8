import { describe, expect, it } from 'vitest'
import { GUIDANCES, type ExerciseMechanics } from '#shared/mechanics/index'
import { SKILL_GRADES } from '#shared/contract/exercise'
import { MOVEMENTS } from './geometry'
import { candidateOf, candidatesFor, SLUGS } from './movements'

const of = (slug: string, change: Partial<ExerciseMechanics> = {}, rest: Parameters<typeof candidateOf>[1] = {}) =>
  candidateOf(slug, { ...rest, mechanics: { ...MOVEMENTS[slug]!.mechanics, ...change } }).coordination

describe('coordination demand', () => {
  it('lies between 0 and 100 for every movement', () => {
    for (const { coordination } of candidatesFor('unspecified')) {
      expect(coordination).toBeGreaterThanOrEqual(0)
      expect(coordination).toBeLessThanOrEqual(100)
    }
  })

  it('never falls when the path is freed', () => {
    // From guided to free, as the vocabulary has it.
    for (const slug of SLUGS) {
      const along = GUIDANCES.map((guidance) => of(slug, { guidance }))
      expect(along).toEqual([...along].sort((one, other) => one - other))
    }
  })

  it('never falls when a support is taken away', () => {
    expect(of('pulldown', { supports: ['thighPad'] })).toBeGreaterThanOrEqual(of('pulldown'))
    expect(of('leg-press', { supports: ['backPad'] })).toBeGreaterThanOrEqual(of('leg-press'))
    expect(of('one-arm-pushdown')).toBeGreaterThan(of('one-arm-pushdown', { supports: ['seat'], balance: undefined }))
  })

  it('rises on one foot, with one side at a time, with speed and with the skill grade', () => {
    const standing = of('one-arm-pushdown')
    const oneLegged = MOVEMENTS['one-arm-pushdown']!.mechanics.frames.map((frame) => ({
      ...frame,
      offLeg: { hip: 20, knee: 60 },
    }))
    expect(of('one-arm-pushdown', { frames: oneLegged })).toBeGreaterThan(standing)
    expect(standing).toBeGreaterThan(of('one-arm-pushdown', { sides: 'both' }))
    expect(of('pulldown', {}, { speed: 'fast' })).toBeGreaterThan(of('pulldown'))
    const grades = SKILL_GRADES.map((skill) => of('pull-up', {}, { skill }))
    expect(grades).toEqual([...grades].sort((one, other) => one - other))
  })

  it('orders the trade’s own ladder: machine, cable, pull-up, handstand (common practice, no source)', () => {
    const ladder = ['pullover-machine', 'pulldown', 'pull-up', 'handstand-hold'].map((slug) => of(slug))
    expect(ladder).toEqual([...ladder].sort((one, other) => one - other))
  })
})
