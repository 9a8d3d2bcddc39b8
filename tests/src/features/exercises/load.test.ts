import { describe, expect, it } from 'vitest'
import { framesOf } from '@/features/exercises/poses'
import { loadBounds } from '@/features/exercises/load'
import { hardestStress } from '@/features/exercises/components/demands'
import { anExerciseOf, aPreview } from '../../support/swap-samples'

const withLoad = (load: Parameters<typeof loadBounds>[0]['load']) =>
  loadBounds(anExerciseOf('pullUp', 'Pull-up', { load }))

describe('loadBounds', () => {
  it('offers no load where there is none', () => {
    expect(withLoad({ kind: 'none' })).toBeNull()
  })

  it('starts at nothing added, and keeps to what the exercise allows', () => {
    expect(withLoad({ kind: 'added', least: 0, most: 80 })).toEqual({ least: 0, most: 80, step: 2.5, start: 0 })
  })

  it('keeps assistance negative', () => {
    const bounds = withLoad({ kind: 'assistance', least: -60, most: -5 })!
    expect(bounds.least).toBe(-60)
    expect(bounds.most).toBe(-5)
    expect(bounds.start).toBeLessThanOrEqual(-5)
  })

  it('starts an external load where its posture was balanced, within its bounds', () => {
    const bounds = loadBounds(anExerciseOf('benchPress', 'Bench press', { load: { kind: 'external', least: 20 } }))!
    expect(bounds.start).toBe(55)
    expect(bounds.most).toBeGreaterThanOrEqual(100)
  })
})

describe('framesOf', () => {
  it('solves a version once for each segment table', () => {
    const exercise = anExerciseOf('squat', 'Squat')
    expect(framesOf(exercise, 'male')).toBe(framesOf(exercise, 'male'))
    expect(framesOf(exercise, 'male')).not.toBe(framesOf(exercise, 'female'))
  })

  it('gives null for geometry it cannot solve, so that the page can stand without its drawing', () => {
    const { mechanics } = anExerciseOf('squat', 'Squat')
    expect(framesOf({ mechanics: { ...mechanics, frames: mechanics.frames.slice(0, 1) } })).toBeNull()
  })
})

describe('hardestStress', () => {
  it('takes each joint’s worst posture, worst joint first, and leaves out what rounds to nothing', () => {
    const preview = aPreview(['start', 'middle', 'end'])
    preview.frames[0]!.joints.push({ joint: 'knee', side: null, stress: 0.001, cap: null })
    expect(hardestStress(preview).map(({ joint, stress }) => [joint, Number(stress.toFixed(2))])).toEqual([
      ['shoulder', 0.8],
      ['elbow', 0.3],
    ])
  })
})
