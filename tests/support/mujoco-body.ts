import type { Arm, ExerciseMechanics, Frame } from '#shared/mechanics/definition'
import type { SegmentTable } from '#shared/mechanics/segments'
import type { PointName, Pose, PoseAngles, SolvedFrame, Vector } from '#shared/mechanics/solution'
import type { ArmPlane, Side } from '#shared/mechanics/vocabulary'

/**
 * The linked body for MuJoCo: a tree of hinged segments standing upright at rest, with the angles that bring it into a posture.
 * Written from the meaning of the definition format alone; no function of shared/mechanics is used.
 */
export interface Hinge {
  name: string
  /** In the frame of the body it turns, standing. */
  axis: Vector
  /** radians */
  angle: number
}
export interface Part {
  name: string
  parent: string | null
  /** Joint centre in the parent's frame, m. */
  at: Vector
  hinges: Hinge[]
  /** kg, and m in the own frame. */
  mass: number
  centre: Vector
  /** Marked points in the own frame, m. */
  sites: Partial<Record<PointName, Vector>>
}

export const X: Vector = [1, 0, 0]
export const Y: Vector = [0, 1, 0]
export const Z: Vector = [0, 0, 1]
export const plus = (a: Vector, b: Vector): Vector => [a[0] + b[0], a[1] + b[1], a[2] + b[2]]
export const minus = (a: Vector, b: Vector): Vector => [a[0] - b[0], a[1] - b[1], a[2] - b[2]]
export const times = (a: Vector, k: number): Vector => [a[0] * k, a[1] * k, a[2] * k]
export const inner = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
export const outer = (a: Vector, b: Vector): Vector => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
]
export const normal = (a: Vector): Vector => times(a, 1 / Math.hypot(...a))
const radians = (angle: number) => (angle * Math.PI) / 180

/** Rodrigues' rotation of v about a unit axis. */
export function turned(v: Vector, axis: Vector, angle: number): Vector {
  const [c, s] = [Math.cos(angle), Math.sin(angle)]
  return plus(plus(times(v, c), times(outer(axis, v), s)), times(axis, inner(axis, v) * (1 - c)))
}

/** Standing direction of a straight arm and the axis that raises it in its plane, before the plane itself is turned. */
export function restingArm(plane: ArmPlane, side: Side): { direction: Vector; axis: Vector } {
  const lateral = side === 'left' ? Y : times(Y, -1)
  if (plane === 'sagittal') return { direction: times(Z, -1), axis: times(Y, -1) }
  if (plane === 'frontal') return { direction: times(Z, -1), axis: outer(times(Z, -1), lateral) }
  return { direction: lateral, axis: outer(lateral, X) }
}

/**
 * How the arm plane is turned from where the trunk carries it. Hands placed in world axes lie in a plane turned about the lateral
 * axis, so that it stands upright or leans to a hand that lies ahead; a hand placed off the plane turns it about p. Of the two
 * senses of a plane the one nearer the trunk's own counts.
 */
function planeHinge(
  arm: Arm | null,
  plane: ArmPlane,
  lean: number,
  pose: Pose,
  side: Side,
): { axis: Vector; angle: number } {
  const still = { axis: Y, angle: 0 }
  if (arm === null || !('hand' in arm) || arm.hand === undefined) return still
  const off = arm.hand[2] ?? 0
  const hand = arm.flat === undefined ? pose[`${side}.grip`] : pose[`${side}.wrist`]
  const reach = minus(hand, pose[`${side}.shoulder`])
  const between = (own: Vector, line: Vector, axis: Vector) => {
    const wanted = inner(line, own) < -1e-9 ? times(line, -1) : line
    return { axis, angle: Math.atan2(inner(outer(own, wanted), axis), inner(own, wanted)) }
  }
  if (arm.from === 'world') {
    if (plane === 'sagittal') return still
    const own = turned(plane === 'frontal' ? times(Z, -1) : X, Y, lean)
    return between(own, off === 0 ? Z : normal([reach[0], 0, reach[2]]), Y)
  }
  if (off === 0) return still
  const { direction, axis } = restingArm(plane, side)
  const inTrunk = turned(reach, Y, -lean)
  return between(outer(axis, direction), normal(minus(inTrunk, times(direction, inner(inTrunk, direction)))), direction)
}

/** The working arm's form, or the idle one's; null for an idle arm that just hangs. */
export function armForm(mechanics: ExerciseMechanics, frame: Frame, idle: boolean): Arm | null {
  if (!idle) return frame.arms
  return frame.offArm ?? (mechanics.sides === 'both' ? frame.arms : null)
}

