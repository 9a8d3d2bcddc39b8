import loadMujoco from '@mujoco/mujoco'
import type { PointName, Vector } from '#shared/mechanics/solution'
import type { Part } from './mujoco-body'
import { inner, minus, mjcf, outer, plus, times } from './mujoco-body'
import type { Push } from './mujoco-loads'

const mujoco = await loadMujoco()

/** MuJoCo's object numbers for names (mjtObj). */
const BODY = 1
const JOINT = 3
const SITE = 6

export interface Wrench {
  force: Vector
  moment: Vector
}

/** One posture in MuJoCo, at rest. Forces in N, lengths in m; call `close` when done (the memory is not JavaScript's). */
export interface Rig {
  /** World place of a marked point. */
  point: (name: PointName) => Vector
  /** World direction of a hinge. */
  axis: (hinge: string) => Vector
  /**
   * What holds the posture still under gravity and the given pushes: the torque at every hinge, the force each part gets from its
   * parent, and the outside wrench about the mid-hip that the free pelvis would still need (zero when all is held).
   */
  hold: (pushes: readonly Push[]) => {
    torque: (hinge: string) => number
    fromParent: (part: string) => Vector
    missing: Wrench
  }
  /** Weight of a part (N) and where it acts (m). */
  weight: (part: string) => { force: Vector; at: Vector }
  close: () => void
}

/** Builds and poses a linked body. Pushes come in fractions of stature, so the stature is needed to place them. */
export function rig(parts: readonly Part[], setting: { lean: number; gravity: number; stature: number }): Rig {
  const model = mujoco.MjModel.from_xml_string(mjcf(parts, setting.gravity))
  const data = new mujoco.MjData(model)
  const id = (kind: number, name: string) => {
    const found = mujoco.mj_name2id(model, kind, name)
    if (found < 0) throw new Error(`MuJoCo has no ${name}`)
    return found
  }
  const at = (values: ArrayLike<number>, index: number): Vector => [
    values[3 * index]!,
    values[3 * index + 1]!,
    values[3 * index + 2]!,
  ]
  // The free pelvis: place, then a quaternion that leans it about the lateral axis.
  data.qpos.set([0, 0, 0, Math.cos(setting.lean / 2), 0, Math.sin(setting.lean / 2), 0], 0)
  for (const hinge of parts.flatMap((part) => part.hinges)) {
    data.qpos[model.jnt_qposadr[id(JOINT, hinge.name)]!] = hinge.angle
  }
  mujoco.mj_forward(model, data)

  const hold: Rig['hold'] = (pushes) => {
    data.qvel.fill(0)
    data.qacc.fill(0)
    data.xfrc_applied.fill(0)
    data.qfrc_applied.fill(0)
    for (const push of pushes) {
      const body = id(BODY, push.part)
      const place = times(push.at, setting.stature)
      const moment = times(push.moment ?? [0, 0, 0], setting.stature)
      // The same push twice: as generalised force for the torques, and as a body force for the forces inside.
      mujoco.mj_applyFT(model, data, [...push.force], [...moment], [...place], body, data.qfrc_applied)
      const about = plus(moment, outer(minus(place, at(data.xipos, body)), push.force))
      const row = [...push.force, ...about]
      row.forEach((value, index) => (data.xfrc_applied[6 * body + index]! += value))
    }
    mujoco.mj_inverse(model, data)
    mujoco.mj_rnePostConstraint(model, data)
    const needed = Array.from(data.qfrc_inverse as Float64Array, (value, index) => value - data.qfrc_applied[index]!)
    const inside = Array.from(data.cfrc_int as Float64Array)
    // A free joint's force is in world axes, its moment in those of the pelvis.
    const [c, s] = [Math.cos(setting.lean), Math.sin(setting.lean)]
    const [mx, my, mz] = [needed[3]!, needed[4]!, needed[5]!]
    return {
      torque: (hinge) => needed[model.jnt_dofadr[id(JOINT, hinge)]!]!,
      fromParent: (part) => at(inside.slice(6 * id(BODY, part) + 3), 0),
      missing: { force: [needed[0]!, needed[1]!, needed[2]!], moment: [mx * c + mz * s, my, -mx * s + mz * c] },
    }
  }
  return {
    point: (name) => at(data.site_xpos, id(SITE, name)),
    axis: (hinge) => at(data.xaxis, id(JOINT, hinge)),
    hold,
    weight: (part) => {
      const body = id(BODY, part)
      return { force: [0, 0, -model.body_mass[body]! * setting.gravity], at: at(data.xipos, body) }
    },
    close: () => {
      data.delete()
      model.delete()
    },
  }
}

/** The same wrench about another point (m). */
export const movedTo = (wrench: Wrench, from: Vector, to: Vector): Wrench => ({
  force: wrench.force,
  moment: plus(wrench.moment, outer(minus(from, to), wrench.force)),
})

/** The part of a wrench's moment about a direction. */
export const about = (wrench: Wrench, direction: Vector): number => inner(wrench.moment, direction)
