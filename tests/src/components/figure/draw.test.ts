import { describe, expect, it } from 'vitest'
import { solveExercise, type ExerciseMechanics } from '#shared/mechanics/index'
import { SAMPLE_MECHANICS } from '#tests/support/sample-mechanics'
import { drawExercise } from '@/components/figure/draw'
import { discRadius, drawMarks, type Mark } from '@/components/figure/marks'

const solved = Object.entries(SAMPLE_MECHANICS).map(([name, mechanics]) => ({
  name,
  mechanics,
  frames: solveExercise(mechanics, 'unspecified').frames,
}))
const numbers = (path: string): number[] => (path.match(/-?\d+(\.\d+)?/g) ?? []).map(Number)
const inks = (name: keyof typeof SAMPLE_MECHANICS): Set<string> => {
  const { mechanics, frames } = solved.find((one) => one.name === name)!
  return new Set(drawExercise(mechanics, frames).frames.flatMap(({ shapes }) => shapes.map(({ ink }) => ink)))
}

describe('drawExercise', () => {
  it.each(solved)('$name: every shape is finite and lies inside the view box', ({ mechanics, frames }) => {
    const { viewBox, frames: drawn } = drawExercise(mechanics, frames)
    const [left, top, width, height] = viewBox
    expect(viewBox.every(Number.isFinite)).toBe(true)
    for (const { path, box } of drawn.flatMap(({ shapes }) => shapes)) {
      expect(path).not.toMatch(/NaN|Infinity|undefined/)
      expect(numbers(path).length).toBeGreaterThan(3)
      expect(box.left).toBeGreaterThanOrEqual(left)
      expect(box.top).toBeGreaterThanOrEqual(top)
      expect(box.right).toBeLessThanOrEqual(left + width)
      expect(box.bottom).toBeLessThanOrEqual(top + height)
    }
  })

  it.each(solved)('$name: the corners of every path lie inside the view box', ({ mechanics, frames }) => {
    const { viewBox, frames: drawn } = drawExercise(mechanics, frames)
    const [left, top, width, height] = viewBox
    for (const { path } of drawn.flatMap(({ shapes }) => shapes)) {
      // Ends of move, line, curve and arc commands: the last two numbers of each.
      for (const command of path.match(/[MLCA][^MLCAZ]*/g) ?? []) {
        const [x, y] = numbers(command).slice(-2) as [number, number]
        expect(x).toBeGreaterThanOrEqual(left)
        expect(x).toBeLessThanOrEqual(left + width)
        expect(y).toBeGreaterThanOrEqual(top)
        expect(y).toBeLessThanOrEqual(top + height)
      }
    }
  })

  it.each(solved)('$name: drawing twice gives the same paths', ({ mechanics, frames }) => {
    expect(drawExercise(mechanics, frames)).toEqual(drawExercise(mechanics, frames))
  })

  it('keeps a hanging athlete’s bar at one place through the repetition', () => {
    const { mechanics, frames } = solved.find((one) => one.name === 'pullUp')!
    const bars = drawExercise(mechanics, frames).frames.map(
      ({ shapes }) => shapes.find(({ ink }) => ink === 'rod')!.path,
    )
    expect(new Set(bars).size).toBe(1)
  })

  it('keeps a pulley at one place while the hands move', () => {
    const { mechanics, frames } = solved.find((one) => one.name === 'straightArmPulldown')!
    const wheels = drawExercise(mechanics, frames).frames.map(
      ({ shapes }) => shapes.find(({ ink }) => ink === 'wheel')!.path,
    )
    expect(new Set(wheels).size).toBe(1)
  })

  it('follows a cable to a far pulley only a little above the athlete', () => {
    const { mechanics } = solved.find((one) => one.name === 'straightArmPulldown')!
    const far = {
      ...mechanics,
      loads: [{ at: 'hands', direction: { toward: [0.55, 4], of: 'ankle' } }],
    } as ExerciseMechanics
    const height = drawExercise(far, solveExercise(far, 'male').frames).viewBox[3]
    expect(height).toBeLessThan(180)
  })

  it('derives the equipment from supports, loads and guidance', () => {
    expect(inks('pullUp')).not.toContain('ground')
    expect(inks('pullUp')).toContain('rod')
    expect(inks('straightArmPulldown')).toContain('wheel')
    expect(inks('benchPress')).toContain('plate')
    expect(inks('kneeExtension')).toContain('pad')
    expect(inks('pushUp')).toContain('ground')
    expect(inks('ringDip')).toContain('strap')
    expect(inks('dip')).toContain('iron')
  })

  it('draws the push-up as it was drawn before', () => {
    const { mechanics, frames } = solved.find((one) => one.name === 'pushUp')!
    const drawing = drawExercise(mechanics, frames)
    expect({
      viewBox: drawing.viewBox,
      paths: drawing.frames[0]!.shapes.map(({ ink, path }) => `${ink} ${path}`),
    }).toMatchSnapshot()
  })
})

describe('drawMarks', () => {
  const { mechanics, frames } = solved.find((one) => one.name === 'pullUp')!
  const { view, frames: drawn } = drawExercise(mechanics, frames)
  const mark = (over: Partial<Mark>): Mark => ({ joint: 'elbow', side: 'right', stress: 0.4, cap: 0.5, ...over })

  it('grows a disc’s area, not its radius, with the share of strength', () => {
    expect(discRadius(0.8) ** 2 / discRadius(0.2) ** 2).toBeCloseTo(4, 0)
  })

  it('puts the ring outside the disc below the cap and inside it past the cap', () => {
    const [below] = drawMarks(view, drawn[0]!.pose, [mark({})])
    const [past] = drawMarks(view, drawn[0]!.pose, [mark({ stress: 0.7 })])
    expect(below!.ring!).toBeGreaterThan(below!.disc)
    expect(past!.ring!).toBeLessThan(past!.disc)
  })

  it('marks both sides when the joint has no side given, and the midline once', () => {
    expect(drawMarks(view, drawn[0]!.pose, [mark({ side: null })])).toHaveLength(2)
    expect(drawMarks(view, drawn[0]!.pose, [mark({ joint: 'lowerBack', side: null })])).toHaveLength(1)
  })

  it('keeps even the largest disc inside the view box', () => {
    const [left, top, width, height] = drawExercise(mechanics, frames).viewBox
    for (const { pose } of drawn)
      for (const joint of ['neck', 'shoulder', 'elbow', 'wrist', 'lowerBack', 'hip', 'knee', 'ankle'] as const)
        for (const { x, y, disc } of drawMarks(view, pose, [mark({ joint, side: null, stress: 9 })])) {
          expect(x - disc).toBeGreaterThanOrEqual(left)
          expect(x + disc).toBeLessThanOrEqual(left + width)
          expect(y - disc).toBeGreaterThanOrEqual(top)
          expect(y + disc).toBeLessThanOrEqual(top + height)
        }
  })

  it('leaves out joints that are not asked for and have no cap', () => {
    expect(drawMarks(view, drawn[0]!.pose, [mark({ stress: 0, cap: null })])).toHaveLength(0)
  })
})
