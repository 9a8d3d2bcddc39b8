import type { Pose, Vector } from '#shared/mechanics/solution'
import { SIDES, type Joint, type Side } from '#shared/mechanics/vocabulary'
import { round } from './geometry'
import { depthOf, project, type View } from './view'

/** What a joint is asked for, as a share of its strength, and the cap that binds it. */
export interface Mark {
  joint: Joint
  /** Null for the midline, or for both sides alike. */
  side: Side | null
  stress: number
  cap: number | null
}

export interface DrawnMark {
  key: string
  x: number
  y: number
  /** Radius of the disc, whose area is the share of strength, and of the ring at the cap. */
  disc: number
  ring: number | null
  far: boolean
}

/** Radius at the joint's full strength, in hundredths of stature; readable on a 64 px thumbnail. */
const FULL = 8
/** Past this the disc stops growing; the number beside the figure goes on. */
const MOST = 1.6
/** Discs smaller than a pen stroke say nothing. */
const LEAST = 0.004

/** Radius of the largest disc that is drawn. */
export const MOST_RADIUS = FULL * Math.sqrt(MOST)

export const discRadius = (share: number): number => round(FULL * Math.sqrt(Math.min(MOST, Math.max(0, share))))

function placesOf(pose: Pose, { joint, side }: Mark): Array<{ side: Side | null; at: Vector }> {
  if (joint === 'lowerBack') return [{ side: null, at: pose.lumbar }]
  if (joint === 'neck') return [{ side: null, at: pose.neckBase }]
  return (side === null ? SIDES : [side]).map((one) => ({ side: one, at: pose[`${one}.${joint}`] }))
}

/** Discs and rings of one frame, far side first. */
export function drawMarks(view: View, pose: Pose, marks: readonly Mark[]): DrawnMark[] {
  return marks
    .flatMap((mark) =>
      placesOf(pose, mark).flatMap(({ side, at }) => {
        const ring = mark.cap === null || mark.cap >= 1 ? null : discRadius(mark.cap)
        if (mark.stress < LEAST && ring === null) return []
        const { x, y } = project(view, at)
        const drawn: DrawnMark = {
          key: `${mark.joint}-${side ?? 'middle'}`,
          x: round(x),
          y: round(y),
          disc: mark.stress < LEAST ? 0 : discRadius(mark.stress),
          ring,
          far: side === 'left',
        }
        return [{ drawn, depth: depthOf(view, at) }]
      }),
    )
    .sort((a, b) => a.depth - b.depth)
    .map(({ drawn }) => drawn)
}
