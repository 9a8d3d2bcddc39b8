import { roleOf, type CutName, type LimbIndex, type SegmentRef } from './bodies'
import { flatBack } from './contacts'
import type { ExerciseMechanics } from './definition'
import { cutWrench } from './equilibrium'
import type { Force } from './loads'
import type { Posture } from './posture'
import { AXES, type Axis, type Term, type Vector } from './solution'
import { add, cross, dot, length, scale, subtract, unit } from './vector'
import type { Action } from './vocabulary'

/** Below this share of body weight × stature a moment is rounding, not work. */
const NEGLIGIBLE = 1e-12

/** One set of forces (gravity, or the load) in equilibrium: the segments' own weights, and what acts from outside. */
export interface ForceSet {
  weights: readonly Force[]
  external: readonly Force[]
}
const allOf = ({ weights, external }: ForceSet): Force[] => [...weights, ...external]

interface Cut {
  name: CutName
  limb?: LimbIndex
  at: Vector
  /** Axes read at this cut: moments about, or forces along, a unit direction. */
  read: { axis: Axis; direction: Vector; kind: 'moment' | 'force' }[]
}

const SHOULDER_AXIS = {
  sagittal: 'shoulderFlexion',
  frontal: 'shoulderAbduction',
  transverse: 'shoulderHorizontal',
} as const satisfies Record<string, Axis>

function cutsOf(mechanics: ExerciseMechanics, posture: Posture): Cut[] {
  const { up, forward } = posture.trunkAxes
  const lateral = cross(up, forward)
  const cuts: Cut[] = [
    {
      name: 'lumbar',
      at: posture.lumbar,
      read: [
        { axis: 'trunkFlexion', direction: lateral, kind: 'moment' },
        { axis: 'trunkLateral', direction: forward, kind: 'moment' },
        { axis: 'trunkRotation', direction: up, kind: 'moment' },
        { axis: 'lumbarAxial', direction: up, kind: 'force' },
      ],
    },
    { name: 'neck', at: posture.neckBase, read: [{ axis: 'neck', direction: lateral, kind: 'moment' }] },
  ]
  for (const limb of [0, 1] as const) {
    if (limb === 1 && mechanics.sides === 'both') continue
    const arm = posture.arms[limb]
    const leg = posture.legs[limb]
    const armAxis = cross(arm.plane.p, arm.plane.q)
    const relaxed = limb === 1 && posture.frame.offArm === undefined
    const forearm = unit(subtract(arm.wrist, arm.elbow))
    const flat = (limb === 1 ? (posture.frame.offArm ?? posture.frame.arms) : posture.frame.arms).flat !== undefined
    // Flexing a hand bent back on the ground turns it toward the line of the forearm.
    const flatAxis = unit(cross(arm.handDirection, forearm))
    const pelvisLateral = scale(cross(posture.pelvisAxes.up, posture.pelvisAxes.forward), -1)
    const outward: Vector = limb === 0 ? [0, -1, 0] : [0, 1, 0]
    cuts.push(
      {
        name: 'wrist',
        limb,
        at: arm.wrist,
        read: [
          flat
            ? { axis: 'wristFlexion', direction: flatAxis, kind: 'moment' }
            : { axis: arm.wristAxis.axis, direction: scale(armAxis, arm.wristAxis.sign), kind: 'moment' },
          { axis: 'handAxial', direction: forearm, kind: 'force' },
        ],
      },
      {
        name: 'elbow',
        limb,
        at: arm.elbow,
        read: [
          {
            axis: 'elbow',
            // Flexing an elbow that lies across carries both hands to the same side of their planes: mirror images.
            direction: arm.hingeAcross
              ? scale(unit(cross(armAxis, forearm)), limb === 0 ? 1 : -1)
              : scale(armAxis, arm.elbowSign),
            kind: 'moment',
          },
        ],
      },
      {
        name: 'shoulder',
        limb,
        at: arm.shoulder,
        read: [
          { axis: relaxed ? 'shoulderFlexion' : SHOULDER_AXIS[mechanics.armPlane], direction: armAxis, kind: 'moment' },
          // The arm pulls the girdle with the net force on it; the muscles answer the other way.
          { axis: 'scapulaVertical', direction: up, kind: 'force' },
          { axis: 'scapulaSagittal', direction: scale(forward, -1), kind: 'force' },
        ],
      },
      {
        name: 'hip',
        limb,
        at: leg.hip,
        read: [
          { axis: 'hipFlexion', direction: pelvisLateral, kind: 'moment' },
          { axis: 'hipAbduction', direction: cross(scale(posture.pelvisAxes.up, -1), outward), kind: 'moment' },
        ],
      },
      { name: 'knee', limb, at: leg.knee, read: [{ axis: 'knee', direction: [0, 1, 0], kind: 'moment' }] },
      { name: 'ankle', limb, at: leg.ankle, read: [{ axis: 'ankle', direction: [0, 1, 0], kind: 'moment' }] },
    )
  }
  return cuts
}

