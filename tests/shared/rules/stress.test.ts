import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { ExerciseMechanics } from '#shared/mechanics/index'
import { capsFromSoreness, previewOf } from '#shared/rules/index'
import { MOVEMENTS } from './geometry'
import { candidateOf, man, movementOf, ruleSet, soreJoint } from './movements'

const changed = (slug: string, change: Partial<ExerciseMechanics>) =>
  candidateOf(slug, { mechanics: { ...MOVEMENTS[slug]!.mechanics, ...change } })
const previewAt = (
  slug: string,
  load: number,
  change: Partial<ExerciseMechanics> = {},
  caps = [] as Parameters<typeof previewOf>[3],
) => previewOf(movementOf(changed(slug, change)), man, load, caps, ruleSet)
const worst = (preview: ReturnType<typeof previewOf>, joint: string) =>
  Math.max(
    ...preview.frames.flatMap((frame) => frame.joints.filter((one) => one.joint === joint).map(({ stress }) => stress)),
  )
const demand = (preview: ReturnType<typeof previewOf>, action: string) =>
  Math.max(
    0,
    ...preview.frames.flatMap((frame) => frame.actions.filter((one) => one.action === action).map((one) => one.demand)),
  )

describe('joint stress', () => {
  it('counts half of a demand that is held still, and all of it over 60° of movement', () => {
    const curl = previewAt('dumbbell-curl', 10)
    expect(worst(curl, 'elbow')).toBeCloseTo(demand(curl, 'elbowFlexion'), 6)
    // The same curl as a hold at its middle posture.
    const level = MOVEMENTS['dumbbell-curl']!.mechanics.frames[1]!
    const hold = previewAt('dumbbell-curl', 10, { frames: [level, { ...level, name: 'held' }] })
    const gripAtElbow = demand(hold, 'grip') * ruleSet.stress.grip.value.elbow
    expect(worst(hold, 'elbow')).toBeCloseTo(Math.max(demand(hold, 'elbowFlexion') / 2, gripAtElbow), 6)
  })

  it('has the grip pull at wrist and elbow, and not in straps', () => {
    const hang = MOVEMENTS['pull-up']!.mechanics.frames[0]!
    const frames = [hang, { ...hang, name: 'held' }]
    const bare = previewAt('pull-up', 0, { frames, armPlane: 'sagittal' })
    const strapped = previewAt('pull-up', 0, { frames, armPlane: 'sagittal', gripFree: true })
    expect(demand(bare, 'grip')).toBeGreaterThan(0.5)
    expect(worst(bare, 'elbow')).toBeGreaterThanOrEqual(demand(bare, 'grip') * ruleSet.stress.grip.value.elbow - 1e-9)
    expect(demand(strapped, 'grip')).toBe(0)
    expect(worst(strapped, 'elbow')).toBeLessThan(worst(bare, 'elbow'))
    expect(worst(strapped, 'wrist')).toBeLessThan(worst(bare, 'wrist'))
  })

  it('makes a hand flat on the ground stress the wrist by the force on it: handstand over push-up', () => {
    const handstand = worst(previewAt('handstand-hold', 0), 'wrist')
    const pushUp = worst(previewAt('push-up', 0), 'wrist')
    // Half of body weight on each hand is the reference, so that a handstand counts nearly 1 (the hands themselves lie below).
    expect(handstand).toBeGreaterThan(0.95)
    expect(handstand).toBeLessThanOrEqual(1)
    expect(pushUp).toBeGreaterThan(0.5)
    expect(pushUp).toBeLessThan(0.85)
  })

  it('takes the end of the range out when the hand grips a handle instead of lying flat', () => {
    const caps = capsFromSoreness([soreJoint({ joint: 'wrist', rating: 6, provocations: ['endRange'] })], ruleSet)
    const flat = previewAt('push-up', 0, {}, caps).frames[0]!.joints.find(({ joint }) => joint === 'wrist')!
    const handles = previewAt(
      'push-up',
      0,
      {
        grip: 'neutral',
        frames: MOVEMENTS['push-up']!.mechanics.frames.map(({ arms, ...frame }) => ({
          ...frame,
          arms: { ...arms, flat: undefined },
        })),
      },
      caps,
    ).frames[0]!.joints.find(({ joint }) => joint === 'wrist')!
    expect([flat.cap, handles.cap]).toEqual([0.2, 0.6])
    expect(flat.stress).toBeGreaterThan(flat.cap!)
    expect(handles.stress / handles.cap!).toBeLessThan(flat.stress / flat.cap!)
  })

  it('is the same or more with every kilogram on the bar, and so is L5/S1 compression', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 150, noNaN: true }),
        fc.double({ min: 0, max: 50, noNaN: true }),
        (load, more) => {
          const light = previewAt('barbell-squat', load)
          const heavy = previewAt('barbell-squat', load + more)
          expect(worst(heavy, 'lowerBack')).toBeGreaterThanOrEqual(worst(light, 'lowerBack') - 1e-9)
          light.frames.forEach((frame, index) =>
            expect(heavy.frames[index]!.compression).toBeGreaterThanOrEqual(frame.compression - 1e-9),
          )
        },
      ),
      { numRuns: 40 },
    )
  })

  it('shows compression in kN without letting it bind a healthy back', () => {
    const squat = previewAt('barbell-squat', 40)
    const compression = Math.max(...squat.frames.map((frame) => frame.compression))
    expect(compression).toBeGreaterThan(ruleSet.stress.compressionReference.value / 1000)
    expect(worst(squat, 'lowerBack')).toBeCloseTo(demand(squat, 'trunkExtension') / 2, 6)
    const sore = capsFromSoreness([soreJoint({ joint: 'lowerBack', side: null, provocations: ['leaning'] })], ruleSet)
    const pressed = previewAt('barbell-squat', 40, {}, sore)
    expect(worst(pressed, 'lowerBack')).toBeCloseTo((compression * 1000) / ruleSet.stress.compressionFull.value, 6)
  })

  it('shows a sore joint by the channel that uses most of its cap', () => {
    const caps = capsFromSoreness([soreJoint({ rating: 6, provocations: ['gripping'] })], ruleSet)
    const elbow = previewAt('pulldown', 40, {}, caps).frames[1]!.joints.find(({ joint }) => joint === 'elbow')!
    expect([elbow.side, elbow.cap]).toEqual(['right', 0.2])
  })
})