function armHinges(
  mechanics: ExerciseMechanics,
  frame: Frame,
  solved: SolvedFrame,
  side: Side,
): { direction: Vector; upper: Hinge[]; elbow: Hinge[]; hand: Hinge } {
  const idle = side === 'left'
  const form = armForm(mechanics, frame, idle)
  const plane = form === null ? 'sagittal' : mechanics.armPlane
  const { direction, axis } = restingArm(plane, side)
  const lean = radians(solved.angles.trunkLean + solved.angles.lumbar)
  const turn = planeHinge(form, plane, lean, solved.pose, side)
  const inWorld = (v: Vector) => turned(turned(v, turn.axis, turn.angle), Y, lean)
  const worldAxis = inWorld(axis)
  const bone = (from: 'shoulder' | 'elbow' | 'wrist', to: 'elbow' | 'wrist' | 'fingers') =>
    normal(minus(solved.pose[`${side}.${to}`], solved.pose[`${side}.${from}`]))
  const signed = (from: Vector, to: Vector, about: Vector) => Math.atan2(inner(outer(from, to), about), inner(from, to))
  const [upperArm, forearm, hand] = [bone('shoulder', 'elbow'), bone('elbow', 'wrist'), bone('wrist', 'fingers')]
  const fold = form?.elbowSide === 'reversed' ? -1 : 1
  // The working arm (and its mirror image) by its reported angles; an idle arm has none, so its drawn ones are measured.
  const own = idle && mechanics.sides === 'oneAtATime'
  const shoulder = own ? signed(inWorld(direction), upperArm, worldAxis) : radians(solved.angles.shoulder)
  const elbow = own ? signed(upperArm, forearm, worldAxis) : fold * radians(solved.angles.elbow)
  const back = (v: Vector) => turned(turned(turned(v, Y, -lean), turn.axis, -turn.angle), axis, -(shoulder + elbow))
  const bend = outer(forearm, hand)
  const wrist: Hinge =
    form?.flat === undefined
      ? { name: `${side}.wrist`, axis, angle: signed(forearm, hand, worldAxis) }
      : {
          name: `${side}.wrist`,
          axis: back(normal(bend)),
          angle: Math.atan2(Math.hypot(...bend), inner(forearm, hand)),
        }
  return {
    direction,
    upper: [
      { name: `${side}.plane`, ...turn },
      { name: `${side}.shoulder`, axis, angle: shoulder },
    ],
    elbow: [
      { name: `${side}.elbow`, axis, angle: elbow },
      // The hinge of an elbow that lies in the plane: flexing carries the hand square to it, to the same side for both arms.
      { name: `${side}.elbow.across`, axis: times(outer(axis, direction), side === 'right' ? 1 : -1), angle: 0 },
    ],
    hand: wrist,
  }
}

function legAngles(solved: SolvedFrame, side: Side, own: boolean): Pick<PoseAngles, 'hip' | 'knee' | 'ankle'> {
  if (!own) return solved.angles
  const { pose } = solved
  const bone = (from: 'hip' | 'knee' | 'heel', to: 'knee' | 'ankle' | 'toe') =>
    normal(minus(pose[`${side}.${to}`], pose[`${side}.${from}`]))
  const angle = (from: Vector, to: Vector, about: Vector) =>
    (Math.atan2(inner(outer(from, to), about), inner(from, to)) * 180) / Math.PI
  const down = turned(times(Z, -1), Y, radians(solved.angles.trunkLean))
  const [thigh, shank, sole] = [bone('hip', 'knee'), bone('knee', 'ankle'), bone('heel', 'toe')]
  const front = turned(shank, Y, -Math.PI / 2)
  return { hip: angle(down, thigh, times(Y, -1)), knee: angle(thigh, shank, Y), ankle: angle(front, sole, Y) }
}