/**
 * The muscles' answer at every cut, for gravity (a) and for the load (b).
 * A moment axis answers −(external moment)·direction; of the force axes the scapular ones answer the arm's pull, while
 * `handAxial` and `lumbarAxial` report the external force itself (positive pulls the joint apart).
 * @param held segments that pads hold
 */
export function jointTerms(
  mechanics: ExerciseMechanics,
  posture: Posture,
  sets: { body: ForceSet; load: ForceSet },
  held: readonly SegmentRef[],
): Term[] {
  const terms: Term[] = []
  const [bodyForces, loadForces] = [allOf(sets.body), allOf(sets.load)]
  for (const cut of cutsOf(mechanics, posture)) {
    const mirrored = mechanics.sides === 'both' && cut.limb !== undefined
    const body = cutWrench(bodyForces, held, { ...cut, mirrored })
    const load = cutWrench(loadForces, held, { ...cut, mirrored })
    if (!body || !load) continue
    for (const { axis, direction, kind } of cut.read) {
      if (kind === 'moment' && cut.name === 'lumbar' && flatBack(mechanics)) continue
      if (cut.name === 'neck' && mechanics.headRests) continue
      const reports = axis === 'handAxial' || axis === 'lumbarAxial'
      const value = (side: { force: Vector; moment: Vector }) =>
        (reports ? 1 : -1) * dot(kind === 'moment' ? side.moment : side.force, direction)
      push(terms, { axis, role: roleOf(cut.limb), a: value(body), b: value(load) })
    }
  }
  gripTerms(mechanics, posture, sets, terms)
  return terms
}

function push(terms: Term[], term: Term): void {
  if (Math.abs(term.a) < NEGLIGIBLE && Math.abs(term.b) < NEGLIGIBLE) return
  terms.push(term)
}

/**
 * Grip: the force on the hand along its own line at the reference load, in full when it pulls the hand away from the
 * forearm, half when square to it, none when it presses into the palm: (1 + cos)/2. Our rule; no source.
 */
function gripTerms(
  mechanics: ExerciseMechanics,
  posture: Posture,
  sets: { body: ForceSet; load: ForceSet },
  terms: Term[],
): void {
  if (mechanics.grip === 'none' || mechanics.gripFree) return
  for (const limb of [0, 1] as const) {
    if (limb === 1 && mechanics.sides === 'both') continue
    const arm = posture.arms[limb]
    const frame = posture.frame
    if ((limb === 1 ? (frame.offArm ?? frame.arms) : frame.arms).flat !== undefined) continue
    const onHand = (set: ForceSet) =>
      set.external
        .filter(({ segment }) => segment.name === 'hand' && segment.limb === limb)
        .reduce<Vector>((sum, force) => add(sum, force.force), [0, 0, 0])
    const body = onHand(sets.body)
    const load = onHand(sets.load)
    const reference = mechanics.referenceLoad === 0 ? 1 : mechanics.referenceLoad
    const total = add(body, scale(load, reference))
    if (length(total) < NEGLIGIBLE) continue
    const line = unit(total)
    const openness = (1 + dot(line, unit(subtract(arm.wrist, arm.elbow)))) / 2
    push(terms, { axis: 'grip', role: roleOf(limb), a: openness * dot(body, line), b: openness * dot(load, line) })
  }
}

/** The axis and sign that an action works on. */
export function axisOfAction(action: Action): { axis: Axis; sign: 1 | -1 } {
  for (const axis of Object.keys(AXES) as Axis[]) {
    const [positive, negative] = AXES[axis]
    if (positive === action) return { axis, sign: 1 }
    if (negative === action) return { axis, sign: -1 }
  }
  throw new Error(`No axis carries ${action}`)
}

/** Adds what a lever machine or cuff asks directly of an action. */
export function addDirectMoments(mechanics: ExerciseMechanics, frameIndex: number, terms: Term[]): Term[] {
  const result = terms.map((term) => ({ ...term }))
  for (const moment of mechanics.moments ?? []) {
    const { axis, sign } = axisOfAction(moment.action)
    const middle = axis === 'neck' || axis.startsWith('trunk')
    const sides = middle || mechanics.sides === 'oneAtATime' || moment.share === 'each' ? 1 : 2
    const b = (sign * moment.arm * (moment.ratio ?? 1) * (moment.curve?.[frameIndex] ?? 1)) / sides
    const role = middle ? 'middle' : 'working'
    const standing = result.find((term) => term.axis === axis && term.role === role)
    // Where both ways count as one action (leaning or turning the trunk), the machine adds to what is there.
    const same = AXES[axis][0] === AXES[axis][1] && standing && (standing.b || standing.a) < 0 ? -1 : 1
    if (standing) standing.b += same * b
    else result.push({ axis, role, a: 0, b })
  }
  return result
}
