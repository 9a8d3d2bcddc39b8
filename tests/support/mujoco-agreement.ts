import {
  AXES,
  axisOfAction,
  SEGMENTS,
  type ExerciseMechanics,
  type ExerciseSolution,
  type Sex,
  type SolvedFrame,
  type Vector,
} from '#shared/mechanics/index'
import type { Pose } from '#shared/mechanics/solution'
import { rig, movedTo, type Wrench } from './mujoco'
import { linkedBody, minus, normal, outer, plus, times, turned, X, Y, Z, type Part } from './mujoco-body'
import { BEARING, heldParts, pushesOfLoad, type Push } from './mujoco-loads'
import { readings, type Reading } from './mujoco-readings'

/** Standard gravity, m/s². */
const G = 9.80665
/** Agreement asked of every value, and the floor below which a value is rounding: a share of (m + |L|)·g·H. */
const RELATIVE = 1e-6
const FLOOR = 1e-9

export interface Trial {
  sex: Sex
  /** kg */
  mass: number
  /** m */
  stature: number
  /** kg */
  load: number
}

/** What one check of an exercise found: how many values were compared, which joints pads hold from both sides, and what differs. */
export interface Agreement {
  compared: number
  untold: string[]
  misses: string[]
}

/** Parts on the far side of a part's joint. */
const beyond = (parts: readonly Part[], name: string): string[] => [
  name,
  ...parts.filter((part) => part.parent === name).flatMap((part) => beyond(parts, part.name)),
]

/** The pushes by which one group of contacts takes a force and moment about its centre, in equal shares. */
function shared(group: SolvedFrame['reactions'], wrench: Wrench, pelvis: Vector, stature: number): Push[] {
  return group.map((contact) => {
    const name = BEARING[contact.support]!
    const side = contact.role === 'idle' ? 'left' : 'right'
    return {
      part: name === 'upperTrunk' ? name : `${side}.${name}`,
      at: minus(contact.at, pelvis),
      force: times(wrench.force, 1 / group.length),
      moment: times(wrench.moment, 1 / group.length / stature),
    }
  })
}

const centreOf = (group: SolvedFrame['reactions']): Vector =>
  times(
    group.reduce<Vector>((sum, each) => plus(sum, each.at), [0, 0, 0]),
    1 / group.length,
  )

/**
 * Compares every term of a solved exercise with MuJoCo for one athlete and load. With `sizes` the wrist is compared without its
 * sign and name, which rest on how a hand holds a bar: postures that no hand takes have no true one.
 */
