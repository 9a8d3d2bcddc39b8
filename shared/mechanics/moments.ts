import { roleOf, type CutName, type LimbIndex, type SegmentRef } from './bodies'
import { flatBack } from './contacts'
import type { ExerciseMechanics } from './definition'
import { cutWrench } from './equilibrium'
import { gripTerms } from './grip'
import type { Force, ForceSet } from './loads'
import type { Posture } from './posture'
import type { Axis, Term, Vector } from './solution'
import { cross, dot, scale, subtract, unit } from './vector'

/** Below this share of body weight × stature a moment is rounding, not work. */
const NEGLIGIBLE = 1e-12

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
      terms.push({ axis, role: roleOf(cut.limb), a: value(body), b: value(load) })
    }
  }
  return [...terms, ...gripTerms(mechanics, posture, sets)].filter(works)
}

/** Whether a term is more than rounding; one that is not a number stays, to be refused. */
const works = ({ a, b }: Term): boolean => !(Math.abs(a) < NEGLIGIBLE && Math.abs(b) < NEGLIGIBLE)
