import type { ExerciseMechanics } from './definition'
import { AXES, type Axis, type Term } from './solution'
import type { Action } from './vocabulary'

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
