import type { Session } from '#shared/contract/session'

/** Everything that stands or was planned in a session, to be drawn. */
export const exerciseIdsOf = ({ slots }: Session): string[] =>
  slots.flatMap(({ exercise, swap }) => (swap === null ? [exercise.id] : [exercise.id, swap.exercise.id]))
