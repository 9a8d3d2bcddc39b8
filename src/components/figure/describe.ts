import { formatPercent } from '@/lib/format'
import { capitalise, jointWords, listWords } from '@/lib/words'
import type { Mark } from './marks'

/** “right elbow 31 % of strength, cap 50 %” */
export function describeMark({ joint, side, stress, cap }: Mark): string {
  const reach = `${jointWords(joint, side)} ${formatPercent(stress)} of strength`
  return cap === null || cap >= 1 ? reach : `${reach}, cap ${formatPercent(cap)}`
}

/** One sentence for those who do not see the drawing: “Pull-up, start. Right elbow 31 % of strength, cap 50 %; lower back 4 % of strength.” */
export function describeFigure(name: string, postures: readonly string[], marks: readonly Mark[]): string {
  const what = postures.length === 0 ? `${name}.` : `${name}, ${listWords(postures)}.`
  const telling = [...marks].sort((a, b) => b.stress - a.stress).filter((mark) => mark.stress >= 0.005)
  return telling.length === 0 ? what : `${what} ${capitalise(telling.map(describeMark).join('; '))}.`
}