/** The segments of one athlete (mass kg, stature m), hinged, with the angles of one solved frame. */
export function linkedBody(
  mechanics: ExerciseMechanics,
  frame: Frame,
  solved: SolvedFrame,
  table: SegmentTable,
  athlete: { mass: number; stature: number },
): Part[] {
  const H = athlete.stature
  const m = athlete.mass
  const along = (direction: Vector, length: number) => times(direction, length * H)
  const hinge = (name: string, axis: Vector, degrees = 0): Hinge => ({ name, axis, angle: radians(degrees) })
  const { angles } = solved
  const parts: Part[] = [
    {
      name: 'pelvis',
      parent: null,
      at: [0, 0, 0],
      hinges: [],
      mass: table.pelvis.mass * m,
      centre: along(Z, table.pelvis.centre),
      sites: { pelvis: [0, 0, 0] },
    },
    {
      name: 'upperTrunk',
      parent: 'pelvis',
      at: along(Z, table.pelvis.length),
      hinges: [hinge('lumbar', Y, angles.lumbar), hinge('lumbar.lateral', X), hinge('lumbar.rotation', Z)],
      mass: table.upperTrunk.mass * m,
      centre: along(Z, table.upperTrunk.centre),
      sites: { lumbar: [0, 0, 0] },
    },
    {
      name: 'head',
      parent: 'upperTrunk',
      at: along(Z, table.upperTrunk.length),
      hinges: [hinge('neck', Y, angles.neck)],
      mass: table.head.mass * m,
      centre: along(Z, table.head.centre),
      sites: {
        neckBase: [0, 0, 0],
        headCentre: along(Z, table.head.centre),
        headTop: along(Z, table.head.length),
      },
    },
  ]
  for (const side of ['right', 'left'] as const) {
    const out = side === 'left' ? 1 : -1
    const { direction, upper, elbow, hand } = armHinges(mechanics, frame, solved, side)
    const ownLeg = side === 'left' && frame.offLeg !== undefined
    const leg = legAngles(solved, side, ownLeg)
    const limb = (
      name: 'upperArm' | 'forearm' | 'hand' | 'thigh' | 'shank',
      parent: string,
      at: Vector,
      hinges: Hinge[],
      line: Vector,
      sites: Part['sites'],
    ): Part => ({
      name: `${side}.${name}`,
      parent,
      at,
      hinges,
      mass: table[name].mass * m,
      centre: along(line, table[name].centre),
      sites,
    })
    const down = times(Z, -1)
    const foot = table.foot
    // The ankle stands over a quarter of the foot; the foot's own centre lies half way between sole and ankle.
    const sole = (share: number): Vector => [(share - 0.25) * foot.length * H, 0, -table.ankleHeight * H]
    parts.push(
      limb(
        'upperArm',
        'upperTrunk',
        plus(along(Z, table.upperTrunk.length), along(Y, out * table.shoulderHalfWidth)),
        upper,
        direction,
        {
          [`${side}.shoulder`]: [0, 0, 0],
        },
      ),
      limb('forearm', `${side}.upperArm`, along(direction, table.upperArm.length), elbow, direction, {
        [`${side}.elbow`]: [0, 0, 0],
      }),
      limb('hand', `${side}.forearm`, along(direction, table.forearm.length), [hand], direction, {
        [`${side}.wrist`]: [0, 0, 0],
        [`${side}.fingers`]: along(direction, table.hand.length),
      }),
      limb(
        'thigh',
        'pelvis',
        along(Y, out * table.hipHalfWidth),
        [hinge(`${side}.hip.abduction`, outer(down, [0, out, 0])), hinge(`${side}.hip`, times(Y, -1), leg.hip)],
        down,
        { [`${side}.hip`]: [0, 0, 0] },
      ),
      limb('shank', `${side}.thigh`, along(down, table.thigh.length), [hinge(`${side}.knee`, Y, leg.knee)], down, {
        [`${side}.knee`]: [0, 0, 0],
      }),
      {
        name: `${side}.foot`,
        parent: `${side}.shank`,
        at: along(down, table.shank.length),
        hinges: [hinge(`${side}.ankle`, Y, leg.ankle)],
        mass: foot.mass * m,
        centre: [sole(foot.centre / foot.length)[0], 0, (-table.ankleHeight * H) / 2],
        sites: { [`${side}.ankle`]: [0, 0, 0], [`${side}.heel`]: sole(0), [`${side}.toe`]: sole(1) },
      },
    )
  }
  return parts
}

const text = (v: Vector) => v.map((value) => value.toPrecision(17)).join(' ')

/** The model as MJCF, MuJoCo's own XML: hinges at rest, a free pelvis, massive segments, no contact. */
export function mjcf(parts: readonly Part[], gravity: number): string {
  const body = (part: Part): string => {
    const joints =
      part.parent === null
        ? '<freejoint name="pelvis"/>'
        : part.hinges.map((each) => `<joint name="${each.name}" type="hinge" axis="${text(each.axis)}"/>`).join('')
    const sites = Object.entries(part.sites)
      .map(([name, at]) => `<site name="${name}" pos="${text(at)}"/>`)
      .join('')
    const children = parts.filter((child) => child.parent === part.name).map(body)
    // The size of the inertia does not matter at rest; it only has to be possible.
    const inertia = part.mass * 0.01
    return `<body name="${part.name}" pos="${text(part.at)}">${joints}<inertial pos="${text(part.centre)}" mass="${part.mass.toPrecision(17)}" diaginertia="${inertia} ${inertia} ${inertia}"/>${sites}${children.join('')}</body>`
  }
  const roots = parts.filter((part) => part.parent === null).map(body)
  return `<mujoco><compiler angle="radian"/><option gravity="0 0 ${-gravity}"/><worldbody>${roots.join('')}</worldbody></mujoco>`
}