export function agreement(
  mechanics: ExerciseMechanics,
  solution: ExerciseSolution,
  trial: Trial,
  wrists: 'signed' | 'sizes' = 'signed',
): Agreement {
  const result: Agreement = { compared: 0, untold: [], misses: [] }
  const { mass, stature, load } = trial
  const held = heldParts(mechanics)
  solution.frames.forEach((solved, index) => {
    const parts = linkedBody(mechanics, mechanics.frames[index]!, solved, SEGMENTS[trial.sex], trial)
    const body = rig(parts, { lean: (solved.angles.trunkLean * Math.PI) / 180, gravity: G, stature })
    const miss = (what: string, ours: number, theirs: number) =>
      result.misses.push(`${solved.name}, ${what}: Pintle ${ours.toPrecision(9)}, MuJoCo ${theirs.toPrecision(9)}`)
    const compare = (what: string, ours: number, theirs: number, unit: number) => {
      result.compared += 1
      const allowed = RELATIVE * Math.abs(theirs) + FLOOR * unit
      // Written so that NaN is a miss.
      if (!(Math.abs(ours - theirs) <= allowed)) miss(what, ours, theirs)
    }
    const weight = (mass + Math.abs(load)) * G
    const { pelvis } = solved.pose
    const centred = Object.fromEntries(
      Object.entries(solved.pose).map(([name, place]) => [name, minus(place, pelvis)]),
    ) as unknown as Pose

    // The hinged body stands where the pose says (the grip is a point on the hand, not a joint).
    for (const name of Object.keys(centred) as (keyof Pose)[]) {
      if (name.endsWith('.grip')) continue
      const gap = minus(body.point(name), times(centred[name], stature))
      compare(`place of ${name}`, Math.hypot(...gap), 0, 1)
    }

    const loads = pushesOfLoad(mechanics, index, centred).map((push): Push => ({
      ...push,
      force: times(push.force, load * G),
    }))
    const { missing } = body.hold(loads)
    const contacts: Push[] = []
    if (held.length === 0) {
      const groups = [...new Set(mechanics.supports)].map((support) =>
        solved.reactions.filter((reaction) => reaction.support === support),
      )
      const [first = [], second] = groups
      const place = (group: SolvedFrame['reactions']) => times(minus(centreOf(group), pelvis), stature)
      const upright = (group: SolvedFrame['reactions']) =>
        group.reduce((sum, each) => sum + mass * G * each.a + load * G * each.b, 0)
      if (!second) {
        const need = movedTo(missing, [0, 0, 0], place(first))
        compare('upright reaction', upright(first), need.force[2], weight)
        contacts.push(...shared(first, need, pelvis, stature))
      } else {
        const aboutSecond = movedTo(missing, [0, 0, 0], place(second))
        const lever = minus(place(first), place(second))
        // The first pushes in a direction of its own, as much as makes the needed moment about the second's lateral axis.
        const push = firstPush(place(first))
        const onFirst: Wrench = {
          force: times(push, aboutSecond.moment[1] / outer(lever, push)[1]),
          moment: [0, 0, 0],
        }
        compare(`reaction of ${first[0]!.support}`, upright(first), onFirst.force[2], weight)
        contacts.push(...shared(first, onFirst, pelvis, stature))
        const rest = movedTo(body.hold([...loads, ...contacts]).missing, [0, 0, 0], place(second))
        compare(`reaction of ${second[0]!.support}`, upright(second), rest.force[2], weight)
        contacts.push(...shared(second, rest, pelvis, stature))
      }
      const left = body.hold([...loads, ...contacts]).missing
      compare('force left on the free pelvis', Math.hypot(...left.force), 0, weight)
      compare('moment left on the free pelvis', Math.hypot(...left.moment), 0, weight * stature)
    }

    const still = body.hold([...loads, ...contacts])
    for (const reading of readings(mechanics, index, solved, centred, body)) {
      const far = beyond(parts, reading.part)
      const heldFar = held.filter((part) => far.includes(part))
      const heldNear = held.filter((part) => !far.includes(part))
      if (mechanics.headRests && reading.axis === 'neck') {
        if (solved.terms.some((term) => term.axis === 'neck')) result.misses.push('neck under a resting head')
        result.untold.push(`${reading.role} ${reading.axis}`)
        continue
      }
      // A back flat on its pad asks nothing of the trunk muscles.
      if (mechanics.firstPushes === 'squareToTrunk' && reading.axis.startsWith('trunk')) {
        if (solved.terms.some((term) => term.axis === reading.axis))
          result.misses.push(`${reading.axis} under a flat back`)
        result.untold.push(`${reading.role} ${reading.axis}`)
        continue
      }
      const sizeOnly =
        reading.unsigned === true ||
        (wrists === 'sizes' && reading.part.endsWith('.hand') && reading.axis !== 'handAxial')
      const standing = solved.terms.filter(
        (term) =>
          term.role === reading.role && (term.axis === reading.axis || (sizeOnly && term.axis.startsWith('wrist'))),
      )
      if (standing.length > 1)
        result.misses.push(`${solved.name}, ${reading.axis} ${reading.role}: ${standing.length} terms for one axis`)
      const force = ['handAxial', 'lumbarAxial', 'scapulaVertical', 'scapulaSagittal'].includes(reading.axis)
      const unit = weight * (force ? 1 : stature)
      const span = G * (force ? 1 : stature)
      const ours = standing.reduce((sum, term) => sum + span * (mass * term.a + load * term.b), 0)
      const direct = span * load * directShare(mechanics, index, reading)
      const name = `${reading.role} ${reading.axis}`
      // Held beyond the joint: what lies there takes all that is missing, and the joint answers for the near side.
      let state = still
      if (heldFar.length > 0) {
        const twin = reading.part.replace('right.', 'left.')
        const pairOnly = heldNear.every((part) => beyond(parts, twin).includes(part))
        const mirrored = mechanics.sides === 'both' && twin !== reading.part && heldNear.length > 0 && pairOnly
        if (heldNear.length > 0 && !mirrored) {
          result.untold.push(name)
          compare(`${name}, held from both sides`, ours, direct, unit)
          continue
        }
        state = body.hold([...loads, ...(mirrored ? halves(reading.part, heldFar[0]!) : [padPush(heldFar[0]!)])])
      }
      const theirs = reading.read(state) + direct
      if (sizeOnly) compare(`size of ${name}`, Math.abs(ours), Math.abs(theirs), unit)
      else compare(name, ours, theirs, unit)
    }
    body.close()

    /** The way the first of two supports pushes from its middle (m from the mid-hip). */
    function firstPush(from: Vector): Vector {
      const { firstPushes, referenceLoad } = mechanics
      if (firstPushes === 'squareToTrunk') {
        return turned(X, Y, ((solved.angles.trunkLean + solved.angles.lumbar) * Math.PI) / 180)
      }
      if (firstPushes !== 'inward') return Z
      const weights = [
        ...parts.map((part) => body.weight(part.name)),
        ...pushesOfLoad(mechanics, index, centred).map((push) => ({
          force: times(push.force, referenceLoad * mass * G),
          at: times(push.at, stature),
        })),
      ]
      const total = weights.reduce((sum, { force }) => sum + force[2], 0)
      const weightLine = weights.reduce((sum, { force, at }) => sum + (at[0] * force[2]) / total, 0)
      return normal([weightLine - from[0], 0, body.point('neckBase')[2] - from[2]])
    }
    /** All that is missing, taken by one pad. */
    function padPush(part: string): Push {
      return { part, at: [0, 0, 0], force: missing.force, moment: times(missing.moment, 1 / stature) }
    }
    /** Gravity and load on a part and all beyond it, about the mid-hip. */
    function onLimb(part: string): Wrench {
      const far = beyond(parts, part)
      const forces = [
        ...far.map((each) => body.weight(each)),
        ...loads
          .filter((push) => far.includes(push.part))
          .map((push) => ({ force: push.force, at: times(push.at, stature) })),
      ]
      return forces.reduce<Wrench>(
        (sum, { force, at }) => ({ force: plus(sum.force, force), moment: plus(sum.moment, outer(at, force)) }),
        { force: [0, 0, 0], moment: [0, 0, 0] },
      )
    }
    /**
     * Both limbs held alike: each pad takes what acts on its limb, and half of what acts on the rest of the body, through the
     * lateral place of the limb's own joint.
     */
    function halves(cut: string, pad: string): Push[] {
      const joint = {
        thigh: 'hip',
        shank: 'knee',
        foot: 'ankle',
        upperArm: 'shoulder',
        forearm: 'elbow',
        hand: 'wrist',
      }[cut.replace('right.', '')]
      const limbs = (['right', 'left'] as const).map((side) => ({
        side,
        own: onLimb(cut.replace('right.', `${side}.`)),
      }))
      // What is missing is the opposite of all that acts; half of it without the limbs is each side's share.
      const half = (pick: (wrench: Wrench) => Vector) =>
        times(
          limbs.reduce((sum, { own }) => plus(sum, pick(own)), pick(missing)),
          0.5,
        )
      return limbs.flatMap(({ side, own }): Push[] => {
        const part = pad.replace('right.', `${side}.`)
        const y = centred[`${side}.${joint}` as keyof Pose][1]
        return [
          { part, at: [0, 0, 0], force: times(own.force, -1), moment: times(own.moment, -1 / stature) },
          {
            part,
            at: [0, y, 0],
            force: half((each) => each.force),
            moment: times(
              half((each) => each.moment),
              1 / stature,
            ),
          },
        ]
      })
    }
  })
  return result
}

/** What lever machines and cuffs ask of an axis directly, per L·g·H. */
function directShare(mechanics: ExerciseMechanics, index: number, reading: Reading): number {
  return (mechanics.moments ?? [])
    .filter((moment) => axisOfAction(moment.action).axis === reading.axis && reading.role !== 'idle')
    .reduce((sum, moment) => {
      const halves = reading.role === 'middle' || moment.share === 'each' || mechanics.sides === 'oneAtATime' ? 1 : 2
      const sign = AXES[reading.axis][0] === moment.action ? 1 : -1
      return sum + (sign * moment.arm * (moment.ratio ?? 1) * (moment.curve?.[index] ?? 1)) / halves
    }, 0)
}
