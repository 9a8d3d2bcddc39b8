import fc from 'fast-check'
import { describe, expect, it, vi } from 'vitest'
import type { Vector } from '#shared/mechanics/index'
import { solvable } from '#tests/support/mechanics-arbitrary'

vi.setConfig({ testTimeout: 60_000 })
const RUNS = { seed: 815, numRuns: 40 }
const solved = solvable('male')

describe('places', () => {
  it('a hand or foot stands where it was asked to', () => {
    fc.assert(
      fc.property(solved, ({ mechanics, solution }) => {
        mechanics.frames.forEach((frame, index) => {
          const { pose, angles } = solution.frames[index]!
          const from = (a: Vector, b: Vector): Vector => [b[0] - a[0], b[1] - a[1], b[2] - a[2]]
          const hand = from(pose['right.shoulder'], pose['right.grip'])
          // Balancing with the arms or legs turns the place itself.
          if ('hand' in frame.arms && mechanics.balance?.solve !== 'arms') {
            const [u, v, w = 0] = frame.arms.hand
            const lean = ((angles.trunkLean + angles.lumbar) * Math.PI) / 180
            const [up, forward, outward]: Vector[] = [
              [Math.sin(lean), 0, Math.cos(lean)],
              [Math.cos(lean), 0, -Math.sin(lean)],
              [0, -1, 0],
            ]
            const sum = (parts: [number, Vector][]) =>
              [0, 1, 2].map((i) => parts.reduce((total, [k, d]) => total + k * d[i]!, 0))
            const world = frame.arms.from === 'world'
            const wanted = {
              sagittal: world
                ? [u, 0, v]
                : sum([
                    [-u, up!],
                    [v, forward!],
                    [w, outward!],
                  ]),
              frontal: world
                ? [w, -u, v]
                : sum([
                    [-u, up!],
                    [v, outward!],
                    [w, forward!],
                  ]),
              transverse: world
                ? [w, -u, v]
                : sum([
                    [u, outward!],
                    [v, forward!],
                    [w, up!],
                  ]),
            }[mechanics.armPlane]
            // A sagittal arm in world axes has only two numbers.
            wanted.forEach((value, i) => expect(hand[i]).toBeCloseTo(value, 9))
          }
          if ('ankle' in frame.legs && Array.isArray(frame.legs.ankle) && mechanics.balance?.solve !== 'legs') {
            const ankle = from(pose['right.hip'], pose['right.ankle'])
            expect(Math.hypot(ankle[0], ankle[2])).toBeCloseTo(Math.hypot(...frame.legs.ankle), 9)
            if (!('from' in frame.legs) || frame.legs.from !== 'trunk') {
              expect(ankle[0]).toBeCloseTo(frame.legs.ankle[0]!, 9)
              expect(ankle[2]).toBeCloseTo(frame.legs.ankle[1]!, 9)
            }
          }
        })
      }),
      RUNS,
    )
  })

  it('nothing lies below the ground, and the bearing point stays where it is', () => {
    fc.assert(
      fc.property(solved, ({ solution }) => {
        for (const { pose } of solution.frames) {
          for (const [, , z] of Object.values(pose)) expect(z).toBeGreaterThan(-1e-9)
        }
        const anchors = solution.frames.map((frame) => frame.reactions.at(-1)?.at)
        if (anchors[0])
          anchors.forEach((at) =>
            expect([at![0], at![2]]).toEqual([expect.closeTo(0, 9), expect.closeTo(anchors[0]![2], 9)]),
          )
      }),
      RUNS,
    )
  })
})
